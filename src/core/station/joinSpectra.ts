import { coarsenDensity } from "../signal/coarsenDensity.ts";
import { welchDensity } from "../signal/welchDensity.ts";
import type { JoinedRecord } from "./joinParts.ts";
import { wholeMoments } from "./recordCorrelation.ts";
import type { Component, StationPart } from "./stationPart.ts";

/** Welch spectra of a station, all its records together. */
export interface JoinedSpectra {
  /** Samples a segment: the shortest of the records'. */
  readonly size: number;
  readonly segments: number;
  readonly step: number;
  /** Per component: one-sided density in frequency, bins 0 … size/2. */
  readonly density: readonly Float64Array[];
}

/** @returns null where no record has equal steps and a whole segment */
export function joinSpectra(record: JoinedRecord): JoinedSpectra | null {
  const parts = record.spectral.filter((part) => (part.spectrum?.segments ?? 0) > 0);
  if (parts.length === 0) return null;
  const size = Math.min(...parts.map((part) => part.spectrum?.size ?? Infinity));
  const segments = parts.reduce((sum, part) => sum + (part.spectrum?.segments ?? 0), 0);
  const density = record.components.map((name) => {
    const sum = new Float64Array(size / 2 + 1);
    let total = 0;
    for (const part of parts) {
      const weight = part.samples;
      const own = partDensity(part, name, size);
      for (let f = 0; f < sum.length; f++) sum[f] += weight * own[f];
      total += weight;
    }
    return sum.map((value) => value / total);
  });
  return { size, segments, step: record.step, density };
}

function partDensity(part: StationPart, name: Component, size: number): Float64Array {
  const { spectrum } = part;
  if (spectrum === null) return new Float64Array(size / 2 + 1);
  const c = part.components.indexOf(name);
  const rest = wholeMoments(part)[1 + c];
  const totals = {
    size: spectrum.size,
    segments: spectrum.segments,
    power: spectrum.power[c],
    edges: spectrum.edges[c],
  };
  return coarsenDensity(welchDensity(totals, part.step, rest), spectrum.size, size);
}
