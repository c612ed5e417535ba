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
  const places = points.slice(first, last + 1).map(({ x }) => placeAlong(flight, x));
  const later = laterStarts(places, fitted.fit.x0).slice(1);
  return [
    fitted,
    ...later.map((after) => fitWindow(points.slice(first + after, last + 1), settings, flight)),
  ];
}

/**
 * The starts that count, by their order in the window; the first is its own.
 * @param places of the stations along the law, in order
 * @param x0     of the law, on the same axis
 */
export function laterStarts(places: readonly number[], x0: number): number[] {
  const farthest = x0 + 2.5 * (places[0] - x0);
  return places.flatMap((place, i) =>
    i === 0 || (i <= places.length - leastStations && place <= farthest) ? [i] : [],
  );
}
