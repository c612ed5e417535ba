import type { Flag } from "../flag.ts";
import { jointLayout, pairIndex } from "../signal/jointMoments.ts";
import type { ReduceSettings } from "../stationResult.ts";
import { replan } from "./planRecord.ts";
import type { ClosedRecord, RecordChunks } from "./recordChunks.ts";
import { recordCorrelation, wholeMoments } from "./recordCorrelation.ts";
import type { RecordPlan } from "./recordPlan.ts";
import type { StationPart } from "./stationPart.ts";
import { zeroCrossing } from "./zeroCrossing.ts";

/** The integral time of the whole record may differ by so much from the pilot's. */
const allowedChange = 0.25;

/**
 * Closes a record: the part, or the plan for a second reading where the pilot did not stand for the whole.
 * A second reading is always the last.
 */
export function settle(
  record: RecordChunks,
  second: boolean,
  settings: ReduceSettings,
): { part: StationPart } | { again: RecordPlan } {
  const { plan, facts } = record;
  const closed = record.close();
  const part = closed.sums.part({
    start: facts.start,
    duration: closed.duration,
    lowestSpeed: closed.lowestSpeed,
    flags: recordFlags(record, closed),
  });
  // a record that is its own pilot has nothing to differ from
  if (second || closed.samples === facts.held) return { part };
  if (closed.unequal > 0 && !plan.weighted) return { again: { ...plan, weighted: true, derivativeStep: 1 } };
  const slope = settings.detrend === "linear" ? wholeSlope(part) : plan.slope;
  if (part.lags !== null && leansOtherwise(part, slope)) return { again: { ...plan, slope } };
  const time = integralTimeOf(part);
  const changed = time !== null && (plan.integralTime === null || differs(time, plan.integralTime));
  const lost = time === null && plan.integralTime !== null && part.lags !== null;
  if (!changed && !lost) return { part };
  // a correlation that no longer crosses zero is looked for four times as far
  const wanted = time ?? 4 * (plan.integralTime ?? plan.step);
  return { again: { ...replan(plan, closed.samples, wanted, settings), pilotTime: plan.integralTime } };
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

function integralTimeOf(part: StationPart): number | null {
  const correlation = recordCorrelation(part, 0);
  if (correlation === null || part.lags === null) return null;
  const { at, area } = zeroCrossing(correlation);
  return at === null ? null : (area / correlation[0]) * part.lags.stride * part.step;
}

function recordFlags({ plan, facts }: RecordChunks, closed: ClosedRecord): Flag[] {
  const flags: Flag[] = [];
  if (facts.skipped > 0) {
    flags.push({
      code: "start-up",
      text: `${facts.skipped} samples at the start are left out as start-up.`,
      value: facts.skipped,
    });
  }
  if (plan.weighted) {
    flags.push({
      code: "unequal-steps",
      text: `${closed.unequal} time steps differ from the record's: moments are weighted with the steps, and what needs a spectrum is missing.`,
      value: closed.unequal,
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
