import { blockRates } from "./blockRates.ts";
import { type DifferenceRates, differenceRates } from "./differenceRates.ts";
import type { IntegralTimes } from "./integralTimes.ts";
import type { JoinedRecord } from "./joinParts.ts";
import type { JoinedSpectra } from "./joinSpectra.ts";
import { meanSquareRate, windowShare } from "./meanSquareRate.ts";
import { type NoiseRule, noiseFloor, scaleBin } from "./noiseFloor.ts";
import type { Component } from "./stationPart.ts";

/** <(du/dt)²> of one component: the record's, and how it varies from block to block. */
export interface ComponentGradient {
  readonly name: Component;
  readonly rule: NoiseRule;
  /** (unit of u)²/s². */
  readonly rate: number;
  /** A number a row: weight × <(du/dt)²>. */
  readonly rows: Float64Array;
  /** What central differences of that spectrum, without its noise, would give. */
  readonly differences: DifferenceRates;
  /** Largest relative change of the rate by moving the cut one band down or up; null without a cut. */
  readonly sensitivity: number | null;
}

/** Segments shorter than this are corrected for what the window adds. */
const longSegment = 50;

/**
 * Mean square of the time derivative of every component, from its Welch spectrum.
 * @returns an entry a component; none where the spectrum shows nothing but noise
 */
export function stationGradients(
  record: JoinedRecord,
  spectra: JoinedSpectra | null,
  times: IntegralTimes,
): ComponentGradient[] {
  if (spectra === null) return [];
  const { size, step } = spectra;
  // uncorrelated samples are noise up to Nyquist
  if (times.scale !== null && times.scale < step) return [];
  const scale = (times.scale ?? size * step) / step;
  return record.components.flatMap((name, c) => {
    const density = spectra.density[c];
    const rule = noiseFloor(density, size, scaleBin(size, scale));
    const squares = record.fields.indexOf(name + name);
    const added = size < longSegment * scale ? windowShare(variance(record, squares), size, step) : 0;
    const rate = meanSquareRate(density, size, step, rule) - added;
    if (!(rate > 0)) return [];
    const differences = differenceRates(density, size, step, rule);
    const moved = (shift: number) =>
      meanSquareRate(density, size, step, noiseFloor(density, size, scaleBin(size, scale), shift)) - added;
    const sensitivity =
      rule.cut === 0 ? null : Math.max(...[-1, 1].map((shift) => Math.abs(moved(shift) / rate - 1)));
    const rows = blockRates(record, name, rule, rate, squares);
    return [{ name, rule, rate, rows, differences, sensitivity }];
  });
}

function variance(record: JoinedRecord, squares: number): number {
  let sum = 0;
  let weight = 0;
  for (const row of record.rows) {
    sum += row[squares];
    weight += row[0];
  }
  return sum / weight;
}
