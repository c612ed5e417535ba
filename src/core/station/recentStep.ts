/** Steps before a restart that tell how long one is. */
const recent = 1000;

/** Median of the last steps that are longer than none. */
export function recentStep(t: Float64Array, count: number): number {
  const steps: number[] = [];
  for (let i = Math.max(1, count - recent); i < count; i++) if (t[i] > t[i - 1]) steps.push(t[i] - t[i - 1]);
  return steps.sort((a, b) => a - b)[steps.length >> 1] ?? 0;
}
