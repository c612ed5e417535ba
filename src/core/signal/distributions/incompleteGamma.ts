import { logGamma } from "./logGamma.ts";

const tiny = 1e-300;
const most = 100_000;

/**
 * Regularized incomplete gamma function, both parts, each without cancellation:
 *     lower = ∫₀^x t^(a-1) e^-t dt / Γ(a)  by its series where x < a + 1,
 *     upper = 1 - lower                    by its continued fraction elsewhere
 * @param a  > 0
 * @param x  ≥ 0
 * @returns  lower and upper, 1 in sum
 * @see      Abramowitz & Stegun (1964) 6.5.29, 6.5.31; the fraction by the method of Lentz (1976)
 */
export function incompleteGamma(a: number, x: number): { lower: number; upper: number } {
  if (x <= 0) return { lower: 0, upper: 1 };
  if (x === Infinity) return { lower: 1, upper: 0 };
  const front = Math.exp(a * Math.log(x) - x - logGamma(a));
  if (x < a + 1) {
    const lower = front * series(a, x);
    return { lower, upper: 1 - lower };
  }
  const upper = front * fraction(a, x);
  return { lower: 1 - upper, upper };
}

function series(a: number, x: number): number {
  let term = 1 / a;
  let sum = term;
  for (let i = 1; i < most && term > sum * 1e-17; i++) {
    term *= x / (a + i);
    sum += term;
  }
  return sum;
}

function fraction(a: number, x: number): number {
  let b = x + 1 - a;
  let c = 1 / tiny;
  let d = 1 / b;
  let value = d;
  for (let i = 1; i < most; i++) {
    const step = -i * (i - a);
    b += 2;
    d = 1 / guard(step * d + b);
    c = guard(b + step / c);
    value *= d * c;
    if (Math.abs(d * c - 1) < 1e-16) break;
  }
  return value;
}

function guard(value: number): number {
  return Math.abs(value) < tiny ? tiny : value;
}
