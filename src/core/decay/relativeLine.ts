import { estimate, type Quantity } from "../quantity.ts";
import { type StraightLine, straightLine } from "./straightLine.ts";

/** Rounds in which the errors are referred to the line itself. */
const rounds = 3;

/** A line through values whose relative errors are known: the errors are taken of the line, not of its scatter. */
export function relativeLine(
  x: readonly number[],
  y: readonly number[],
  errors: readonly number[] | null,
): StraightLine | null {
  if (errors === null) return straightLine(x, y, null);
  let line = straightLine(
    x,
    y,
    errors.map((error, i) => error * y[i]),
  );
  for (let round = 0; round < rounds && line !== null; round++) {
    const { intercept, slope } = line;
    const expected = x.map((at) => intercept + slope * at);
    if (expected.some((value) => !(value > 0))) break;
    line = straightLine(
      x,
      y,
      errors.map((error, i) => error * expected[i]),
    );
  }
  return line;
}

/**
 * Where a line is zero, with its interval: all x0 for which |intercept + slope x0| is within its own error.
 * @param quantile Student's t, 97.5 %
 * @param variance of a weighted residual
 * @param why      said where a slope of zero is not excluded
 * @see            Fieller (1954), J. R. Statist. Soc. B 16, 175
 */
export function zeroOfLine(line: StraightLine, quantile: number, variance: number, why: string): Quantity {
  const { intercept, slope } = line;
  const value = -intercept / slope;
  const factor = quantile ** 2 * variance;
  const a = slope ** 2 - factor * line.varianceOfSlope;
  const half = intercept * slope - factor * line.covariance;
  const c = intercept ** 2 - factor * line.varianceOfIntercept;
  if (!(a > 0)) {
    return { value, low: null, high: null, why_low: why, why_high: why };
  }
  const root = Math.sqrt(Math.max(half ** 2 - a * c, 0));
  return estimate(value, (-half - root) / a, (-half + root) / a);
}
