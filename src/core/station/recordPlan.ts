import type { BranchCut } from "./branchCuts.ts";

/**
 * What the pilot (a record's first 2^20 samples, or all of it) decides for the whole record.
 * A plan is plain data: a record that has to be read once more is read with the plan it came back with.
 */
export interface RecordPlan {
  /** Time between samples: their mean where the steps are equal, their median where not; > 0. */
  readonly step: number;
  /** The steps are unequal: moments are weighted with the trapezoid rule, all else comes from equal steps made by splines. */
  readonly weighted: boolean;
  /** Last digit the time stamps are printed with; 0 where none was found. */
  readonly quantum: number;
  /** The stamps have too few digits and agree with a constant step: samples are counted, not timed. */
  readonly rounded?: boolean;
  /** Nobody has said yet that such stamps stand for a constant step. */
  readonly unconfirmed?: boolean;
  /** Restarts that reach back in time, for another reading: what they overtook is left out. */
  readonly cuts?: readonly BranchCut[];
  /** It was made for the whole record: a reading with it is the last. */
  readonly last?: boolean;
  /** Mean of u, v, w in the pilot, subtracted from every sample before anything is summed. */
  readonly reference: readonly number[];
  /** Slope of u, v, w in time about `centre`, subtracted too; zero unless a linear trend is removed. */
  readonly slope: readonly number[];
  /** Time at which the trend is zero. */
  readonly centre: number;
  /** Integral time of u in the pilot; null where its correlation does not fall to zero. */
  readonly integralTime: number | null;
  /** Set in the plan of a second reading: the pilot's integral time, which did not hold for the record. */
  readonly pilotTime?: number | null;
  /** Lag products are formed for 0 … lagLimit - 1 samples; a power of two. */
  readonly lagLimit: number;
  /** Every lagStride-th of them is kept; a power of two. */
  readonly lagStride: number;
  /** Samples in a segment of the Welch spectrum; a power of two. */
  readonly segment: number;
  /** Samples in the short segments that tell how the gradient varies along the record; a power of two. */
  readonly bandSegment: number;
  /** Samples in the smallest block, 64 · 2^m. */
  readonly blockSamples: number;
  /** Samples either side in the central difference behind the derivative skewness. */
  readonly derivativeStep: number;
}
