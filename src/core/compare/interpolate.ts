/**
 * Piecewise straight interpolation at ascending places; beyond an end the last piece is carried on.
 * @param s  ascending coordinates, at least two
 * @param y  values there
 * @param at ascending places
 */
export function interpolate(
  s: ArrayLike<number>,
  y: ArrayLike<number>,
  at: ArrayLike<number>,
  out: Float64Array,
): void {
  let piece = 0;
  for (let i = 0; i < at.length; i++) {
    while (piece < s.length - 2 && s[piece + 1] < at[i]) piece++;
    const width = s[piece + 1] - s[piece];
    // two stations at one place: the first of them
    const share = width > 0 ? (at[i] - s[piece]) / width : 0;
    out[i] = y[piece] + share * (y[piece + 1] - y[piece]);
  }
}

/** Mean of a piecewise straight curve over its range (trapezoid, exact); its one value where the range is a point. */
export function meanOver(s: ArrayLike<number>, y: ArrayLike<number>): number {
  const last = s.length - 1;
  if (!(s[last] > s[0])) return y[0];
  let area = 0;
  for (let i = 0; i < last; i++) area += ((y[i] + y[i + 1]) / 2) * (s[i + 1] - s[i]);
  return area / (s[last] - s[0]);
}
