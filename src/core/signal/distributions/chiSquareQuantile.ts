import { chiSquareTail } from "./chiSquareTail.ts";
import { invertTail } from "./invertTail.ts";
import { logGamma } from "./logGamma.ts";
import { normalQuantile } from "./normalQuantile.ts";

/**
 * Quantile of the chi-square distribution.
 * @param p        from 0 to 1; 0.95 gives 3.84 for one degree of freedom
 * @param freedom  ν > 0
 * @returns        x with P(X < x) = p
 */
export function chiSquareQuantile(p: number, freedom: number): number {
  const half = freedom / 2;
  const front = -half * Math.LN2 - logGamma(half);
  // Wilson and Hilferty's cube: a guess good to a few per cent
  const cube = 1 - 2 / (9 * freedom) + normalQuantile(p) * Math.sqrt(2 / (9 * freedom));
  const guess = freedom * cube ** 3;
  return invertTail(
    {
      tail: (x) => chiSquareTail(x, freedom),
      density: (x) => Math.exp(front + (half - 1) * Math.log(x) - x / 2),
    },
    1 - p,
    guess > 0 && Number.isFinite(guess) ? guess : freedom,
  );
}
