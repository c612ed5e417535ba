import { isEstimate, type Quantity } from "../quantity.ts";
import type { StationFacts } from "../stationResult.ts";
import { dissipationReason } from "./adoptedDissipation.ts";
import type { StationMaterial } from "./stationQuantities.ts";
import { lateral, taylorFactors, type ValueName } from "./stationValues.ts";

/** How the reduction went: the settings as they worked out. */
export function stationFacts(material: StationMaterial, values: Record<ValueName, Quantity>): StationFacts {
  const { record, spectra, sampling, times, all, settings, correlation } = material;
  const U = record.means[0];
  const { uu, vv, ww } = all.whole;
  const [v2, w2] = lateral(uu, vv, ww);
  const factors = U > 0 ? taylorFactors(uu, v2, w2, U, settings.taylorCorrection) : null;
  const sum = spectra?.density[0].reduce((total, value) => total + value, 0);
  return {
    step: record.untimed === null ? record.step : null,
    integralTimes: sampling.integralTimes,
    groups: sampling.groups?.count ?? 0,
    ...(record.repeats > 1 ? { repeats: record.repeats } : {}),
    segment: spectra?.size ?? null,
    segments: spectra?.segments ?? 0,
    recoveredVariance:
      spectra === null || sum === undefined ? null : sum / (spectra.size * spectra.step * uu),
    ...cutFacts(material, values.eta),
    taylorFactor: factors === null ? null : factors[0],
    ...(factors === null ? {} : { taylorFactors: factors }),
    lagLimit: correlation === null ? null : correlation.covariance[0].length * correlation.step,
    tauStar: times.tauStar,
    integralScaleSpread: spreadOf(material),
    dissipationReason: dissipationReason(settings, record.components.length),
    components: record.components,
  };
}

/** Where the integral for the gradient of u ends, and what that decides. */
function cutFacts({ record, spectra, gradients }: StationMaterial, eta: Quantity) {
  const U = record.means[0];
  const found = gradients.find(({ name }) => name === "u");
  const rule = found?.rule;
  const perBin = spectra === null || !(U > 0) ? null : (2 * Math.PI) / (U * spectra.size * spectra.step);
  const cutoff = rule === undefined || rule.cut === 0 || perBin === null ? null : rule.cutBin * perBin;
  const highest = perBin === null || spectra === null ? null : (cutoff ?? (spectra.size / 2) * perBin);
  // lambda goes with the root of the gradient
  const sensitivity = found?.sensitivity ?? null;
  return {
    cutoff,
    noiseFloor: rule === undefined || rule.floor === 0 || !(U > 0) ? null : (rule.floor * U) / (2 * Math.PI),
    shareBeyondCutoff: cutoff === null ? null : (rule?.shareBeyond ?? null),
    cutoffSensitivity: cutoff === null || sensitivity === null ? null : sensitivity / 2,
    k1max_eta: highest === null || !isEstimate(eta) ? null : highest * eta.value,
  };
}

/** Largest of the integral times over the smallest, of the routes that give one; the lag at 1/e is no integral. */
function spreadOf({ times }: StationMaterial): number | null {
  const found = Object.entries(times.routes).flatMap(([name, time]) =>
    typeof time === "number" && time > 0 && name !== "one-over-e" ? [time] : [],
  );
  return found.length < 2 ? null : Math.max(...found) / Math.min(...found);
}
