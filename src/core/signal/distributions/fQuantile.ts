import { chiSquareQuantile } from "./chiSquareQuantile.ts";
import { fTail } from "./fTail.ts";
import { invertTail } from "./invertTail.ts";
import { logGamma } from "./logGamma.ts";

/**
 * Quantile of the F distribution.
 * @param p   from 0 to 1
 * @param d1  degrees of freedom of the numerator, > 0
 * @param d2  of the denominator, > 0; Infinity leaves chi-square over d1
 * @returns   x with P(X < x) = p
 */
export function fQuantile(p: number, d1: number, d2: number): number {
  if (d2 === Infinity) return chiSquareQuantile(p, d1) / d1;
  const front = logGamma((d1 + d2) / 2) - logGamma(d1 / 2) - logGamma(d2 / 2) + (d1 / 2) * Math.log(d1 / d2);
  return invertTail(
    {
      tail: (x) => fTail(x, d1, d2),
      density: (x) =>
        Math.exp(front + (d1 / 2 - 1) * Math.log(x) - ((d1 + d2) / 2) * Math.log1p((d1 * x) / d2)),
    },
    1 - p,
    1,
  );
}
