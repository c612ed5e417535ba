import type { Flag } from "../flag.ts";
import { jointLayout, pairIndex } from "../signal/jointMoments.ts";
import type { ReduceSettings } from "../stationResult.ts";
import { type BranchCut, listedCut } from "./branchCuts.ts";
import { joinCuts } from "./cutList.ts";
import { replan } from "./planRecord.ts";
import type { ClosedRecord, RecordChunks } from "./recordChunks.ts";
import { wholeMoments } from "./recordCorrelation.ts";
import type { RecordPlan } from "./recordPlan.ts";
import { recordTime } from "./recordTime.ts";
import type { StationPart } from "./stationPart.ts";
import { timeFlags } from "./timeFlags.ts";

/** The integral time of the whole record may differ by so much from the pilot's. */
const allowedChange = 0.25;

/** What is known of a record that is read once more. */
export interface Reading {
  /** Its plan is the whole record's: there is no other reading after it. */
  readonly last: boolean;
  /** Restarts, and what each of them overtook. */
  readonly cuts: readonly BranchCut[];
}

/**
 * Closes a record: the part, or the plan for another reading. There is one where time ran back into what had been
 * summed already, so that the restarts are known; and a last one where the pilot did not stand for the whole.
 */
export function settle(
  record: RecordChunks,
  { last, cuts }: Reading,
  settings: ReduceSettings,
): { part: StationPart } | { again: RecordPlan } {
  const { plan, facts } = record;
  const closed = record.close();
  const sums = closed.sums.part({
    start: facts.start,
    samples: closed.samples,
    duration: closed.duration,
    lowestSpeed: closed.lowestSpeed,
    flags: [],
  });
  const all = [...cuts, ...facts.cuts];
  const listed = joinCuts([{ first: all.map(listedCut), more: 0 }, facts.twice, closed.seamList]);
  const part = {
    ...sums,
    flags: recordFlags(record, closed, all, sums),
    ...(listed.first.length > 0 ? { cuts: listed } : {}),
  };
  // a record that is its own pilot has nothing to differ from
  if (last || closed.samples === facts.held) return { part };
  const restarts = plan.cuts ?? [...facts.cuts, ...closed.cuts];
  const known = restarts.length > 0 ? { ...plan, cuts: restarts } : plan;
  if (plan.cuts === undefined && closed.cuts.length > 0) return { again: known };
  const next = nextPlan(known, part, closed, settings);
  return next === null ? { part } : { again: { ...next, last: true } };
}

/** The plan that the whole record asks for; null where the pilot's stands. */
function nextPlan(
  plan: RecordPlan,
  part: StationPart,
  closed: ClosedRecord,
  settings: ReduceSettings,
): RecordPlan | null {
  if (closed.unequal > 0 && !plan.weighted)
    return { ...plan, weighted: true, rounded: false, unconfirmed: false };
  const slope = settings.detrend === "linear" ? wholeSlope(part) : plan.slope;
  if (part.lags !== null && leansOtherwise(part, slope)) return { ...plan, slope };
  const time = recordTime(part);
  const changed = time !== null && (plan.integralTime === null || differs(time, plan.integralTime));
  const lost = time === null && plan.integralTime !== null && part.lags !== null;
  if (!changed && !lost) return null;
  // a correlation that no longer crosses zero is looked for four times as far
  const wanted = time ?? 4 * (plan.integralTime ?? plan.step);
  return { ...replan(plan, closed.longest, wanted, settings), pilotTime: plan.integralTime };
}

/** Slope of the whole record: that of the plan, and what the means of its blocks still show. */
function wholeSlope(part: StationPart): number[] {
  const { plan, blocks } = part;
  const width = blocks.fields.length;
  const middle = (part.samples - 1) / 2;
  return plan.slope.map((slope, c) => {
    let product = 0;
    let square = 0;
    for (let row = 0, before = 0; row < blocks.rows; row++) {
      const count = blocks.data[row * width];
      const time = before + (count - 1) / 2 - middle;
      product += count * time * blocks.data[row * width + 1 + c];
      square += count * time * time;
      before += count;
    }
    return square > 0 ? slope + product / (square * part.step) : slope;
  });
}

/** Whether another trend would change the record: by more than a hundredth of u' from end to end. */
function leansOtherwise(part: StationPart, slope: readonly number[]): boolean {
  const layout = jointLayout(part.components.length);
  const whole = wholeMoments(part);
  return slope.some((value, c) => {
    const variance = whole[layout.second + pairIndex(layout.sequences, c, c)] / whole[0];
    return Math.abs(value - part.plan.slope[c]) * part.duration > 0.01 * Math.sqrt(variance);
  });
}

function differs(time: number, other: number): boolean {
  return Math.abs(time / other - 1) > allowedChange;
}

function recordFlags(
  { plan, facts }: RecordChunks,
  closed: ClosedRecord,
  cuts: readonly BranchCut[],
  part: StationPart,
): Flag[] {
  const flags = timeFlags({ plan, closed, cuts, part, repeated: closed.repeated + facts.repeated });
  if (facts.skipped > 0) {
    flags.push({
      code: "start-up",
      text: `${facts.skipped} samples at the start are left out as start-up.`,
      value: facts.skipped,
    });
  }
  if (plan.pilotTime !== undefined) {
    flags.push({
      code: "record-unsteady-scale",
      text: "The integral time of the whole record differs by more than a quarter from that of its beginning: the flow may not be steady.",
      ...(plan.pilotTime !== null && plan.integralTime !== null
        ? { value: plan.integralTime / plan.pilotTime }
        : {}),
    });
  }
  return flags;
}
