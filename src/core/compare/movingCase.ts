import { type ComparedQuantity, comparedQuantities } from "../comparison.ts";
import { drawStations } from "../decay/drawStations.ts";
import { placeAlong } from "../decay/flightCourse.ts";
import type { CentredLaw } from "../decay/lawProblem.ts";
import { type SeededRandom, seededRandom } from "../signal/seededRandom.ts";
import { type ComparedCase, logSlopes, moveStations } from "./comparedCase.ts";
import type { ComparedSeries } from "./comparedSeries.ts";
import { type IntensityLine, intensityLine } from "./intensityLine.ts";
import { stationsOf } from "./overlay.ts";

/** One case while its station values are drawn anew. */
export interface MovingCase {
  readonly source: ComparedCase;
  readonly random: SeededRandom;
  /** Movement of ln q and of ln epsilon at each fitted station. */
  readonly ofQ: Float64Array;
  readonly ofEpsilon: Float64Array;
  readonly slopes: Float64Array;
  readonly baseSlopes: Float64Array;
  readonly needsEpsilon: boolean;
  /** Null where nothing tells the errors of a quantity. */
  readonly series: Readonly<Record<ComparedQuantity, MovingSeries | null>>;
}

/** One quantity of a case as it stands in the present draw. */
export interface MovingSeries {
  readonly series: ComparedSeries;
  /** Index of each station among those compared. */
  readonly stations: readonly number[];
  /** ln of the values drawn. */
  readonly values: Float64Array;
}

/** @param seed of this case alone: what is drawn for it does not depend on the others */
export function movingCase(source: ComparedCase, seed: number): MovingCase {
  const count = source.law?.count ?? 0;
  const baseSlopes = new Float64Array(count);
  if (source.law) logSlopes(source.law.problem, source.law.fitted.fit.law, baseSlopes);
  const series = comparedQuantities.map((quantity) => [quantity, movingSeries(source, quantity)]);
  return {
    source,
    random: seededRandom(seed),
    ofQ: new Float64Array(count),
    ofEpsilon: new Float64Array(count),
    slopes: new Float64Array(count),
    baseSlopes,
    needsEpsilon: Object.values(source.series).some((one) => typeof one !== "string" && one.byEpsilon !== 0),
    series: Object.fromEntries(series) as MovingCase["series"],
  };
}

function movingSeries(source: ComparedCase, quantity: ComparedQuantity): MovingSeries | null {
  const series = source.series[quantity];
  if (typeof series === "string") return null;
  const told = series.error !== null || series.byQ !== 0 || series.byEpsilon !== 0;
  return told
    ? { series, stations: stationsOf(series, source), values: new Float64Array(series.x.length) }
    : null;
}

/** Draws ln q anew at the fitted stations: each for itself, or all at once by the blocks they have in common. */
export function moveLaw({ source, random, ofQ }: MovingCase): void {
  const { law } = source;
  if (law === null) return;
  drawStations(law.blocks, law.error, random, ofQ);
  moveStations(law, ofQ);
}

/**
 * Draws all compared quantities: what follows the fitted energy or the dissipation of the law moves with them, all else
 * by its own errors.
 * @param law of the case alone, fitted to the values drawn; null where it has none
 */
export function moveSeries(moving: MovingCase, law: CentredLaw | null): void {
  const { source, random, ofQ, ofEpsilon, slopes, baseSlopes, needsEpsilon } = moving;
  if (source.law !== null && law !== null && needsEpsilon) {
    logSlopes(source.law.problem, law, slopes);
    for (let i = 0; i < slopes.length; i++) ofEpsilon[i] = slopes[i] - baseSlopes[i];
  }
  for (const quantity of comparedQuantities) {
    const one = moving.series[quantity];
    if (one === null) continue;
    const { logarithm, error, point, byQ, byEpsilon } = one.series;
    const follows = byQ !== 0 || byEpsilon !== 0;
    for (let i = 0; i < one.values.length; i++) {
      const move = follows
        ? byQ * ofQ[point[i]] + byEpsilon * ofEpsilon[point[i]]
        : (error?.[i] ?? 0) * random.gaussian();
      one.values[i] = logarithm[i] + move;
    }
  }
}

/** The line of the intensity drawn; null where there is none. */
export function movedLine({ source, ofQ }: MovingCase, x0: number | null): IntensityLine | null {
  const { flight, series } = source;
  const { Tu } = series;
  if (typeof Tu === "string" || x0 === null) return null;
  const fitted = Tu.point.map((_, i) => i).filter((i) => Tu.point[i] >= 0);
  const x = fitted.map((i) => placeAlong(flight, Tu.x[i]));
  const y = fitted.map((i) => Tu.logarithm[i] + ofQ[Tu.point[i]] / 2);
  return intensityLine(x, y, x0);
}
