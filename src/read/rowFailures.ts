import { ReductionFailure } from "../core/failure.ts";
import type { TableForm } from "./surveyTable.ts";
import type { TakenColumn } from "./takeColumns.ts";

/** A field that is no number: `6.1.4`. */
export function badField(
  form: TableForm,
  column: TakenColumn,
  found: string,
  line: number,
): ReductionFailure {
  return new ReductionFailure(
    "not-a-number",
    {
      message: `\`${shown(found)}\` is not a number`,
      found: shown(found),
      expected: `a number for ${column.role}`,
      remedy: "Mend the line or leave it out, or choose another column.",
    },
    { file: form.file, line, column: column.index + 1 },
  );
}

/** A number beyond all measurement: most often what a program writes for "no value". */
export function tooLarge(
  form: TableForm,
  column: TakenColumn,
  found: string,
  line: number,
): ReductionFailure {
  return new ReductionFailure(
    "not-a-number",
    {
      message: "The number is too large to be a measurement",
      found: shown(found),
      expected: `a number for ${column.role} below 1e60`,
      remedy:
        "Mend the line or leave it out; if it stands for no value, name it under read.missing in the sheet.",
    },
    { file: form.file, line, column: column.index + 1 },
  );
}

/** A field without a value: nothing, `NaN`, or what the sheet calls missing. */
export function missingField(
  form: TableForm,
  column: TakenColumn,
  found: string,
  line: number,
): ReductionFailure {
  return new ReductionFailure(
    "not-a-number",
    {
      message: "A value is missing",
      found: found.trim() === "" ? "an empty field" : shown(found),
      expected: `a number for ${column.role}`,
      remedy: "A gap is never filled in: cut the record before it, or leave the file out.",
    },
    { file: form.file, line, column: column.index + 1 },
  );
}

/** A row that is longer or shorter than the table. */
export function raggedRow(form: TableForm, fields: readonly string[], line: number): ReductionFailure {
  return new ReductionFailure(
    "not-a-number",
    {
      message: "The row has another length than the table",
      found: `${fields.length} ${fields.length === 1 ? "field" : "fields"}`,
      expected: `${form.width}`,
      remedy: "Mend the line or leave it out.",
    },
    {
      file: form.file,
      line,
      column: Math.min(fields.length, form.width) + (fields.length < form.width ? 0 : 1),
    },
  );
}

function shown(field: string): string {
  const text = field.trim();
  return text.length > 40 ? `${text.slice(0, 40)}…` : text;
}
