import { type CaseInput, type ComparedQuantity, comparedQuantities } from "../comparison.ts";
import type { Alignment } from "./alignment.ts";
import type { ComparedCase } from "./comparedCase.ts";
import type { ComparedSeries } from "./comparedSeries.ts";
import { type IntensityLine, intensityLine, placeOfIntensity } from "./intensityLine.ts";
import { interpolate, meanOver } from "./interpolate.ts";

/** Two cases laid over one another on a common coordinate s: ln xi, x, or -ln Tu. */
export interface Overlay {
  /** Ends of the common range as they are shown; null where there is none. */
  readonly overlap: readonly [number, number] | null;
  readonly why: string | null;
  /** Where each quantity is compared, or why it cannot be. */
  readonly curves: Readonly<Record<ComparedQuantity, RatioCurve | string>>;
  readonly matched: MatchedIntensity | string;
  /** Coordinates of a case's stations once its origin is known (and the line of its intensity). */
  readonly coordinates: (at: 0 | 1, x0: number, line: IntensityLine | null, out: Float64Array) => void;
  /** From s to what is shown: xi, x or Tu. */
  readonly shown: (s: number) => number;
}

/** ln of second over first. */
export interface RatioCurve {
  /** Ascending s of all stations of both cases within the overlap. */
  readonly at: Float64Array;
  readonly logarithm: Float64Array;
  /** Mean over the overlap: the ln of the geometric mean. */
  readonly mean: number;
}

/** The place of one intensity in both cases, on the line of each. */
export interface MatchedIntensity {
  readonly logarithm: number;
  readonly distance: number;
}

/**
 * Lays two cases over one another: s = ln((x - x0)/ell), x, or -ln Tu on the line of each case's intensity.
 * The ratios are formed by straight interpolation in s on the range both cover; nothing is carried beyond it.
 * @param aligned origins of both
 * @param inputs  the same cases, for their reference lengths
 */
export function overlay(
  cases: readonly [ComparedCase, ComparedCase],
  { align, origins, why }: Alignment,
  inputs: readonly [CaseInput, CaseInput],
): Overlay {
  const lengths = inputs.map(({ decaySettings }) => decaySettings.referenceLength);
  // with only one reference length the two are compared in the unit of x
  const [ellA, ellB] = lengths.includes(null) ? [1, 1] : lengths.map((length) => length ?? 1);
  const coordinates: Overlay["coordinates"] = (at, x0, line, out) => {
    const { x } = cases[at];
    const ell = at === 0 ? ellA : ellB;
    for (let i = 0; i < x.length; i++) {
      if (align === "x") out[i] = x[i];
      else if (align === "x0" || line === null) out[i] = Math.log((x[i] - x0) / ell);
      else out[i] = line.slope * Math.log(x[i] - x0) - line.level;
    }
  };
  const shown = shownFrom(align);
  const lines = linesOf(cases, origins);
  const matched = matchedIntensity(cases, lines);
  const base = { matched, coordinates, shown };
  const refused = refusal(align, origins, why, lines);
  if (refused !== null) return { ...base, overlap: null, why: refused, curves: everyQuantity(() => refused) };
  const s = cases.map(({ x }, at) => {
    const out = new Float64Array(x.length);
    coordinates(at === 0 ? 0 : 1, origins?.[at] ?? 0, lines[at], out);
    return out;
  });
  const low = Math.max(...s.map((own) => own[0] ?? Number.POSITIVE_INFINITY));
  const high = Math.min(...s.map((own) => own[own.length - 1] ?? Number.NEGATIVE_INFINITY));
  if (!(high > low)) {
    const apart = "the ranges of the two cases do not overlap";
    return { ...base, overlap: null, why: apart, curves: everyQuantity(() => apart) };
  }
  const curves = everyQuantity((quantity) =>
    align === "Tu" && quantity === "Tu"
      ? "the cases are laid over one another at equal Tu"
      : curve([cases[0].series[quantity], cases[1].series[quantity]], cases, s, low, high),
  );
  const ends = [shown(low), shown(high)].sort((a, b) => a - b);
  return { ...base, overlap: [ends[0], ends[1]], why: null, curves };
}

function shownFrom(align: Alignment["align"]): Overlay["shown"] {
  if (align === "x") return (s) => s;
  return align === "x0" ? Math.exp : (s) => Math.exp(-s);
}

function refusal(
  align: Alignment["align"],
  origins: Alignment["origins"],
  why: string | null,
  lines: readonly (IntensityLine | null)[],
): string | null {
  if (align === "x") return null;
  if (origins === null) return why;
  return align === "Tu" && lines.includes(null)
    ? "the intensity of a case does not fall along its window"
    : null;
}

function everyQuantity(of: (quantity: ComparedQuantity) => RatioCurve | string): Overlay["curves"] {
  const entries = comparedQuantities.map((quantity) => [quantity, of(quantity)]);
  return Object.fromEntries(entries) as Overlay["curves"];
}

/** Index of each station of a series among the stations compared. */
export function stationsOf(series: ComparedSeries, { x }: ComparedCase): number[] {
  return series.x.map((at) => x.indexOf(at));
}

function curve(
  series: readonly (ComparedSeries | string)[],
  cases: readonly ComparedCase[],
  s: readonly Float64Array[],
  low: number,
  high: number,
): RatioCurve | string {
  const [first, second] = series;
  if (typeof first === "string") return first;
  if (typeof second === "string") return second;
  const places = [first, second].map((one, i) =>
    Float64Array.from(stationsOf(one, cases[i]), (at) => s[i][at]),
  );
  const from = Math.max(low, places[0][0], places[1][0]);
  const to = Math.min(high, places[0][places[0].length - 1], places[1][places[1].length - 1]);
  if (!(to > from)) return "the stations that carry it do not overlap";
  const inside = places.flatMap((own) => [...own].filter((at) => at > from && at < to));
  const at = Float64Array.from([...new Set([from, ...inside, to])].sort((a, b) => a - b));
  const [a, b] = [new Float64Array(at.length), new Float64Array(at.length)];
  interpolate(places[0], first.logarithm, at, a);
  interpolate(places[1], second.logarithm, at, b);
  const logarithm = b.map((value, i) => value - a[i]);
  return { at, logarithm, mean: meanOver(at, logarithm) };
}

/** The line of each case's intensity over its fitted stations; null where it has no law or no Tu. */
function linesOf(cases: readonly ComparedCase[], origins: Alignment["origins"]): (IntensityLine | null)[] {
  return cases.map(({ series }, i) => {
    if (origins === null || typeof series.Tu === "string") return null;
    const { x, logarithm, point } = series.Tu;
    const fitted = x.map((_, at) => at).filter((at) => point[at] >= 0);
    return intensityLine(
      fitted.map((at) => x[at]),
      fitted.map((at) => logarithm[at]),
      origins[i],
    );
  });
}

/** The middle (in ln) of the intensities both windows hold. */
function matchedIntensity(
  cases: readonly ComparedCase[],
  [a, b]: readonly (IntensityLine | null)[],
): MatchedIntensity | string {
  if (a === null || b === null) return "a case has no law or no falling intensity in its window";
  const ranges = cases.map(({ series }) => (typeof series.Tu === "string" ? [0] : series.Tu.logarithm));
  const low = Math.max(...ranges.map((range) => Math.min(...range)));
  const high = Math.min(...ranges.map((range) => Math.max(...range)));
  if (!(high >= low)) return "the windows of the two cases hold no intensity in common";
  const logarithm = (low + high) / 2;
  return { logarithm, distance: placeOfIntensity(b, logarithm) - placeOfIntensity(a, logarithm) };
}
