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
      remedy: absent ? `Add ${key} to the sheet.` : `Mend ${key} in the sheet.`,
    },
    { file, key },
  );
}

/** `files[2].path`, as it would be written. */
function keyOf(issue: v.BaseIssue<unknown>): string {
  const parts = (issue.path ?? []).map(({ key }) =>
    typeof key === "number" ? `[${key}]` : `.${String(key)}`,
  );
  return parts.join("").replace(/^\./, "") || "(the whole sheet)";
}

function shown(value: unknown): string {
  const text = JSON.stringify(value) ?? String(value);
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
