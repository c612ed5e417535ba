import type { FigureCase } from "./figureSpec.ts";

/** Whether a station belongs to the fit window: it was fitted, or it lies between the window's ends. */
export function isUsed({ decay }: FigureCase, x: number): boolean {
  if (decay === null) return false;
  const point = decay.points.find((candidate) => candidate.x === x);
  return point ? point.used : x >= decay.window[0] && x <= decay.window[1];
}
