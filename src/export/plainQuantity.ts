import type { Quantity } from "../core/quantity.ts";

/** A value as scripts read it: plain numbers, an interval or a reason for none. */
export type PlainQuantity =
  | { value: number; low: number | null; high: number | null; why_low?: string; why_high?: string }
  | { value: null; why: string };

/** A quantity without what only the program needs. */
export function plainQuantity(quantity: Quantity): PlainQuantity {
  if (quantity.value === null) return { value: null, why: quantity.why };
  const { value, low, high, why_low, why_high } = quantity;
  return {
    value,
    low,
    high,
    ...(low === null && why_low !== undefined ? { why_low } : {}),
    ...(high === null && why_high !== undefined ? { why_high } : {}),
  };
}
