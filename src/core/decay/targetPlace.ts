import { bare, isEstimate, missing, type Quantity } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import type { BodyCurve } from "./bodyCurves.ts";
import { relativeError } from "./relativeError.ts";
import { studentReach } from "./studentReach.ts";

const halvings = 60;

/**
 * The first place at which the intensity falls to a target.
 *     se(x) = se(ln Tu)/|d ln Tu/dx|
 * @param logarithm ln of the target
 * @returns         x; missing with the reason where no place between the stations meets it
 */
export function targetPlace(
  curve: BodyCurve,
  stations: readonly StationResult[],
  logarithm: number,
): Quantity {
  const known = stations.flatMap(({ x }) => {
    const value = curve.logarithm(x);
    return value === null ? [] : [{ x, above: value - logarithm }];
  });
  if (known.length === 0) return missing("no station carries an intensity");
  const right = known.findIndex(({ above }) => above <= 0);
  const last = known[known.length - 1];
  const times = (above: number) => Math.exp(above).toPrecision(3);
  if (right < 0)
    return missing(`the intensity is ${times(last.above)} times the target at the last station still`);
  if (right === 0 && known[0].above < 0)
    return missing(`the intensity is ${times(known[0].above)} times the target at the first station already`);
  const at = right === 0 ? known[0].x : crossingOf(curve, logarithm, known[right - 1].x, known[right].x);
  const value = curve.at(at);
  const error = relativeError(value);
  const [low, high] = [known[Math.max(right - 1, 0)].x, known[Math.max(right, 1)]?.x ?? at];
  const [before, after] = [low, high].map((x) => curve.logarithm(x));
  const slope = before === null || after === null || high === low ? 0 : (after - before) / (high - low);
  if (error === null || slope === 0) return bare(at, "the stations beside it carry no interval");
  const freedom = isEstimate(value) ? (value.error?.freedom ?? null) : null;
  const reach = studentReach(freedom) * Math.abs(error / slope);
  return { value: at, low: at - reach, high: at + reach };
}

/** Where the curve falls through the target between two places, by halving. */
function crossingOf(curve: BodyCurve, logarithm: number, from: number, to: number): number {
  let [inside, outside] = [from, to];
  for (let i = 0; i < halvings; i++) {
    const middle = (inside + outside) / 2;
    if ((curve.logarithm(middle) ?? logarithm) > logarithm) inside = middle;
    else outside = middle;
  }
  return (inside + outside) / 2;
}
