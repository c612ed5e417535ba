import { isEstimate } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";

/** Share by which U may vary before x and the time of flight part. */
export const steadySpeed = 0.01;

/** How U varies over the stations of a window, as shares of its mean. */
export interface SpeedVariation {
  readonly mean: number;
  /** Largest less smallest. */
  readonly range: number;
  /** What is left of that between the nearest ends of the intervals of these two; below zero where they overlap. */
  readonly beyondErrors: number;
}

/**
 * @param stations those of a window; a U without an interval stands for itself
 * @returns        null where not every one of two stations or more carries a U above zero
 */
export function speedVariation(stations: readonly StationResult[]): SpeedVariation | null {
  const speeds = stations.flatMap(({ U }) => (isEstimate(U) && U.value > 0 ? [U] : []));
  if (speeds.length < Math.max(stations.length, 2)) return null;
  const mean = speeds.reduce((sum, { value }) => sum + value, 0) / speeds.length;
  const fastest = speeds.reduce((most, one) => (one.value > most.value ? one : most));
  const slowest = speeds.reduce((least, one) => (one.value < least.value ? one : least));
  return {
    mean,
    range: (fastest.value - slowest.value) / mean,
    beyondErrors: ((fastest.low ?? fastest.value) - (slowest.high ?? slowest.value)) / mean,
  };
}
