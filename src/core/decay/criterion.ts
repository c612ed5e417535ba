import type { Criterion } from "../decayArgument.ts";
import { bare, type Estimate, estimate, isEstimate, missing, type Quantity } from "../quantity.ts";
import { type SeededRandom, seededRandom } from "../signal/seededRandom.ts";
import { notHeld } from "./notHeld.ts";

/** A condition: what must lie between which ends. */
export interface Condition {
  readonly key: string;
  readonly words: string;
  /** One for each station; missing ones are passed over. */
  readonly values: readonly Quantity[];
  readonly low: number;
  readonly high: number;
}

type Reading = (value: Estimate, condition: Condition) => boolean;

const resamples = 1000;
/** A value that every station holds to by no interval's contradiction. */
const possible: Reading = ({ value, low, high }, condition) =>
  (low ?? value) <= condition.high && (high ?? value) >= condition.low;
const certain: Reading = ({ value, low, high }, condition) =>
  (low ?? value) >= condition.low && (high ?? value) <= condition.high;

/**
 * The x from which a condition holds for good, in two readings: from where no interval contradicts it, and from where
 * every interval lies inside. A value without an interval stands for itself. The interval of x is told by drawing all
 * values anew by their own errors about the measured ones, so that it errs on the wide side.
 * @param xs        stations in order of x
 * @param condition one value for each station
 * @param towards   "end": up to which x it holds instead
 * @returns         x, unit of x; missing where the last (first) station does not hold it, or none carries the quantity
 */
export function criterion(
  xs: readonly number[],
  condition: Condition,
  towards: "start" | "end" = "start",
): Criterion {
  const order = condition.values.map((_, i) => i);
  if (towards === "end") order.reverse();
  const known = order.flatMap((i) => {
    const value = condition.values[i];
    return isEstimate(value) ? [{ x: xs[i], value, error: errorOf(value) }] : [];
  });
  const { key, words } = condition;
  if (known.length === 0) {
    const reason = condition.values.find((value) => !isEstimate(value));
    const none = missing(reason?.value === null ? reason.why : "no station carries it");
    return { key, words, notContradicted: none, inside: none };
  }
  const read = (reading: Reading): Quantity => {
    const holds = known.map(({ value }) => reading(value, condition));
    const at = firstHolding(holds);
    const end = towards === "start" ? "last" : "first";
    if (at === null) return notHeld(end);
    const spread = resampled(known, reading, condition);
    return spread === null
      ? bare(known[at].x, "these values carry no errors to draw them anew by")
      : withEnds(known[at].x, spread, towards);
  };
  return { key, words, notContradicted: read(possible), inside: read(certain) };
}

/** Index from which all hold; null where the last does not. */
function firstHolding(holds: readonly boolean[]): number | null {
  const at = holds.lastIndexOf(false) + 1;
  return at < holds.length ? at : null;
}

interface Known {
  readonly x: number;
  readonly value: Estimate;
  readonly error: number | null;
}

/** Standard error in the value's own unit; null for none. */
function errorOf({ value, low, high, error }: Estimate): number | null {
  if (error) return error.scale === "log" ? error.standard * Math.abs(value) : error.standard;
  return low === null || high === null ? null : (high - low) / 3.919927969080108;
}

/** Indices of the x found in each draw, sorted; past the last for a draw in which it is never held. */
function resampled(known: readonly Known[], reading: Reading, condition: Condition): Spread | null {
  if (known.every(({ error }) => error === null)) return null;
  const random = seededRandom(seedOf(known));
  const found = new Float64Array(resamples);
  for (let draw = 0; draw < resamples; draw++) {
    const holds = known.map((one) => reading(moved(one, random), condition));
    found[draw] = firstHolding(holds) ?? known.length;
  }
  found.sort();
  const at = (share: number) => known[found[Math.round(share * (resamples - 1))]]?.x ?? null;
  return { near: at(0.025), far: at(0.975) };
}

/** x at both ends of the central 95 % of draws, nearest the beginning of the search first; null: never held. */
interface Spread {
  readonly near: number | null;
  readonly far: number | null;
}

function moved({ value, error }: Known, random: SeededRandom): Estimate {
  const step = (error ?? 0) * random.gaussian();
  const { low, high } = value;
  return {
    ...value,
    value: value.value + step,
    low: low === null ? null : low + step,
    high: high === null ? null : high + step,
  };
}

const neverWhy = "in more than one draw of forty it is never held";

function withEnds(x: number, { near, far }: Spread, towards: "start" | "end"): Quantity {
  const reversed = towards === "end";
  // a value found on one side of all draws still belongs to its own interval
  const ends = [near, far].map((end) => end ?? Number.NaN);
  const low = reversed ? Math.min(ends[1], x) : Math.min(ends[0], x);
  const high = reversed ? Math.max(ends[0], x) : Math.max(ends[1], x);
  const found = estimate(x, low, high);
  if (!isEstimate(found)) return found;
  return {
    ...found,
    ...(found.low === null ? { why_low: neverWhy } : {}),
    ...(found.high === null ? { why_high: neverWhy } : {}),
  };
}

/** A seed that follows from the places alone. */
function seedOf(known: readonly Known[]): number {
  return known.reduce((hash, { x }) => Math.imul(hash, 31) ^ Math.round(1e6 * Math.abs(x)), 17) >>> 0;
}
