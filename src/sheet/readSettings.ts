import type { ColumnChoice, ColumnChoices, ReadSettings } from "../core/records.ts";
import type { CaseSheet, SheetColumn, SheetFile } from "./caseSheet.ts";

/** What of a sheet decides how one of its files is read. */
export function readSettings(sheet: CaseSheet, file: SheetFile): ReadSettings {
  const { layout, units, zero, startup, along, read } = sheet;
  return { layout, units, zero, startup, along, columns: choices(sheet.columns), ...read, x: file.x };
}

function choices(columns: CaseSheet["columns"]): ColumnChoices | null {
  if (columns === null) return null;
  return Object.fromEntries(
    Object.entries(columns).flatMap(([role, column]) =>
      column === undefined ? [] : [[role, choice(column)] as const],
    ),
  );
}

function choice(column: SheetColumn): ColumnChoice {
  return typeof column === "object" ? column : { from: column, unit: null };
}
