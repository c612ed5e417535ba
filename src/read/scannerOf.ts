import type { RowPlan } from "./readRows.ts";
import { RowScanner } from "./rowScanner.ts";
import type { TableForm } from "./surveyTable.ts";

/** A scanner for this table; null where its rows cannot be told apart by single bytes. */
export function scannerOf({ separator, decimal, width }: TableForm, { columns }: RowPlan): RowScanner | null {
  if (separator === decimal) return null;
  const slots = new Int32Array(width).fill(-1);
  for (const [slot, { index }] of columns.entries()) {
    if (slots[index] !== -1) return null; // one column in two roles
    slots[index] = slot;
  }
  return columns.length === 0 ? null : new RowScanner({ separator, decimal, width, slots });
}
