/** Every so many bands one bar: the intervals of neighbours are alike. */
const barEvery = 3;

/** Upright strokes from low to high, as one broken line. */
export function barsOf(x: readonly number[], low: readonly number[], high: readonly number[]) {
  const shown = x.flatMap((_, i) => (i % barEvery === 0 ? [i] : []));
  return [shown.flatMap((i) => [x[i], x[i], null]), shown.flatMap((i) => [low[i], high[i], null])] as const;
}
