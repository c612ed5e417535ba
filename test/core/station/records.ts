import type { RecordOrigin, VelocityBlock } from "../../../src/core/records.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { type RecordOptions, startRecord } from "../../../src/core/station/startRecord.ts";
import type { StationPart } from "../../../src/core/station/stationPart.ts";
import type { ReduceSettings, StationResult } from "../../../src/core/stationResult.ts";

/** Settings of the tests: all defaults, air, frozen records. */
export const settings: ReduceSettings = {
  kinematicViscosity: 1.5e-5,
  referenceSpeed: null,
  kind: null,
  simultaneous: "auto",
  periodic: "auto",
  sensorLength: null,
  integralScale: "zero-crossing",
  correlation: "biased",
  detrend: "mean",
  segment: null,
  taylorCorrection: false,
  dissipation: "auto",
};

export const origin: RecordOrigin = {
  file: "probe.csv",
  x: 1,
  y: null,
  z: null,
  position: "sheet",
  step: 1e-3,
};

/** Columns of one record; t left out: equal steps of the origin. */
export interface Signal {
  readonly t?: Float64Array;
  readonly u: Float64Array;
  readonly v?: Float64Array;
  readonly w?: Float64Array;
}

export function blockOf(signal: Signal, from = 0, to = signal.u.length): VelocityBlock {
  const cut = (column: Float64Array | undefined) => column?.slice(from, to) ?? null;
  return {
    count: to - from,
    t: cut(signal.t),
    u: signal.u.slice(from, to),
    v: cut(signal.v),
    w: cut(signal.w),
  };
}

/** A record handed over in pieces that begin at the given samples. */
export function partOf(
  signal: Signal,
  options: {
    cuts?: readonly number[];
    origin?: Partial<RecordOrigin>;
    settings?: Partial<ReduceSettings>;
    record?: Partial<RecordOptions>;
  } = {},
): StationPart {
  const reducer = startRecord(
    { ...origin, ...options.origin },
    { ...settings, ...options.settings },
    options.record,
  );
  const borders = [0, ...(options.cuts ?? []), signal.u.length];
  for (let i = 0; i + 1 < borders.length; i++) reducer.add(blockOf(signal, borders[i], borders[i + 1]));
  const end = reducer.finish();
  if ("again" in end) throw new Error("a second reading was asked for");
  return end.part;
}

export function stationOf(
  signal: Signal,
  more: Partial<ReduceSettings> = {},
  from: Partial<RecordOrigin> = {},
): StationResult {
  const part = partOf(signal, { settings: more, origin: from });
  return reduceStation([part], { ...settings, ...more });
}

export function whiteNoise(count: number, seed: number): Float64Array {
  const random = seededRandom(seed);
  return Float64Array.from({ length: count }, () => random.gaussian());
}

/** Exponential correlation, rho = e^(-i/scale), unit variance. */
export function exponential(count: number, scale: number, seed: number): Float64Array {
  const random = seededRandom(seed);
  const keep = Math.exp(-1 / scale);
  const fresh = Math.sqrt(1 - keep * keep);
  let value = random.gaussian();
  return Float64Array.from({ length: count }, () => {
    value = keep * value + fresh * random.gaussian();
    return value;
  });
}

/** A smooth signal: an exponential one, filtered once more, so that it has a gradient. */
export function smooth(count: number, seed: number): Float64Array {
  const rough = exponential(count, 40, seed);
  let value = 0;
  return rough.map((one) => {
    value = 0.8 * value + 0.2 * one;
    return value;
  });
}

/** Three independent smooth components about a stream of 10 m/s. */
export function smoothRecord(count: number, seed: number): Required<Omit<Signal, "t">> {
  return {
    u: smooth(count, seed).map((value) => 10 + value),
    v: smooth(count, seed + 1),
    w: smooth(count, seed + 2),
  };
}
