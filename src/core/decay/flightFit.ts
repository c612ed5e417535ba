import type { FlightFit } from "../decayArgument.ts";
import type { DecayResult, DecaySettings } from "../decayResult.ts";
import { missing } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { fitWindow, windowQuantity } from "./fitWindow.ts";
import { flightCourse, placeAlong } from "./flightCourse.ts";
import { speedVariation, steadySpeed } from "./speedVariation.ts";

/**
 * The law along the time of flight over the window, for a stream that speeds up or slows down:
 *     q = A ((s - s0)/ell)^(-n),   s of flightCourse with the mean U of the window
 * @param stations derived, in order of x
 * @param decay    of these stations
 * @returns        n (1) and the origin carried back to x; null where U varies by no more than 1 % and the law does not
 *                 run along it, U is not known at every station of the window, or the decay is one in time
 */
export function flightFit(
  stations: readonly StationResult[],
  decay: DecayResult,
  settings: DecaySettings,
): FlightFit | null {
  const points = decay.points.filter((point) => point.used);
  const places = new Set(points.map(({ x }) => x));
  const variation = speedVariation(stations.filter(({ x }) => places.has(x)));
  if (settings.along === "t" || variation === null) return null;
  if (!decay.flight && !(variation.beyondErrors > steadySpeed)) return null;
  const fitted = new Set(decay.points.map(({ x }) => x));
  const carried = stations.filter(({ x }) => fitted.has(x));
  const flight = decay.flight ?? flightCourse(carried, variation.mean);
  if (flight === null) return null;
  const window = fitWindow(points, settings, flight);
  const base = {
    variation: variation.range,
    speed: flight.speed,
    x: points.map(({ x }) => x),
    distance: points.map(({ x }) => placeAlong(flight, x)),
  };
  if ("refused" in window) return { ...base, n: missing(window.refused), x0: missing(window.refused) };
  return { ...base, n: windowQuantity(window, "n"), x0: windowQuantity(window, "x0") };
}
