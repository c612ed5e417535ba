import { assert } from "../failure.ts";
import { type Estimate, isEstimate, missing, type Quantity } from "../quantity.ts";
import type { SourceNote } from "../records.ts";
import type { ReduceSettings, StationFacts, StationResult } from "../stationResult.ts";
import { integralTimes } from "./integralTimes.ts";
import { joinCorrelations } from "./joinCorrelations.ts";
import { type JoinedRecord, joinParts } from "./joinParts.ts";
import { joinSpectra } from "./joinSpectra.ts";
import { sampling as samplingOf } from "./sampling.ts";
import { stationCurves } from "./stationCurves.ts";
import { replicates } from "./stationErrors.ts";
import { stationFlags } from "./stationFlags.ts";
import { stationGradients } from "./stationGradients.ts";
import type { StationPart } from "./stationPart.ts";
import {
  lateralLength,
  otherDissipation,
  type StationMaterial,
  scaleQuantity,
  timesScale,
  valueQuantities,
} from "./stationQuantities.ts";
import { stationRows } from "./stationRows.ts";
import { lateral, taylorFactors, type ValueName } from "./stationValues.ts";

/** Why a quantity waits for the decay law. */
export const setByDecay = "it follows from the decay law, which is fitted after the stations are reduced";

/**
 * One station from its records: the stages in their order. The order of the parts does not matter.
 * @param parts     one or more records at one x
 * @param settings  what the user decided
 * @returns         every quantity with its interval or the reason for none
 */
export function reduceStation(parts: readonly StationPart[], settings: ReduceSettings): StationResult {
  assert(parts.length > 0, "a station has at least one record");
  const record = joinParts(parts, settings);
  const correlation = joinCorrelations(record, settings.correlation === "unbiased");
  const spectra = joinSpectra(record);
  const times = integralTimes(correlation, spectra, settings.integralScale);
  const gradients = stationGradients(record, spectra, times);
  const { table, rows, column } = stationRows(record, gradients, times);
  const sampling = samplingOf(record, times);
  const all = replicates(
    rows,
    sampling.groups,
    {
      components: record.components,
      column,
      means: record.means,
      step: record.step,
      viscosity: settings.kinematicViscosity,
      referenceSpeed: settings.referenceSpeed,
      taylorCorrection: settings.taylorCorrection,
    },
    sampling.why,
  );
  const material = { record, correlation, spectra, times, gradients, sampling, all, settings };
  const values = valueQuantities(material);
  const facts = stationFacts(material, values);
  return {
    x: record.parts[0].origin.x,
    samples: record.samples,
    duration: record.duration,
    ...quantities(material, values),
    flags: stationFlags(material, { ...facts, taylorFactor: facts.taylorFactor ?? 1, eta: values.eta }),
    sources: sourceNotes(record),
    curves: stationCurves(record, spectra, correlation, times.tauStar),
    blocks: table,
    facts,
  };
}

function quantities(material: StationMaterial, values: Record<ValueName, Quantity>) {
  const { settings, times, sampling, record, all } = material;
  const U = record.means[0];
  const T_int = scaleQuantity(times.routes[settings.integralScale], sampling);
  const L11 =
    U > 0
      ? scaleQuantity(scaled(times.routes[settings.integralScale], U), sampling)
      : missing("the mean velocity is not positive");
  const { inertial, second } = otherDissipation(material, values);
  const C_epsilon = timesScale("C_epsilon_over_T", T_int, material, values);
  const {
    U: mean,
    uu,
    vv,
    ww,
    uv,
    uw,
    vw,
    k,
    Tu,
    isotropy_uv,
    isotropy_uw,
    S_dudx,
    epsilon_gradient,
  } = values;
  return {
    ...{ U: mean, uu, vv, ww, uv, uw, vw, k, Tu, isotropy_uv, isotropy_uw, S_dudx },
    T_int,
    L11,
    gradient: values.gradient_u,
    epsilon_gradient,
    epsilon_decay: missing(setByDecay),
    epsilon_inertial: inertial,
    balance: missing(setByDecay),
    Re_L: timesScale("Re_L_over_T", T_int, material, values),
    q: missing("the records give velocities, not a quantity q"),
    ...adopted(settings, values, inertial, C_epsilon, all.whole.uu),
    routes: routes(material, values, second),
  };
}

/** The adopted dissipation, and what follows from it. */
function adopted(
  settings: ReduceSettings,
  values: Record<ValueName, Quantity>,
  inertial: Quantity,
  C_epsilon: Quantity,
  uu: number,
) {
  const { dissipation, kind, kinematicViscosity } = settings;
  if (dissipation === "decay" || (dissipation === "auto" && kind === "les")) {
    const waits = missing(setByDecay);
    return { epsilon: waits, lambda: waits, eta: waits, Re_lambda: waits, C_epsilon: waits };
  }
  if (dissipation !== "inertial") {
    const { epsilon_gradient, lambda, eta, Re_lambda } = values;
    return { epsilon: epsilon_gradient, lambda, eta, Re_lambda, C_epsilon };
  }
  if (!isEstimate(inertial) || kinematicViscosity === null) {
    return { epsilon: inertial, lambda: inertial, eta: inertial, Re_lambda: inertial, C_epsilon: inertial };
  }
  const nu = kinematicViscosity;
  const lambda = Math.sqrt((15 * nu * uu) / inertial.value);
  const like = (value: number): Estimate => ({ ...inertial, value });
  const gradient = values.epsilon_gradient;
  const ratio = isEstimate(gradient) ? inertial.value / gradient.value : 0;
  return {
    epsilon: inertial,
    lambda: like(lambda),
    eta: like((nu ** 3 / inertial.value) ** 0.25),
    Re_lambda: like((Math.sqrt(uu) * lambda) / nu),
    C_epsilon: isEstimate(C_epsilon) ? like(C_epsilon.value * ratio) : C_epsilon,
  };
}

/** Values that stand among the routes under their own name. */
const kept = [
  "lambda_f",
  "gradient_u",
  "gradient_v",
  "gradient_w",
  "gradient_difference2",
  "gradient_difference4",
  "epsilon_u-gradient",
  "skewness_u",
  "skewness_v",
  "skewness_w",
  "flatness_u",
  "flatness_v",
  "flatness_w",
  "K_v",
  "K_w",
] as const;

function routes(
  material: StationMaterial,
  values: Record<ValueName, Quantity>,
  second: Quantity,
): Record<string, Quantity> {
  const { times, sampling, record } = material;
  const scales = Object.entries(times.routes).map(([name, time]) => [
    `T_int_${name}`,
    scaleQuantity(time, sampling),
  ]);
  return {
    ...Object.fromEntries(scales),
    L_v: lateralLength("v", material),
    L_w: lateralLength("w", material),
    ...Object.fromEntries(kept.map((name) => [name, values[name]])),
    lambda_gradient: values.lambda,
    eta_gradient: values.eta,
    Re_lambda_gradient: values.Re_lambda,
    "epsilon_all-gradients":
      record.components.length === 3
        ? values.epsilon_gradient
        : missing("not all three components were measured"),
    "epsilon_second-order": second,
  };
}

function scaled(time: number | string, speed: number): number | string {
  return typeof time === "number" ? time * speed : time;
}

function stationFacts(material: StationMaterial, values: Record<ValueName, Quantity>): StationFacts {
  const { record, spectra, gradients, sampling, times, all, settings, correlation } = material;
  const U = record.means[0];
  const { uu, vv, ww } = all.whole;
  const [v2, w2] = lateral(uu, vv, ww);
  const rule = gradients.find(({ name }) => name === "u")?.rule;
  const perBin = spectra === null || !(U > 0) ? null : (2 * Math.PI) / (U * spectra.size * spectra.step);
  const cutoff = rule === undefined || rule.cut === 0 || perBin === null ? null : rule.cutBin * perBin;
  const highest = perBin === null || spectra === null ? null : (cutoff ?? (spectra.size / 2) * perBin);
  const eta = values.eta.value;
  const sum = spectra?.density[0].reduce((total, value) => total + value, 0);
  return {
    step: record.step,
    integralTimes: sampling.integralTimes,
    groups: sampling.groups?.count ?? 0,
    segment: spectra?.size ?? null,
    segments: spectra?.segments ?? 0,
    recoveredVariance:
      spectra === null || sum === undefined ? null : sum / (spectra.size * spectra.step * uu),
    cutoff,
    noiseFloor: rule === undefined || rule.floor === 0 || !(U > 0) ? null : (rule.floor * U) / (2 * Math.PI),
    shareBeyondCutoff: cutoff === null ? null : (rule?.shareBeyond ?? null),
    taylorFactor: U > 0 ? taylorFactors(uu, v2, w2, U, settings.taylorCorrection)[0] : null,
    k1max_eta: highest === null || eta === null ? null : highest * eta,
    lagLimit: correlation === null ? null : correlation.covariance[0].length * correlation.step,
    tauStar: times.tauStar,
    components: record.components,
  };
}

/** One note a file; its size is known to whoever read it. */
function sourceNotes({ parts }: JoinedRecord): SourceNote[] {
  const notes = new Map<string, SourceNote>();
  for (const { origin } of parts) {
    notes.set(origin.file, { name: origin.file, bytes: 0, x: origin.x, position: origin.position });
  }
  return [...notes.values()];
}
