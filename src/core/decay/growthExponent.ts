import type { PowerLaw } from "../decayResult.ts";
import { bare, estimate, isEstimate, missing, type Quantity } from "../quantity.ts";
import { chiSquareTail } from "../signal/distributions/chiSquareTail.ts";
import { lawDistance } from "./lawDistance.ts";
import { relativeError } from "./relativeError.ts";
import { straightLine } from "./straightLine.ts";
import { studentReach } from "./studentReach.ts";

/**
 * Exponent of a length that grows from the origin of the decay law:
 *     L = B ((x - x0)/ell)^m
 * a straight line in logarithms; the origin's own error is added, (dm/dx0)² var(x0).
 * @param x       stations, unit of x0, above x0
 * @param lengths one for each station; missing ones are passed over
 * @returns       m, 1, with its 95 % interval; missing with fewer than three lengths
 */
export function growthExponent(x: readonly number[], lengths: readonly Quantity[], law: PowerLaw): Quantity {
  const points = lengths.flatMap((length, i) =>
    isEstimate(length) && length.value > 0 && x[i] > law.x0
      ? [{ x: x[i], y: Math.log(length.value), error: relativeError(length) }]
      : [],
  );
  if (points.length < 3) return missing("fewer than three stations of the window carry this length");
  const errors = points.map((point) => point.error).filter((error) => error !== null);
  const weights = errors.length === points.length ? errors : null;
  const y = points.map((point) => point.y);
  const lineFrom = (x0: number) =>
    straightLine(
      points.map((point) => Math.log(lawDistance({ ...law, x0 }, point.x))),
      y,
      weights,
    );
  const line = lineFrom(law.x0);
  if (line === null) return missing("these stations stand at one x");
  const known = weights !== null && chiSquareTail(line.sum, line.freedom) >= 0.05;
  const variance = known ? 1 : line.sum / line.freedom;
  const step = 1e-4 * (Math.min(...points.map((point) => point.x)) - law.x0);
  const shifted = lineFrom(law.x0 - step);
  const byOrigin = shifted === null ? 0 : (line.slope - shifted.slope) / step;
  const standard = Math.sqrt(variance * line.varianceOfSlope + byOrigin ** 2 * law.covariance[4]);
  if (!Number.isFinite(standard)) return bare(line.slope, "these stations stand too close together");
  const freedom = known ? null : line.freedom;
  const reach = studentReach(freedom) * standard;
  return estimate(line.slope, line.slope - reach, line.slope + reach, { standard, freedom, scale: "linear" });
}
