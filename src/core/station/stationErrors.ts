import { bare, estimate, missing, type Quantity, type StandardError } from "../quantity.ts";
import { studentQuantile } from "../signal/distributions/studentQuantile.ts";
import { jackknife } from "../signal/jackknife.ts";
import type { BlockGroups } from "./groupBlocks.ts";
import {
  type StationValues,
  stationValues,
  type ValueContext,
  type ValueName,
  valueScales,
} from "./stationValues.ts";

/** Values of the whole record and of the record less each group. */
export interface Replicates {
  readonly whole: StationValues;
  readonly without: readonly StationValues[];
  readonly weights: Float64Array;
  /** How often the record repeats itself; 1: not at all. */
  readonly repeats: number;
  /** Why there is no interval; null where there is one. */
  readonly why: string | null;
}

/**
 * The station's values from all of its blocks and with one group of them left out at a time.
 * @param rows    sums of each block, adding up plainly
 * @param groups  null: no intervals, for the reason `why`
 */
export function replicates(
  rows: readonly Float64Array[],
  groups: BlockGroups | null,
  context: ValueContext,
  why: string,
): Replicates {
  const total = new Float64Array(rows[0].length);
  for (const row of rows) for (let i = 0; i < total.length; i++) total[i] += row[i];
  const whole = stationValues(total, context);
  if (groups === null) return { whole, without: [], weights: new Float64Array(0), repeats: 1, why };
  const weights = new Float64Array(groups.count);
  const without = Array.from({ length: groups.count }, (_, group) => {
    const rest = total.slice();
    rows.forEach((row, block) => {
      if (groups.of[block] !== group) return;
      for (let i = 0; i < rest.length; i++) rest[i] -= row[i];
      weights[group] += row[0];
    });
    return stationValues(rest, context);
  });
  return { whole, without, weights, repeats: groups.repeats, why: null };
}

/**
 * The error of a value, by the jackknife on its own scale; null where none can be had. Of a record that repeats
 * itself r times in B groups it is that of one period,
 *     se √(r/(1 - r/B)),  with B/r - 1 degrees of freedom,
 * for a group is r/B of all that there is.
 */
export function valueError(name: ValueName, all: Replicates): StandardError | null {
  return leftOutError(leftOut(name, all), all, valueScales[name]);
}

/** One value of all blocks, and of all less each group. */
export interface LeftOut {
  readonly value: number;
  readonly without: readonly number[];
  /** A standard error that the groups do not tell, on the value's own scale. */
  readonly further?: number;
}
type Groups = Pick<Replicates, "weights" | "repeats">;

function leftOut(name: ValueName, { whole, without }: Replicates): LeftOut {
  return { value: whole[name], without: without.map((values) => values[name]) };
}

/** The error of any value that is known without each group. */
export function leftOutError(
  { value, without, further = 0 }: LeftOut,
  { weights, repeats }: Groups,
  scale: StandardError["scale"],
): StandardError | null {
  const on = (one: number) => (scale === "log" ? Math.log(one) : one);
  const told = jackknife(on(value), without.map(on), weights);
  const error = told && { ...told, standard: Math.hypot(told.standard, further) };
  if (error === null || repeats <= 1) return error && { ...error, scale };
  const groups = without.length;
  const standard = error.standard * Math.sqrt(repeats / (1 - repeats / groups));
  return { standard, freedom: Math.max(1, groups / repeats - 1), scale };
}

/**
 * A value with its interval.
 * @param absent  why the value is missing, where it is not a number
 */
export function valueQuantity(name: ValueName, all: Replicates, absent: string): Quantity {
  const own = leftOut(name, all);
  return Number.isFinite(own.value) ? leftOutQuantity(own, all, valueScales[name]) : missing(absent);
}

/** A value that is known without each group, with its interval. */
export function leftOutQuantity(
  own: LeftOut,
  all: Groups & Pick<Replicates, "why">,
  scale: StandardError["scale"],
): Quantity {
  const { value } = own;
  if (all.why !== null) return bare(value, all.why);
  const error = leftOutError(own, all, scale);
  if (error === null) return bare(value, partless);
  const decided = error.scale === "log" && quantile(error.freedom) * error.standard > widest;
  return decided ? bare(value, "a single part of the record decides the value") : withError(value, error);
}

/** Why a value has no interval although the record is long enough for one. */
export const partless = "a part of the record gives no value of it";

/** Half the width of an interval in the logarithm, a factor of 150, beyond which it tells of one group only. */
const widest = 5;

/** A value and the 95 % interval of Student's t on the scale of its error. */
export function withError(value: number, error: StandardError): Quantity {
  const reach = quantile(error.freedom) * error.standard;
  if (error.scale === "linear") return estimate(value, value - reach, value + reach, error);
  return estimate(value, value * Math.exp(-reach), value * Math.exp(reach), error);
}

const quantiles = new Map<number | null, number>();

/** Student's 97.5 % point, found once: whole freedoms are those of every quantity of every station. */
function quantile(freedom: number | null): number {
  const known = quantiles.get(freedom);
  if (known !== undefined) return known;
  const found = studentQuantile(0.975, freedom);
  if (freedom === null || Number.isInteger(freedom)) quantiles.set(freedom, found);
  return found;
}

/** Errors of independent factors of a product, on the scale of the logarithm; freedom by Welch and Satterthwaite. */
export function joinedError(a: StandardError, b: StandardError): StandardError {
  const [va, vb] = [a.standard ** 2, b.standard ** 2];
  const spread =
    (a.freedom === null ? 0 : va ** 2 / a.freedom) + (b.freedom === null ? 0 : vb ** 2 / b.freedom);
  return {
    standard: Math.sqrt(va + vb),
    freedom: spread > 0 ? (va + vb) ** 2 / spread : null,
    scale: "log",
  };
}
