import { deriveStations } from "../../core/decay/deriveStations.ts";
import { fitDecay } from "../../core/decay/fitDecay.ts";
import type { DecayResult, DecaySettings } from "../../core/decayResult.ts";
import type { StationResult } from "../../core/stationResult.ts";

/** A fit in the frame: a given window takes a few milliseconds, so the page need not ask the worker first. */
export function fitNow(
  stations: readonly StationResult[],
  settings: DecaySettings,
): { stations: readonly StationResult[]; decay: DecayResult } {
  const decay = fitDecay(stations, settings);
  return { stations: deriveStations(stations, decay, settings), decay };
}
