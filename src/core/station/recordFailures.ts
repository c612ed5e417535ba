import { ReductionFailure } from "../failure.ts";
import type { RecordOrigin } from "../records.ts";
import type { BranchCut } from "./branchCuts.ts";

/** A record too short for any statistics. */
export function tooFew(count: number, fewest: number, origin: RecordOrigin): ReductionFailure {
  return new ReductionFailure(
    "too-few-samples",
    {
      message: "the record is too short to be reduced",
      found: count === 1 ? "1 sample" : `${count} samples`,
      expected: `${fewest} or more`,
      remedy: "Leave the file out, or give a longer record.",
    },
    { file: origin.file },
  );
}

/** A velocity that is no finite number: the reader lets none through, so it overflowed or was built in. */
export function notFinite(origin: RecordOrigin): ReductionFailure {
  return new ReductionFailure(
    "not-a-number",
    {
      message: "a velocity is not a finite number",
      remedy: "Name the tokens that mean a missing value, or leave the lines out.",
    },
    { file: origin.file },
  );
}

/** A signal that does not change: a dead probe, or the wrong column. */
export function constantSignal(value: number, origin: RecordOrigin): ReductionFailure {
  return new ReductionFailure(
    "constant-signal",
    {
      message: "u does not change over the whole record",
      found: `${value} in every sample`,
      remedy: "Check which column is taken as u, and whether the probe was recording.",
    },
    { file: origin.file },
  );
}

/** Time that runs backward so far that nothing is left once the older runs are cut. */
export function backwardTime(cut: BranchCut, left: number, origin: RecordOrigin): ReductionFailure {
  return new ReductionFailure(
    "backward-time",
    {
      message: `time runs backward, first at sample ${cut.sample + 1}, and of the newest run too little is left`,
      found: `time ${cut.time} there, and ${left} samples after the last restart`,
      expected: "ascending times",
      remedy: "Sort the samples by time, choose another time column, or give each run a file of its own.",
    },
    { file: origin.file },
  );
}
