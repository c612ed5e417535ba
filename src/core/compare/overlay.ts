import { type CaseInput, type ComparedQuantity, comparedQuantities } from "../comparison.ts";
import { placeAlong } from "../decay/flightCourse.ts";
import type { Alignment } from "./alignment.ts";
import type { ComparedCase } from "./comparedCase.ts";
import type { ComparedSeries } from "./comparedSeries.ts";
import { type IntensityLine, intensityLine } from "./intensityLine.ts";
import { interpolate, meanBetween } from "./interpolate.ts";
import { type MatchedIntensity, matchedIntensity } from "./matchedIntensity.ts";
import { stretchesOf } from "./stretchesOf.ts";

/** Two cases laid over one another on a common coordinate s: ln xi, x, or -ln Tu. */
export interface Overlay {
  /** Ends of the common range as they are shown; null where there is none. */
  readonly overlap: readonly [number, number] | null;
  readonly why: string | null;
  /** Where each quantity is compared, or why it cannot be. */
  readonly curves: Readonly<Record<ComparedQuantity, RatioCurve | string>>;
  /** Stretches of the common range, in s. */
  readonly stretches: readonly (readonly [number, number])[];
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

/** What two cases are laid over one another by. */
export interface Laying {
  readonly align: Alignment["align"];
  /** Virtual origins along what the laws run along; null where a case has no law. */
  readonly origins: readonly [number | null, number | null];
  /** x in the first case at which equal Tu is looked for; null: its body's, else the middle. */
  readonly at: number | null;
}

/**
 * Lays two cases over one another: s = ln((x - x0)/ell), x, or -ln Tu on the line of each case's intensity.
 * The ratios are formed by straight interpolation in s on the range both cover; nothing is carried beyond it.
 * @param inputs the same cases, for their reference lengths
 */
export function overlay(
  cases: readonly [ComparedCase, ComparedCase],
  { align, origins, at }: Laying,
  inputs: readonly [CaseInput, CaseInput],
): Overlay {
  const lengths = commonLengths(inputs);
  const coordinates: Overlay["coordinates"] = (side, x0, line, out) => {
    const { x, along } = cases[side];
    for (let i = 0; i < x.length; i++) {
      if (align === "x") out[i] = x[i];
      else if (align === "x0" || line === null) out[i] = Math.log((along[i] - x0) / lengths[side]);
      else out[i] = line.slope * Math.log(along[i] - x0) - line.level;
    }
  };
  const shown = shownFrom(align);
  const lines = cases.map((one, i) => lineOf(one, origins[i]));
  const apart = noDistance(inputs);
  const matched =
    apart ?? matchedIntensity(cases, lines, at ?? inputs[0].decaySettings.body?.x ?? null, at !== null);
  const base = { matched, coordinates, shown };
  const scaled = inputs.every(({ decaySettings }) => decaySettings.referenceLength !== null);
  const offScale = align === "x" || (align === "x0" && !scaled) ? apart : null;
  const refused = offScale ?? refusal(align, cases, origins, lines);
  if (refused !== null) return { ...base, ...nothing(refused) };
  const s = cases.map(({ x }, side) => {
    const out = new Float64Array(x.length);
    coordinates(side === 0 ? 0 : 1, origins[side] ?? 0, lines[side], out);
    return out;
  });
  const low = Math.max(...s.map((own) => own[0] ?? Number.POSITIVE_INFINITY));
  const high = Math.min(...s.map((own) => own[own.length - 1] ?? Number.NEGATIVE_INFINITY));
  if (!(high > low)) return { ...base, ...nothing("the ranges of the two cases do not overlap") };
  const unlike = unlikeUnits(inputs, "their lengths have no ratio");
  const curves = everyQuantity((quantity) => {
    if (align === "Tu" && quantity === "Tu") return "the cases are laid over one another at equal Tu";
    if (unlike !== null && lengthsCompared.includes(quantity)) return unlike;
    return curve([cases[0].series[quantity], cases[1].series[quantity]], cases, s, low, high);
  });
  const ends = [shown(low), shown(high)].sort((a, b) => a - b);
  const stretches = stretchesOf(s, [low, high]);
  return { ...base, overlap: [ends[0], ends[1]], why: null, curves, stretches };
}

/** Reference lengths of both; with only one of them the two are compared in the unit of x. */
export function commonLengths(inputs: readonly [CaseInput, CaseInput]): readonly [number, number] {
  const [a, b] = inputs.map(({ decaySettings }) => decaySettings.referenceLength);
  return a === null || b === null ? [1, 1] : [a, b];
}

/** Why no distance lies between two cases: they decay in space and time, or count in unlike units; null: one does. */
export function noDistance(inputs: readonly CaseInput[]): string | null {
  const inTime = inputs.filter(({ decaySettings }) => decaySettings.along === "t");
  if (inTime.length === 0 || inTime.length === inputs.length)
    return unlikeUnits(inputs, "no distance lies between them");
  return `${inTime[0].name} decays in time, the other case along x: no distance lies between them`;
}

function unlikeUnits(inputs: readonly CaseInput[], so: string): string | null {
  const without = inputs.filter(({ decaySettings }) => decaySettings.units === "nondimensional");
  if (without.length === 0 || without.length === inputs.length) return null;
  return `${without[0].name} is nondimensional, the other case in SI units: ${so}`;
}

/** Quantities that have a unit. */
const lengthsCompared: readonly ComparedQuantity[] = ["L11", "lambda", "eta"];

function nothing(why: string): Pick<Overlay, "overlap" | "why" | "curves" | "stretches"> {
  return { overlap: null, why, curves: everyQuantity(() => why), stretches: [] };
}

function shownFrom(align: Laying["align"]): Overlay["shown"] {
  if (align === "x") return (s) => s;
  return align === "x0" ? Math.exp : (s) => Math.exp(-s);
}

function refusal(
  align: Laying["align"],
  cases: readonly ComparedCase[],
  origins: Laying["origins"],
  lines: readonly (IntensityLine | null)[],
): string | null {
  if (align === "x") return null;
  const without = cases.filter((_, i) => origins[i] === null).map(({ name }) => name);
  if (without.length > 0) return `${without.join(" and ")}: no law was fitted`;
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
  return { at, logarithm, mean: meanBetween(at, logarithm, at[0], at[at.length - 1]) };
}

/** The line of a case's intensity over its fitted stations; null where it has no law or no Tu. */
function lineOf({ series, flight }: ComparedCase, x0: number | null): IntensityLine | null {
  if (x0 === null || typeof series.Tu === "string") return null;
  const { x, logarithm, point } = series.Tu;
  const fitted = x.map((_, at) => at).filter((at) => point[at] >= 0);
  return intensityLine(
    fitted.map((at) => placeAlong(flight, x[at])),
    fitted.map((at) => logarithm[at]),
    x0,
  );
}
