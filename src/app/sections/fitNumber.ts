import type { Quantity } from "../../core/quantity.ts";
import type { CaseView } from "../session/caseView.ts";
import type { Manner } from "./QuantityText.tsx";

/** How a virtual origin of a case is shown: in reference lengths, or in the unit of x. */
export function originManner({ along, units, length, symbol }: CaseView): Manner {
  const label = along === "t" ? "t0" : "x0";
  return length === null ? { label, units } : { label, units, per: { length, symbol } };
}

/** Both missing for one and the same reason: it is then given once. */
export function sameReason(a: Quantity, b: Quantity): string | null {
  return a.value === null && b.value === null && a.why === b.why ? a.why : null;
}
