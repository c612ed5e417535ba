import type { Shape } from "plotly.js";
import type { StationResult } from "../core/stationResult.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureCase, FigureOptions } from "./figureSpec.ts";
import { concernsKey } from "./flagConcern.ts";
import { isInside } from "./pageShapes.ts";
import { type Panel, placeX, placeY } from "./panel.ts";
import type { PlottedPoint } from "./stationTrace.ts";

/** Foot of the pole above the marker's middle, its length, and the size of the cloth, mm. */
const [foot, pole, cloth] = [1, 2.6, 1.3];

/**
 * A pennant over each station whose value of this quantity is in doubt. What is said of every station of a case
 * is no mark of any of them, and stands in the notes alone.
 * @param points those of `of.stations`, in their order
 */
export function flagPennants(
  of: FigureCase,
  key: string,
  points: readonly PlottedPoint[],
  panel: Panel,
  options: FigureOptions,
): Partial<Shape>[] {
  const shared = sharedCodes(of.stations, key);
  return of.stations.flatMap((station, i) => {
    const point = points[i];
    const isMarked = station.flags.some((flag) => concernsKey(flag, key) && !shared.has(flag.code));
    if (!isMarked || point?.x == null || point.y === null) return [];
    if (!isInside(panel.x.range, point.x) || !isInside(panel.y.range, point.y)) return [];
    return [pennant(placeX(panel, point.x), placeY(panel, point.y) + foot, options)];
  });
}

/** Codes of the doubts that every station of a case shares. */
function sharedCodes(stations: readonly StationResult[], key: string): ReadonlySet<string> {
  const codes = stations.map(
    ({ flags }) => new Set(flags.filter((flag) => concernsKey(flag, key)).map(({ code }) => code)),
  );
  const [first, ...others] = codes;
  return new Set([...(first ?? [])].filter((code) => others.every((each) => each.has(code))));
}

function pennant(x: number, y: number, options: FigureOptions): Partial<Shape> {
  const { pt } = drawingOf(options);
  const top = y + pole;
  const path = `M${x},${y} L${x},${top} L${x + cloth},${top - 0.45} L${x},${top - 0.9}`;
  return {
    type: "path",
    xref: "x",
    yref: "y",
    path,
    fillcolor: "rgba(0,0,0,0)",
    line: { color: options.tokens.ink, width: pt(0.5) },
  };
}
