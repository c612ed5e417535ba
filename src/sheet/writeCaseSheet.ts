import type { CaseSheet } from "./caseSheet.ts";
import { defaultCaseSheet } from "./defaultCaseSheet.ts";

/**
 * A case sheet as JSON text, without what equals the default: reading it gives the same sheet again.
 * `case`, `layout` and `files` always stand in it.
 */
export function writeCaseSheet(sheet: CaseSheet): string {
  const { case: name, layout, files, ...rest } = sheet;
  const written = {
    case: name,
    layout,
    ...differing(rest, defaultCaseSheet),
    files: files.map(({ path, x }) => (x === null ? { path } : { path, x })),
  };
  return `${JSON.stringify(written, null, 2)}\n`;
}

function differing(value: object, standard: object): object {
  return Object.fromEntries(
    Object.entries(value).flatMap(([key, mine]) => {
      const theirs: unknown = (standard as Readonly<Record<string, unknown>>)[key];
      if (JSON.stringify(mine) === JSON.stringify(theirs)) return [];
      return [[key, isPart(mine) && isPart(theirs) ? differing(mine, theirs) : mine]];
    }),
  );
}

function isPart(value: unknown): value is object {
  return value !== null && typeof value === "object" && !Array.isArray(value);
}
