import { compareDefaults } from "../core/comparison.ts";
import type { CaseSheet, SheetCompare } from "./caseSheet.ts";

/** What of the first sheet decides how cases are compared; a sheet that was kept from before a choice has its default. */
export function compareSettings(sheet: CaseSheet): SheetCompare {
  return { ...compareDefaults, ...sheet.compare };
}
