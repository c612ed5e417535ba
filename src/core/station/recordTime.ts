import type { JoinedRecord } from "./joinParts.ts";
import { recordCorrelation } from "./recordCorrelation.ts";
import type { StationPart } from "./stationPart.ts";
import { zeroCrossing } from "./zeroCrossing.ts";

/**
 * Integral time of u in one record, up to the first zero of its correlation.
 * @returns s; null where the record has no lag products, or its correlation does not fall to zero
 */
export function recordTime(part: StationPart): number | null {
  const correlation = recordCorrelation(part, 0);
  if (correlation === null || part.lags === null) return null;
  const { at, area } = zeroCrossing(correlation);
  return at === null ? null : (area / correlation[0]) * part.lags.stride * part.step;
}

/**
 * The integral time by which records are held against each other: the median of their own, each about its own mean,
 * which what they differ in does not touch.
 * @returns s; null where none of them has one
 */
export function usualTime({ parts, untimed }: Pick<JoinedRecord, "parts" | "untimed">): number | null {
  if (untimed !== null) return null;
  const times = parts.flatMap((part) => recordTime(aboutItself(part)) ?? []).sort((a, b) => a - b);
  return times[times.length >> 1] ?? null;
}

/** A record about its own mean, whatever it has in common with others. */
export function aboutItself(part: StationPart): StationPart {
  if (part.commonRest === undefined) return part;
  const { commonRest: _, ...own } = part;
  return own;
}
