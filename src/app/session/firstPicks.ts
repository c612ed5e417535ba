import type { StationResult } from "../../core/stationResult.ts";

/** Where along a case's stations the first two picks lie: past the near field, and well downstream. */
const places = [0.3, 0.75];

/** Positions of the stations whose spectra are shown until the reader picks others. */
export function firstPicks(stations: readonly StationResult[]): number[] {
  const recorded = stations.filter(({ curves }) => curves !== null);
  if (recorded.length === 0) return [];
  const xs = places.map((place) => recorded[Math.round(place * (recorded.length - 1))].x);
  return [...new Set(xs)];
}
