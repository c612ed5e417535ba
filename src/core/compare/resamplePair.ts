import { type ComparedQuantity, comparedQuantities } from "../comparison.ts";
import { drawTogether } from "../decay/drawTogether.ts";
import { type SeededRandom, seededRandom } from "../signal/seededRandom.ts";
import { type Alignment, ownLaw } from "./alignment.ts";
import { type ComparedCase, logSlopes, moveStations } from "./comparedCase.ts";
import type { ComparedSeries } from "./comparedSeries.ts";
import { type IntensityLine, intensityLine, placeOfIntensity } from "./intensityLine.ts";
import { interpolate, meanOver } from "./interpolate.ts";
import { type Overlay, type RatioCurve, stationsOf } from "./overlay.ts";
import { spreadOf } from "./spreadOf.ts";

export interface RatioSpread {
  readonly mean: number;
  readonly curve: readonly (number | null)[];
}

/** Standard errors told by resampling. */
export interface Resampled {
  /** Of the mean ln ratio and of ln ratio along its curve; null where a case carries no errors. */
  readonly ratios: Readonly<Record<ComparedQuantity, RatioSpread | null>>;
  /** Of x0_B - x0_A. */
  readonly distance: number | null;
  readonly matched: number | null;
}

const resamples = 500;

/** One case while it is resampled. */
interface Moving {
  readonly source: ComparedCase;
  readonly random: SeededRandom;
  /** Movement of ln q and of ln epsilon at each fitted station. */
  readonly ofQ: Float64Array;
  readonly ofEpsilon: Float64Array;
  readonly slopes: Float64Array;
  readonly baseSlopes: Float64Array;
  /** Coordinates of the stations compared. */
  readonly s: Float64Array;
  readonly needsEpsilon: boolean;
}

/**
 * Standard errors of all that a comparison gives, from station values drawn anew about the measured ones: each draw
 * moves ln q at every fitted station, refits both laws, moves all other values by their own errors, and forms the
 * ratios again at the same places. The draws follow from the names of the cases alone.
 */
export function resamplePair(
  cases: readonly [ComparedCase, ComparedCase],
  aligned: Alignment,
  laid: Overlay,
): Resampled {
  const seed = seedOf(`${cases[0].name}\n${cases[1].name}`);
  const moving = [movingCase(cases[0], seed), movingCase(cases[1], seed + 1)];
  const ratios = comparedQuantities.map((quantity) => ratioSamples(quantity, cases, laid));
  const distance = new Float64Array(aligned.origins === null ? 0 : resamples);
  const matched = new Float64Array(typeof laid.matched === "string" ? 0 : resamples);
  for (let draw = 0; draw < resamples; draw++) {
    for (const one of moving) moveLaw(one);
    const origins = aligned.refit();
    for (const one of moving) moveDissipation(one);
    if (origins !== null) distance[draw] = origins[1] - origins[0];
    const lines = moving.map((one, i) => (origins === null ? null : movedLine(one, origins[i])));
    const [a, b] = lines;
    if (typeof laid.matched !== "string" && a && b) {
      const { logarithm } = laid.matched;
      matched[draw] = placeOfIntensity(b, logarithm) - placeOfIntensity(a, logarithm);
    }
    laid.coordinates(0, origins?.[0] ?? 0, lines[0], moving[0].s);
    laid.coordinates(1, origins?.[1] ?? 0, lines[1], moving[1].s);
    for (const ratio of ratios) if (ratio !== null) drawRatio(ratio, moving, draw);
  }
  const spreads = ratios.map((ratio): RatioSpread | null => {
    const mean = ratio === null ? null : spreadOf(ratio.means);
    return ratio === null || mean === null ? null : { mean, curve: ratio.along.map(spreadOf) };
  });
  return {
    ratios: Object.fromEntries(
      comparedQuantities.map((quantity, i) => [quantity, spreads[i]]),
    ) as Resampled["ratios"],
    distance: distance.length > 0 ? spreadOf(distance) : null,
    matched: matched.length > 0 ? spreadOf(matched) : null,
  };
}

/** Hash of a text (FNV-1a), so that a seed follows from the cases' names. */
function seedOf(text: string): number {
  let hash = 0x811c9dc5;
  for (let i = 0; i < text.length; i++) hash = Math.imul(hash ^ text.charCodeAt(i), 0x01000193);
  return hash >>> 0;
}

function movingCase(source: ComparedCase, seed: number): Moving {
  const count = source.law?.x.length ?? 0;
  const baseSlopes = new Float64Array(count);
  if (source.law) logSlopes(source.law.problem, source.law.fitted.fit.law, baseSlopes);
  return {
    source,
    random: seededRandom(seed),
    ofQ: new Float64Array(count),
    ofEpsilon: new Float64Array(count),
    slopes: new Float64Array(count),
    baseSlopes,
    s: new Float64Array(source.x.length),
    needsEpsilon: Object.values(source.series).some((one) => typeof one !== "string" && one.byEpsilon !== 0),
  };
}

/** Draws ln q anew at the fitted stations: each for itself, or all at once by the blocks they have in common. */
function moveLaw({ source, random, ofQ }: Moving): void {
  const { law } = source;
  if (law === null) return;
  if (law.blocks !== null) drawTogether(law.blocks, random, ofQ);
  else for (let i = 0; i < ofQ.length; i++) ofQ[i] = law.error[i] * random.gaussian();
  moveStations(law, ofQ);
}

/** How the dissipation of the case's own law moves with it. */
function moveDissipation({ source, ofEpsilon, slopes, baseSlopes, needsEpsilon }: Moving): void {
  if (source.law === null || !needsEpsilon) return;
  logSlopes(source.law.problem, ownLaw(source.law), slopes);
  for (let i = 0; i < slopes.length; i++) ofEpsilon[i] = slopes[i] - baseSlopes[i];
}

function movedLine({ source, ofQ }: Moving, x0: number): IntensityLine | null {
  const { Tu } = source.series;
  if (typeof Tu === "string") return null;
  const fitted = Tu.point.map((_, i) => i).filter((i) => Tu.point[i] >= 0);
  const x = fitted.map((i) => Tu.x[i]);
  const y = fitted.map((i) => Tu.logarithm[i] + ofQ[Tu.point[i]] / 2);
  return intensityLine(x, y, x0);
}

/** One side of a ratio while it is resampled, with scratch for each draw. */
interface MovingSeries {
  readonly series: ComparedSeries;
  readonly stations: readonly number[];
  readonly places: Float64Array;
  readonly values: Float64Array;
  readonly out: Float64Array;
}

interface RatioSamples {
  readonly sides: readonly MovingSeries[];
  readonly curve: RatioCurve;
  readonly means: Float64Array;
  readonly along: readonly Float64Array[];
}

function ratioSamples(
  quantity: ComparedQuantity,
  cases: readonly [ComparedCase, ComparedCase],
  { curves }: Overlay,
): RatioSamples | null {
  const curve = curves[quantity];
  if (typeof curve === "string") return null;
  const sides = cases.flatMap((one) => {
    const series = one.series[quantity];
    if (typeof series === "string" || !toldErrors(series)) return [];
    const scratch = () => new Float64Array(series.x.length);
    const out = new Float64Array(curve.at.length);
    return [{ series, stations: stationsOf(series, one), places: scratch(), values: scratch(), out }];
  });
  if (sides.length < 2) return null;
  const along = Array.from(curve.at, () => new Float64Array(resamples));
  return { sides, curve, means: new Float64Array(resamples), along };
}

function toldErrors({ error, byQ, byEpsilon }: ComparedSeries): boolean {
  return error !== null || byQ !== 0 || byEpsilon !== 0;
}

function drawRatio({ sides, curve, means, along }: RatioSamples, moving: readonly Moving[], draw: number) {
  for (let side = 0; side < 2; side++) drawSide(sides[side], moving[side], curve.at);
  const [a, b] = [sides[0].out, sides[1].out];
  for (let i = 0; i < b.length; i++) {
    b[i] -= a[i];
    along[i][draw] = b[i];
  }
  means[draw] = meanOver(curve.at, b);
}

function drawSide(
  { series, stations, places, values, out }: MovingSeries,
  { ofQ, ofEpsilon, s, random }: Moving,
  at: Float64Array,
): void {
  const { logarithm, error, point, byQ, byEpsilon } = series;
  const follows = byQ !== 0 || byEpsilon !== 0;
  for (let i = 0; i < values.length; i++) {
    places[i] = s[stations[i]];
    const move = follows
      ? byQ * ofQ[point[i]] + byEpsilon * ofEpsilon[point[i]]
      : (error?.[i] ?? 0) * random.gaussian();
    values[i] = logarithm[i] + move;
  }
  interpolate(places, values, at, out);
}
