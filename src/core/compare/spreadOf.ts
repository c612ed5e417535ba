/**
 * Standard deviation that a normal would have with the same central 68 %: the outliers of a few refits that run far
 * upstream do not count.
 * @param values overwritten: sorted in place
 */
export function spreadOf(values: Float64Array): number {
  values.sort();
  const at = (share: number) => {
    const place = share * (values.length - 1);
    const below = Math.floor(place);
    const above = Math.min(below + 1, values.length - 1);
    return values[below] + (place - below) * (values[above] - values[below]);
  };
  return (at(0.8413447460685429) - at(0.15865525393145707)) / 2;
}
