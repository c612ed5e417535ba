import { ReductionFailure } from "../failure.ts";
import type { RecordOrigin, RoundedTimes } from "../records.ts";
import { roundedStep } from "./roundedTimes.ts";
import { gapSteps, isEqualStep, printQuantum } from "./stepRule.ts";

export interface StepFacts {
  /** Mean step where the steps are equal, median where not, s. */
  readonly step: number;
  readonly quantum: number;
  /** The stamps have too few digits, and agree with a constant step all the same. */
  readonly rounded: boolean;
  /** Steps that differ from the record's; gaps are not among them. */
  readonly unequal: number;
  /** The longest stretch without a gap: its first sample, and the one after its last. */
  readonly longest: readonly [number, number];
}

const probe = 4096;

/**
 * Time between samples, from the stamps of a pilot. Stamps rounded to few digits still give the step to all
 * digits: it is then that of the straight line through them.
 * @param t       time stamps, s, ascending; null: the origin's step holds
 * @param count   stamps, ≥ 2
 * @param origin  where the record came from
 * @param times   "written": stamps with few digits are taken for what they say
 * @returns       step, last printed digit, and how many steps are unequal
 * @throws no-time
 */
export function examineSteps(
  t: Float64Array | null,
  count: number,
  origin: RecordOrigin,
  times: RoundedTimes = "even",
): StepFacts {
  const whole = [0, count] as const;
  if (t === null) {
    if (origin.step === null || !(origin.step > 0)) throw withoutStep(origin);
    return { step: origin.step, quantum: 0, rounded: false, unequal: 0, longest: whole };
  }
  const mean = (t[count - 1] - t[0]) / (count - 1);
  if (!(mean > 0)) throw sameTime(origin);
  const quantum = quantumOf(t, count);
  if (countUnequal(t, count, mean) === 0) {
    return { step: mean, quantum, rounded: false, unequal: 0, longest: whole };
  }
  const median = medianStep(t, count);
  const longest = longestStretch(t, count, gapSteps * median);
  const rounded = times === "written" ? null : roundedStep(t, ...longest, quantum);
  if (rounded !== null) return { step: rounded, quantum, rounded: true, unequal: 0, longest };
  const step = meanWithin(t, count, gapSteps * median);
  if (countUnequal(t, count, step) === 0) return { step, quantum, rounded: false, unequal: 0, longest };
  const usual = meanNear(t, count, median);
  return { step: usual, quantum, rounded: false, unequal: countUnequal(t, count, usual), longest };
}

function quantumOf(t: Float64Array, count: number): number {
  const ends = [
    printQuantum(t, 0, Math.min(probe, count)),
    printQuantum(t, Math.max(0, count - probe), count),
  ];
  // a digit is that of all stamps: the finer of the two ends decides, and none at either end is none at all
  return Math.min(...ends);
}

/** Steps between two samples that are not the record's, gaps left aside. */
function countUnequal(t: Float64Array, count: number, step: number): number {
  let unequal = 0;
  const rule = { step, quantum: 0, rounded: false };
  for (let i = 1; i < count; i++) {
    const own = t[i] - t[i - 1];
    if (own <= gapSteps * step && !isEqualStep(own, rule)) unequal++;
  }
  return unequal;
}

/** Mean of the steps that are no gap. */
function meanWithin(t: Float64Array, count: number, gap: number): number {
  let sum = 0;
  let steps = 0;
  for (let i = 1; i < count; i++) {
    const step = t[i] - t[i - 1];
    if (step > gap) continue;
    sum += step;
    steps++;
  }
  return sum / steps;
}

/** Mean of the steps that are the median one: their rounding adds up over a record. */
function meanNear(t: Float64Array, count: number, median: number): number {
  const rule = { step: median, quantum: 0 };
  let sum = 0;
  let steps = 0;
  for (let i = 1; i < count; i++) {
    if (!isEqualStep(t[i] - t[i - 1], rule)) continue;
    sum += t[i] - t[i - 1];
    steps++;
  }
  return sum / steps;
}

function longestStretch(t: Float64Array, count: number, gap: number): readonly [number, number] {
  let best: readonly [number, number] = [0, 0];
  let from = 0;
  for (let i = 1; i <= count; i++) {
    if (i < count && t[i] - t[i - 1] <= gap) continue;
    if (i - from > best[1] - best[0]) best = [from, i];
    from = i;
  }
  return best;
}

/** Median of the steps that are longer than none. */
function medianStep(t: Float64Array, count: number): number {
  const steps = new Float64Array(count - 1);
  let held = 0;
  for (let i = 1; i < count; i++) if (t[i] > t[i - 1]) steps[held++] = t[i] - t[i - 1];
  return steps.subarray(0, held).sort()[Math.floor((held - 1) / 2)];
}

function withoutStep(origin: RecordOrigin): ReductionFailure {
  return new ReductionFailure(
    "no-time",
    {
      message: "the record has no time column and no time step was given",
      remedy: "Name the time column, or give the time between samples.",
    },
    { file: origin.file },
  );
}

function sameTime(origin: RecordOrigin): ReductionFailure {
  return new ReductionFailure(
    "no-time",
    {
      message: "all samples carry the same time",
      remedy: "Choose another time column, or give the time between samples.",
    },
    { file: origin.file },
  );
}
