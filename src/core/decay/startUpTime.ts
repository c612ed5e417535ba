import { isEstimate } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";

/** The time after which all records of a case are steady, from their beginning, and the station that clears last. */
export interface StartUpTime {
  readonly time: number;
  readonly station: StationResult;
}

/** A prediction beyond this share of a record would leave nothing to reduce. */
const most = 0.4;

/**
 * What to leave out of a case's records, which begin together. A station's own record tells when it is steady, where
 * it shows a transient; one that shows none is cleared by the flow: after a station upstream by the time of flight,
 *     t(x) = t(x_i) + ∫ dx/U from x_i to x,
 * so that the last station clears last.
 * @param stations reduced, in any order; U by the trapezoid over 1/U
 * @returns        null where no record shows a transient
 */
export function startUpTime(stations: readonly StationResult[]): StartUpTime | null {
  const inOrder = [...stations].sort((a, b) => a.x - b.x);
  /** When the flow that is steady upstream reaches the station at hand; null: nothing is known. */
  let steady: number | null = null;
  let latest: StartUpTime | null = null;
  inOrder.forEach((station, i) => {
    if (steady !== null) steady = later(steady, inOrder[i - 1], station);
    const own = station.flags.find(({ code }) => code === "start-up")?.value ?? null;
    const time = own ?? (steady !== null && steady <= most * (station.duration ?? 0) ? steady : null);
    steady = own === null ? steady : Math.max(own, steady ?? 0);
    if (time !== null && (latest === null || time > latest.time)) latest = { time, station };
  });
  return latest;
}

/** A time at one station, a flight later at the next; null where either has no U. */
function later(time: number, from: StationResult, to: StationResult): number | null {
  if (!isEstimate(from.U) || !isEstimate(to.U) || !(from.U.value > 0 && to.U.value > 0)) return null;
  return time + ((to.x - from.x) / 2) * (1 / from.U.value + 1 / to.U.value);
}
