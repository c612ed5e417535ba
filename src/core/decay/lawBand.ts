import type { PowerLaw } from "../decayResult.ts";
import { lawDistance, lawRate } from "./lawDistance.ts";

/**
 * The law at one place: q = A ((x - x0)/ell)^(-n).
 * @param x above x0
 * @returns q; null at or before the virtual origin
 */
export function lawAt(law: PowerLaw, x: number): number | null {
  return x > law.x0 ? law.A * (lawDistance(law, x) / law.length) ** -law.n : null;
}

/** Values of a law with its 95 % band; null at or before the virtual origin. */
export interface LawBand {
  readonly q: readonly (number | null)[];
  readonly low: readonly (number | null)[];
  readonly high: readonly (number | null)[];
}

/**
 * The law with the band that the covariance of its numbers gives ln q:
 *     var(ln q) = g' C g,   g = (1, n/(x - x0), -ln((x - x0)/ell))
 * and along the time of flight s - s0 for x - x0, and g of x0 times ds/dx there.
 * @param xs places, in the unit of x0
 */
export function lawBand(law: PowerLaw, xs: readonly number[]): LawBand {
  const q = xs.map((x) => lawAt(law, x));
  const spread = xs.map((x) => Math.exp(law.quantile * Math.sqrt(lawVariance(law, x, 0))));
  return {
    q,
    low: q.map((value, i) => (value === null ? null : value / spread[i])),
    high: q.map((value, i) => (value === null ? null : value * spread[i])),
  };
}

/**
 * Variance of ln q (order 0) or of ln(-dq/dx) (order 1) at one place, from the law's covariance; 0 before the origin.
 *     ln(-dq/dx) = ln n + ln A - (n + 1) ln((x - x0)/ell) - ln ell
 */
export function lawVariance(law: PowerLaw, x: number, order: 0 | 1): number {
  const { covariance, x0, n, length } = law;
  if (!(x > x0)) return 0;
  const distance = lawDistance(law, x);
  const byOrigin = (lawRate(law, x0) * (n + order)) / distance;
  const by = [1, byOrigin, (order === 1 ? 1 / n : 0) - Math.log(distance / length)];
  let sum = 0;
  for (let row = 0; row < 3; row++)
    for (let column = 0; column < 3; column++) sum += by[row] * covariance[3 * row + column] * by[column];
  return Math.max(sum, 0);
}

/** Variance of ln q(to) - ln q(from), both of one law and above its origin. */
export function lawChangeVariance(law: PowerLaw, from: number, to: number): number {
  const { covariance, n } = law;
  const [before, after] = [lawDistance(law, from), lawDistance(law, to)];
  const byOrigin = lawRate(law, law.x0) * (n / after - n / before);
  const byExponent = -Math.log(after / before);
  const sum =
    byOrigin ** 2 * covariance[4] +
    2 * byOrigin * byExponent * covariance[5] +
    byExponent ** 2 * covariance[8];
  return Math.max(sum, 0);
}
