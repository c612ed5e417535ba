import Papa from "papaparse";
import type { Separator } from "../core/records.ts";

/**
 * Whole lines of text as rows of fields, one row for each line, blank lines included.
 * A quote never reaches over the end of its line: then the line numbers in messages would be wrong, and one
 * stray quote would swallow the rest of a file.
 * @param text      lines parted by "\n", without the last line end
 * @param separator " " stands for runs of blanks and tabs, also before the first field
 */
export function splitRows(text: string, separator: Separator): string[][] {
  const even = separator === " " ? text.replace(/[ \t]+/g, " ") : text;
  if (!even.includes('"')) return trimmed(parse(even, separator), separator);
  const lines = even.split("\n");
  const rows = parse(even, separator);
  const whole = rows.length === lines.length;
  return trimmed(whole ? rows : lines.flatMap((line) => parse(line, separator)), separator);
}

function parse(text: string, separator: Separator): string[][] {
  if (text === "") return [[""]];
  return Papa.parse<string[]>(text, { delimiter: separator, newline: "\n" }).data;
}

/** Blanks at the ends of a line part nothing. */
function trimmed(rows: string[][], separator: Separator): string[][] {
  if (separator !== " ") return rows;
  for (const row of rows) {
    if (row.length > 1 && row[0] === "") row.shift();
    if (row.length > 1 && row[row.length - 1] === "") row.pop();
  }
  return rows;
}
