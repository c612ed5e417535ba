/**
 * Standard deviation that a normal would have with the same central 68 %: the outliers of a few refits that run far
 * upstream do not count.
 * @param draws in any order
 * @returns     in the unit of the values; null where one draw in ten gave no number
 */
export function spreadOf(draws: Float64Array): number | null {
  const values = draws.filter(Number.isFinite).sort();
  if (values.length < 0.9 * draws.length) return null;
  const at = (share: number) => {
    const place = share * (values.length - 1);
    const below = Math.floor(place);
    const above = Math.min(below + 1, values.length - 1);
    return values[below] + (place - below) * (values[above] - values[below]);
  };
  const spread = (at(0.8413447460685429) - at(0.15865525393145707)) / 2;
  return Number.isFinite(spread) ? spread : null;
}
