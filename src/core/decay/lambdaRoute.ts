import type { DecayResult, DecaySettings, Flight } from "../decayResult.ts";
import { isEstimate, missing, type Quantity } from "../quantity.ts";
import { chiSquareTail } from "../signal/distributions/chiSquareTail.ts";
import type { StationResult } from "../stationResult.ts";
import { decayQuantity, decayValue } from "./decayQuantity.ts";
import { placeAlong, quantityBack } from "./flightCourse.ts";
import { relativeError } from "./relativeError.ts";
import { relativeLine, zeroOfLine } from "./relativeLine.ts";
import type { StraightLine } from "./straightLine.ts";
import { studentReach } from "./studentReach.ts";

type Route = DecayResult["lambda_route"];

/**
 * Origin and exponent from the growth of the Taylor microscale, without the decay law: on it
 *     Lambda² = 10 nu k/epsilon = (10 nu/(n U)) (x - x0)
 * is a straight line whose zero is x0 and whose slope gives n. epsilon is that of the measured gradients alone.
 * @param stations those of the window, in order of x
 * @param flight   the course of the law; null: x
 * @returns        n (1) and x0 (unit of x), x0's interval by Fieller's theorem; missing without viscosity, without U,
 *                 or with fewer than three stations that carry a dissipation from gradients
 * @see            Batchelor & Townsend (1948), Proc. R. Soc. A 193, 539; Fieller (1954), J. R. Statist. Soc. B 16, 175
 */
export function lambdaRoute(
  stations: readonly StationResult[],
  settings: DecaySettings,
  flight: Flight | null = null,
): Route {
  const { kinematicViscosity: nu } = settings;
  if (nu === null) return both(missing("no kinematic viscosity is given"));
  if (settings.kind === "les") return both(unresolvedGradients);
  const what = decayQuantity(stations, "k");
  const points = stations.flatMap((station) => {
    const k = decayValue(station, what);
    const { epsilon_gradient: epsilon } = station;
    if (k === null || !isEstimate(epsilon) || !(epsilon.value > 0)) return [];
    const [ofK, ofEpsilon] = [k.error, relativeError(epsilon)];
    const error = ofK === null || ofEpsilon === null ? null : Math.hypot(ofK, ofEpsilon);
    return [{ x: station.x, square: (10 * nu * k.value) / epsilon.value, error }];
  });
  if (points.length < 3)
    return both(
      missing(
        "fewer than three stations carry a dissipation from measured gradients; one that comes from the decay would argue in a circle",
      ),
    );
  const U = flight?.speed ?? meanSpeed(stations, settings);
  if (U === null) return both(missing("no mean velocity at these stations"));
  const x = points.map((point) => placeAlong(flight, point.x));
  const squares = points.map((point) => point.square);
  const errors = points.map((point) => point.error).filter((error) => error !== null);
  const line = relativeLine(x, squares, errors.length === points.length ? errors : null);
  if (line === null || !(line.slope > 0)) return both(missing("Lambda² does not grow along these stations"));
  const known = errors.length === points.length && chiSquareTail(line.sum, line.freedom) >= 0.05;
  const variance = known ? 1 : line.sum / line.freedom;
  const quantile = studentReach(known ? null : line.freedom);
  return {
    n: exponent(line, (10 * nu) / U, quantile, variance),
    x0: quantityBack(
      flight,
      zeroOfLine(line, quantile, variance, "the slope of Lambda² is not told from zero: any origin fits"),
    ),
  };
}

/** A filtered spectrum loses a share of the gradients that changes along the stream: the line would be confidently wrong. */
export const unresolvedGradients = missing(
  "the resolved gradients of a large-eddy simulation do not carry all of the dissipation",
);

const both = (quantity: Quantity): Route => ({ n: quantity, x0: quantity });

function meanSpeed(stations: readonly StationResult[], { along }: DecaySettings): number | null {
  if (along === "t") return 1;
  const speeds = stations.flatMap(({ U }) => (isEstimate(U) && U.value > 0 ? [U.value] : []));
  return speeds.length === 0 ? null : speeds.reduce((sum, speed) => sum + speed, 0) / speeds.length;
}

/** n = (10 nu/U)/slope; open above where a slope of zero lies within the interval. */
function exponent(line: StraightLine, numerator: number, quantile: number, variance: number): Quantity {
  const reach = quantile * Math.sqrt(variance * line.varianceOfSlope);
  const { slope } = line;
  const high = slope > reach ? numerator / (slope - reach) : null;
  return {
    value: numerator / slope,
    low: numerator / (slope + reach),
    high,
    ...(high === null ? { why_high: "a Lambda² that does not grow at all is not excluded" } : {}),
  };
}
