import type { DissipationConstant } from "../decayArgument.ts";
import type { PowerLaw } from "../decayResult.ts";
import { bare, isEstimate, missing } from "../quantity.ts";
import { chiSquareTail } from "../signal/distributions/chiSquareTail.ts";
import type { StationResult } from "../stationResult.ts";
import { growthExponent } from "./growthExponent.ts";
import { logEstimate } from "./powerProduct.ts";
import { relativeError } from "./relativeError.ts";

/**
 * Whether C_epsilon = epsilon L11/u'³ stays the same along the window, which the exponents implied for the lengths take for
 * granted: its geometric mean weighted by the stations' errors, the probability of a larger chi-square about it, and its
 * exponent in C_epsilon ~ (x - x0)^c.
 * @param stations of the window, in order of x
 * @param law      null: no origin to take the exponent from
 * @returns        constant: whether 0 lies within the interval of c; null where c carries none
 * @see            Sreenivasan (1984), Phys. Fluids 27, 1048; Pope (2000) §6.1.3
 */
export function dissipationConstant(
  stations: readonly StationResult[],
  law: PowerLaw | null,
): DissipationConstant {
  const values = stations.map(({ C_epsilon }) => C_epsilon);
  const exponent =
    law === null
      ? missing("there is no law to take the origin from")
      : growthExponent(
          stations.map(({ x }) => x),
          values,
          law,
        );
  const inside =
    isEstimate(exponent) && exponent.low !== null && exponent.high !== null
      ? exponent.low <= 0 && exponent.high >= 0
      : null;
  return { exponent, constant: inside, ...meanOf(values) };
}

/** Weighted geometric mean; one value alone stands for itself. */
function meanOf(values: readonly StationResult["C_epsilon"][]): Pick<DissipationConstant, "mean" | "p"> {
  const known = values.flatMap((value) =>
    isEstimate(value) && value.value > 0
      ? [{ logarithm: Math.log(value.value), error: relativeError(value) }]
      : [],
  );
  if (known.length === 0) {
    const reason = values.find((value) => !isEstimate(value));
    return { mean: missing(reason?.value === null ? reason.why : "no station carries it"), p: null };
  }
  const errors = known.map(({ error }) => error).filter((error) => error !== null);
  const told = errors.length === known.length;
  const weights = known.map((_, i) => (told ? errors[i] ** -2 : 1));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const mean = known.reduce((sum, { logarithm }, i) => sum + (weights[i] * logarithm) / total, 0);
  if (!told) return { mean: bare(Math.exp(mean), "not all stations carry an interval"), p: null };
  const square = known.reduce((sum, { logarithm }, i) => sum + weights[i] * (logarithm - mean) ** 2, 0);
  const freedom = known.length - 1;
  return {
    mean: logEstimate(Math.exp(mean), 1 / Math.sqrt(total), null),
    p: freedom > 0 ? chiSquareTail(square, freedom) : null,
  };
}
