import { chiSquareQuantile } from "../signal/distributions/chiSquareQuantile.ts";
import { chiSquareTail } from "../signal/distributions/chiSquareTail.ts";
import type { KolmogorovSpectrum } from "./kolmogorovSpectrum.ts";

/** How far two spectra lie apart, and how far they would by chance. */
export interface SpectralDistance {
  /** Common range of k1 eta. */
  readonly range: readonly [number, number];
  readonly bands: number;
  readonly distance: number;
  readonly chance: number;
  readonly chance_95: number;
  readonly p: number;
}

const fewestBands = 5;

/**
 * Root mean square of ln(second/first) over the bands of the second spectrum that the first one covers, the first read
 * off between its own bands on straight lines. Beside it what chance makes of two spectra of one turbulence:
 *     mean of D² = mean of v + e,   v: variance of each difference,   e: mean of m² times that of both ln eps,
 * with m = (1 - slope)/4, since a dissipation that is off by a share moves the curve along both axes by a quarter of it;
 * D² is taken for a scaled chi-square of that mean and of the variance which v and e give.
 * @returns the reason where fewer than five bands are common
 * @see     Satterthwaite (1946), Biometrics 2, 110
 */
export function spectralDistance(
  first: KolmogorovSpectrum,
  second: KolmogorovSpectrum,
): SpectralDistance | string {
  const bands = second.place.flatMap((place, i) => {
    const read = readAt(first, place);
    if (read === null) return [];
    const variance = second.variance[i] + read.variance;
    return [{ place, apart: second.level[i] - read.level, variance, moved: (1 - read.slope) / 4 }];
  });
  const count = bands.length;
  if (count < fewestBands) return "the spectra have fewer than five bands of k₁η in common";
  const mean = (of: (band: (typeof bands)[number]) => number) =>
    bands.reduce((sum, band) => sum + of(band), 0) / count;
  const ofDissipation = first.ofDissipation + second.ofDissipation;
  const square = mean(({ apart }) => apart ** 2);
  const common = mean(({ moved }) => moved ** 2) * ofDissipation;
  const expected = mean(({ variance }) => variance) + common;
  const spread =
    (2 / count) * mean(({ variance }) => variance ** 2) +
    2 * common ** 2 +
    (4 / count) * ofDissipation * mean(({ variance, moved }) => variance * moved ** 2);
  const freedom = (2 * expected ** 2) / spread;
  return {
    range: [Math.exp(bands[0].place), Math.exp(bands[count - 1].place)],
    bands: count,
    distance: Math.sqrt(square),
    chance: Math.sqrt(expected),
    chance_95: Math.sqrt((expected * chiSquareQuantile(0.95, freedom)) / freedom),
    p: chiSquareTail((square * freedom) / expected, freedom),
  };
}

/** Level, variance and slope between two bands; null beyond the ends. */
function readAt({ place, level, variance }: KolmogorovSpectrum, at: number) {
  const after = place.findIndex((own) => own >= at);
  if (after < 0 || (after === 0 && place[0] > at)) return null;
  const above = Math.max(after, 1);
  const below = above - 1;
  if (place[above] === undefined) return null;
  const share = (at - place[below]) / (place[above] - place[below]);
  const slope = (level[above] - level[below]) / (place[above] - place[below]);
  return {
    level: level[below] + share * (level[above] - level[below]),
    variance: (1 - share) ** 2 * variance[below] + share ** 2 * variance[above],
    slope,
  };
}
