import type { ProbeReading } from "../probeReading.ts";
import { bare, type Quantity, type StandardError } from "../quantity.ts";
import { fTail } from "../signal/distributions/fTail.ts";
import { studentTail } from "../signal/distributions/studentTail.ts";
import { jackknife } from "../signal/jackknife.ts";
import { jointLayout } from "../signal/jointMoments.ts";
import { type BlockGroups, groupBlocks } from "./groupBlocks.ts";
import type { JoinedRecord } from "./joinParts.ts";
import { shortestRecord } from "./sampling.ts";
import { withError } from "./stationErrors.ts";

/** The probes of one station beside each other. */
export interface ProbeComparison {
  readonly probes: readonly ProbeReading[];
  /** Probability that U and u' as different as these come from one flow; null where their errors are not known. */
  readonly p: number | null;
}

/** One value of every probe, with what it is when one group of blocks is left out. */
interface Leaves {
  readonly value: number;
  readonly without: readonly number[];
  readonly weights: Float64Array;
}
/** U, and ln u'. */
type Pair = readonly [Leaves, Leaves];

/**
 * Whether the probes at one x may be averaged: U and u' of each about its own mean, their spread held against
 * their sampling errors. Probes sampled together share their eddies: each probe's departure from their mean is
 * tested with the error of that departure, the same blocks left out at all, and the least probability is
 * multiplied by the number of probes (Bonferroni). Others are independent: Welch's test of equal means.
 * @param record  a station of two records or more
 * @param scale   its integral time, s; null where it is not known
 * @see   Welch (1951), Biometrika 38, 330
 */
export function compareProbes(record: JoinedRecord, scale: number | null): ProbeComparison {
  const { parts, perPart, together, repeats } = record;
  const groups = parts.map((part, i) =>
    scale === null || part.duration / repeats < shortestRecord * scale
      ? null
      : groupBlocks(
          Float64Array.from(perPart[i], (row) => row[0]),
          part.duration / repeats / scale,
          repeats,
        ),
  );
  const means = parts.map((_, i) => record.partMeans[i][0]);
  const pairs = parts.map((_, i) => leavesOf(perPart[i], record.components.length, means[i], groups[i]));
  const probes = parts.map(({ origin }, i) => {
    const [U, rms] = pairs[i];
    return {
      file: origin.file,
      y: origin.y,
      z: origin.z,
      U: quantityOf(U.value, errorOf(U, "linear", repeats)),
      u_rms: quantityOf(Math.exp(rms.value), errorOf(rms, "log", repeats)),
      agrees: null,
      departs: [],
    };
  });
  if (groups.some((group) => group === null)) return { probes, p: null };
  const test = together ? apartTogether : apartAlone;
  const values = [0, 1].map((which) => pairs.map((pair) => pair[which]));
  // two tests are made of one question
  const p = Math.min(1, 2 * Math.min(...values.map((each) => test(each, repeats))));
  return { probes, p };
}

function leavesOf(
  rows: readonly Float64Array[],
  components: number,
  mean: number,
  groups: BlockGroups | null,
): Pair {
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
  return [
    { value: meanOf(total), without: rest.map(meanOf), weights },
    { value: lnRms(total), without: rest.map(lnRms), weights },
  ];
}

function errorOf(
  { value, without, weights }: Leaves,
  scale: StandardError["scale"],
  repeats: number,
): StandardError | null {
  const error = jackknife(value, without, weights);
  return error === null ? null : { ...error, standard: error.standard * Math.sqrt(repeats), scale };
}

function quantityOf(value: number, error: StandardError | null): Quantity {
  if (error === null) return bare(value, `the record is shorter than ${shortestRecord} integral times`);
  return withError(value, error);
}

/** Probes that saw the same eddies: every one against the mean of all. */
function apartTogether(probes: readonly Leaves[], repeats: number): number {
  const { weights } = probes[0];
  const centre = (of: (one: Leaves) => number) =>
    probes.reduce((sum, one) => sum + of(one), 0) / probes.length;
  const whole = centre(({ value }) => value);
  const without = probes[0].without.map((_, g) => centre((one) => one.without[g]));
  const least = probes.map((one) => {
    const departure = one.value - whole;
    const apart = { value: departure, without: one.without.map((value, g) => value - without[g]), weights };
    const error = errorOf(apart, "linear", repeats);
    // what differs by rounding alone does not differ
    const rounding = 1e-12 * Math.max(1, Math.abs(one.value));
    if (error === null || Math.abs(departure) <= rounding) return 1;
    return studentTail(departure / Math.max(error.standard, rounding), error.freedom);
  });
  // of two probes, one departs as the other does
  return Math.min(1, (probes.length === 2 ? 1 : probes.length) * Math.min(...least));
}

/** Independent probes: equal means where the errors are not equal. */
function apartAlone(probes: readonly Leaves[], repeats: number): number {
  const known = probes.map((one) => ({ value: one.value, error: errorOf(one, "linear", repeats) }));
  if (known.some(({ error }) => error === null || !(error.standard > 0))) return 1;
  const count = probes.length;
  const weights = known.map(({ error }) => (error?.standard ?? 1) ** -2);
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const centre = known.reduce((sum, { value }, i) => sum + weights[i] * value, 0) / total;
  const between =
    known.reduce((sum, { value }, i) => sum + weights[i] * (value - centre) ** 2, 0) / (count - 1);
  const loose = known.reduce(
    (sum, { error }, i) => sum + (1 - weights[i] / total) ** 2 / (error?.freedom ?? Infinity),
    0,
  );
  const statistic = between / (1 + ((2 * (count - 2)) / (count ** 2 - 1)) * loose);
  return fTail(statistic, count - 1, (count ** 2 - 1) / (3 * loose));
}
