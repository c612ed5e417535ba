/** Counts, and sums of squares and cubes, of the increments of a sequence that arrives in chunks. */
export interface IncrementSums {
  readonly lags: readonly number[];
  /**
   * Takes the next samples, and adds the increments x_i - x_(i-l) that end among them to a row: their number,
   * the sum of their squares and of their cubes, three entries a lag.
   */
  add(row: Float64Array, x: Float64Array, from: number, to: number): void;
  /** What follows forms no increments with what came before. */
  restart(): void;
}

/** An increment over l samples is taken every l/2: those between are told by their neighbours. */
const shareOfLag = 2;

/**
 * Increments at a set of lags. Which are taken follows from the sample's index alone, so that chunks of any
 * length give the same increments.
 * @param lags  in samples, ≥ 1, ascending
 */
export function startIncrements(lags: readonly number[]): IncrementSums {
  const reach = lags.at(-1) ?? 0;
  let held = new Float64Array(reach);
  let known = 0;
  let index = 0;

  /** History first, then the samples. */
  function hold(x: Float64Array, from: number, to: number): void {
    const length = reach + to - from;
    if (held.length < length) {
      const longer = new Float64Array(length);
      longer.set(held.subarray(0, reach));
      held = longer;
    }
    held.set(x.subarray(from, to), reach);
  }
  return {
    lags,
    add(row, x, from, to) {
      hold(x, from, to);
      const end = reach + to - from;
      lags.forEach((lag, at) => {
        const first = reach + Math.max(0, lag - known);
        addIncrements(row.subarray(3 * at, 3 * at + 3), held, lag, first, end, index - reach);
      });
      held.copyWithin(0, end - reach, end);
      known += to - from;
      index += to - from;
    },
    restart() {
      known = 0;
    },
  };
}

function addIncrements(
  sums: Float64Array,
  x: Float64Array,
  lag: number,
  first: number,
  end: number,
  offset: number,
): void {
  const stride = Math.max(1, Math.floor(lag / shareOfLag));
  // counted from the start of the sequence: every stride-th sample
  const start = Math.ceil((first + offset) / stride) * stride - offset;
  let [count, squares, cubes] = [0, 0, 0];
  for (let i = start; i < end; i += stride) {
    const d = x[i] - x[i - lag];
    count++;
    squares += d * d;
    cubes += d * d * d;
  }
  sums[0] += count;
  sums[1] += squares;
  sums[2] += cubes;
}

/** Whole lags from `first` to `last`, ten a decade, from one series for all records: 1 2 3 4 5 6 8 10 13 16 … */
export function incrementLags(first: number, last: number): number[] {
  const lags: number[] = [];
  for (let j = 0; ; j++) {
    const lag = Math.round(10 ** (j / 10));
    if (lag > last) return lags;
    if (lag >= first && lags.at(-1) !== lag) lags.push(lag);
  }
}
