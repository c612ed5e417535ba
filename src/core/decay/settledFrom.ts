import { isEstimate, type Quantity } from "../quantity.ts";

/** The last stations whose mean is taken as the settled value. */
const lastStations = 3;

/**
 * From where on a quantity has settled: the first station after which no interval contradicts that the quantity lies
 * within a tolerance of its last value (the mean of the last three). A value without an interval stands for itself.
 * @param values    one for each station in order of x; missing ones are passed over
 * @param tolerance allowed distance from the last value, in the quantity's own unit; > 0
 * @returns         index of that station; null where fewer than four stations carry the quantity
 */
export function settledFrom(values: readonly Quantity[], tolerance: number): number | null {
  const known = values.flatMap((value, at) => (isEstimate(value) ? [{ ...value, at }] : []));
  if (known.length <= lastStations) return null;
  const last = known.slice(-lastStations).reduce((sum, { value }) => sum + value / lastStations, 0);
  const contradicting = known.filter(
    ({ value, low, high }) => (low ?? value) > last + tolerance || (high ?? value) < last - tolerance,
  );
  return contradicting.length === 0 ? 0 : contradicting[contradicting.length - 1].at + 1;
}
