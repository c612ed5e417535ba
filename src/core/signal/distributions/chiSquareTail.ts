import { incompleteGamma } from "./incompleteGamma.ts";

/**
 * Tail of the chi-square distribution: the probability of a larger value, Γ(ν/2, x/2)/Γ(ν/2).
 * @param x        ≥ 0
 * @param freedom  ν > 0
 * @returns        probability, from 1 at x = 0 down to 0
 * @see            Abramowitz & Stegun (1964) 26.4.19
 */
export function chiSquareTail(x: number, freedom: number): number {
  return incompleteGamma(freedom / 2, x / 2).upper;
}
