/** Sums of the first and of the last l samples of a sequence that arrives in chunks, for l = 0, stride, … */
export interface EdgeSums {
  add(x: Float64Array, from: number, to: number): void;
  heads(): Float64Array;
  tails(): Float64Array;
  /** Pairs of samples l apart, for l = 0, stride, … */
  pairs(): Float64Array;
  /** What follows forms no pairs with what came before: its edges are added to those before. */
  restart(): void;
}

/**
 * With them a constant can be taken out of lag products afterwards and exactly: for N samples and sum S,
 *     Σ (x_i - d)(x_(i-l) - d) = Σ x_i x_(i-l) - d (2S - head_l - tail_l) + (N - l) d²
 * @param limit   lags 0 … limit - 1
 * @param stride  every stride-th lag is kept; a divisor of limit
 */
export function startEdges(limit: number, stride: number): EdgeSums {
  const first = new Float64Array(limit);
  const recent = new Float64Array(limit);
  let count = 0;
  const lags = limit / stride;
  const before = {
    heads: new Float64Array(lags),
    tails: new Float64Array(lags),
    pairs: new Float64Array(lags),
  };

  const heads = () => runningSums(limit, stride, (l) => (l < count ? first[l] : 0));
  const tails = () => runningSums(limit, stride, (l) => (l < count ? recent[(count - 1 - l) % limit] : 0));
  const pairs = () => Float64Array.from({ length: lags }, (_, i) => Math.max(0, count - i * stride));
  const sumOf = (a: Float64Array, b: Float64Array) => a.map((value, l) => value + b[l]);

  return {
    add(x, from, to) {
      for (let i = from; i < to && count + i - from < limit; i++) first[count + i - from] = x[i];
      // only the last `limit` of them can stay
      for (let i = Math.max(from, to - limit); i < to; i++) recent[(count + i - from) % limit] = x[i];
      count += to - from;
    },
    heads: () => sumOf(before.heads, heads()),
    tails: () => sumOf(before.tails, tails()),
    pairs: () => sumOf(before.pairs, pairs()),
    restart() {
      before.heads = sumOf(before.heads, heads());
      before.tails = sumOf(before.tails, tails());
      before.pairs = sumOf(before.pairs, pairs());
      count = 0;
    },
  };
}

function runningSums(limit: number, stride: number, at: (l: number) => number): Float64Array {
  const sums = new Float64Array(limit / stride);
  let sum = 0;
  for (let l = 0; l < limit; l++) {
    if (l % stride === 0) sums[l / stride] = sum;
    sum += at(l);
  }
  return sums;
}
