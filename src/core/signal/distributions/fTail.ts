import { chiSquareTail } from "./chiSquareTail.ts";
import { incompleteBeta } from "./incompleteBeta.ts";

/**
 * Tail of the F distribution: the probability of a larger value,
 *     I_y(d2/2, d1/2),   y = d2/(d2 + d1 x)
 * @param x   ≥ 0
 * @param d1  degrees of freedom of the numerator, > 0
 * @param d2  of the denominator, > 0; Infinity leaves chi-square over d1
 * @returns   probability, from 1 at x = 0 down to 0
 * @see       Abramowitz & Stegun (1964) 26.6.2
 */
export function fTail(x: number, d1: number, d2: number): number {
  if (d2 === Infinity) return chiSquareTail(d1 * x, d1);
  const whole = d2 + d1 * x;
  return incompleteBeta(d2 / whole, d2 / 2, d1 / 2, (d1 * x) / whole);
}
