import type { ReduceSettings } from "../stationResult.ts";
import type { JoinedCorrelation } from "./joinCorrelations.ts";
import type { JoinedSpectra } from "./joinSpectra.ts";
import { modelScale } from "./modelScale.ts";
import { zeroCrossing } from "./zeroCrossing.ts";

/** Integral time of u by each route; a number in s, or the reason why there is none. */
export interface IntegralTimes {
  readonly routes: Readonly<Record<ReduceSettings["integralScale"], number | string>>;
  /** First zero crossing of the correlation of u, s; null where there is none. */
  readonly tauStar: number | null;
  /** The adopted one, or the best guess where it is missing: what lengths of record are told in. */
  readonly scale: number | null;
}

/**
 * Integral time of u,
 *     zero-crossing  T = ∫₀^τ* ρ dτ, τ* the first zero
 *     one-over-e     the lag where ρ = 1/e
 *     exponential    ρ = e^(-τ/T) fitted to ρ > 0.2, through ρ(0) = 1
 *     low-frequency  E(0)/(4 uu), E one-sided, from ln E linear in f² on 0 < f < 0.12/T
 *     model          von Karman's form of E11 fitted to the energetic range (see modelScale)
 * @param correlation  of the station; null where its records hold no lag products
 * @param spectra      of the station, or null
 * @param adopted      route that the user chose
 * @param why          why there is no correlation
 * @see   Pope (2000) §3.6; Tennekes & Lumley (1972) §6.4
 */
export function integralTimes(
  correlation: JoinedCorrelation | null,
  spectra: JoinedSpectra | null,
  adopted: ReduceSettings["integralScale"],
  why = "the records hold no lag products, so there is no correlation",
): IntegralTimes {
  if (correlation === null) return { routes: allRoutes(why), tauStar: null, scale: null };
  const { step } = correlation;
  const variance = correlation.covariance[0][0];
  const rho = correlation.covariance[0].map((value) => value / variance);
  const { at, area } = zeroCrossing(rho);
  const crossed = at === null ? neverFalls(area * step, rho.length * step) : area * step;
  const routes = {
    "zero-crossing": crossed,
    "one-over-e": oneOverE(rho, step),
    exponential: exponentialTime(rho, step),
    "low-frequency": lowFrequency(spectra, variance, area * step),
    model: spectra === null ? noSegment : modelScale(spectra, Math.max(area, 1) * step),
  };
  const chosen = routes[adopted];
  const scale = typeof chosen === "number" ? chosen : at === null ? null : area * step;
  return { routes, tauStar: at === null ? null : at * step, scale };
}

const noSegment = "the record is shorter than a segment of the spectrum";

function allRoutes(why: string): IntegralTimes["routes"] {
  return {
    "zero-crossing": why,
    "one-over-e": why,
    exponential: why,
    "low-frequency": why,
    model: why,
  };
}

function neverFalls(area: number, reach: number): string {
  return `the correlation does not fall to zero within ${reach.toPrecision(3)} of lag: the integral time is ${area.toPrecision(3)} or more`;
}

function oneOverE(rho: Float64Array, step: number): number | string {
  const after = rho.findIndex((value) => value <= 1 / Math.E);
  if (after < 1) return "the correlation does not fall to 1/e within the lags formed";
  return (after - 1 + (rho[after - 1] - 1 / Math.E) / (rho[after - 1] - rho[after])) * step;
}

/** Least squares of ln ρ on a line through the origin. */
function exponentialTime(rho: Float64Array, step: number): number | string {
  let squares = 0;
  let products = 0;
  for (let lag = 1; lag < rho.length && rho[lag] > 0.2; lag++) {
    squares += lag * lag;
    products -= lag * Math.log(rho[lag]);
  }
  if (!(products > 0)) return "fewer than two lags have a correlation above 0.2";
  return (squares / products) * step;
}

function lowFrequency(spectra: JoinedSpectra | null, variance: number, scale: number): number | string {
  if (spectra === null) return noSegment;
  const { density, size, step, segments } = spectra;
  const end = (0.12 / scale) * size * step;
  // the mean of ln of a chi-square over its freedom is some 1/freedom below 0
  const bias = 19 / (36 * segments);
  let n = 0;
  let sx = 0;
  let sy = 0;
  let sxx = 0;
  let sxy = 0;
  for (let f = 1; f < end && f < density[0].length; f++) {
    if (!(density[0][f] > 0)) continue;
    const y = Math.log(density[0][f]) + bias;
    n++;
    sx += f * f;
    sy += y;
    sxx += f ** 4;
    sxy += f * f * y;
  }
  const spread = n * sxx - sx * sx;
  if (n < 3 || !(spread > 0))
    return "the spectrum has fewer than three bins below 0.12 over the integral time";
  const level = (sy * sxx - sx * sxy) / spread;
  const found = Math.exp(level) / (4 * variance);
  return found < spectra.step / 10 ? "the spectrum falls to nothing towards frequency 0" : found;
}
