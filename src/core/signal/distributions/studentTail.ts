import { incompleteBeta } from "./incompleteBeta.ts";
import { normalCdf } from "./normalCdf.ts";

/**
 * Two-sided tail of Student's t: the probability of |T| > t,
 *     I_x(ν/2, ½),   x = ν/(ν + t²)
 * @param t        any real; its sign does not matter
 * @param freedom  ν > 0; null or Infinity is the normal distribution
 * @returns        probability
 * @see            Abramowitz & Stegun (1964) 26.7.1
 */
export function studentTail(t: number, freedom: number | null): number {
  if (freedom === null || freedom === Infinity) return 2 * normalCdf(-Math.abs(t));
  const square = t * t;
  return incompleteBeta(freedom / (freedom + square), freedom / 2, 0.5, square / (freedom + square));
}
