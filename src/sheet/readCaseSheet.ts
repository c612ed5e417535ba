import * as v from "valibot";
import { ReductionFailure } from "../core/failure.ts";
import type { CaseSheet } from "./caseSheet.ts";
import { caseSheetSchema } from "./caseSheetSchema.ts";
import { jsonFault } from "./jsonFault.ts";
import { unknownKeys } from "./unknownKeys.ts";

/** A sheet with every default filled in, and what in its text was not understood. */
export interface ReadSheet {
  readonly sheet: CaseSheet;
  /** One sentence for each key that is not known. */
  readonly warnings: string[];
}

/**
 * Reads and checks a case sheet.
 * @param text what stands in the file
 * @param file its name, for messages
 * @throws sheet-not-json with line and column; sheet-invalid with the key
 */
export function readCaseSheet(text: string, file: string): ReadSheet {
  const value = parseJson(text, file);
  const result = v.safeParse(caseSheetSchema, value);
  if (!result.success) throw invalid(result.issues, file);
  const sheet = result.output as CaseSheet;
  if (sheet.along === "t" && sheet.layout !== "profile") throw alongTime(file);
  const warnings = unknownKeys(caseSheetSchema, value).map(
    (key) => `${file}: key ${key} is not known and was not used`,
  );
  const placed = sheet.layout === "profile" ? sheet.files.findIndex(({ x }) => x !== null) : -1;
  if (placed >= 0)
    warnings.push(`${file}: key files[${placed}].x was not used, since each row of a profile has its own`);
  return { sheet, warnings };
}

/**
 * The value a JSON text holds.
 * @throws sheet-not-json with line and column
 */
export function parseJson(text: string, file: string): unknown {
  const plain = text.replace(/^\ufeff/, "");
  try {
    return JSON.parse(plain);
  } catch {
    if (plain.includes("\0")) throw notUtf8(file);
    const { line, column, found } = jsonFault(plain);
    throw new ReductionFailure(
      "sheet-not-json",
      {
        message: "The case sheet is not valid JSON",
        found,
        remedy: "Mend the sheet there: a comma, a quote or a bracket is missing or too many.",
      },
      { file, line, column },
    );
  }
}

function invalid(issues: readonly v.BaseIssue<unknown>[], file: string): ReductionFailure {
  const [first] = issues;
  const key = keyOf(first);
  const others = [...new Set(issues.slice(1).map(keyOf))].filter((other) => other !== key);
  const also = others.length > 0 ? `; also wrong: ${others.join(", ")}` : "";
  const absent = first.input === undefined;
  return new ReductionFailure(
    "sheet-invalid",
    {
      message: `${absent ? "A key is missing from the case sheet" : "A value in the case sheet cannot be used"}${also}`,
      found: absent ? "nothing" : shown(first.input),
      expected: absent && first.message.startsWith("Invalid key") ? "a value" : first.message,
      remedy: absent ? `Add ${key} to the sheet.` : `Mend ${key === whole ? "it" : key} in the sheet.`,
    },
    { file, key },
  );
}

const whole = "(the whole sheet)";

/** `files[2].path`, as it would be written. */
function keyOf(issue: v.BaseIssue<unknown>): string {
  const parts = (issue.path ?? []).map(({ key }) =>
    typeof key === "number" ? `[${key}]` : `.${String(key)}`,
  );
  return parts.join("").replace(/^\./, "") || whole;
}

/** One level of it: what is nested a hundred thousand deep cannot be written out. */
function shown(value: unknown): string {
  if (typeof value === "number") return String(value); // 1e999 is a number in JSON, and infinite
  const nested = (inner: unknown) => inner !== value && inner instanceof Object;
  const text = JSON.stringify(value, (_, inner: unknown) => (nested(inner) ? "…" : inner)) ?? String(value);
  return text.length > 60 ? `${text.slice(0, 60)}…` : text;
}

function alongTime(file: string): ReductionFailure {
  return new ReductionFailure(
    "sheet-invalid",
    {
      message: "A decay in time is read from a profile",
      found: '"t" with another layout',
      expected: 'along "x", or layout "profile"',
      remedy: "Mend along or layout in the sheet.",
    },
    { file, key: "along" },
  );
}

function notUtf8(file: string): ReductionFailure {
  return new ReductionFailure(
    "sheet-not-json",
    {
      message: "The case sheet is not UTF-8 text",
      found: "zero bytes, as in UTF-16 or a binary file",
      remedy: "Save the sheet as UTF-8.",
    },
    { file },
  );
}
