/**
 * Borders of bins of equal width in the logarithm, none narrower than one point:
 * at the low end a bin is a point, from there on it holds as many as its share of a decade asks for.
 * @param first      first index, ≥ 1
 * @param end        index after the last
 * @param perDecade  bins a decade
 * @returns          ascending borders, from first to end: bin b holds the points border[b] … border[b+1] - 1
 */
export function logBins(first: number, end: number, perDecade: number): number[] {
  const borders = [first];
  const growth = 10 ** (1 / perDecade);
  for (let border = first; border < end; ) {
    border = Math.min(Math.max(border + 1, Math.round(border * growth)), end);
    borders.push(border);
  }
  return borders;
}
