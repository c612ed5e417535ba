import type { StandardError } from "../quantity.ts";
import { type BlockGroups, groupBlocks } from "./groupBlocks.ts";
import type { IntegralTimes } from "./integralTimes.ts";
import type { JoinedRecord } from "./joinParts.ts";

/** How well a station is sampled: what its intervals rest on. */
export interface Sampling {
  /** Length in integral times; null where the integral time is not known. */
  readonly integralTimes: number | null;
  readonly groups: BlockGroups | null;
  /** Error of every integral time and length; null where there is none. */
  readonly scaleError: StandardError | null;
  /** Why there are no intervals. */
  readonly why: string;
}

/** Shortest record that is given intervals, in integral times. */
export const shortestRecord = 100;

/** Groups that a period of a replayed record must hold. */
export const fewestInPeriod = 5;

/**
 * Groups for the jackknife, and the error of the integral scale by its own law,
 *     se(ln L11) = √(4 τ* / T),
 * since a jackknife fails at a zero crossing.
 */
export function sampling(record: JoinedRecord, times: IntegralTimes): Sampling {
  if (times.scale === null) {
    const why =
      record.untimed ??
      "the integral time is not known, and with it not how many independent samples there are";
    return { integralTimes: null, groups: null, scaleError: null, why };
  }
  const integralTimes = record.span / times.scale;
  if (integralTimes < shortestRecord) {
    const what = record.repeats > 1 ? "one period of the replayed record" : "the record";
    const why = `${what} is ${integralTimes.toFixed(0)} integral times long; ${shortestRecord} are needed`;
    return { integralTimes, groups: null, scaleError: null, why };
  }
  const groups = groupBlocks(
    Float64Array.from(record.rows, (row) => row[0]),
    integralTimes,
    record.repeats,
  );
  if (record.repeats > 1 && groups.count < fewestInPeriod * record.repeats) {
    const why = `the record repeats itself ${record.repeats.toFixed(0)} times: its blocks are too long against one period`;
    return { integralTimes, groups: null, scaleError: null, why };
  }
  const reach = times.tauStar ?? 2 * times.scale;
  return {
    integralTimes,
    groups,
    scaleError: { standard: Math.sqrt((4 * reach) / record.span), freedom: null, scale: "log" },
    why: "",
  };
}
