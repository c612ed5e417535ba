import { bandBorders } from "./bandBorders.ts";
import type { BlockPlace, JoinedRecord } from "./joinParts.ts";
import { windowShare } from "./meanSquareRate.ts";
import type { NoiseRule } from "./noiseFloor.ts";
import type { Component } from "./stationPart.ts";

/**
 * Mean square of the time derivative block by block, with the record's own floor and cut, less what the window
 * adds, and scaled so that the blocks' mean is the record's value: what the blocks tell is how it varies.
 * @param record  the station
 * @param name    component
 * @param rule    the record's noise floor and cut
 * @param rate    the record's <(du/dt)²>
 * @param squares index of the component's variance in a row
 * @returns       a number a row: weight × <(du/dt)²>
 */
export function blockRates(
  record: JoinedRecord,
  name: Component,
  rule: NoiseRule,
  rate: number,
  squares: number,
): Float64Array {
  const rates = Float64Array.from(record.rows, (row, i) =>
    rowRate(record.blocks[i], name, rule, row[squares] / row[0]),
  );
  let sum = 0;
  let weight = 0;
  for (let i = 0; i < rates.length; i++) {
    if (!Number.isFinite(rates[i])) continue;
    sum += record.rows[i][0] * rates[i];
    weight += record.rows[i][0];
  }
  const scale = sum > 0 ? (rate * weight) / sum : 0;
  // a block without a segment of its own, at the record's end, counts as the mean
  return rates.map((one, i) => record.rows[i][0] * (scale > 0 && Number.isFinite(one) ? one * scale : rate));
}

function rowRate(places: readonly BlockPlace[], name: Component, rule: NoiseRule, variance: number): number {
  let sum = 0;
  let segments = 0;
  for (const { part, block } of places) {
    const { bands } = part;
    if (bands === null || !(bands.segments[block] > 0)) continue;
    const c = part.components.indexOf(name);
    const row = bands.sums[c].subarray(block * bands.count, (block + 1) * bands.count);
    const count = bands.segments[block];
    sum +=
      count *
      (bandRate(row, bands.size, part.step, count, rule) - windowShare(variance, bands.size, part.step));
    segments += count;
  }
  return sum / segments;
}

/** ∫(2πf)² (E - floor) df below the cut, from band sums of f² |X_f|². */
function bandRate(row: Float64Array, size: number, step: number, segments: number, rule: NoiseRule): number {
  const borders = bandBorders(size);
  const width = 1 / (size * step);
  const scale = (2 * step) / (segments * 0.375 * size);
  let power = 0;
  let squares = 0;
  for (let band = rule.cut; band < row.length; band++) {
    power += row[band];
    const end = band === 0 ? size / 2 + 1 : borders[band - 1];
    for (let f = borders[band]; f < end && rule.floor > 0; f++) squares += f * f;
  }
  return (2 * Math.PI * width) ** 2 * width * (scale * power - rule.floor * squares);
}
