import type { Growth } from "../decayArgument.ts";
import type { DecayResult } from "../decayResult.ts";
import { isEstimate, missing, type Quantity } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { meet } from "./decayRoutes.ts";
import { growthExponent } from "./growthExponent.ts";

/**
 * Exponents of L11, lambda and Re_lambda from the origin of the law, each beside what n implies: with C_epsilon constant
 *     L11 ~ (x - x0)^(1 - n/2),   lambda ~ (x - x0)^(1/2),   Re_lambda ~ (x - x0)^((1 - n)/2)
 * @param stations of the window, in order of x
 * @see            Pope (2000) §5.4.6; Batchelor & Townsend (1948), Proc. R. Soc. A 193, 539
 */
export function growths(stations: readonly StationResult[], { law, n }: DecayResult): Growth[] {
  const xs = stations.map(({ x }) => x);
  const none = missing("there is no law to take the origin from");
  const of = (key: Growth["key"], offset: number, factor: number): Growth => {
    const values = stations.map((station) => station[key]);
    const exponent = law === null ? none : growthExponent(xs, values, law);
    const implied = linear(n, offset, factor);
    return { key, exponent, implied, agrees: agreement(exponent, implied) };
  };
  return [of("L11", 1, -1 / 2), of("lambda", 1 / 2, 0), of("Re_lambda", 1 / 2, -1 / 2)];
}

/** offset + factor n, its ends carried along. */
function linear(n: Quantity, offset: number, factor: number): Quantity {
  if (!isEstimate(n)) return n;
  if (factor === 0) {
    const why = "the same for every n";
    return { value: offset, low: null, high: null, why_low: why, why_high: why };
  }
  const along = (end: number | null) => (end === null ? null : offset + factor * end);
  const { low, high, why_low, why_high } = n;
  // every factor here is negative: the ends change places
  return {
    value: offset + factor * n.value,
    low: along(high),
    high: along(low),
    ...(why_high === undefined ? {} : { why_low: why_high }),
    ...(why_low === undefined ? {} : { why_high: why_low }),
  };
}

function agreement(exponent: Quantity, implied: Quantity): boolean | null {
  if (!isEstimate(exponent) || !isEstimate(implied)) return null;
  const exact = implied.low === null && implied.high === null;
  return meet(exponent, exact ? { ...implied, low: implied.value, high: implied.value } : implied);
}
