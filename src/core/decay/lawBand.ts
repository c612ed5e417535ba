import type { PowerLaw } from "../decayResult.ts";

/**
 * The law at one place: q = A ((x - x0)/ell)^(-n).
 * @param x above x0
 * @returns q; null at or before the virtual origin
 */
export function lawAt({ A, x0, n, length }: PowerLaw, x: number): number | null {
  return x > x0 ? A * ((x - x0) / length) ** -n : null;
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
export function lawVariance({ covariance, x0, n, length }: PowerLaw, x: number, order: 0 | 1): number {
  if (!(x > x0)) return 0;
  const distance = Math.log((x - x0) / length);
  const by = [1, (n + order) / (x - x0), (order === 1 ? 1 / n : 0) - distance];
  let sum = 0;
  for (let row = 0; row < 3; row++)
    for (let column = 0; column < 3; column++) sum += by[row] * covariance[3 * row + column] * by[column];
  return Math.max(sum, 0);
}

/** Variance of ln q(to) - ln q(from), both of one law and above its origin. */
export function lawChangeVariance({ covariance, x0, n }: PowerLaw, from: number, to: number): number {
  const byOrigin = n / (to - x0) - n / (from - x0);
  const byExponent = -Math.log((to - x0) / (from - x0));
  const sum =
    byOrigin ** 2 * covariance[4] +
    2 * byOrigin * byExponent * covariance[5] +
    byExponent ** 2 * covariance[8];
  return Math.max(sum, 0);
}
