import type { Data } from "plotly.js";
import { present } from "./axisRange.ts";
import type { FigureCase, FigureOptions } from "./figureSpec.ts";
import type { PlottedPoint } from "./stationTrace.ts";
import { caseLine } from "./stationTrace.ts";

/** How lengths and Reynolds number grow where the energy decays with exponent n and C_ε is constant. */
export const impliedSlope = {
  L11: (n: number) => 1 - n / 2,
  lambda: () => 1 / 2,
  eta: (n: number) => (n + 1) / 4,
  Re_lambda: (n: number) => (1 - n) / 2,
} as const;

/**
 * A line of the slope that the fitted decay implies, through the geometric centre of the stations of the window.
 * None without a law, and none where the axis is not the distance from the virtual origin.
 */
export function impliedLine(
  of: FigureCase,
  points: readonly PlottedPoint[],
  key: keyof typeof impliedSlope,
  options: FigureOptions,
): Partial<Data>[] {
  const law = of.decay?.law;
  const used = points.filter(({ used, x, y }) => used && x !== null && x > 0 && y !== null && y > 0);
  if (!law || used.length < 2) return [];
  const slope = impliedSlope[key](law.n);
  const places = present(used.map(({ x }) => x));
  const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
  const level = Math.exp(mean(used.map(({ x, y }) => Math.log(y ?? 1) - slope * Math.log(x ?? 1))));
  const ends = [Math.min(...places), Math.max(...places)];
  return [
    caseLine(
      ends,
      ends.map((place) => level * place ** slope),
      of.mark,
      options,
      { weightPt: 0.95, dashed: true },
    ),
  ];
}
