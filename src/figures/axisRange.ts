/** Numbers that are there: figures leave gaps for the rest. */
export function present(values: Iterable<number | null | undefined>): number[] {
  return [...values].filter((value): value is number => typeof value === "number" && Number.isFinite(value));
}

/** A range on a logarithmic axis with a margin on each side, as a share of its length. */
export function logRange(values: readonly (number | null)[], margin = 0.06): [number, number] {
  const above = present(values).filter((value) => value > 0);
  if (above.length === 0) return [0.1, 10];
  const low = Math.log10(Math.min(...above));
  const high = Math.log10(Math.max(...above));
  const room = Math.max((high - low) * margin, 0.04);
  return [10 ** (low - room), 10 ** (high + room)];
}

/** A range on a straight axis with a margin on each side; `include` is kept inside. */
export function linearRange(
  values: readonly (number | null)[],
  { include = [], margin = 0.08 }: { include?: readonly number[]; margin?: number } = {},
): [number, number] {
  const all = [...present(values), ...include];
  if (all.length === 0) return [0, 1];
  const [low, high] = [Math.min(...all), Math.max(...all)];
  // numbers that differ by rounding alone are one number
  const span = high - low > 1e-9 * Math.max(Math.abs(low), Math.abs(high)) ? high - low : 0;
  const room = span * margin || Math.abs(high) * 0.1 || 1;
  return [low - room, high + room];
}

/** From zero, or from below zero where there is something there, to a little above the largest. */
export function streamwiseRange(values: readonly (number | null)[]): [number, number] {
  const all = present(values);
  if (all.length === 0) return [0, 1];
  const [low, high] = [Math.min(...all, 0), Math.max(...all)];
  const room = (high - low) * 0.06 || 1;
  return [low < 0 ? low - room : 0, high + room];
}
