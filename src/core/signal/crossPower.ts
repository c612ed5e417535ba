/** Σ Re(X_f conj Y_f) over the segments of two sequences whose transforms arrive one sequence after the other. */
export interface CrossPower {
  /** f = 0 … size/2. */
  readonly power: Float64Array;
  /** The transform of a segment of the first sequence; kept until that of the second arrives. */
  first(transform: Float64Array): void;
  /** The transform of the same segment of the second sequence. */
  second(transform: Float64Array): void;
}

/** @param size  samples a segment */
export function startCrossPower(size: number): CrossPower {
  const power = new Float64Array(size / 2 + 1);
  const bins = size + 2;
  const waiting: Float64Array[] = [];
  const spare: Float64Array[] = [];
  return {
    power,
    first(transform) {
      const kept = spare.pop() ?? new Float64Array(bins);
      kept.set(transform.subarray(0, bins));
      waiting.push(kept);
    },
    second(transform) {
      const kept = waiting.shift();
      if (kept === undefined) return;
      for (let f = 0, i = 0; f < power.length; f++, i += 2) {
        power[f] += kept[i] * transform[i] + kept[i + 1] * transform[i + 1];
      }
      spare.push(kept);
    },
  };
}
