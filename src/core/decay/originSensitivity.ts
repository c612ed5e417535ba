import { type LawCourse, lawDistance, lawRate } from "./lawDistance.ts";

/**
 * How far n moves with x0 along the ridge of nearly equal fits: the slope of ln q stays what it is at the geometric
 * centre of the window,
 *     dn/dx0 = -n/(x_c - x0),   x_c - x0 = sqrt((x_first - x0)(x_last - x0))
 * and along the time of flight with its distances, times ds/dx at the origin.
 * @param law    n and x0 as fitted or held
 * @param window x of the first and of the last station used, unit of x
 * @returns      1/unit of x; null where the origin lies at the first station
 */
export function originSensitivity(
  law: LawCourse & { readonly n: number },
  [first, last]: readonly [number, number],
): number | null {
  // two roots, so that the product of two tiny distances does not underflow
  const centre = Math.sqrt(lawDistance(law, first)) * Math.sqrt(lawDistance(law, last));
  const slope = (-law.n * lawRate(law, law.x0)) / centre;
  return Number.isFinite(slope) ? slope : null;
}
