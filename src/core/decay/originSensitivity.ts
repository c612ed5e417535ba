/**
 * How far n moves with x0 along the ridge of nearly equal fits: the slope of ln q stays what it is at the geometric
 * centre of the window,
 *     dn/dx0 = -n/(x_c - x0),   x_c - x0 = sqrt((x_first - x0)(x_last - x0))
 * @param law    n and x0 as fitted or held
 * @param window x of the first and of the last station used, unit of x
 * @returns      1/unit of x; null where the origin lies at the first station
 */
export function originSensitivity(
  { n, x0 }: { readonly n: number; readonly x0: number },
  [first, last]: readonly [number, number],
): number | null {
  // two roots, so that the product of two tiny distances does not underflow
  const slope = -n / (Math.sqrt(first - x0) * Math.sqrt(last - x0));
  return Number.isFinite(slope) ? slope : null;
}
