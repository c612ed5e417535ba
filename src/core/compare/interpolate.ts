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

/**
 * Mean of a piecewise straight curve over a part of its range (exact); its value there where the part is a point.
 * @param s    ascending places
 * @param from where the part begins; no lower than s[0]
 * @param to   where it ends; no higher than the last s
 */
export function meanBetween(s: ArrayLike<number>, y: ArrayLike<number>, from: number, to: number): number {
  let area = 0;
  for (let i = 0; i < s.length - 1; i++) {
    const low = Math.max(s[i], from);
    const high = Math.min(s[i + 1], to);
    if (high > low) area += (high - low) * valueAt(s, y, i, (low + high) / 2);
  }
  if (to > from) return area / (to - from);
  let piece = 0;
  while (piece < s.length - 2 && s[piece + 1] < from) piece++;
  return s.length < 2 ? y[0] : valueAt(s, y, piece, from);
}

function valueAt(s: ArrayLike<number>, y: ArrayLike<number>, piece: number, at: number): number {
  const width = s[piece + 1] - s[piece];
  return width > 0 ? y[piece] + ((at - s[piece]) / width) * (y[piece + 1] - y[piece]) : y[piece];
}
