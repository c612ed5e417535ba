import type { Separator } from "../core/records.ts";
import { commentText } from "./commentLine.ts";
import { type Heading, parseHeading, parseUnit } from "./heading.ts";
import { parseNumber } from "./parseNumber.ts";
import type { Head } from "./readHead.ts";
import { recogniseColumns } from "./recogniseColumns.ts";
import { type Dialect, withoutEnd } from "./recogniseDialect.ts";
import { splitRows } from "./splitRows.ts";

/** A heading, its units row if it has one, and where the rows begin. */
export interface FoundHeading {
  readonly heading: {
    readonly line: number;
    /** 0: units stand in the heading, or nowhere. */
    readonly unitsLine: number;
    readonly headings: readonly Heading[];
    readonly rows: readonly (readonly string[])[];
  } | null;
  /** 1-based. */
  readonly firstLine: number;
  /** A line that is clearly meant as a heading and has too many or too few names. */
  readonly mismatch: { readonly line: number; readonly names: number } | null;
}

interface Line {
  /** 1-based. */
  readonly at: number;
  readonly text: string;
  readonly comment: boolean;
  readonly row: readonly string[];
}

/**
 * Finds the heading above the rows: the nearest line above the first run of rows that names columns, commented
 * out or not, and a row of units under it. Lines between heading and run are rows: a bad one is not skipped.
 * @param given 1-based line of the heading, 0: there is none; null: recognised
 */
export function findHeading(head: Head, dialect: Dialect, given: number | null): FoundHeading {
  const lines = linesOf(head, dialect.separator);
  const run = firstRun(lines, dialect);
  if (given === 0) return { heading: null, firstLine: firstRow(lines, run, dialect), mismatch: null };
  const above = lines.slice(0, run).reverse();
  const named = given === null ? nearest(above, dialect) : lines.find(({ at }) => at === given);
  const names = named && namesOf(named, dialect.width);
  if (!named || !names) {
    const mismatched = given === null ? above.find((line) => misfit(line, dialect)) : named;
    const found = mismatched && { line: mismatched.at, names: withoutEnd(mismatched.row).length };
    return { heading: null, firstLine: firstRow(lines, run, dialect), mismatch: found ?? null };
  }
  const next = lines.find(({ at }) => at > named.at);
  const units = next && unitsOf(next, dialect.width);
  const headings = names.map(parseHeading).map((heading, i) => {
    const unit = units?.[i] ?? null;
    return heading.unit !== null || unit === null || unit === "" ? heading : { ...heading, unit };
  });
  const last = units && next ? next : named;
  const first = lines.find((line) => line.at > last.at && !line.comment);
  return {
    heading: {
      line: named.at,
      unitsLine: last === named ? 0 : last.at,
      headings,
      rows: last === named ? [names] : [names, withoutEnd(last.row)],
    },
    firstLine: first?.at ?? head.lines.length + 1,
    mismatch: null,
  };
}

function linesOf(head: Head, separator: Separator): Line[] {
  return head.lines.flatMap((line, i) => {
    if (line.trim() === "") return [];
    const comment = commentText(line, separator);
    return [lineOf(i + 1, comment ?? line, comment !== null, separator)];
  });
}

/** Its fields are told apart when they are asked for: of most lines nobody asks. */
function lineOf(at: number, text: string, comment: boolean, separator: Separator): Line {
  let row: readonly string[] | null = null;
  return {
    at,
    text,
    comment,
    get row() {
      row ??= splitRows(text, separator)[0];
      return row;
    },
  };
}

/** Index of the first line that begins three rows in a row (fewer at the file's end). */
function firstRun(lines: readonly Line[], dialect: Dialect): number {
  const rows = lines.map((line, i) => ({ i, line })).filter(({ line }) => !line.comment);
  const at = rows.findIndex((_, i) => rows.slice(i, i + 3).every(({ line }) => isRow(line, dialect)));
  return at < 0 ? lines.length : rows[at].i;
}

function isRow(line: Line, dialect: Dialect): boolean {
  const row = withoutEnd(line.row);
  return (
    row.length === dialect.width && row.every((field, i) => !dialect.numeric[i] || isNumber(field, dialect))
  );
}

/** Without a heading: rows that are only partly numbers, just above the run, belong to it. */
function firstRow(lines: readonly Line[], run: number, dialect: Dialect): number {
  let first = run;
  for (let i = run - 1; i >= 0; i--) {
    if (lines[i].comment) continue;
    const row = withoutEnd(lines[i].row);
    const numbers = row.filter((field) => isNumber(field, dialect)).length;
    if (row.length !== dialect.width || 2 * numbers < row.length) break;
    first = i;
  }
  return lines[first]?.at ?? 1;
}

/** The nearest line above that names a column of the trade; failing that, the nearest of the right length. */
function nearest(above: readonly Line[], { width }: Dialect): Line | undefined {
  const fitting = above.filter((line) => namesOf(line, width) !== null);
  const known = fitting.find((line) => knownRoles(namesOf(line, width) ?? []) > 0);
  return known ?? fitting.find((line) => !line.comment && width > 1 && unitsOf(line, width) === null);
}

function misfit(line: Line, dialect: Dialect): boolean {
  if (line.comment) return false;
  const row = withoutEnd(line.row);
  return row.every((field) => !isNumber(field, dialect)) && namesColumns(row);
}

/** True of names that are clearly meant as a heading: two or more, and half of them the trade's. */
export function namesColumns(names: readonly string[]): boolean {
  const known = knownRoles(names);
  return known > 1 && 2 * known >= names.length;
}

/** How many of some names are columns of the trade. */
function knownRoles(names: readonly string[]): number {
  const { roles, clashes } = recogniseColumns(names.map(parseHeading), null);
  return roles.filter((role) => role !== null).length + clashes.length;
}

/** The line as `width` names, whatever parts them; null where it cannot be or where a name is a number. */
function namesOf(line: Line, width: number): readonly string[] | null {
  const ways = [
    () => withoutEnd(line.row),
    () => withoutEnd(splitRows(line.text, "\t")[0]),
    () => withoutEnd(splitRows(line.text, ";")[0]),
    () => withoutEnd(splitRows(line.text, ",")[0]),
    () => line.text.trim().split(/\s{2,}/),
    () => withoutEnd(splitRows(line.text, " ")[0]),
    () => line.text.trim().split(/\s+(?![[(])/),
  ];
  for (const way of ways) {
    const names = way().map((name) => name.trim());
    if (names.length === width && names.every(isName)) return names;
  }
  return null;
}

function unitsOf(line: Line, width: number): readonly (string | null)[] | null {
  const row = withoutEnd(line.row);
  if (row.length !== width && !line.comment) return null;
  const fields = row.length === width ? row : withoutEnd(splitRows(line.text, " ")[0]);
  if (fields.length !== width || fields.some((field) => isPlainNumber(field))) return null;
  const units = fields.map(parseUnit);
  return units.every((unit) => unit !== null) && units.some((unit) => unit !== "") ? units : null;
}

/** `nan` stands for a number that is not there: it names no column. */
function isName(text: string): boolean {
  return text !== "" && Number.isNaN(Number(text)) && !/^[+-]?(nan|na|inf)$/i.test(text);
}

function isNumber(field: string, { decimal }: Dialect): boolean {
  return !Number.isNaN(parseNumber(field, decimal));
}

function isPlainNumber(field: string): boolean {
  return field.trim() !== "" && !Number.isNaN(Number(field));
}
