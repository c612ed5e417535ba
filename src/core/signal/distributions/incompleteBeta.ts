import { logGamma } from "./logGamma.ts";

const tiny = 1e-300;
const most = 100_000;

/**
 * Regularized incomplete beta function,
 *     I_x(a, b) = ∫₀^x t^(a-1) (1-t)^(b-1) dt / B(a, b),
 * by its continued fraction, taken on the side where it converges fast: I_x(a, b) = 1 - I_(1-x)(b, a).
 * @param x  from 0 to 1
 * @param a  > 0
 * @param b  > 0
 * @param complement  1 - x, where the caller has it more exactly than the subtraction would give it
 * @returns  from 0 to 1
 * @see      Abramowitz & Stegun (1964) 26.5.8; the fraction by the method of Lentz (1976)
 */
export function incompleteBeta(x: number, a: number, b: number, complement = 1 - x): number {
  if (x <= 0) return 0;
  if (complement <= 0) return 1;
  const front = Math.exp(
    logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log(complement),
  );
  if (x < (a + 1) / (a + b + 2)) return (front * fraction(x, a, b)) / a;
  return 1 - (front * fraction(complement, b, a)) / b;
}

function fraction(x: number, a: number, b: number): number {
  let c = 1;
  let d = 1 / guard(1 - ((a + b) * x) / (a + 1));
  let value = d;
  for (let m = 1; m < most; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / guard(1 + even * d);
    c = guard(1 + even / c);
    value *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / guard(1 + odd * d);
    c = guard(1 + odd / c);
    value *= d * c;
    if (Math.abs(d * c - 1) < 1e-16) break;
  }
  return value;
}

function guard(value: number): number {
  return Math.abs(value) < tiny ? tiny : value;
}
