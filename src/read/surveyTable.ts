import { ReductionFailure } from "../core/failure.ts";
import type { ReadSettings } from "../core/records.ts";
import { commentText } from "./commentLine.ts";
import { findHeading, namesColumns } from "./findHeading.ts";
import type { Heading } from "./heading.ts";
import type { Head } from "./readHead.ts";
import { type Dialect, recogniseDialect, withoutEnd } from "./recogniseDialect.ts";
import { splitRows } from "./splitRows.ts";

/** What a file's table looks like: all that must be known before its rows are read. */
export interface TableForm extends Omit<Dialect, "share"> {
  readonly file: string;
  /** 1-based line of the heading, 0 for none. */
  readonly headingLine: number;
  /** One for each column; empty names where the file has no heading. */
  readonly headings: readonly Heading[];
  /** Rows that repeat the heading after a restart are known by their fields. */
  readonly headingRows: readonly (readonly string[])[];
  /** 1-based line of the first row. */
  readonly firstLine: number;
  /** Lines above the first row that are neither heading nor blank, without comment marks. */
  readonly comments: readonly string[];
  /** The rows in the head of the file, as they stand there. */
  readonly headRows: readonly (readonly string[])[];
}
export type FormSettings = Pick<ReadSettings, "separator" | "decimal" | "heading">;

/** Enough lines to tell a dialect, from the end of the head: its beginning may be anything. */
const sniffed = 64;

/**
 * Recognises dialect, heading and first row of a table. What the settings give is not recognised but used.
 * @throws heading-only, not-a-record, ambiguous-columns
 */
export function surveyTable(head: Head, settings: FormSettings): TableForm {
  const after = settings.heading ?? 0;
  const written = head.lines.flatMap((line, i) =>
    line.trim() === "" || commentText(line, settings.separator) !== null || i < after ? [] : [line],
  );
  const dialects = recogniseDialect(written.slice(-sniffed), settings);
  if (dialects.length === 0) throw wordsForNumbers(head) ?? withoutNumbers(head);
  const near = dialects.filter(({ share }) => share > dialects[0].share - 0.02);
  const found = near.map((dialect) => ({ dialect, ...findHeading(head, dialect, settings.heading) }));
  const best = found.find(({ heading }) => heading !== null) ?? found[0];
  if (best.heading === null && !best.mismatch && settings.heading === null && best.dialect.share < 0.5) {
    throw withoutNumbers(head);
  }
  if (settings.decimal === null) refuseCommaForBoth(head, best.dialect, written);
  if (best.mismatch && best.heading === null) throw mismatch(head, best.mismatch, best.dialect);
  return formOf(head, best.dialect, best.heading, best.firstLine);
}

function formOf(
  head: Head,
  dialect: Dialect,
  heading: ReturnType<typeof findHeading>["heading"],
  firstLine: number,
): TableForm {
  const above = head.lines.slice(0, firstLine - 1);
  const comments = above.flatMap((line, i) => {
    if (line.trim() === "" || i + 1 === heading?.line || i + 1 === heading?.unitsLine) return [];
    return [commentText(line, dialect.separator) ?? line.trim()];
  });
  const rows = head.lines
    .slice(firstLine - 1)
    .filter((line) => line.trim() !== "" && commentText(line, dialect.separator) === null);
  const blank: Heading = { text: "", name: "", unit: null };
  const { share: _share, ...written } = dialect;
  return {
    ...written,
    file: head.file,
    headingLine: heading?.line ?? 0,
    headings: heading?.headings ?? Array.from({ length: dialect.width }, () => blank),
    headingRows: heading?.rows ?? [],
    firstLine,
    comments,
    headRows: rows.length === 0 ? [] : splitRows(rows.join("\n"), dialect.separator).map(withoutEnd),
  };
}

/** `0,02375,0,19375`: the comma may part columns, or stand in both numbers. Reading it either way is a guess. */
function refuseCommaForBoth(head: Head, dialect: Dialect, lines: readonly string[]): void {
  if (dialect.separator !== "," || dialect.decimal !== ".") return;
  const rows = splitRows(lines.slice(-sniffed).join("\n"), ",").map((row) =>
    row.map((field) => field.trim()),
  );
  const whole = rows.every((row) => row.every((field) => !/[.eE]/.test(field) || /[a-z]{2}/i.test(field)));
  const zeros = rows.some((row) => row.some((field) => /^[+-]?0\d+$/.test(field)));
  if (!whole || !zeros) return;
  throw new ReductionFailure(
    "ambiguous-columns",
    {
      message: "The comma parts the columns and may also be the decimal sign",
      found: lines[lines.length - 1],
      expected: "semicolons or tabs between the columns where the decimal sign is a comma",
      remedy: "Export the file with another separator, or with decimal points.",
    },
    { file: head.file, line: head.lines.lastIndexOf(lines[lines.length - 1]) + 1 },
  );
}

function mismatch(head: Head, at: { line: number; names: number }, dialect: Dialect): ReductionFailure {
  return new ReductionFailure(
    "ambiguous-columns",
    {
      message: "The heading does not fit the rows",
      found:
        at.names === dialect.width
          ? "numbers in place of names"
          : `${at.names} names above rows of ${dialect.width} columns`,
      expected: "one name for each column",
      remedy: "Mend the heading, or say which line is the heading and which columns are meant.",
    },
    { file: head.file, line: at.line },
  );
}

/** Lines under a heading of the trade, and not one number in them. */
function wordsForNumbers(head: Head): ReductionFailure | null {
  const written = head.lines.flatMap((line, i) =>
    line.trim() === "" || commentText(line, null) !== null ? [] : [{ line, at: i + 1 }],
  );
  for (const separator of [",", ";", "\t", " "] as const) {
    const heading = written.findIndex(({ line }) => namesColumns(splitRows(line, separator)[0]));
    const row = heading < 0 ? undefined : written[heading + 1];
    if (row) return noNumber(head.file, splitRows(row.line, separator)[0][0], row.at);
  }
  return null;
}

function noNumber(file: string, found: string, line: number): ReductionFailure {
  return new ReductionFailure(
    "not-a-number",
    {
      message: "No row holds a number",
      found: found.trim().slice(0, 40),
      expected: "a number",
      remedy: "Export the record again, or leave the file out.",
    },
    { file, line, column: 1 },
  );
}

/** No number anywhere: a heading without rows, or something else altogether. */
function withoutNumbers(head: Head): ReductionFailure {
  const written = head.lines.filter((line) => line.trim() !== "");
  const table = !/^\s*[{[<]/.test(written[0] ?? ""); // JSON or a page of the web
  const named = (table && written.length <= 2) || written.every((line) => commentText(line, null) !== null);
  const facts = named
    ? { message: "The file has a heading and no rows", found: written.at(-1)?.slice(0, 80) ?? "nothing" }
    : { message: "No line of numbers was found", found: written[0].slice(0, 80) };
  return new ReductionFailure(
    named ? "heading-only" : "not-a-record",
    {
      ...facts,
      expected: "one row of numbers in each line",
      remedy: named ? "Export the record again with its rows." : "Leave the file out; it is no record.",
    },
    { file: head.file, line: head.lines.findIndex((line) => line.trim() !== "") + 1 },
  );
}
