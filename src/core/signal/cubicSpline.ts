/**
 * Second derivatives of the natural cubic spline through points at unequal places; zero at both ends,
 *     h_(i-1) m_(i-1) + 2 (h_(i-1) + h_i) m_i + h_i m_(i+1) = 6 (Δ_i - Δ_(i-1)),  Δ_i = (y_(i+1) - y_i)/h_i
 * @param x       places, ascending, no two alike
 * @param y       values
 * @param count   points, ≥ 2
 * @param second  out: m at each point
 * @param work    at least `count` numbers
 * @see   de Boor (1978), A Practical Guide to Splines, ch. IV
 */
export function splineSecond(
  x: Float64Array,
  y: Float64Array,
  count: number,
  second: Float64Array,
  work: Float64Array,
): void {
  second[0] = 0;
  work[0] = 0;
  for (let i = 1; i < count - 1; i++) {
    const before = x[i] - x[i - 1];
    const after = x[i + 1] - x[i];
    const bend = (y[i + 1] - y[i]) / after - (y[i] - y[i - 1]) / before;
    const pivot = 2 * (before + after) - before * work[i - 1];
    work[i] = after / pivot;
    second[i] = (6 * bend - before * second[i - 1]) / pivot;
  }
  second[count - 1] = 0;
  for (let i = count - 2; i > 0; i--) second[i] -= work[i] * second[i + 1];
}

/** The spline between points i and i + 1. */
export function splineAt(
  x: Float64Array,
  y: Float64Array,
  second: Float64Array,
  i: number,
  place: number,
): number {
  const h = x[i + 1] - x[i];
  const b = (place - x[i]) / h;
  const a = 1 - b;
  return (
    a * y[i] + b * y[i + 1] + (((a * a * a - a) * second[i] + (b * b * b - b) * second[i + 1]) * (h * h)) / 6
  );
}
