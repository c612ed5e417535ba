import type { CaseSheet } from "./caseSheet.ts";

/** One sentence where the case that all others are to be held against is none of them; null where it is. */
export function againstWarning(sheets: readonly CaseSheet[], file: string): string | null {
  const against = sheets[0]?.compare.against ?? null;
  const names = sheets.map((sheet) => sheet.case);
  if (against === null || names.includes(against)) return null;
  return `${file}: key compare.against names "${against}", and the cases are ${names.map((name) => `"${name}"`).join(", ")}; they were compared with the first`;
}
