import type { Separator } from "../core/records.ts";

/** Marks that make a line a comment; `;` only where it parts no columns. */
const marks = ["#", "%", "!", "//"];

/** The text of a comment line without its marks; null where the line is none. */
export function commentText(line: string, separator: Separator | null): string | null {
  const text = line.trimStart();
  const mark =
    marks.find((each) => text.startsWith(each)) ??
    (separator !== ";" && text.startsWith(";") ? ";" : undefined);
  return mark === undefined ? null : text.replace(/^[#%!/;]+/, "").trim();
}
