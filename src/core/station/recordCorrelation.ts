import { jointLayout } from "../signal/jointMoments.ts";
import { mergeJoint } from "../signal/mergeJoint.ts";
import type { StationPart } from "./stationPart.ts";

/** Joint moments of a whole part: its blocks merged in order. */
export function wholeMoments(part: Pick<StationPart, "blocks" | "components">): Float64Array {
  const layout = jointLayout(part.components.length);
  const width = part.blocks.fields.length;
  const whole = new Float64Array(layout.length);
  for (let row = 0; row < part.blocks.rows; row++) {
    mergeJoint(whole, part.blocks.data.subarray(row * width, row * width + layout.length), layout);
  }
  return whole;
}

/**
 * The mean that a part's fluctuation is about, less the plan's reference: its own, or that of all records of its
 * probe.
 */
export function restOfMean(part: StationPart, component: number): number {
  return part.commonRest?.[component] ?? wholeMoments(part)[1 + component];
}

/**
 * Lag products of a whole part about its mean, exactly,
 *     R_l = Σ x_i x_(i-l) - d (2 S - head_l - tail_l) + (pairs at l) d²,   S = Σ x
 * with x about the plan's reference and d what is left of the mean.
 * @param part       a part with lag products
 * @param component  index of the component
 * @returns          R at lags 0, stride, 2 stride …; null where the part has none
 */
export function recordCorrelation(part: StationPart, component: number): Float64Array | null {
  const { lags } = part;
  if (lags === null) return null;
  const products = lags.products[component];
  const rest = restOfMean(part, component);
  const heads = lags.heads[component];
  const tails = lags.tails[component];
  const sum = lags.totals?.[component] ?? part.samples * wholeMoments(part)[1 + component];
  const correlation = new Float64Array(lags.count);
  for (let row = 0; row < part.blocks.rows; row++) {
    const offset = row * lags.count;
    for (let l = 0; l < lags.count; l++) correlation[l] += products[offset + l];
  }
  for (let l = 0; l < lags.count; l++) {
    const pairs = lags.pairs?.[l] ?? part.samples - l * lags.stride;
    correlation[l] += pairs * rest * rest - rest * (2 * sum - heads[l] - tails[l]);
  }
  return correlation;
}
