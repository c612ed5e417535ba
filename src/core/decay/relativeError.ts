import { isEstimate, type Quantity } from "../quantity.ts";

/** Half the width of a normal 95 % interval in standard errors. */
const halfWidth = 1.959963984540054;

/**
 * Standard error of ln q of a positive quantity: its own, or that which its interval implies.
 * @returns relative standard error, 1; null where the quantity carries neither error nor closed interval
 */
export function relativeError(quantity: Quantity): number | null {
  if (!isEstimate(quantity) || !(quantity.value > 0)) return null;
  const { value, low, high, error } = quantity;
  if (error) return above(error.scale === "log" ? error.standard : error.standard / value);
  if (low === null || high === null || !(low > 0)) return null;
  return above(Math.log(high / low) / (2 * halfWidth));
}

/** An error of zero would weigh a station infinitely: it is none. */
function above(error: number): number | null {
  return error > 0 && Number.isFinite(error) ? error : null;
}
