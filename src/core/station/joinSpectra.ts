import { coarsenDensity } from "../signal/coarsenDensity.ts";
import { crossDensity } from "../signal/crossDensity.ts";
import { welchDensity } from "../signal/welchDensity.ts";
import type { JoinedRecord } from "./joinParts.ts";
import { restOfMean } from "./recordCorrelation.ts";
import type { Component, StationPart } from "./stationPart.ts";

/** Welch spectra of a station, all its records together. */
export interface JoinedSpectra {
  /** Samples a segment: the shortest of the records'. */
  readonly size: number;
  readonly segments: number;
  readonly step: number;
  /** Per component: one-sided density in frequency, bins 0 … size/2. */
  readonly density: readonly Float64Array[];
  /** One-sided co-spectral density of u and v on the same bins; null where a record has none. */
  readonly cross?: Float64Array | null;
}

/** @returns null where no record has equal steps and a whole segment */
export function joinSpectra(record: JoinedRecord): JoinedSpectra | null {
  const parts = record.spectral.filter((part) => (part.spectrum?.segments ?? 0) > 0);
  if (parts.length === 0) return null;
  const size = Math.min(...parts.map((part) => part.spectrum?.size ?? Infinity));
  const segments = parts.reduce((sum, part) => sum + (part.spectrum?.segments ?? 0), 0);
  const density = record.components.map((name) =>
    average(parts, size, (part) => partDensity(part, name, size)),
  );
  const crossed = record.components[1] === "v" && parts.every(({ spectrum }) => spectrum?.cross);
  const cross = crossed ? average(parts, size, (part) => partCross(part, size)) : null;
  return { size, segments, step: record.step, density, cross };
}

/** Mean over the records by length. */
function average(parts: readonly StationPart[], size: number, of: (part: StationPart) => Float64Array) {
  const sum = new Float64Array(size / 2 + 1);
  let total = 0;
  for (const part of parts) {
    const own = of(part);
    for (let f = 0; f < sum.length; f++) sum[f] += part.samples * own[f];
    total += part.samples;
  }
  return sum.map((value) => value / total);
}

function partDensity(part: StationPart, name: Component, size: number): Float64Array {
  const { spectrum } = part;
  if (spectrum === null) return new Float64Array(size / 2 + 1);
  const c = part.components.indexOf(name);
  const rest = restOfMean(part, c);
  const totals = {
    size: spectrum.size,
    segments: spectrum.segments,
    power: spectrum.power[c],
    edges: spectrum.edges[c],
  };
  return coarsenDensity(welchDensity(totals, part.step, rest), spectrum.size, size);
}

function partCross(part: StationPart, size: number): Float64Array {
  const { spectrum } = part;
  if (spectrum === null || !spectrum.cross) return new Float64Array(size / 2 + 1);
  const side = (name: Component) => {
    const c = part.components.indexOf(name);
    return { edges: spectrum.edges[c], mean: restOfMean(part, c) };
  };
  const totals = { size: spectrum.size, segments: spectrum.segments, power: spectrum.cross };
  return coarsenDensity(crossDensity(totals, part.step, side("u"), side("v")), spectrum.size, size);
}
