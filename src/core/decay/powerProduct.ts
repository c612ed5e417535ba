import { bare, type Estimate, estimate, isEstimate, missing, type Quantity } from "../quantity.ts";
import { relativeError } from "./relativeError.ts";
import { studentReach } from "./studentReach.ts";

/** A quantity and the power it is raised to. */
export type Power = readonly [Quantity, number];

/**
 * factor · q1^p1 · q2^p2 ... of positive quantities measured apart: relative errors add in squares,
 *     se(ln product)² = sum (p_i se(ln q_i))²
 * with the degrees of freedom of Welch and Satterthwaite.
 * @param factor > 0
 * @returns      the product with its 95 % interval; without one where a part has none; missing where a part is
 * @see          Satterthwaite (1946), Biometrics Bull. 2, 110
 */
export function powerProduct(factor: number, powers: readonly Power[]): Quantity {
  let value = factor;
  let square = 0;
  let fourth = 0;
  let without: Estimate | null = null;
  for (const [quantity, power] of powers) {
    if (!isEstimate(quantity)) return missing(quantity.why);
    if (!(quantity.value > 0)) return missing("one of its parts is not above zero");
    value *= quantity.value ** power;
    const error = relativeError(quantity);
    if (error === null) {
      without = quantity;
      continue;
    }
    const part = (power * error) ** 2;
    square += part;
    fourth += quantity.error?.freedom ? part ** 2 / quantity.error.freedom : 0;
  }
  if (without !== null) return bare(value, without.why_low ?? "one of its parts has no interval");
  const freedom = fourth > 0 ? square ** 2 / fourth : null;
  return logEstimate(value, Math.sqrt(square), freedom);
}

/** A positive value whose logarithm has a standard error: value · exp(± t se). */
export function logEstimate(value: number, standard: number, freedom: number | null): Quantity {
  const spread = Math.exp(studentReach(freedom) * standard);
  return estimate(value, value / spread, value * spread, { standard, freedom, scale: "log" });
}
