import type { RecordOrigin, VelocityBlock } from "../records.ts";
import type { ReduceSettings } from "../stationResult.ts";
import { PilotBuffer } from "./pilotBuffer.ts";
import { RecordChunks } from "./recordChunks.ts";
import type { RecordPlan } from "./recordPlan.ts";
import { settle } from "./settleRecord.ts";
import type { StationPart } from "./stationPart.ts";

/** One record as it is read: blocks in, one part out. */
export interface RecordReducer {
  /** Takes the next samples; keeps no reference to the block's arrays. */
  add(block: VelocityBlock): void;
  /**
   * The record reduced, or the plan with which its file has to be read once more, since the pilot did not stand
   * for the whole.
   * @throws too-few-samples, constant-signal
   */
  finish(): { part: StationPart } | { again: RecordPlan };
}

/** Samples of the pilot, which are held in memory. */
export const pilotSamples = 1 << 20;

export interface RecordOptions {
  /** Time left out at the start, s. */
  readonly startup: number;
  /** The plan of an earlier reading; null: the pilot makes one. */
  readonly plan: RecordPlan | null;
  /** Samples of the pilot. */
  readonly pilot: number;
}
export const recordDefaults: RecordOptions = { startup: 0, plan: null, pilot: pilotSamples };

/**
 * Begins the reduction of one probe's record. Results depend on the samples and on nothing else: in whichever
 * blocks they arrive, all sums are formed over chunks counted from the record's start.
 * @param origin    where the record stands and came from
 * @param settings  what the user decided
 * @param options   see recordDefaults
 * @throws too-few-samples, constant-signal, backward-time, no-time, not-a-number: by add and finish
 */
export function startRecord(
  origin: RecordOrigin,
  settings: ReduceSettings,
  options: Partial<RecordOptions> = {},
): RecordReducer {
  const { startup, plan, pilot: length } = { ...recordDefaults, ...options };
  const pilot = new PilotBuffer(origin, startup);
  const held = plan === null ? length : 1;
  let record: RecordChunks | null = null;

  function begin(): RecordChunks {
    const opened = new RecordChunks(plan ?? pilot.plan(settings), origin, pilot.facts());
    opened.add(pilot.block(), 0);
    pilot.release();
    return opened;
  }
  return {
    add(block) {
      let from = 0;
      if (record === null) {
        from = pilot.add(block, held);
        if (!pilot.holds(held)) return;
        record = begin();
      }
      record.add(block, from);
    },
    finish() {
      record ??= begin();
      return settle(record, plan !== null, settings);
    },
  };
}
