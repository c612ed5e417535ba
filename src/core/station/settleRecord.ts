import type { Flag } from "../flag.ts";
import type { ReduceSettings } from "../stationResult.ts";
import { replan } from "./planRecord.ts";
import type { ClosedRecord, RecordChunks } from "./recordChunks.ts";
import { recordCorrelation } from "./recordCorrelation.ts";
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
  if (second) return { part };
  if (closed.unequal > 0 && !plan.weighted) return { again: { ...plan, weighted: true, derivativeStep: 1 } };
  const time = integralTimeOf(part);
  const changed = time !== null && (plan.integralTime === null || differs(time, plan.integralTime));
  const lost = time === null && plan.integralTime !== null && part.lags !== null;
  if (!changed && !lost) return { part };
  // a correlation that no longer crosses zero is looked for four times as far
  const wanted = time ?? 4 * (plan.integralTime ?? plan.step);
  return { again: { ...replan(plan, closed.samples, wanted, settings), pilotTime: plan.integralTime } };
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
