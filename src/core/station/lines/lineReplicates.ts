import { bare, missing, type Quantity, type StandardError } from "../../quantity.ts";
import { jackknife } from "../../signal/jackknife.ts";
import { withError } from "../stationErrors.ts";
import type { LineSampling } from "./lineSampling.ts";
import {
  type LineContext,
  type LineValueName,
  type LineValues,
  lineScales,
  lineValues,
} from "./lineValues.ts";

/** Values of all snapshots, and of all less each group of them. */
export interface LineReplicates {
  readonly whole: LineValues;
  readonly without: readonly LineValues[];
  readonly weights: Float64Array;
  /** Why there is no interval; null where there is one. */
  readonly why: string | null;
}

/** @param rows  sums of each block of snapshots, adding up plainly */
export function lineReplicates(
  rows: readonly Float64Array[],
  { groups, why }: LineSampling,
  context: LineContext,
): LineReplicates {
  const total = new Float64Array(rows[0].length);
  for (const row of rows) for (let i = 0; i < total.length; i++) total[i] += row[i];
  const whole = lineValues(total, context);
  if (groups === null) return { whole, without: [], weights: new Float64Array(0), why };
  const weights = new Float64Array(groups.count);
  const without = Array.from({ length: groups.count }, (_, group) => {
    const rest = total.slice();
    rows.forEach((row, block) => {
      if (groups.of[block] !== group) return;
      for (let i = 0; i < rest.length; i++) rest[i] -= row[i];
      weights[group] += row[0];
    });
    return lineValues(rest, context);
  });
  return { whole, without, weights, why: null };
}

/** Error of a value on its own scale; null where none can be had. */
export function lineError(name: LineValueName, all: LineReplicates): StandardError | null {
  const scale = lineScales[name];
  const on = (value: number) => (scale === "log" ? Math.log(value) : value);
  const replicates = all.without.map((values) => on(values[name]));
  const error = jackknife(on(all.whole[name]), replicates, all.weights);
  return error === null ? null : { ...error, scale };
}

/** @param absent  why the value is missing, where it is not a number */
export function lineQuantity(name: LineValueName, all: LineReplicates, absent: string): Quantity {
  const value = all.whole[name];
  if (!Number.isFinite(value)) return missing(absent);
  if (all.why !== null) return bare(value, all.why);
  const error = lineError(name, all);
  return error === null
    ? bare(value, "a part of the snapshots gives no value of it")
    : withError(value, error);
}
