import type { PowerLaw } from "../decayResult.ts";
import { bare, estimate, type Quantity } from "../quantity.ts";

/**
 * n and x0 with the symmetric intervals of the covariance, to be held against those of the profile: value ± t s, s from the
 * covariance of (ln A, x0, n).
 * @param law adopted
 * @returns   n (1) and x0 (unit of x); without an interval where it was held
 * @see       Bates & Watts (1988), Nonlinear Regression Analysis, §2.3
 */
export function covarianceIntervals({ n, x0, covariance, quantile }: PowerLaw): {
  readonly n: Quantity;
  readonly x0: Quantity;
} {
  const about = (value: number, variance: number) => {
    if (!(variance > 0)) return bare(value, "held, not fitted");
    const half = quantile * Math.sqrt(variance);
    return estimate(value, value - half, value + half);
  };
  return { n: about(n, covariance[8]), x0: about(x0, covariance[4]) };
}
