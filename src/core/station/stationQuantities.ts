import { bare, isEstimate, missing, type Quantity, type StandardError } from "../quantity.ts";
import type { ReduceSettings } from "../stationResult.ts";
import type { ProbeComparison } from "./compareProbes.ts";
import type { IntegralTimes } from "./integralTimes.ts";
import type { JoinedCorrelation } from "./joinCorrelations.ts";
import type { JoinedRecord } from "./joinParts.ts";
import type { JoinedSpectra } from "./joinSpectra.ts";
import type { Sampling } from "./sampling.ts";
import {
  joinedError,
  partless,
  type Replicates,
  valueError,
  valueQuantity,
  withError,
} from "./stationErrors.ts";
import type { ComponentGradient } from "./stationGradients.ts";
import { type ValueName, valueScales } from "./stationValues.ts";
import type { StructureSums } from "./structureSums.ts";
import { areaUpTo } from "./zeroCrossing.ts";

/** What the quantities of a station are made from. */
export interface StationMaterial {
  readonly record: JoinedRecord;
  readonly correlation: JoinedCorrelation | null;
  readonly spectra: JoinedSpectra | null;
  readonly times: IntegralTimes;
  readonly gradients: readonly ComponentGradient[];
  readonly structure: StructureSums | null;
  readonly sampling: Sampling;
  readonly all: Replicates;
  readonly settings: ReduceSettings;
  /** The probes beside each other; null where there is one. */
  readonly compared: ProbeComparison | null;
}

/** Every value with its interval, or the reason why it is missing. */
export function valueQuantities(material: StationMaterial): Record<ValueName, Quantity> {
  const names = Object.keys(valueScales) as ValueName[];
  const entries = names.map((name) => [name, valueQuantity(name, material.all, absence(name, material))]);
  return Object.fromEntries(entries);
}

const structural = /^epsilon_(?:second|third)-order$/;
const needsViscosity = /^epsilon|^eta$|Re_|_epsilon/;
const needsSpectrum = /gradient|^epsilon|lambda|^eta$|S_dudx|^K_|_epsilon/;
const needsTime = /gradient|^epsilon|lambda|^eta$|S_dudx|^K_|_over_T|_ratio$/;
const ofTensor = /^(?:anisotropy|barycentric)|vw$/;
const lateralOf =
  /^(?:isotropy_u|skewness_|flatness_|gradient_|K_|rho_u)?([vw])$|^u?([vw])w?$|^([vw])\3$|^L_([vw])_ratio$/;

/** Why a value is not to be had from these sums. */
function absence(name: ValueName, material: StationMaterial): string {
  const { record, settings, spectra, all, times, structure } = material;
  const letters = ofTensor.test(name) ? ["v", "w"] : [lateralOf.exec(name)?.slice(1).find(Boolean) ?? "u"];
  const lacking = letters.find((letter) => !record.components.some((own) => own === letter));
  if (lacking !== undefined) return `${lacking} was not measured`;
  if (needsViscosity.test(name) && !structural.test(name) && settings.kinematicViscosity === null)
    return "no kinematic viscosity is given";
  if (record.untimed !== null && needsTime.test(name)) return record.untimed;
  if (!(all.whole.U > 0))
    return "the mean velocity is not positive, so time is not to be turned into distance";
  if (needsSpectrum.test(name) && spectra === null)
    return "no piece of a record holds a whole segment of the spectrum";
  if (structural.test(name) && structure === null)
    return "no lag lies between the Taylor and the integral scale";
  if (needsSpectrum.test(name)) return "the spectrum shows nothing above its noise floor";
  if (name.endsWith("_ratio") && times.tauStar === null) return "the correlation of u does not fall to zero";
  return "the fluctuation is zero";
}

/** A scale found from the correlation, with the error that all of them share. */
export function scaleQuantity(value: number | string, sampling: Sampling): Quantity {
  if (typeof value === "string") return missing(value);
  if (!(value > 0)) return missing("the correlation gives no positive scale");
  return sampling.scaleError === null ? bare(value, sampling.why) : withError(value, sampling.scaleError);
}

/** A product of a value per integral time with the integral time: both errors count. */
export function timesScale(
  name: ValueName,
  time: Quantity,
  material: StationMaterial,
  values: Record<ValueName, Quantity>,
): Quantity {
  const rest = values[name];
  if (!isEstimate(rest)) return rest;
  return timesScaleOf(rest.value, valueError(name, material.all), time, material.sampling);
}

/** A value with an error on the scale of the logarithm, times an integral scale. */
export function timesScaleOf(
  value: number,
  error: StandardError | null,
  scale: Quantity,
  { scaleError, why }: Sampling,
): Quantity {
  if (!isEstimate(scale)) return scale;
  const product = value * scale.value;
  if (scaleError === null) return bare(product, why);
  if (error === null) return bare(product, partless);
  return withError(product, joinedError(error, scaleError));
}

/** Length scale of v or w: its correlation integrated to the first zero crossing of that of u, times U. */
export function lateralLength(
  name: "v" | "w",
  { record, correlation, times, sampling }: StationMaterial,
): Quantity {
  const c = record.components.indexOf(name);
  if (c < 0) return missing(`${name} was not measured`);
  if (correlation === null)
    return missing(record.untimed ?? "the records hold no lag products, so there is no correlation");
  if (times.tauStar === null) return missing("the correlation of u does not fall to zero");
  const covariance = correlation.covariance[c];
  const area = (areaUpTo(covariance, times.tauStar / correlation.step) * correlation.step) / covariance[0];
  return scaleQuantity(record.means[0] * area, sampling);
}
