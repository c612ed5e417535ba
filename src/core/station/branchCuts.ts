import type { OwnCut } from "./cutList.ts";

/** A restart whose time reaches back into what was there already. */
interface Restart {
  /** Index of the newer run's first sample, counted over all samples of the file. */
  readonly sample: number;
  /** Its time. */
  readonly time: number;
  /** Samples of the older run that were left out. */
  readonly dropped: number;
}
export interface BranchCut extends Restart {
  /** Time that the older run had reached. */
  readonly from: number;
}

/** A restart as it is listed. */
export function listedCut({ sample, time, from, dropped }: BranchCut): OwnCut {
  return { at: sample + 1, kind: "backward", from, to: time, samples: dropped };
}

/** A sample of the older run goes where it lies within half a step of the restart, or later. */
export const cutTolerance = 0.5;

/**
 * Leaves out what restarts have overtaken, once all restarts are known: a sample goes where any later run began
 * at its time or before. What a sequence of cuts would leave is the same.
 */
export class CutSieve<Cut extends Restart> {
  private readonly cuts: readonly Cut[];
  /** Earliest restart from the i-th on, less the tolerance. */
  private readonly bounds: Float64Array;
  private readonly gone: Float64Array;
  private readonly tolerance: number;
  private next = 0;

  /** @param cuts  in order of `sample` */
  constructor(cuts: readonly Cut[], step: number) {
    this.cuts = cuts;
    this.tolerance = cutTolerance * step;
    this.bounds = new Float64Array(cuts.length + 1).fill(Infinity);
    this.gone = new Float64Array(cuts.length);
    for (let j = cuts.length - 1; j >= 0; j--) {
      this.bounds[j] = Math.min(this.bounds[j + 1], cuts[j].time - this.tolerance);
    }
  }

  /** Whether a sample stays; to be asked in the order of the samples. */
  keeps(sample: number, time: number): boolean {
    while (this.next < this.cuts.length && this.cuts[this.next].sample <= sample) this.next++;
    if (time <= this.bounds[this.next]) return true;
    for (let j = this.next; j < this.cuts.length; j++) {
      if (time <= this.cuts[j].time - this.tolerance) continue;
      this.gone[j]++;
      break;
    }
    return false;
  }

  /** The cuts with the samples that each took. */
  tally(): Cut[] {
    return this.cuts.map((cut, j) => ({ ...cut, dropped: this.gone[j] }));
  }
}
