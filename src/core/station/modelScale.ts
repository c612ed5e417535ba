import { logBins } from "../signal/logBins.ts";
import type { JoinedSpectra } from "./joinSpectra.ts";

/** Γ(1/3)/(√π Γ(5/6)): makes L in the form its own integral scale. */
const scaleConstant = 1.33896;
const perDecade = 20;
/** The fit ends where f T is this: k1 L11 = π. */
const reach = 0.5;
/** The search goes so many times below and above the guess. */
const span = 10;

/**
 * Integral time by von Karman's interpolation form of the longitudinal spectrum,
 *     E(f) = A / (1 + (2π · 1.339 f T)²)^(5/6),
 * A and T free, fitted to the logarithm of the Welch spectrum in bands of a twentieth of a decade, each weighing
 * as the number of its bins, over 0 < f < 0.5/T: the energetic range, whatever the Reynolds number makes of the
 * rest. The range follows the fitted T. The answer is as good as the form: of records with Pope's model spectrum
 * it gives a scale some 12 % short at Re_lambda 50, 7 % at 200, and one to 2 % of an exponential correlation.
 * @param spectra  of the station; its first component is u
 * @param guess    another route's integral time, s; > 0
 * @returns        T, s, or the reason why there is none
 * @see   von Karman (1948), Proc. Natl Acad. Sci. 34, 530
 */
export function modelScale(spectra: JoinedSpectra, guess: number): number | string {
  const bands = spectrumBands(spectra);
  let scale = guess;
  let bandsUsed = 0;
  for (let turn = 0; turn < 8; turn++) {
    const used = bands.filter(({ f }) => f * scale < reach);
    if (used.length === bandsUsed) break; // the same bands give the same scale
    if (used.length < 4) return "the spectrum has fewer than four bands in its energetic range";
    const next = minimum(used, Math.log(guess / span), Math.log(guess * span));
    if (next === null)
      return "no integral time within a factor of ten of the correlation's fits the spectrum";
    scale = Math.exp(next);
    bandsUsed = used.length;
  }
  return scale < spectra.step ? "the spectrum is that of uncorrelated samples" : scale;
}

interface Band {
  readonly f: number;
  readonly log: number;
  readonly weight: number;
}

function spectrumBands({ density: [E], size, step, segments }: JoinedSpectra): Band[] {
  const borders = logBins(1, size / 2 + 1, perDecade);
  return borders.slice(1).flatMap((end, b) => {
    const weight = end - borders[b];
    let sum = 0;
    for (let f = borders[b]; f < end; f++) sum += E[f];
    if (!(sum > 0)) return [];
    // the mean of ln of a chi-square over its freedom is some 1/freedom below 0
    const bias = 19 / (36 * segments * weight);
    return [{ f: (borders[b] + end - 1) / 2 / (size * step), log: Math.log(sum / weight) + bias, weight }];
  });
}

/** Weighted mean square about the form, its level being the best one. */
function misfit(bands: readonly Band[], scale: number): number {
  let [weight, sum, squares] = [0, 0, 0];
  for (const { f, log, weight: w } of bands) {
    const rest = log + (5 / 6) * Math.log1p((2 * Math.PI * scaleConstant * f * scale) ** 2);
    weight += w;
    sum += w * rest;
    squares += w * rest * rest;
  }
  return squares / weight - (sum / weight) ** 2;
}

/** Slope of the misfit against ln T, halved. */
function slope(bands: readonly Band[], scale: number): number {
  let [weight, sum, rises, products] = [0, 0, 0, 0];
  for (const { f, log, weight: w } of bands) {
    const square = (2 * Math.PI * scaleConstant * f * scale) ** 2;
    const rest = log + (5 / 6) * Math.log1p(square);
    const rise = ((5 / 3) * square) / (1 + square);
    weight += w;
    sum += w * rest;
    rises += w * rise;
    products += w * rest * rise;
  }
  return products / weight - (sum / weight) * (rises / weight);
}

/**
 * ln T of the least misfit between two ends: golden sections until the valley is narrow, then the zero of the slope
 * by halving, since the misfit itself is flat to half the digits; null where it lies at an end.
 */
function minimum(bands: readonly Band[], low: number, high: number): number | null {
  const of = (log: number) => misfit(bands, Math.exp(log));
  const golden = (Math.sqrt(5) - 1) / 2;
  let [a, b] = [low, high];
  let [c, d] = [b - golden * (b - a), a + golden * (b - a)];
  let [fc, fd] = [of(c), of(d)];
  while (b - a > 1e-2) {
    if (fc < fd) {
      [b, d, fd] = [d, c, fc];
      c = b - golden * (b - a);
      fc = of(c);
    } else {
      [a, c, fc] = [c, d, fd];
      d = a + golden * (b - a);
      fd = of(d);
    }
  }
  if (a === low || b === high) return null;
  for (let halving = 0; halving < 48; halving++) {
    const middle = (a + b) / 2;
    if (slope(bands, Math.exp(middle)) < 0) a = middle;
    else b = middle;
  }
  return (a + b) / 2;
}
