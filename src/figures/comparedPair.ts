import type { Comparison } from "../core/comparison.ts";
import { lawDistance } from "../core/decay/lawDistance.ts";
import type { Flight } from "../core/decayResult.ts";
import type { FigureCase } from "./figureSpec.ts";

/** A comparison with both of its cases. */
export interface ComparedPair {
  readonly comparison: Comparison;
  readonly first: FigureCase;
  readonly second: FigureCase;
}

/** The comparisons whose cases are both there, in their order. */
export function comparedPairs(
  comparisons: readonly Comparison[],
  cases: readonly FigureCase[],
): ComparedPair[] {
  return comparisons.flatMap((comparison) => {
    const [first, second] = comparison.cases.map((name) => cases.find((of) => of.name === name));
    return first && second ? [{ comparison, first, second }] : [];
  });
}

/** A case as it is laid over the others: its origin by the exponents used, with the interval of that. */
export interface LaidCase {
  readonly of: FigureCase;
  /** Virtual origin, and both ends of its 95 % interval; null where it is held or not known. */
  readonly x0: number | null;
  readonly ends: readonly [number, number] | null;
}

/** The case held against, then every other one, each once. */
export function laidCases(pairs: readonly ComparedPair[]): LaidCase[] {
  const laid = pairs.flatMap(({ comparison, first, second }) =>
    [first, second].map((of, side) => ({ of, ...originOf(comparison, side) })),
  );
  // a pair with a case that has no law knows no origin of the other one either
  const known = (of: FigureCase) => laid.find((one) => one.of === of && one.x0 !== null);
  return [...new Set(laid.map(({ of }) => of))].map((of) => known(of) ?? { of, x0: null, ends: null });
}

function originOf({ aligned_with, origins }: Comparison, side: number): Omit<LaidCase, "of"> {
  const x0 = (aligned_with === "common n" ? origins.common : origins.own)?.x0[side];
  if (!x0 || x0.value === null) return { x0: null, ends: null };
  const { value, low, high } = x0;
  return { x0: value, ends: low === null || high === null ? null : [low, high] };
}

/** (x − x0)/ℓ along what the law of a case runs along; in the unit of x with ℓ = 1. */
export function distanceFrom(x0: number, x: number, { decay }: FigureCase, length: number): number {
  const flight: Flight | null = decay?.flight ?? null;
  return lawDistance({ x0, flight }, x) / length;
}

/** Whether every case has a reference length: then distances are multiples of it. */
export function inLengths(cases: readonly FigureCase[]): boolean {
  return cases.length > 0 && cases.every(({ length }) => length !== null);
}
