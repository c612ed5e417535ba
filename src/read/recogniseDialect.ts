import type { ReadSettings, Separator } from "../core/records.ts";
import { parseNumber } from "./parseNumber.ts";
import { splitRows } from "./splitRows.ts";

/** How the lines of a table are written. */
export interface Dialect {
  readonly separator: Separator;
  readonly decimal: "." | ",";
  /** Fields in a row, without what a separator at the end of the line adds. */
  readonly width: number;
  /** Rows that look like the table's own, of those that were looked at, 0 to 1. */
  readonly share: number;
  /** Columns that hold numbers. */
  readonly numeric: readonly boolean[];
}

const candidates: readonly [Separator, "." | ","][] = [
  [",", "."],
  [";", "."],
  [";", ","],
  ["\t", "."],
  ["\t", ","],
  [" ", "."],
  [" ", ","],
  [",", ","], // only with quotes round the numbers
];

/**
 * All ways to read some lines that give numbers, the best first: by the share of fields that are numbers in
 * rows of equal length, then by the number of columns.
 * @param lines data lines (a few others among them do no harm), none of them a comment
 * @param given what the user decided; null: recognised
 */
export function recogniseDialect(
  lines: readonly string[],
  given: Pick<ReadSettings, "separator" | "decimal">,
): Dialect[] {
  return candidates
    .filter(([separator]) => given.separator === null || given.separator === separator)
    .filter(([, decimal]) => given.decimal === null || given.decimal === decimal)
    .map(([separator, decimal]) => tried(lines, separator, decimal))
    .filter(({ share }) => share > 0)
    .sort((a, b) => b.share - a.share || b.width - a.width);
}

function tried(lines: readonly string[], separator: Separator, decimal: "." | ","): Dialect {
  const rows = splitRows(lines.join("\n"), separator).map(withoutEnd);
  const width = commonest(rows.map((row) => row.length));
  const regular = rows.filter((row) => row.length === width);
  const counts = Array.from({ length: width }, () => 0);
  for (const row of regular) {
    row.forEach((field, i) => {
      if (!Number.isNaN(parseNumber(field, decimal))) counts[i]++;
    });
  }
  const numbers = counts.reduce((sum, count) => sum + count, 0);
  const share = rows.length === 0 ? 0 : numbers / (width * rows.length);
  return { separator, decimal, width, share, numeric: counts.map((count) => 2 * count >= regular.length) };
}

/** A row without the empty fields that separators at its end make. */
export function withoutEnd(row: readonly string[]): string[] {
  let length = row.length;
  while (length > 1 && row[length - 1].trim() === "") length--;
  return row.slice(0, length);
}

function commonest(values: readonly number[]): number {
  const counts = new Map<number, number>();
  for (const value of values) counts.set(value, (counts.get(value) ?? 0) + 1);
  let best = 0;
  for (const [value, count] of counts) if (count > (counts.get(best) ?? 0)) best = value;
  return best;
}
