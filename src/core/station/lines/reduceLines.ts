import { assert, ReductionFailure } from "../../failure.ts";
import { isEstimate, missing, type Quantity, scaled } from "../../quantity.ts";
import type { SourceNote } from "../../records.ts";
import type { ReduceSettings, StationFacts, StationResult } from "../../stationResult.ts";
import { adoptedDissipation, setByDecay } from "../adoptedDissipation.ts";
import { leftOutError, leftOutQuantity } from "../stationErrors.ts";
import { lineCurves } from "./lineCurves.ts";
import { lineDissipation } from "./lineDissipation.ts";
import { lineComponents } from "./lineFields.ts";
import { lineFlags } from "./lineFlags.ts";
import { type LineMaterial, lineLength, lineMaterial } from "./lineMaterial.ts";
import type { LinePart } from "./linePart.ts";
import {
  lengthQuantity,
  lineQuantities,
  timesLength,
  timesLengthOf,
  transverseLength,
} from "./lineQuantities.ts";
import type { LineValueName } from "./lineValues.ts";

/**
 * One station from the lines of its snapshots. The result is that of a record in time, with these readings: L11,
 * gradient, lambda, Re_lambda, C_epsilon and S_dudx are those of the component along the line; T_int is L11/U;
 * L_v, L_w and gradient_v, gradient_w stand for the two components across (along y: u and w). The order of the
 * parts does not matter.
 * @param parts     lines at one x
 * @param settings  what the user decided
 * @throws different-points, backward-time, constant-signal
 */
export function reduceLines(parts: readonly LinePart[], settings: ReduceSettings): StationResult {
  assert(parts.length > 0, "a station has at least one line");
  const material = lineMaterial(parts, settings);
  if (!(material.all.whole.uu > 0)) throw withoutFluctuation(parts[0]);
  const { lines, sampling, spectra, rows, fields } = material;
  const values = lineQuantities(material);
  const facts = lineFacts(material, values);
  const U = material.all.whole.U;
  const data = new Float64Array(rows.length * fields.length);
  for (const [i, row] of rows.entries()) data.set(row, i * fields.length);
  return {
    x: lines.parts[0].origin.x,
    samples: lines.samples,
    duration: lines.end - lines.start,
    ...quantities(material, values),
    flags: lineFlags(material, facts.k1max_eta),
    sources: sourceNotes(lines.parts),
    curves: lineCurves(lines, spectra, U, lineCount(material)),
    blocks: {
      ...{ fields, rows: rows.length, data, blockSamples: lines.blockSnapshots },
      step: lines.snapshots > 1 ? (lines.end - lines.start) / (lines.snapshots - 1) : 0,
      start: lines.start,
    },
    facts: { ...facts, groups: sampling.groups?.count ?? 0 },
  };
}

function quantities(material: LineMaterial, values: Record<LineValueName, Quantity>) {
  const { settings, scales, all, lines } = material;
  const along = ({ x: "uu", y: "vv", z: "ww" } as const)[lines.along];
  const L11 = lengthQuantity(scales.routes[settings.integralScale], material);
  const { inertial, second, third } = lineDissipation(material);
  const { U, uu, vv, ww, uv, uw, vw, k, Tu, isotropy_uv, isotropy_uw, S_dudx, epsilon_gradient } = values;
  const C_epsilon = timesLength("C_epsilon_over_L", L11, material, values);
  return {
    ...{ U, uu, vv, ww, uv, uw, vw, k, Tu, isotropy_uv, isotropy_uw, S_dudx },
    T_int: asTime(L11, all.whole.U),
    L11,
    gradient: values.gradient_u,
    epsilon_gradient,
    epsilon_decay: missing(setByDecay),
    epsilon_inertial: inertial.quantity,
    balance: missing(setByDecay),
    Re_L: timesLength("Re_L_over_L", L11, material, values),
    q: missing("the lines give velocities, not a quantity q"),
    ...adoptedDissipation(settings, {
      gradient: values,
      inertial,
      C_epsilon,
      variance: { value: all.whole[along], without: all.without.map((one) => one[along]) },
      quantity: (own) => leftOutQuantity(own, { ...all, repeats: 1 }, "log"),
      timesLength: (own) =>
        timesLengthOf(own.value, leftOutError(own, { ...all, repeats: 1 }, "log"), L11, material),
    }),
    routes: routes(material, values, second, third),
  };
}

/** r/U: a length as the time in which the mean flow carries it past a point. */
function asTime(length: Quantity, U: number): Quantity {
  if (!isEstimate(length)) return length;
  return U > 0 ? scaled(length, 1 / U) : missing("the mean velocity is not positive, so a length is no time");
}

/** Values that stand among the routes under their own name. */
const kept = [
  ...(["lambda_f", "gradient_u", "gradient_v", "gradient_w"] as const),
  ...(["gradient_difference2", "gradient_difference4", "epsilon_u-gradient", "K_v", "K_w"] as const),
  ...(["skewness_u", "skewness_v", "skewness_w", "flatness_u", "flatness_v", "flatness_w"] as const),
];

function routes(
  material: LineMaterial,
  values: Record<LineValueName, Quantity>,
  second: Quantity,
  third: Quantity,
): Record<string, Quantity> {
  const { scales, lines, all } = material;
  const lengths = Object.entries(scales.routes).map(([name, length]) => [
    `T_int_${name}`,
    asTime(lengthQuantity(length, material), all.whole.U),
  ]);
  return {
    ...Object.fromEntries(lengths),
    L_v: transverseLength(1, material),
    L_w: transverseLength(2, material),
    ...Object.fromEntries(kept.map((name) => [name, values[name]])),
    lambda_gradient: values.lambda,
    eta_gradient: values.eta,
    Re_lambda_gradient: values.Re_lambda,
    "epsilon_all-gradients":
      lines.components.length === 3
        ? values.epsilon_gradient
        : missing("not all three components were measured"),
    "epsilon_second-order": second,
    "epsilon_third-order": third,
  };
}

/** Independent lines in all snapshots together. */
function lineCount({ sampling, scales, lines, spectra }: LineMaterial): number {
  const length = lineLength(lines, spectra);
  const along = length === null || scales.scale === null ? 1 : Math.max(1, length / (2 * scales.scale));
  return sampling.samples / along;
}

function lineFacts(material: LineMaterial, values: Record<LineValueName, Quantity>): StationFacts {
  const { lines, spectra, gradients, sampling, scales, all, periodic } = material;
  const [longitudinal] = lineComponents(lines.along);
  const own = gradients.find(({ name }) => name === longitudinal);
  const rule = own?.rule ?? null;
  const unit = spectra === null ? null : (2 * Math.PI) / spectra.length;
  const cutoff = rule === null || rule.cut === 0 || unit === null ? null : rule.cutBin * unit;
  const highest = cutoff ?? (lines.spacing === null ? null : Math.PI / lines.spacing);
  const c = lines.components.indexOf(longitudinal);
  const time = (length: number | null) =>
    length === null ? null : length / (all.whole.U > 0 ? all.whole.U : 1);
  const sum =
    spectra === null || c < 0 ? null : spectra.density[c].reduce((total, value) => total + value, 0);
  const variance = spectra?.covariance[c]?.[0] ?? 0;
  return {
    step: time(lines.spacing),
    // a length of line makes up for no snapshot: few of them are a short record, however long the line
    integralTimes: 2 * (sampling.groups === null ? sampling.independent : sampling.samples),
    groups: 0,
    segment: spectra === null ? null : lines.points.length,
    segments: spectra?.lines ?? 0,
    recoveredVariance: sum === null || spectra === null ? null : sum / spectra.length / variance,
    cutoff,
    noiseFloor: rule === null || rule.floor === 0 ? null : rule.floor / (2 * Math.PI),
    shareBeyondCutoff: cutoff === null ? null : (rule?.shareBeyond ?? null),
    taylorFactor: null,
    k1max_eta: highest === null || values.eta.value === null ? null : highest * values.eta.value,
    lagLimit: spectra === null ? null : time(spectra.covariance[0].length * spectra.step),
    tauStar: time(scales.tauStar),
    components: lines.components,
    lines: {
      along: lines.along,
      points: lines.points.length,
      spacing: lines.spacing,
      length: lineLength(lines, spectra),
      periodic,
      parallel: lines.across.length,
      snapshots: lines.snapshots,
      independentSnapshots: sampling.independent,
      independentSamples: sampling.samples,
      snapshotCorrelation: sampling.neighbours,
    },
  };
}

/** One note a file; its size is known to whoever read it. */
function sourceNotes(parts: readonly LinePart[]): SourceNote[] {
  const notes = new Map<string, SourceNote>();
  for (const { origin } of parts)
    notes.set(origin.file, { name: origin.file, bytes: 0, x: origin.x, position: origin.position });
  return [...notes.values()];
}

function withoutFluctuation({ origin }: LinePart): ReductionFailure {
  return new ReductionFailure(
    "constant-signal",
    {
      message: `u does not vary along the lines or in time at x = ${origin.x}`,
      found: "one value at every point",
      remedy: "Choose the column of u, or leave the file out.",
    },
    { file: origin.file },
  );
}
