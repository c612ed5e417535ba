import type { TableForm } from "./surveyTable.ts";

/** Enough to see which file it is. */
const shown = 8;

/** The headings of a table as they stand in the file, for messages: the first few and how many more there are. */
export function headingList({ headings }: Pick<TableForm, "headings">): string {
  const texts = headings.map(({ text }, i) => text || `column ${i + 1}`);
  if (texts.length <= shown + 1) return texts.join(", ");
  return `${texts.slice(0, shown).join(", ")} and ${texts.length - shown} more`;
}
