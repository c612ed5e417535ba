import { assert } from "../failure.ts";
import { missing, type Quantity } from "../quantity.ts";
import type { SourceNote } from "../records.ts";
import type { ReduceSettings, StationResult } from "../stationResult.ts";
import { adoptedDissipation, setByDecay } from "./adoptedDissipation.ts";
import { compareProbes } from "./compareProbes.ts";
import { withoutDivided } from "./dividedStation.ts";
import { inertialDissipation } from "./inertialDissipation.ts";
import type { IntegralTimes } from "./integralTimes.ts";
import type { JoinedRecord } from "./joinParts.ts";
import { usualTime } from "./recordTime.ts";
import { sampling as samplingOf } from "./sampling.ts";
import { stationBasis } from "./stationBasis.ts";
import { stationCurves } from "./stationCurves.ts";
import { stationCuts } from "./stationCuts.ts";
import { leftOutError, leftOutQuantity, replicates } from "./stationErrors.ts";
import { stationFacts } from "./stationFacts.ts";
import { stationFlags } from "./stationFlags.ts";
import { type ComponentGradient, stationGradients } from "./stationGradients.ts";
import type { StationPart } from "./stationPart.ts";
import {
  type StationMaterial,
  scaleQuantity,
  timesScale,
  timesScaleOf,
  valueQuantities,
} from "./stationQuantities.ts";
import { stationRoutes } from "./stationRoutes.ts";
import { stationRows } from "./stationRows.ts";
import type { ValueContext, ValueName } from "./stationValues.ts";
import { type StructureSums, structureSums } from "./structureSums.ts";

/**
 * One station from its records: the stages in their order. The order of the parts does not matter.
 * @param parts     one or more records at one x
 * @param settings  what the user decided
 * @returns         every quantity with its interval or the reason for none
 */
export function reduceStation(parts: readonly StationPart[], settings: ReduceSettings): StationResult {
  assert(parts.length > 0, "a station has at least one record");
  const given = stationBasis(parts, settings);
  const compared = parts.length > 1 ? compareProbes(given.record, usualTime(given.record), settings) : null;
  const basis =
    compared === null || compared.kept.length === parts.length
      ? given
      : stationBasis(compared.kept, settings);
  const { record, correlation, spectra, times } = basis;
  const gradients = stationGradients(record, spectra, times);
  const structure = structureOf(record, gradients, times);
  const { table, rows, column } = stationRows(record, gradients, times, structure);
  const sampling = samplingOf(record, times);
  const all = replicates(
    rows,
    sampling.groups,
    valueContext(record, column, structure, settings),
    sampling.why,
  );
  const sums = { record, correlation, spectra, structure, all };
  const material = { ...sums, times, gradients, sampling, settings, compared };
  const values = valueQuantities(material);
  const facts = stationFacts(material, values);
  const divided = compared?.divided ?? [];
  return {
    x: record.parts[0].origin.x,
    samples: record.samples,
    duration: record.duration,
    ...withoutDivided(quantities(material, values), compared?.probes ?? [], divided, settings.referenceSpeed),
    flags: stationFlags(material, { ...facts, taylorFactor: facts.taylorFactor ?? 1, eta: values.eta }),
    sources: sourceNotes(given.record),
    // spectra and blocks of unlike probes are those of none of them
    curves: divided.length > 0 ? null : stationCurves(record, spectra, correlation, times.tauStar),
    blocks: divided.length > 0 ? null : table,
    facts,
    ...(compared ? { probes: compared.probes } : {}),
    ...stationCuts(given.record.parts),
  };
}

function valueContext(
  record: JoinedRecord,
  column: ValueContext["column"],
  structure: StructureSums | null,
  settings: ReduceSettings,
): ValueContext {
  return {
    components: record.components,
    column,
    means: record.means,
    step: record.untimed === null ? record.step : null,
    viscosity: settings.kinematicViscosity,
    referenceSpeed: settings.referenceSpeed,
    taylorCorrection: settings.taylorCorrection,
    structure: structure && { second: structure.second.lag, third: structure.third.lag },
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
  const inertial = inertialDissipation(material);
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
    epsilon_inertial: inertial.quantity,
    balance: missing(setByDecay),
    Re_L: timesScale("Re_L_over_T", T_int, material, values),
    q: missing("the records give velocities, not a quantity q"),
    ...adoptedDissipation(settings, {
      gradient: values,
      inertial,
      C_epsilon,
      variance: { value: all.whole.uu, without: all.without.map(({ uu }) => uu) },
      quantity: (own) => leftOutQuantity(own, all, "log"),
      timesLength: (own) => timesScaleOf(own.value, leftOutError(own, all, "log"), L11, sampling),
    }),
    routes: stationRoutes(material, values),
  };
}

function scaled(time: number | string, speed: number): number | string {
  return typeof time === "number" ? time * speed : time;
}

/**
 * The structure functions are looked at from the Taylor scale, u'/√<(du/dt)²>, to the integral time: below, noise
 * and viscosity rule.
 */
function structureOf(record: JoinedRecord, gradients: readonly ComponentGradient[], times: IntegralTimes) {
  const found = gradients.find(({ name }) => name === "u");
  if (found === undefined || times.scale === null) return null;
  const square = record.fields.indexOf("uu");
  const variance = total(record, square) / total(record, 0);
  return structureSums(record, Math.sqrt(variance / found.rate), times.scale);
}

function total(record: JoinedRecord, field: number): number {
  return record.rows.reduce((sum, row) => sum + row[field], 0);
}

/** One note a file; its size is known to whoever read it. */
function sourceNotes({ parts }: JoinedRecord): SourceNote[] {
  const notes = new Map<string, SourceNote>();
  for (const { origin } of parts) {
    notes.set(origin.file, { name: origin.file, bytes: 0, x: origin.x, position: origin.position });
  }
  return [...notes.values()];
}
