import type { RecordOrigin, RoundedTimes, VelocityBlock } from "../records.ts";
import type { ReduceSettings } from "../stationResult.ts";
import { type BranchCut, CutSieve } from "./branchCuts.ts";
import { PilotBuffer } from "./pilotBuffer.ts";
import { RecordChunks } from "./recordChunks.ts";
import type { RecordPlan } from "./recordPlan.ts";
import type { PlaceOf } from "./samplePlaces.ts";
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
  /** What time stamps with too few digits are taken for. */
  readonly times: RoundedTimes;
}
export const recordDefaults: RecordOptions = { startup: 0, plan: null, pilot: pilotSamples, times: "ask" };

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
  const { startup, plan, pilot: length, times } = { ...recordDefaults, ...options };
  const pilot = new PilotBuffer(origin, startup, times);
  const sieve = plan?.cuts === undefined ? null : new CutSieve(plan.cuts, plan.step);
  const held = plan === null ? length : 1;
  let record: RecordChunks | null = null;
  /** Samples of the file so far. */
  let raw = 0;

  function begin(): RecordChunks {
    pilot.settle();
    const opened = new RecordChunks(plan ?? pilot.plan(settings), origin, pilot.facts());
    opened.add(pilot.block(), 0, pilot.facts().place);
    pilot.release();
    return opened;
  }
  /** Fills the pilot; the index in the block of the first sample that it left, or null where it wants more. */
  function fill(block: VelocityBlock, place: PlaceOf): number | null {
    for (let from = 0; ; ) {
      from = pilot.add(block, from, held, place);
      if (!pilot.holds(held)) return null;
      // stamps alike may turn out to be one sample sent twice: then there is room again
      pilot.settle();
      if (pilot.holds(held)) return from;
    }
  }
  return {
    add(given) {
      const { block, kept } = sieve === null ? { block: given, kept: null } : sifted(given, raw, sieve);
      const before = raw;
      const place = (i: number) => before + (kept === null ? i : kept[i]);
      const from = record === null ? fill(block, place) : 0;
      if (from !== null) {
        record ??= begin();
        record.add(block, from, place);
      }
      raw += given.count;
    },
    finish() {
      record ??= begin();
      return settle(record, { last: plan?.last === true, cuts: sieve?.tally() ?? [] }, settings);
    },
  };
}

/** The samples of a block that no later run overtakes, and which of it they are; null: all. */
function sifted(
  block: VelocityBlock,
  raw: number,
  sieve: CutSieve<BranchCut>,
): { block: VelocityBlock; kept: readonly number[] | null } {
  const { t, u, v, w } = block;
  if (t === null) return { block, kept: null };
  const kept: number[] = [];
  for (let i = 0; i < block.count; i++) if (sieve.keeps(raw + i, t[i])) kept.push(i);
  if (kept.length === block.count) return { block, kept: null };
  const of = (column: Float64Array) => Float64Array.from(kept, (i) => column[i]);
  return { block: { count: kept.length, t: of(t), u: of(u), v: v && of(v), w: w && of(w) }, kept };
}
