import type { JoinedRecord } from "./joinParts.ts";
import { recordCorrelation } from "./recordCorrelation.ts";
import type { Component, StationPart } from "./stationPart.ts";
import { areaUpTo } from "./zeroCrossing.ts";

/** Lag products of a station, all its records together, each about its own mean. */
export interface JoinedCorrelation {
  /** Time between kept lags. */
  readonly step: number;
  /** Per component of the station: estimated covariance at each lag; divided by N, or by N - l if unbiased. */
  readonly covariance: readonly Float64Array[];
  /** Samples between kept lags. */
  readonly stride: number;
}

/** @returns null where no record has equal steps */
export function joinCorrelations(record: JoinedRecord, unbiased: boolean): JoinedCorrelation | null {
  const { spectral, components } = record;
  if (spectral.length === 0) return null;
  const stride = Math.max(...spectral.map((part) => part.lags?.stride ?? 1));
  const reach = Math.min(...spectral.map((part) => (part.lags?.count ?? 0) * (part.lags?.stride ?? 1)));
  const count = Math.floor(reach / stride);
  return {
    step: stride * record.step,
    stride,
    covariance: components.map((name) => covariance(spectral, name, stride, count, unbiased)),
  };
}

function covariance(
  parts: readonly StationPart[],
  name: Component,
  stride: number,
  count: number,
  unbiased: boolean,
): Float64Array {
  const sum = new Float64Array(count);
  const pairs = new Float64Array(count);
  for (const part of parts) {
    const own = recordCorrelation(part, part.components.indexOf(name));
    if (own === null || part.lags === null) continue;
    const every = stride / part.lags.stride;
    for (let l = 0; l < count; l++) {
      sum[l] += own[l * every];
      pairs[l] += divisor(part, l * every, unbiased);
    }
  }
  return sum.map((value, l) => value / pairs[l]);
}

/**
 * What a sum of lag products is divided by: its pairs, or with the biased estimate N, and where the record is in
 * pieces so much less as pairs are lost between them.
 */
function divisor({ samples, lags }: StationPart, l: number, unbiased: boolean): number {
  const lag = l * (lags?.stride ?? 1);
  const count = lags?.pairs?.[0] ?? samples;
  const pairs = Math.max(1, lags?.pairs?.[l] ?? samples - lag);
  if (unbiased) return pairs;
  return lags?.pairs === undefined ? count : (count * pairs) / Math.max(1, count - lag);
}

/**
 * Area under the lag products of each row's blocks up to a lag: block by block, adding up to the record's own.
 * The mean is taken out with the block's own sum: what that leaves at its edges is of the order of the change of
 * the mean from pilot to record, times l/N, and nothing in a record that is its own pilot.
 * @param end  lag in time
 * @returns    a number a row, (unit of u)² times samples times s; zeros where the record has no lag products
 */
export function blockAreas(record: JoinedRecord, name: Component, end: number): Float64Array {
  return Float64Array.from(record.blocks, (places) => {
    let area = 0;
    for (const { part, block } of places) area += partArea(part, block, name, end);
    return area / places.length;
  });
}

function partArea(part: StationPart, block: number, name: Component, end: number): number {
  const { lags } = part;
  if (lags === null) return 0;
  const c = part.components.indexOf(name);
  const products = lags.products[c].subarray(block * lags.count, (block + 1) * lags.count);
  return areaUpTo(products, end / (lags.stride * part.step)) * lags.stride * part.step;
}
