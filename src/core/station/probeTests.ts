import { fTail } from "../signal/distributions/fTail.ts";
import { studentTail } from "../signal/distributions/studentTail.ts";
import { type Leaves, leavesError } from "./probeLeaves.ts";

/** Whether one quantity is alike at all probes. */
export interface Alikeness {
  /** Probability that values as different as these are of one flow. */
  readonly p: number;
  /** The same for each probe against the others. */
  readonly each: readonly number[];
}

/**
 * Probes sampled together share their eddies: each probe's departure from their mean is tested with the error of
 * that departure, the same blocks left out at all, and the least probability is multiplied by the number of probes
 * (Bonferroni).
 * @param repeats  how often the records repeat themselves
 */
export function alikeTogether(probes: readonly Leaves[], repeats: number): Alikeness {
  const { weights } = probes[0];
  const centre = (of: (one: Leaves) => number) =>
    probes.reduce((sum, one) => sum + of(one), 0) / probes.length;
  const whole = centre(({ value }) => value);
  const without = probes[0].without.map((_, g) => centre((one) => one.without[g]));
  const each = probes.map((one) => {
    const departure = one.value - whole;
    const apart = { value: departure, without: one.without.map((value, g) => value - without[g]), weights };
    const error = leavesError(apart, "linear", repeats);
    // what differs by rounding alone does not differ
    const rounding = 1e-12 * Math.max(1, Math.abs(one.value));
    if (error === null || Math.abs(departure) <= rounding) return 1;
    return studentTail(departure / Math.max(error.standard, rounding), error.freedom);
  });
  // of two probes, one departs as the other does
  const tests = probes.length === 2 ? 1 : probes.length;
  return { p: Math.min(1, tests * Math.min(...each)), each };
}

/**
 * Independent probes: equal means where the errors are not equal, and each against the others weighted with theirs.
 * @see   Welch (1951), Biometrika 38, 330; freedom of a difference: Welch (1947), Biometrika 34, 28
 */
export function alikeAlone(probes: readonly Leaves[], repeats: number): Alikeness {
  const known = probes.flatMap((one) => {
    const error = leavesError(one, "linear", repeats);
    if (error === null || !(error.standard > 0)) return [];
    return [{ value: one.value, weight: error.standard ** -2, freedom: error.freedom ?? Infinity }];
  });
  if (known.length < probes.length) return { p: 1, each: probes.map(() => 1) };
  const count = probes.length;
  const total = known.reduce((sum, { weight }) => sum + weight, 0);
  const centre = known.reduce((sum, { value, weight }) => sum + weight * value, 0) / total;
  const between =
    known.reduce((sum, { value, weight }) => sum + weight * (value - centre) ** 2, 0) / (count - 1);
  const loose = known.reduce((sum, { weight, freedom }) => sum + (1 - weight / total) ** 2 / freedom, 0);
  const statistic = between / (1 + ((2 * (count - 2)) / (count ** 2 - 1)) * loose);
  const p = fTail(statistic, count - 1, (count ** 2 - 1) / (3 * loose));
  const each = known.map(({ value, weight, freedom }, i) => {
    const rest = total - weight;
    const others = (total * centre - weight * value) / rest;
    const [own, theirs] = [1 / weight, 1 / rest];
    const spread = known.reduce(
      (sum, one, j) => (j === i ? sum : sum + (theirs * (one.weight / rest)) ** 2 / one.freedom),
      own ** 2 / freedom,
    );
    return studentTail((value - others) / Math.sqrt(own + theirs), (own + theirs) ** 2 / spread);
  });
  return { p, each };
}
