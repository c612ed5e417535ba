import type { CompareSettings } from "../core/comparison.ts";
import type { CaseSheet } from "./caseSheet.ts";

/** What of the first sheet decides how cases are compared. */
export function compareSettings(sheet: CaseSheet): CompareSettings {
  return sheet.compare;
}
