import type { DecaySettings } from "../decayResult.ts";
import { type ChosenWindow, leastStations } from "./chooseWindow.ts";
import type { RawPoint } from "./decayPoints.ts";
import { fitWindow, type Refusal, type WindowFit } from "./fitWindow.ts";
import { placeAlong } from "./flightCourse.ts";

/**
 * The later windows whose intervals join those of an automatic window: a near field smaller than the scatter passes any
 * test, so every start from the chosen one to 2.5 times its x - x0 counts, as long as five stations are left.
 * @returns the laws of these windows, the chosen one first; refused ones are left in
 */
export function laterWindows(
  points: readonly RawPoint[],
  { first, last, fitted }: ChosenWindow,
  settings: DecaySettings,
): (WindowFit | Refusal)[] {
  if ("refused" in fitted) return [fitted];
  const { flight } = fitted;
  const { x0 } = fitted.fit;
  const farthest = x0 + 2.5 * (placeAlong(flight, points[first].x) - x0);
  const windows: (WindowFit | Refusal)[] = [fitted];
  for (let from = first + 1; from <= last - leastStations + 1; from++) {
    if (placeAlong(flight, points[from].x) > farthest) break;
    windows.push(fitWindow(points.slice(from, last + 1), settings, flight));
  }
  return windows;
}
