import type { FigureCase } from "./figureSpec.ts";

/**
 * Whether a station belongs to the fit window: it was fitted, or it lies between the window's ends.
 * Before a case has been fitted nothing lies outside.
 */
export function isUsed({ decay }: FigureCase, x: number): boolean {
  if (decay === null) return true;
  const point = decay.points.find((candidate) => candidate.x === x);
  return point ? point.used : x >= decay.window[0] && x <= decay.window[1];
}
