import type { DecaySettings } from "../decayResult.ts";
import { isEstimate } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { type DecayQuantity, decayQuantity, decayValue } from "./decayQuantity.ts";
import { smoothErrors } from "./smoothErrors.ts";

/** One station as a candidate of the fit; q still in its own unit. */
export interface RawPoint {
  readonly station: StationResult;
  readonly x: number;
  readonly q: number;
  /** Standard error of ln q from the station's own sampling; null where there is none. */
  readonly error: number | null;
  /** What the fit weights with; null with equal weights. */
  readonly smoothedError: number | null;
}

export interface DecayPoints extends DecayQuantity {
  /** In order of x; stations that lack the quantity are left out. */
  readonly points: readonly RawPoint[];
  readonly weights: "sampling" | "equal";
}

/**
 * The stations of a case as points of a decay law: the quantity that decays, and the errors it is weighted with.
 * Without errors at all stations the weights are equal, whatever was asked for.
 * @param stations in any order
 */
export function decayPoints(stations: readonly StationResult[], settings: DecaySettings): DecayPoints {
  const what = decayQuantity(stations, settings.quantity);
  const found = [...stations]
    .sort((a, b) => a.x - b.x)
    .flatMap((station) => {
      const value = decayValue(station, what);
      return value === null ? [] : [{ station, ...value }];
    });
  const smoothed =
    settings.weights === "sampling"
      ? smoothErrors(
          found.map(({ station, error, freedom }) => {
            return { x: station.x, error, freedom, duration: station.duration };
          }),
        )
      : null;
  return {
    ...what,
    weights: smoothed === null ? "equal" : "sampling",
    points: found.map(({ station, value, error }, i) => {
      return { station, x: station.x, q: value, error, smoothedError: smoothed?.[i] ?? null };
    }),
  };
}

/**
 * Us of q = k/Us²: the reference speed, or the mean U of the stations fitted; 1 in a decay along time.
 * @returns speed, m/s; null in a q profile, and where no station carries a U
 */
export function decaySpeed(
  stations: readonly StationResult[],
  quantity: DecayQuantity["quantity"],
  settings: DecaySettings,
): number | null {
  if (quantity === "q") return null;
  if (settings.referenceSpeed !== null) return settings.referenceSpeed;
  if (settings.along === "t") return 1;
  const speeds = stations.flatMap(({ U }) => (isEstimate(U) && U.value > 0 ? [U.value] : []));
  return speeds.length === 0 ? null : speeds.reduce((sum, speed) => sum + speed, 0) / speeds.length;
}
