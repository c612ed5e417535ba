import { relativeError } from "../decay/relativeError.ts";
import { isEstimate } from "../quantity.ts";
import { bandAverage } from "../signal/bandAverage.ts";
import type { StationResult } from "../stationResult.ts";

/** A spectrum in Kolmogorov form, band by band, as logarithms. */
export interface KolmogorovSpectrum {
  /** ln(k1 eta), ascending. */
  readonly place: readonly number[];
  /** ln of E11/(eps nu^5)^(1/4), freed of the bias that the logarithm of a mean of periodograms has. */
  readonly level: readonly number[];
  /** Variance of each level by the sampling of the spectrum. */
  readonly variance: readonly number[];
  /** Variance of ln eps: it moves the whole curve. */
  readonly ofDissipation: number;
}

const bandsPerDecade = 10;

/**
 * E11/(eps nu^5)^(1/4) against k1 eta, with nu^3 = eps eta^4, over bands of a tenth of a decade, up to the place where a
 * noise floor cut the spectrum. The mean of periodograms with f degrees of freedom has, in its logarithm,
 *     bias psi(f/2) - ln(f/2),   variance psi'(f/2)
 * @returns the reason where the station has no spectrum, or no dissipation to scale it by
 * @see     Pope (2000) §6.5.4 for the form; Johnson, Kotz & Balakrishnan (1994), ch. 18, for ln chi-square
 */
export function kolmogorovSpectrum(station: StationResult): KolmogorovSpectrum | string {
  const { curves, epsilon, eta, facts } = station;
  if (curves === null) return "the stations have no spectra";
  if (!isEstimate(epsilon)) return epsilon.why;
  if (!isEstimate(eta)) return eta.why;
  const bands = bandAverage(curves.k1, curves.E11, bandsPerDecade, curves.freedoms ?? curves.freedom);
  const unit = epsilon.value ** (2 / 3) * eta.value ** (5 / 3);
  const kept = bands.k1
    .map((_, i) => i)
    .filter((i) => bands.E[i] > 0 && (facts.cutoff === null || bands.k1[i] <= facts.cutoff));
  return {
    place: kept.map((i) => Math.log(bands.k1[i] * eta.value)),
    level: kept.map((i) => Math.log(bands.E[i] / unit) - logBias(bands.freedom[i] / 2)),
    variance: kept.map((i) => logVariance(bands.freedom[i] / 2)),
    ofDissipation: (relativeError(epsilon) ?? 0) ** 2,
  };
}

/** psi(a) - ln a by its asymptotic series: within 0.002 from a = 1 on. */
function logBias(a: number): number {
  return -1 / (2 * a) - 1 / (12 * a ** 2) + 1 / (120 * a ** 4);
}

/** psi'(a) likewise: within 0.012 from a = 1 on, 1e-4 from a = 3 on. */
function logVariance(a: number): number {
  return 1 / a + 1 / (2 * a ** 2) + 1 / (6 * a ** 3) - 1 / (30 * a ** 5);
}
