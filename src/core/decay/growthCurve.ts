import type { PowerLaw } from "../decayResult.ts";
import type { StationResult } from "../stationResult.ts";
import { lawDistance } from "./lawDistance.ts";
import { logSeries } from "./logSeries.ts";
import { straightLine } from "./straightLine.ts";

/** A length that grows from the origin of the law, L11 = B ((x - x0)/ell)^m, as a straight line in logarithms. */
export interface GrowthCurve {
  readonly logarithm: (x: number) => number;
  /** Standard error of ln L11 at a place. */
  readonly error: (x: number) => number;
  /** m. */
  readonly slope: number;
  /** Places of the first and the last station that carry it. */
  readonly ends: readonly [number, number];
}

/**
 * @param stations of the window, in order of x
 * @returns        null with fewer than three stations beyond the origin that carry an L11
 */
export function growthCurve(stations: readonly StationResult[], law: PowerLaw): GrowthCurve | null {
  const beyond = stations.filter(({ x }) => x > law.x0);
  const along = (x: number) => Math.log(lawDistance(law, x));
  const { x, s, logarithm, error } = logSeries(
    beyond.map((station) => station.x),
    beyond.map(({ L11 }) => L11),
    along,
  );
  const line = x.length < 3 ? null : straightLine(s, logarithm, error);
  if (line === null) return null;
  // scatter beyond the errors widens them
  const variance = error === null ? line.sum / line.freedom : Math.max(1, line.sum / line.freedom);
  return {
    logarithm: (at) => line.intercept + line.slope * along(at),
    error: (at) => {
      const { varianceOfIntercept, varianceOfSlope, covariance } = line;
      const place = along(at);
      const square = varianceOfIntercept + 2 * place * covariance + place ** 2 * varianceOfSlope;
      return Math.sqrt(Math.max(square * variance, 0));
    },
    slope: line.slope,
    ends: [x[0], x[x.length - 1]],
  };
}
