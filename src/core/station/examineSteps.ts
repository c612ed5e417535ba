import { ReductionFailure } from "../failure.ts";
import type { RecordOrigin } from "../records.ts";
import { gapSteps, isEqualStep, printQuantum } from "./stepRule.ts";

export interface StepFacts {
  /** Mean step where the steps are equal, median where not, s. */
  readonly step: number;
  readonly quantum: number;
  /** Steps that differ from the record's. */
  readonly unequal: number;
}

const probe = 4096;

/**
 * Time between samples, from the stamps of a pilot. Stamps rounded to few digits still give the step to all
 * digits: it is then the mean one, over the whole pilot.
 * @param t       time stamps, s, ascending; null: the origin's step holds
 * @param count   stamps, ≥ 2
 * @param origin  where the record came from
 * @returns       step, last printed digit, and how many steps are unequal
 * @throws no-time, backward-time
 */
export function examineSteps(t: Float64Array | null, count: number, origin: RecordOrigin): StepFacts {
  if (t === null) {
    if (origin.step !== null && origin.step > 0) return { step: origin.step, quantum: 0, unequal: 0 };
    throw new ReductionFailure(
      "no-time",
      {
        message: "the record has no time column and no time step was given",
        remedy: "Name the time column, or give the time between samples.",
      },
      { file: origin.file },
    );
  }
  for (let i = 1; i < count; i++) if (t[i] < t[i - 1]) throw backwardTime(i, t[i - 1], t[i], origin);
  const quantum = Math.max(
    printQuantum(t, 0, Math.min(probe, count)),
    printQuantum(t, Math.max(0, count - probe), count),
  );
  const mean = (t[count - 1] - t[0]) / (count - 1);
  if (!(mean > 0)) throw sameTime(origin);
  if (countUnequal(t, count, mean, quantum) === 0) return { step: mean, quantum, unequal: 0 };
  const median = medianStep(t, count);
  const step = median > 0 ? median : mean;
  return { step, quantum, unequal: countUnequal(t, count, step, quantum) };
}

/** Steps between two samples that are not the record's; gaps are among them. */
function countUnequal(t: Float64Array, count: number, step: number, quantum: number): number {
  let unequal = 0;
  const rule = { step, quantum };
  for (let i = 1; i < count; i++) if (!isEqualStep(t[i] - t[i - 1], rule)) unequal++;
  return unequal;
}

function medianStep(t: Float64Array, count: number): number {
  const steps = new Float64Array(count - 1);
  for (let i = 1; i < count; i++) steps[i - 1] = t[i] - t[i - 1];
  steps.sort();
  return steps[Math.floor((count - 2) / 2)];
}

/** Time that runs backward: most often a restart whose older branch was kept. */
export function backwardTime(
  sample: number,
  before: number,
  after: number,
  origin: RecordOrigin,
): ReductionFailure {
  return new ReductionFailure(
    "backward-time",
    {
      message: `time runs backward at sample ${sample + 1}`,
      found: `${after} after ${before}`,
      expected: "ascending times",
      remedy: "Leave out the samples that a restart wrote twice, or give each run a file of its own.",
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

/** Length of time a sample stands for on one of its sides: none across a gap, where the record is cut. */
export function halfStep(step: number, usual: number): number {
  return step > gapSteps * usual ? 0 : step / 2;
}
