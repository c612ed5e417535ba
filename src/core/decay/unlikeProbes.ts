import type { Flag } from "../flag.ts";
import type { StationResult } from "../stationResult.ts";
import type { DecayQuantity } from "./decayQuantity.ts";
import { decayValue } from "./decayQuantity.ts";

/** Stations of a case that no law can rest on, since their probes do not agree: the fit goes without them. */
export function unlikeProbes(stations: readonly StationResult[], what: DecayQuantity): Flag[] {
  const left = stations.filter(
    (station) =>
      decayValue(station, what) === null && (station.probes ?? []).some(({ agrees }) => agrees === false),
  );
  if (left.length === 0) return [];
  const places = left.map(({ x }) => x).sort((a, b) => a - b);
  const text = `The law goes without ${places.length === 1 ? "the station" : "the stations"} at x = ${places.join(", ")}: the probes there do not agree, so that no ${what.quantity} is given.`;
  return [{ code: "inhomogeneous", text, value: places.length }];
}
