import { placeAlong, placeBack } from "../decay/flightCourse.ts";
import type { ComparedCase } from "./comparedCase.ts";
import { type IntensityLine, intensityAt, placeOfIntensity } from "./intensityLine.ts";

/** The places of one intensity in both cases, on the line of each. */
export interface MatchedIntensity {
  /** In the first case: chosen, and held while the stations are drawn anew. */
  readonly x: number;
  /** ln Tu there. */
  readonly logarithm: number;
  /** From there to the place of equal Tu in the second case. */
  readonly distance: number;
}

/**
 * Where the second case has the intensity that the first one has at a chosen place, each read off its line along the
 * window; nothing is carried beyond the stations of either window.
 * @param lines  null where the intensity of a case does not fall, or it has no law
 * @param at     x in the first case; null: the middle, in ln Tu, of the intensities that both windows hold
 * @param chosen whether the user chose it: else a place that cannot be matched gives way to the middle
 * @returns      the reason where there is no such place
 */
export function matchedIntensity(
  cases: readonly ComparedCase[],
  [a, b]: readonly (IntensityLine | null)[],
  at: number | null,
  chosen: boolean,
): MatchedIntensity | string {
  if (a === null || b === null) return "a case has no law or no falling intensity in its window";
  const [ofA, ofB] = cases.map(({ series }) => (typeof series.Tu === "string" ? null : series.Tu));
  if (!ofA || !ofB) return "a case has no intensity";
  if (at !== null) {
    const found = matchedAt(cases, a, b, at, [ofA.x, ofB.x]);
    if (typeof found !== "string" || chosen) return found;
  }
  const low = Math.max(...[ofA, ofB].map(({ logarithm }) => Math.min(...logarithm)));
  const high = Math.min(...[ofA, ofB].map(({ logarithm }) => Math.max(...logarithm)));
  if (!(high >= low)) return "the windows of the two cases hold no intensity in common";
  const logarithm = (low + high) / 2;
  const [x, place] = [a, b].map((line, i) => placeBack(cases[i].flight, placeOfIntensity(line, logarithm)));
  return { x, logarithm, distance: place - x };
}

function matchedAt(
  cases: readonly ComparedCase[],
  a: IntensityLine,
  b: IntensityLine,
  at: number,
  [xA, xB]: readonly (readonly number[])[],
): MatchedIntensity | string {
  if (at < xA[0] || at > xA[xA.length - 1])
    return "the place chosen for equal Tu lies outside the stations of the case held against";
  const logarithm = intensityAt(a, placeAlong(cases[0].flight, at));
  const place = placeBack(cases[1].flight, placeOfIntensity(b, logarithm));
  if (!(place >= xB[0] && place <= xB[xB.length - 1]))
    return "the other case reaches the intensity of the chosen place nowhere among its stations";
  return { x: at, logarithm, distance: place - at };
}
