import type { Dash, Shape, ShapeLine } from "plotly.js";
import { dashOf, drawingOf } from "./drawing.ts";
import type { FigureOptions } from "./figureSpec.ts";
import { type Panel, placeX, placeY } from "./panel.ts";

type Placed = Pick<Panel, "box" | "x" | "y">;

/** A line between two places of the page, mm. */
export function pageLine(
  from: readonly [number, number],
  to: readonly [number, number],
  line: Partial<ShapeLine>,
): Partial<Shape> {
  const [x0, y0] = from;
  const [x1, y1] = to;
  return { type: "line", xref: "x", yref: "y", layer: "below", x0, y0, x1, y1, line };
}

/** Dashed line over a panel's whole width: a level to compare with. */
export function levelLine(
  panel: Placed,
  level: number,
  options: FigureOptions,
  dashed = true,
): Partial<Shape>[] {
  if (!isInside(panel.y.range, level)) return [];
  const at = placeY(panel, level);
  return [pageLine([panel.box.left, at], [panel.box.right, at], referenceLine(options, dashed))];
}

/** Dashed line over a panel's whole height. */
export function uprightLine(
  panel: Placed,
  value: number,
  options: FigureOptions,
  dashed = true,
): Partial<Shape>[] {
  if (!isInside(panel.x.range, value)) return [];
  const at = placeX(panel, value);
  return [pageLine([at, panel.box.bottom], [at, panel.box.top], referenceLine(options, dashed))];
}

export function isInside([low, high]: readonly [number, number], value: number): boolean {
  return value >= low && value <= high;
}

function referenceLine(options: FigureOptions, dashed: boolean) {
  const { pt } = drawingOf(options);
  return {
    color: options.tokens.ink2,
    width: pt(0.5),
    dash: (dashed ? dashOf([3, 3], options.scale) : "solid") as Dash,
  };
}

/** Shaded stretch of the y axis (or of the x axis) under everything else. */
export function shadedBand(
  panel: Placed,
  [low, high]: readonly [number, number],
  options: FigureOptions,
  along: "x" | "y" = "y",
): Partial<Shape> {
  const { box } = panel;
  const clamp = (value: number, [least, most]: readonly [number, number]) =>
    Math.min(Math.max(value, least), most);
  const ends =
    along === "y"
      ? {
          x0: box.left,
          x1: box.right,
          y0: placeY(panel, clamp(low, panel.y.range)),
          y1: placeY(panel, clamp(high, panel.y.range)),
        }
      : {
          x0: placeX(panel, clamp(low, panel.x.range)),
          x1: placeX(panel, clamp(high, panel.x.range)),
          y0: box.bottom,
          y1: box.top,
        };
  return {
    type: "rect",
    xref: "x",
    yref: "y",
    layer: "below",
    ...ends,
    fillcolor: options.tokens.tol,
    line: { width: 0 },
  };
}
