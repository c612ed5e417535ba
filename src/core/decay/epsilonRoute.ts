import type { DecayResult, DecaySettings, Flight } from "../decayResult.ts";
import { isEstimate, missing, type Quantity } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { type FitPoint, fitWindow, windowQuantity } from "./fitWindow.ts";
import { unresolvedGradients } from "./lambdaRoute.ts";
import { relativeError } from "./relativeError.ts";

/**
 * Origin and exponent from the fall of the measured dissipation: on the decay law epsilon ~ (x - x0)^-(n + 1).
 * epsilon is that of the gradients alone; one that comes from the decay would argue in a circle.
 * @param stations those of the window, in order of x
 * @param flight   the course of the law; null: x
 * @returns        n (1) and x0 (unit of x) with profile intervals; missing with the reason of a refused law
 */
export function epsilonRoute(
  stations: readonly StationResult[],
  settings: DecaySettings,
  flight: Flight | null = null,
): DecayResult["epsilon_route"] {
  if (settings.kind === "les") return both(unresolvedGradients);
  const points: FitPoint[] = stations.flatMap((station) => {
    const { epsilon_gradient: epsilon } = station;
    if (!isEstimate(epsilon) || !(epsilon.value > 0)) return [];
    return [{ x: station.x, q: epsilon.value, smoothedError: relativeError(epsilon) }];
  });
  if (points.length === 0) return both(missing("no station carries a dissipation from measured gradients"));
  const fitted = fitWindow(points, { ...settings, x0: null, n: null, residuals: "log" }, flight);
  if ("refused" in fitted) return both(missing(fitted.refused));
  return { n: lessOne(windowQuantity(fitted, "n")), x0: windowQuantity(fitted, "x0") };
}

const both = (quantity: Quantity) => ({ n: quantity, x0: quantity });

/** The exponent of k from that of epsilon. */
function lessOne(quantity: Quantity): Quantity {
  if (!isEstimate(quantity)) return quantity;
  const { value, low, high } = quantity;
  return {
    ...quantity,
    value: value - 1,
    low: low === null ? null : low - 1,
    high: high === null ? null : high - 1,
  };
}
