import { realFourier } from "../signal/realFourier.ts";

/** A signal that comes back. */
export interface Replay {
  /** In points of the signal. */
  readonly period: number;
  /** Correlation with itself one period later. */
  readonly peak: number;
  /** Correlation from `from` on, a number a point: the revival with its surroundings. */
  readonly from: number;
  readonly rho: Float64Array;
}

/** Correlation from which on a signal is said to come back, and how many of its own standard errors it must be. */
const leastPeak = 0.5;
const errors = 6;
/** Integral times of low correlation that must lie before: a tone never loses it. */
const quiet = 5;
const low = 0.3;
/** The first of several peaks is the period if it is so high against the highest. */
const almost = 0.8;
/** Integral times below which a record is too short to tell. */
const fewest = 40;
/** Integral times kept on either side of a revival, for the eye. */
const around = 6;

/**
 * Whether a signal repeats itself: a correlation that was lost and comes back, at a lag of up to half the record,
 * to one half or more and to more than chance would make of it,
 *     se(ρ) = √(∫ρ² dτ / (T - τ)),  the integral over all lags around 0
 * @param x  the signal, in points not much longer than a third of its integral time
 * @returns  null where it does not
 * @see   Bartlett (1946), Suppl. J. R. Stat. Soc. 8, 27, for the error of a correlation
 */
export function replayPeriod(x: Float64Array): Replay | null {
  const half = Math.floor(x.length / 2);
  if (half < 8) return null;
  const rho = correlationOf(x, half);
  if (rho === null) return null;
  let zero = 1;
  while (zero < half && rho[zero] > 0) zero++;
  let [scale, squares] = [0.5, 0.5];
  for (let l = 1; l < zero; l++) {
    scale += rho[l];
    squares += rho[l] ** 2;
  }
  if (x.length < fewest * scale) return null;
  const from = endOfQuiet(rho, zero, Math.ceil(quiet * scale));
  const isPeak = (l: number) => {
    const error = Math.sqrt((2 * squares) / (x.length - l));
    const top = rho[l] >= rho[l - 1] && (l + 1 >= half || rho[l] >= rho[l + 1]);
    return top && rho[l] > Math.max(leastPeak, errors * error);
  };
  let highest = 0;
  for (let l = from; l < half; l++) if (isPeak(l)) highest = Math.max(highest, rho[l]);
  for (let l = from; l < half; l++) {
    if (!isPeak(l) || rho[l] < almost * highest) continue;
    const reach = Math.ceil(around * scale);
    const first = Math.max(0, l - reach);
    return { period: vertex(rho, l), peak: rho[l], from: first, rho: rho.slice(first, l + reach + 1) };
  }
  return null;
}

/** Correlation coefficients at lags 0 … count - 1, each over its own number of pairs. */
function correlationOf(x: Float64Array, count: number): Float64Array | null {
  const size = 2 ** Math.ceil(Math.log2(x.length + count));
  const fourier = realFourier(size);
  const padded = new Float64Array(size);
  const mean = x.reduce((sum, value) => sum + value, 0) / x.length;
  for (let i = 0; i < x.length; i++) padded[i] = x[i] - mean;
  const power = fourier.forward(padded).slice(0, size + 2);
  for (let f = 0; f <= size; f += 2) {
    power[f] = power[f] ** 2 + power[f + 1] ** 2;
    power[f + 1] = 0;
  }
  const products = new Float64Array(count);
  fourier.inverse(power, products);
  const variance = products[0] / x.length;
  if (!(variance > 0)) return null;
  return products.map((value, l) => value / (x.length - l) / variance);
}

/** Index after the first stretch of `length` low correlations. */
function endOfQuiet(rho: Float64Array, from: number, length: number): number {
  let run = 0;
  for (let l = from; l < rho.length; l++) {
    run = Math.abs(rho[l]) < low ? run + 1 : 0;
    if (run === length) return l + 1;
  }
  return rho.length;
}

/** Top of the parabola through a peak and its neighbours. */
function vertex(rho: Float64Array, l: number): number {
  if (l + 1 >= rho.length) return l;
  const bend = rho[l - 1] - 2 * rho[l] + rho[l + 1];
  return bend < 0 ? l + (rho[l - 1] - rho[l + 1]) / (2 * bend) : l;
}
