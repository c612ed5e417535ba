import { type Estimate, isEstimate, type Quantity } from "../quantity.ts";
import { type Refusal, type WindowFit, windowQuantity } from "./fitWindow.ts";

const openWhy = "a later start of the window leaves this side open";

/**
 * n or x0 of an automatic window: the value of the chosen window with the union of the intervals of all windows.
 * A side that is open in one of them is open in the union; a later window with no law of its own (it falls like an
 * exponential) leaves n without an upper and x0 without a lower end.
 * @param windows the chosen one first
 */
export function unionOfWindows(windows: readonly (WindowFit | Refusal)[], key: "n" | "x0"): Quantity {
  const quantities = windows.flatMap((window) => ("refused" in window ? [] : [windowQuantity(window, key)]));
  const [chosen] = quantities;
  if (!isEstimate(chosen) || (chosen.low === null && chosen.high === null)) return chosen;
  const others = quantities.filter(isEstimate);
  const refused = windows.length > quantities.length;
  const low = end(others, "low", refused && key === "x0");
  const high = end(others, "high", refused && key === "n");
  return {
    value: chosen.value,
    low,
    high,
    ...(low === null ? { why_low: chosen.why_low ?? openWhy } : {}),
    ...(high === null ? { why_high: chosen.why_high ?? openWhy } : {}),
    ...(chosen.error ? { error: chosen.error } : {}),
  };
}

function end(quantities: readonly Estimate[], side: "low" | "high", open: boolean): number | null {
  const ends = quantities.map((quantity) => quantity[side]).filter((value) => value !== null);
  if (open || ends.length < quantities.length) return null;
  return side === "low" ? Math.min(...ends) : Math.max(...ends);
}
