import { bare, type Quantity, type StandardError } from "../quantity.ts";
import { jackknife } from "../signal/jackknife.ts";
import { jointLayout } from "../signal/jointMoments.ts";
import { type BlockGroups, groupBlocks } from "./groupBlocks.ts";
import type { JoinedRecord } from "./joinParts.ts";
import { shortestRecord } from "./sampling.ts";
import { withError } from "./stationErrors.ts";

/** One value of a probe, with what it is when one group of blocks is left out. */
export interface Leaves {
  readonly value: number;
  readonly without: readonly number[];
  readonly weights: Float64Array;
}
/** A probe's U and ln u', about its own mean. */
export interface ProbeLeaves {
  readonly U: Leaves;
  readonly lnRms: Leaves;
  /** Whether it is long enough for errors. */
  readonly tested: boolean;
}

/**
 * U and ln u' of every record of a station, whole and without each group of its blocks.
 * @param scale  integral time, s; null where it is not known: there are no groups then
 */
export function probeLeaves(record: JoinedRecord, scale: number | null): ProbeLeaves[] {
  const { parts, perPart, repeats, partMeans, components } = record;
  return parts.map(({ duration }, i) => {
    const own = duration / repeats;
    const short = scale === null || own < shortestRecord * scale;
    const weights = Float64Array.from(perPart[i], (row) => row[0]);
    const groups = short ? null : groupBlocks(weights, own / scale, repeats);
    return { ...leavesOf(perPart[i], components.length, partMeans[i][0], groups), tested: !short };
  });
}

function leavesOf(
  rows: readonly Float64Array[],
  components: number,
  mean: number,
  groups: BlockGroups | null,
): Omit<ProbeLeaves, "tested"> {
  const { second } = jointLayout(components);
  const total = [0, 0, 0];
  const parts = Array.from({ length: groups?.count ?? 0 }, () => [0, 0, 0]);
  rows.forEach((row, block) => {
    const sums = [row[0], row[1], row[second]];
    for (let i = 0; i < 3; i++) total[i] += sums[i];
    if (groups === null) return;
    for (let i = 0; i < 3; i++) parts[groups.of[block]][i] += sums[i];
  });
  const rest = parts.map((part) => part.map((value, i) => total[i] - value));
  const meanOf = ([weight, sum]: number[]) => mean + sum / weight;
  const lnRms = ([weight, sum, squares]: number[]) => Math.log(squares / weight - (sum / weight) ** 2) / 2;
  const weights = Float64Array.from(parts, ([weight]) => weight);
  return {
    U: { value: meanOf(total), without: rest.map(meanOf), weights },
    lnRms: { value: lnRms(total), without: rest.map(lnRms), weights },
  };
}

/** Error of one value; of a record that repeats itself so many times, that of one period. */
export function leavesError(
  { value, without, weights }: Leaves,
  scale: StandardError["scale"],
  repeats: number,
): StandardError | null {
  const error = jackknife(value, without, weights);
  return error === null ? null : { ...error, standard: error.standard * Math.sqrt(repeats), scale };
}

/** @param untimed  why no record is given an error, where there is such a reason */
export function probeQuantity(value: number, error: StandardError | null, untimed: string | null): Quantity {
  if (error !== null) return withError(value, error);
  return bare(value, untimed ?? `the record is shorter than ${shortestRecord} integral times`);
}
