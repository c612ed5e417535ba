import type { Quantity } from "../../core/quantity.ts";
import type { LaneMap } from "./rulerScale.ts";

export interface WhiskerEnds {
  readonly low: number;
  readonly high: number;
  /** The interval goes on beyond this end of the scale, or has no end on this side. */
  readonly lowLeaves: boolean;
  readonly highLeaves: boolean;
}

/** Ends of an interval in px, kept on the scale; null where there is no interval, or none of it shows. */
export function whiskerEnds(x0: Quantity, map: LaneMap, width: number): WhiskerEnds | null {
  if (x0.value === null || (x0.low === null && x0.high === null)) return null;
  const low = x0.low === null ? Number.NEGATIVE_INFINITY : map.at + map.perX * x0.low;
  const high = x0.high === null ? Number.POSITIVE_INFINITY : map.at + map.perX * x0.high;
  if (high < 0 || low > width) return null;
  return {
    low: Math.max(1, low),
    high: Math.min(width - 1, high),
    lowLeaves: low < 1,
    highLeaves: high > width - 1,
  };
}
