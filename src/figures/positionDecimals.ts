/** No position is written with more. */
const most = 6;
/** Of the least distance between two positions: rounding may move none by more. */
const share = 0.01;

/**
 * Decimals that write a case's positions so that each is told from its neighbours and stands where it is:
 * the fewest that move none by more than a hundredth of the least distance between two of them.
 * @param xs positions in any order; one alone is held to four digits
 */
export function positionDecimals(xs: readonly number[]): number {
  const sorted = [...new Set(xs)].sort((a, b) => a - b);
  const steps = sorted.slice(1).map((x, i) => x - sorted[i]);
  const scale = steps.length > 0 ? Math.min(...steps) : Math.abs(sorted[0] ?? 0) * share;
  // a number that decimals cannot write exactly is off by its rounding in the last binary digit
  const allowed = scale * share;
  for (let decimals = 0; decimals < most; decimals++) {
    const off = (x: number) => Math.abs(Number(x.toFixed(decimals)) - x);
    if (sorted.every((x) => off(x) <= Math.max(allowed, Math.abs(x) * 1e-12))) return decimals;
  }
  return most;
}
