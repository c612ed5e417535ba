import { logBins } from "../signal/logBins.ts";
import type { StationCurves } from "../stationResult.ts";
import type { JoinedCorrelation } from "./joinCorrelations.ts";
import type { JoinedRecord } from "./joinParts.ts";
import type { JoinedSpectra } from "./joinSpectra.ts";
import { localSpectrum } from "./localSpectrum.ts";

/** Bins a decade in the spectra that are kept: at the low end every point of the estimate. */
const perDecade = 100;
const mostLags = 1000;

/**
 * Curves of a station: spectra against wavenumber, k1 = 2πf/U and E(k1) = U/(2π) E(f), averaged over bins of a
 * hundredth of a decade where they hold more than one point; correlations up to four zero crossings.
 * @returns null where no record holds a whole segment, or U is not positive
 */
export function stationCurves(
  record: JoinedRecord,
  spectra: JoinedSpectra | null,
  correlation: JoinedCorrelation | null,
  tauStar: number | null,
): StationCurves | null {
  const U = record.means[0];
  if (spectra === null || correlation === null || !(U > 0)) return null;
  const borders = logBins(1, spectra.size / 2 + 1, perDecade);
  const at = (name: "u" | "v" | "w") => record.components.indexOf(name);
  const curve = (name: "u" | "v" | "w") =>
    at(name) < 0 ? null : average(spectra.density[at(name)], borders, U / (2 * Math.PI));
  const rho = (name: "u" | "v" | "w") =>
    at(name) < 0 ? null : thinned(correlation.covariance[at(name)], lags.every, lags.count);
  const lags = lagsKept(correlation, tauStar);
  const single = (36 * spectra.segments) / 19;
  return {
    k1: wavenumbers(borders, (2 * Math.PI) / (U * spectra.size * spectra.step)),
    E11: average(spectra.density[0], borders, U / (2 * Math.PI)),
    E22: curve("v"),
    E33: curve("w"),
    E12: !spectra.cross ? null : average(spectra.cross, borders, U / (2 * Math.PI)),
    local: localOf(spectra, U, [at("v"), at("w")]),
    freedom: single,
    freedoms: Float64Array.from({ length: borders.length - 1 }, (_, b) =>
      // 2 T df for a band; neighbouring bins of a Hann window are not independent
      Math.max(single, (2 * record.duration * (borders[b + 1] - borders[b])) / (spectra.size * spectra.step)),
    ),
    lag: Float64Array.from({ length: lags.count }, (_, i) => i * lags.every * correlation.step),
    rho_u: thinned(correlation.covariance[0], lags.every, lags.count),
    rho_v: rho("v"),
    rho_w: rho("w"),
    ...revivalOf(record),
  };
}

/** Around the period of a replayed record, where the correlation revives. */
function revivalOf({ parts }: JoinedRecord): Pick<StationCurves, "revival"> {
  const found = parts.find(({ replay }) => replay?.revival !== undefined)?.replay;
  if (!found?.revival) return {};
  const { from, step, rho } = found.revival;
  const lag = Float64Array.from(rho, (_, i) => from + i * step);
  return { revival: { period: found.period, peak: found.peak, lag, rho: rho.slice() } };
}

function localOf({ density, size, step }: JoinedSpectra, U: number, [v, w]: readonly [number, number]) {
  const unit = (2 * Math.PI) / (U * size * step);
  const k1 = Float64Array.from({ length: size / 2 }, (_, i) => (i + 1) * unit);
  const spectrum = (c: number) => density[c].subarray(1).map((value) => (value * U) / (2 * Math.PI));
  return localSpectrum(k1, spectrum(0), v < 0 ? null : spectrum(v), w < 0 ? null : spectrum(w));
}

function wavenumbers(borders: readonly number[], unit: number): Float64Array {
  return Float64Array.from(
    { length: borders.length - 1 },
    (_, b) => ((borders[b] + borders[b + 1] - 1) / 2) * unit,
  );
}

function average(density: Float64Array, borders: readonly number[], factor: number): Float64Array {
  const out = new Float64Array(borders.length - 1);
  for (let b = 0; b < out.length; b++) {
    for (let f = borders[b]; f < borders[b + 1]; f++) out[b] += density[f];
    out[b] *= factor / (borders[b + 1] - borders[b]);
  }
  return out;
}

function lagsKept(correlation: JoinedCorrelation, tauStar: number | null) {
  const length = correlation.covariance[0].length;
  const reach = tauStar === null ? length : Math.min(length, Math.ceil((4 * tauStar) / correlation.step) + 1);
  const every = Math.max(1, Math.ceil(reach / mostLags));
  return { every, count: Math.ceil(reach / every) };
}

function thinned(covariance: Float64Array, every: number, count: number): Float64Array {
  return Float64Array.from({ length: count }, (_, i) =>
    covariance[0] > 0 ? covariance[i * every] / covariance[0] : 0,
  );
}
