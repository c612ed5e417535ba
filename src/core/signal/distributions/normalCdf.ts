import { incompleteGamma } from "./incompleteGamma.ts";

/**
 * Standard normal distribution function,
 *     Φ(x) = ½ Γ(½, x²/2)/Γ(½) for x < 0, and 1 - Φ(-x) above
 * @param x  any real
 * @returns  probability of a value below x; the lower tail keeps its digits
 * @see      Abramowitz & Stegun (1964) 26.2
 */
export function normalCdf(x: number): number {
  const half = incompleteGamma(0.5, (x * x) / 2).upper / 2;
  return x < 0 ? half : 1 - half;
}
