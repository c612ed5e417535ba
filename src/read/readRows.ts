import type { ReadSettings } from "../core/records.ts";
import type { ByteSource } from "./byteSource.ts";
import { commentText } from "./commentLine.ts";
import { type LineBytes, lineBytes } from "./lineBytes.ts";
import { nextLine } from "./nextLine.ts";
import { parseNumber } from "./parseNumber.ts";
import { badField, missingField, raggedRow, tooLarge } from "./rowFailures.ts";
import type { RowScanner } from "./rowScanner.ts";
import { scannerOf } from "./scannerOf.ts";
import { splitRows } from "./splitRows.ts";
import type { TableForm } from "./surveyTable.ts";
import type { TakenColumn } from "./takeColumns.ts";
import { inCaseUnit } from "./unitFactors.ts";
import { evenLines } from "./wholeLines.ts";

/** What is read of each row. A column that is `sparse` may be empty in a row: its number is NaN there. */
export interface RowPlan {
  readonly columns: readonly TakenColumn[];
  readonly sparse: readonly boolean[];
  readonly missing: ReadSettings["missing"];
}

/** How the reading went. */
export interface RowTally {
  readonly rows: number;
  /** 1-based lines between the rows that held none: comments, repeated headings, blank lines. */
  readonly leftOut: readonly number[];
  readonly leftOutCount: number;
  /** 1-based; null where the last row is whole. */
  readonly cutLine: number | null;
}

/** Nothing that was measured is as large; the fourth power of what is smaller is still a number. */
const largest = 1e60;

/** Enough lines left out to list; the rest is only counted. */
const listed = 100;

/** Most lines at a time that are read as fields of text once they have proved not to be plain rows. */
const mostLines = 2 ** 12;

/**
 * Streams the rows of a table as numbers in the units of the case. Plain rows are read from their bytes; lines
 * that are none are split into fields of text, more of them at a time where they follow one another.
 * @param onRow gets the numbers of a row in the order of `plan.columns`, in one array that is used again for the
 *              next row, and the row's 1-based line
 * @throws not-a-number a field that is none, a value that is missing, a row of another length
 */
export async function readRows(
  source: ByteSource,
  form: TableForm,
  plan: RowPlan,
  onRow: (values: Float64Array, line: number) => void,
  onBytes?: (bytes: number) => void,
): Promise<RowTally> {
  const reader = new RowReader(form, plan, onRow);
  for await (const chunk of lineBytes(source, onBytes)) reader.readLines(chunk);
  return reader.tally();
}

class RowReader {
  private readonly values: Float64Array;
  private readonly scanner: RowScanner | null;
  private readonly decoder = new TextDecoder();
  /** 1-based number of the line to come. */
  private line = 1;
  /** How many lines go the slow way at once when the next one does. */
  private slowLines = 1;
  private readonly noValue: ReadonlySet<string>;
  private readonly noNumber: readonly number[];
  private readonly headings: ReadonlySet<string>;
  private rows = 0;
  private leftOut: number[] = [];
  private leftOutCount = 0;
  private blank: number[] = [];
  private cutLine: number | null = null;

  constructor(
    private readonly form: TableForm,
    private readonly plan: RowPlan,
    private readonly onRow: (values: Float64Array, line: number) => void,
  ) {
    this.values = new Float64Array(plan.columns.length);
    this.scanner = scannerOf(form, plan);
    this.noValue = new Set([...alwaysMissing, ...plan.missing.map((token) => token.toLowerCase())]);
    this.headings = new Set(form.headingRows.map(words));
    this.noNumber = plan.missing.map(Number).filter((value) => !Number.isNaN(value));
  }

  /** Lines of the file, in order. */
  readLines({ bytes, length, unended }: LineBytes): void {
    let at = 0;
    if (unended) at = this.readSlowly(bytes, 0, length, true); // the scanner needs the end of a line to stop at
    while (at < length) {
      const scanner = this.line < this.form.firstLine ? null : this.scanner;
      const next = scanner === null ? -1 : scanner.scan(bytes, at);
      if (scanner === null || next < 0 || !this.takeScanned(scanner.values)) {
        at = this.readSlowly(bytes, at, length, false);
      } else {
        at = next;
        if (this.slowLines > 1) this.slowLines--;
      }
    }
  }

  /** The scanner's numbers as a row; false where one of them stands for no value. */
  private takeScanned(values: Float64Array): boolean {
    const { columns } = this.plan;
    for (let i = 0; i < columns.length; i++) {
      const value = values[i];
      if (!this.isMeasured(value)) return false;
      this.values[i] = (value * columns[i].times) / columns[i].per;
    }
    if (this.blank.length > 0) this.skip(...this.blank.splice(0));
    this.rows++;
    this.onRow(this.values, this.line++);
    return true;
  }

  private isMeasured(value: number): boolean {
    return (
      value < largest && value > -largest && (this.noNumber.length === 0 || !this.noNumber.includes(value))
    );
  }

  /** Some lines as text; where they end. */
  private readSlowly(bytes: Uint8Array, from: number, length: number, unended: boolean): number {
    let to = from;
    for (let lines = 0; lines < this.slowLines && to < length; lines++) to = nextLine(bytes, to, length);
    const text = evenLines(this.decoder.decode(bytes.subarray(from, to)));
    const lines = text.endsWith("\n") ? text.slice(0, -1) : text;
    for (const fields of splitRows(lines, this.form.separator)) this.read(fields, this.line++, unended);
    this.slowLines = Math.min(mostLines, 2 * this.slowLines);
    return to;
  }

  /** One line, in order. The common row is read without a look at what else the line could be. */
  private read(fields: string[], line: number, unended: boolean): void {
    if (line < this.form.firstLine) return;
    if (fields.length === this.form.width && !mayBeComment(fields[0]) && this.fill(fields)) {
      if (this.blank.length > 0) this.skip(...this.blank.splice(0));
      this.rows++;
      this.onRow(this.values, line);
    } else {
      this.odd(fields, line, unended);
    }
  }

  tally(): RowTally {
    const { rows, leftOut, leftOutCount, cutLine } = this;
    return { rows, leftOut, leftOutCount, cutLine };
  }

  private fill(fields: readonly string[]): boolean {
    const { columns } = this.plan;
    for (let i = 0; i < columns.length; i++) {
      const value = parseNumber(fields[columns[i].index], this.form.decimal);
      if (!this.isMeasured(value)) return false;
      this.values[i] = (value * columns[i].times) / columns[i].per;
    }
    return true;
  }

  private odd(fields: string[], line: number, unended: boolean): void {
    const { form } = this;
    if (fields.every((field) => field.trim() === "")) {
      this.blank.push(line);
    } else if (commentText(fields[0], form.separator) !== null || this.repeatsHeading(fields)) {
      this.skip(...this.blank.splice(0), line);
    } else {
      const whole = this.fitted(fields);
      const problem = whole === null ? raggedRow(form, fields, line) : this.problem(whole, line);
      if (problem === null) {
        if (this.blank.length > 0) this.skip(...this.blank.splice(0));
        this.rows++;
        this.onRow(this.values, line);
      } else if (unended) {
        this.cutLine = line;
      } else {
        throw problem;
      }
    }
  }

  /** The row in the table's width, empty fields at its end taken off or added; null where it has another. */
  private fitted(fields: string[]): string[] | null {
    const { width } = this.form;
    if (fields.length < width) {
      const lacks = this.plan.columns.some(({ index }, i) => index >= fields.length && !this.plan.sparse[i]);
      return lacks ? null : [...fields, ...Array.from({ length: width - fields.length }, () => "")];
    }
    return fields.slice(width).every((field) => field.trim() === "") ? fields.slice(0, width) : null;
  }

  /** Fills the row's numbers, gaps as NaN; tells what is wrong with the first field that cannot be read. */
  private problem(fields: readonly string[], line: number) {
    const { columns, sparse } = this.plan;
    for (let i = 0; i < columns.length; i++) {
      const { index } = columns[i];
      const value = parseNumber(fields[index], this.form.decimal);
      const gap = this.noValue.has(fields[index].trim().toLowerCase()) || this.noNumber.includes(value);
      if (gap && !sparse[i]) return missingField(this.form, columns[i], fields[index], line);
      if (!gap && Number.isNaN(value)) return badField(this.form, columns[i], fields[index], line);
      if (!gap && Math.abs(value) >= largest) return tooLarge(this.form, columns[i], fields[index], line);
      this.values[i] = gap ? Number.NaN : inCaseUnit(value, columns[i]);
    }
    return null;
  }

  private repeatsHeading(fields: readonly string[]): boolean {
    return this.form.headingRows.length > 0 && this.headings.has(words(fields));
  }

  private skip(...lines: number[]): void {
    this.leftOutCount += lines.length;
    for (const line of lines) if (this.leftOut.length < listed) this.leftOut.push(line);
  }
}

/** A heading may be parted by other signs than the rows. */
function words(fields: readonly string[]): string {
  return fields
    .join(" ")
    .replace(/[\s,;"]+/g, " ")
    .trim();
}

/** What programs write where they have no number. */
const alwaysMissing = [
  "",
  "-",
  "nan",
  "+nan",
  "-nan",
  "inf",
  "+inf",
  "-inf",
  "infinity",
  "na",
  "n/a",
  "null",
];

/** A row begins with a digit, a sign, a point, a blank or a quote; only what does not is looked at further. */
function mayBeComment(field: string): boolean {
  const code = field.charCodeAt(0);
  return code === 35 || code === 37 || code === 33 || code === 47 || code === 59; // # % ! / ;
}
