import type { LocalDecay } from "../decayArgument.ts";
import type { DecayPoint, PowerLaw } from "../decayResult.ts";
import { bare, estimate, missing, type Quantity } from "../quantity.ts";
import { lawDistance } from "./lawDistance.ts";
import { logEstimate } from "./powerProduct.ts";
import { straightLine } from "./straightLine.ts";

/**
 * The law seen station by station: the local exponent -d ln q/d ln(x - x0) over each station and its two neighbours,
 * and the compensated energy q ((x - x0)/ell)^n, a level line where the law holds. The origin is taken as known.
 * @param points in order of x, inside the window and out of it
 * @param law    adopted
 */
export function localDecay(points: readonly DecayPoint[], law: PowerLaw): LocalDecay {
  const beyond = points.filter(({ x }) => x > law.x0);
  return {
    x: beyond.map(({ x }) => x),
    exponent: beyond.map((_, i) => localExponent(beyond.slice(Math.max(i - 1, 0), i + 2), law)),
    compensated: beyond.map(({ x, q, smoothedError, error }) => {
      const value = q * (lawDistance(law, x) / law.length) ** law.n;
      const standard = smoothedError ?? error;
      return standard === null
        ? bare(value, "the station carries no sampling error")
        : logEstimate(value, standard, null);
    }),
  };
}

function localExponent(points: readonly DecayPoint[], law: PowerLaw): Quantity {
  if (points.length < 3) return missing("a station at an end has one neighbour only");
  const errors = points.map((point) => point.smoothedError).filter((error) => error !== null);
  const told = errors.length === points.length;
  const line = straightLine(
    points.map(({ x }) => Math.log(lawDistance(law, x))),
    points.map(({ q }) => Math.log(q)),
    told ? errors : null,
  );
  if (line === null) return missing("its neighbours stand at the same x");
  if (!told) return bare(-line.slope, "the stations carry no sampling errors");
  const standard = Math.sqrt(line.varianceOfSlope);
  const reach = 1.959963984540054 * standard;
  return estimate(-line.slope, -line.slope - reach, -line.slope + reach, {
    standard,
    freedom: null,
    scale: "linear",
  });
}
