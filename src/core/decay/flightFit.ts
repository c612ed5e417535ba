import type { FlightFit } from "../decayArgument.ts";
import type { DecayResult, DecaySettings } from "../decayResult.ts";
import { type Estimate, isEstimate, missing, type Quantity } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { fitWindow, windowQuantity } from "./fitWindow.ts";

/** Share by which U may vary before the time of flight is the better coordinate. */
export const steadySpeed = 0.01;

/**
 * The law along the time of flight, for a stream that speeds up or slows down: turbulence decays in its own time, so that
 *     q = A ((X - X0)/ell)^(-n),   X = x1 + Um integral from x1 of dx/U   (trapezoid over 1/U)
 * with Um the mean of U over the window, X is a length and equals x where U is constant.
 * @param stations of the window, in order of x
 * @param decay    of these stations
 * @returns        n (1) and the origin carried back to x with the speed of the first station; null where U varies by no
 *                 more than 1 %, is not known at every station, or the decay is one in time
 * @see            Comte-Bellot & Corrsin (1966), J. Fluid Mech. 25, 657
 */
export function flightFit(
  stations: readonly StationResult[],
  decay: DecayResult,
  settings: DecaySettings,
): FlightFit | null {
  const points = decay.points.filter((point) => point.used);
  const speeds = points.map(({ x }) => stations.find((station) => station.x === x)?.U);
  const known = speeds.filter((U): U is Estimate => U !== undefined && isEstimate(U) && U.value > 0);
  if (settings.along === "t" || known.length < Math.max(points.length, 2)) return null;
  const values = known.map(({ value }) => value);
  const speed = values.reduce((sum, value) => sum + value, 0) / values.length;
  const variation = (Math.max(...values) - Math.min(...values)) / speed;
  if (!(variation > steadySpeed)) return null;
  const distance = [points[0].x];
  for (let i = 1; i < points.length; i++) {
    const slowness = (1 / values[i - 1] + 1 / values[i]) / 2;
    distance.push(distance[i - 1] + speed * slowness * (points[i].x - points[i - 1].x));
  }
  const moved = points.map((point, i) => ({ ...point, x: distance[i] }));
  const atStart = values[0] / speed;
  const held = settings.x0 === null ? null : points[0].x - (points[0].x - settings.x0) / atStart;
  const window = fitWindow(moved, { ...settings, x0: held });
  const base = { variation, speed, x: points.map(({ x }) => x), distance };
  if ("refused" in window) return { ...base, n: missing(window.refused), x0: missing(window.refused) };
  const back = (X: number) => points[0].x - (points[0].x - X) * atStart;
  return {
    ...base,
    n: windowQuantity(window, "n"),
    x0: carried(windowQuantity(window, "x0"), back, atStart),
  };
}

/** A place and its ends carried to another axis by a rising straight line of the given slope. */
function carried(quantity: Quantity, map: (at: number) => number, slope: number): Quantity {
  if (!isEstimate(quantity)) return quantity;
  const { value, low, high, error } = quantity;
  return {
    ...quantity,
    value: map(value),
    low: low === null ? null : map(low),
    high: high === null ? null : map(high),
    ...(error ? { error: { ...error, standard: error.standard * slope } } : {}),
  };
}
