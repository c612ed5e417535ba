import type { Data } from "plotly.js";
import { type CaseMark, caseMark } from "./caseMark.ts";
import { type Drawing, dashOf, drawingOf } from "./drawing.ts";
import type { FigureOptions } from "./figureSpec.ts";

/** One station on a panel; what is null leaves a gap. */
export interface PlottedPoint {
  readonly x: number | null;
  readonly y: number | null;
  readonly low: number | null;
  readonly high: number | null;
  /** Inside the fit window. */
  readonly used: boolean;
  /** Streamwise position of the station: what hovering tells. */
  readonly station: number;
}

/** Markers with their 95 % bars: filled inside the window, open outside and where there is no interval. */
export function stationTrace(
  points: readonly PlottedPoint[],
  mark: number,
  name: string,
  options: FigureOptions,
  sizeMm = 1.5,
): Partial<Data> {
  const drawing = drawingOf(options);
  const sign = caseMark(options.tokens, mark);
  const filled = points.map((point) => point.used && !sign.open && hasInterval(point));
  return {
    type: "scatter",
    mode: "markers",
    name,
    x: points.map(({ x }) => x),
    y: points.map(({ y }) => y),
    customdata: points.map(({ station }) => station),
    hoverinfo: "none",
    marker: markerOf(sign, drawing, sizeMm, {
      color: filled.map((full) => (full ? sign.colour : options.tokens.paper)),
    }),
    error_y: {
      type: "data",
      symmetric: false,
      array: points.map(({ y, high }) => (y === null || high === null ? null : Math.max(high - y, 0))),
      arrayminus: points.map(({ y, low }) => (y === null || low === null ? null : Math.max(y - low, 0))),
      visible: points.some(hasInterval),
      color: sign.colour,
      thickness: drawing.pt(0.6),
      // Plotly counts half a cap.
      width: drawing.mm(0.5),
    },
  } as Partial<Data>;
}

const hasInterval = ({ low, high }: PlottedPoint) => low !== null || high !== null;

function markerOf(sign: CaseMark, { mm, pt }: Drawing, sizeMm: number, fill: { color: string | string[] }) {
  // Triangles and diamonds look smaller than a circle of the same width.
  const grown = sign.marker === "circle" || sign.marker === "square" ? 1 : 1.2;
  return {
    symbol: sign.marker,
    size: mm(sizeMm) * grown,
    opacity: 1,
    ...fill,
    line: { color: sign.colour, width: pt(0.6) },
  };
}

/** One marker of a case, filled (or open from the seventh case on): legends and best fits. */
export function loneMarker(
  at: { x: number; y: number },
  mark: number,
  options: FigureOptions,
  sizeMm = 1.5,
): Partial<Data> {
  const sign = caseMark(options.tokens, mark);
  const color = sign.open ? options.tokens.paper : sign.colour;
  return {
    type: "scatter",
    mode: "markers",
    x: [at.x],
    y: [at.y],
    hoverinfo: "skip",
    marker: markerOf(sign, drawingOf(options), sizeMm, { color }),
  } as Partial<Data>;
}

/** A line in the case's colour: thick with its dash, or thin and solid. */
export function caseLine(
  x: readonly (number | null)[],
  y: readonly (number | null)[],
  mark: number,
  options: FigureOptions,
  line: { weightPt: number; dashed: boolean },
): Partial<Data> {
  const sign = caseMark(options.tokens, mark);
  return {
    type: "scatter",
    mode: "lines",
    x: [...x],
    y: [...y],
    hoverinfo: "skip",
    connectgaps: false,
    line: {
      color: sign.colour,
      width: drawingOf(options).pt(line.weightPt),
      dash: line.dashed ? dashOf(sign.dash, options.scale) : "solid",
      simplify: false,
    },
  } as Partial<Data>;
}
