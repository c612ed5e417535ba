import { bare, isEstimate, missing, type Quantity, type StandardError } from "../../quantity.ts";
import { joinedError, withError } from "../stationErrors.ts";
import { areaUpTo } from "../zeroCrossing.ts";
import { lineComponents } from "./lineFields.ts";
import type { LineMaterial } from "./lineMaterial.ts";
import { lineError, lineQuantity } from "./lineReplicates.ts";
import { type LineValueName, lineScales } from "./lineValues.ts";

/** Every value with its interval, or the reason why it is missing. */
export function lineQuantities(material: LineMaterial): Record<LineValueName, Quantity> {
  const names = Object.keys(lineScales) as LineValueName[];
  const entries = names.map((name) => [name, lineQuantity(name, material.all, absence(name, material))]);
  return Object.fromEntries(entries);
}

const needsViscosity = /epsilon|^eta$|Re_/;
const ofLine = /gradient|epsilon|lambda|^eta$|S_dudx|K_|Re_/;
const letterOf = /^(?:isotropy_u|skewness_|flatness_)([vw])$|^u?([vw])w?$|^([vw])\3$/;

/** Why a value is not to be had from these lines. */
function absence(name: LineValueName, { lines, settings, spectra, all }: LineMaterial): string {
  const order = lineComponents(lines.along);
  const slot = /^(?:gradient|K)_([uvw])$/.exec(name)?.[1];
  const found = letterOf.exec(name);
  const own = slot === undefined ? (found?.[1] ?? found?.[2] ?? found?.[3]) : order["uvw".indexOf(slot)];
  const letters = name === "vw" ? ["v", "w"] : [own ?? "u"];
  const lacking = letters.find((letter) => !lines.components.some((each) => each === letter));
  if (lacking !== undefined) return `${lacking} was not measured`;
  if (ofLine.test(name) && !lines.components.includes(order[0]))
    return `${order[0]}, the component along the line, was not measured`;
  if (needsViscosity.test(name) && settings.kinematicViscosity === null)
    return "no kinematic viscosity is given";
  if (name === "Tu" && !(all.whole.U > 0)) return "the mean velocity is not positive";
  if (!ofLine.test(name)) return "the fluctuation is zero";
  if (lines.spacing === null) return "the points are not equally spaced, and a spectrum needs equal steps";
  if (lines.along === "x") return "the station is too near the end of its line for a difference along x";
  return spectra === null ? "the line is too short" : "the spectrum shows nothing above its noise floor";
}

/** A length found from the correlation, with the error that all of them share. */
export function lengthQuantity(value: number | string, { sampling }: LineMaterial): Quantity {
  if (typeof value === "string") return missing(value);
  if (!(value > 0)) return missing("the correlation gives no positive scale");
  if (sampling.scaleError === null)
    return bare(value, sampling.why || "the correlation does not fall to zero");
  return withError(value, sampling.scaleError);
}

/** A product of a value per length with L11: both errors count. */
export function timesLength(
  name: LineValueName,
  L11: Quantity,
  material: LineMaterial,
  values: Record<LineValueName, Quantity>,
): Quantity {
  const rest = values[name];
  return isEstimate(rest) ? timesLengthOf(rest.value, lineError(name, material.all), L11, material) : rest;
}

/** A value with an error on the scale of the logarithm, times L11. */
export function timesLengthOf(
  value: number,
  error: StandardError | null,
  L11: Quantity,
  { sampling: { scaleError, why } }: LineMaterial,
): Quantity {
  if (!isEstimate(L11)) return L11;
  const product = value * L11.value;
  return error && scaleError
    ? withError(product, joinedError(error, scaleError))
    : bare(product, why || "L11 has none");
}

/** Transverse scale of a component across the line, integrated to the first zero of the one along it. */
export function transverseLength(place: 1 | 2, material: LineMaterial): Quantity {
  const { lines, spectra, scales } = material;
  const name = lineComponents(lines.along)[place];
  const c = lines.components.indexOf(name);
  if (c < 0) return missing(`${name} was not measured`);
  if (lines.along === "x") return missing("of lines along x only the correlation of u is formed");
  if (spectra === null) return missing("the points are not equally spaced, so there is no correlation");
  if (scales.tauStar === null) return missing("the longitudinal correlation does not fall to zero");
  const covariance = spectra.covariance[c];
  if (!(covariance[0] > 0)) return missing("the fluctuation is zero");
  return lengthQuantity(
    (areaUpTo(covariance, scales.tauStar / spectra.step) * spectra.step) / covariance[0],
    material,
  );
}
