/** y = intercept + slope x, with the covariance of both. */
export interface StraightLine {
  readonly intercept: number;
  readonly slope: number;
  readonly varianceOfIntercept: number;
  readonly varianceOfSlope: number;
  readonly covariance: number;
  /** Weighted sum of squared residuals. */
  readonly sum: number;
  readonly freedom: number;
}

/**
 * Weighted straight line.
 * @param error standard error of each y; null: equal weights, the covariance then that of residuals of variance one
 * @returns     null where fewer than two x differ
 */
export function straightLine(
  x: readonly number[],
  y: readonly number[],
  error: readonly number[] | null,
): StraightLine | null {
  const weights = x.map((_, i) => (error === null ? 1 : 1 / error[i] ** 2));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const mean = (values: readonly number[]) =>
    values.reduce((sum, value, i) => sum + weights[i] * value, 0) / total;
  const [centre, level] = [mean(x), mean(y)];
  const spread = x.reduce((sum, value, i) => sum + weights[i] * (value - centre) ** 2, 0);
  if (!(spread > 0)) return null;
  const slope = x.reduce((sum, value, i) => sum + weights[i] * (value - centre) * (y[i] - level), 0) / spread;
  const intercept = level - slope * centre;
  return {
    intercept,
    slope,
    varianceOfIntercept: 1 / total + centre ** 2 / spread,
    varianceOfSlope: 1 / spread,
    covariance: -centre / spread,
    sum: x.reduce((sum, value, i) => sum + weights[i] * (y[i] - intercept - slope * value) ** 2, 0),
    freedom: x.length - 2,
  };
}
