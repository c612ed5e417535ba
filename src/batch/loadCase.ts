import { readFileSync, statSync } from "node:fs";
import { dirname, resolve } from "node:path";
import type { PlainFailure } from "../core/failure.ts";
import { ReductionFailure } from "../core/failure.ts";
import type { SourceFile } from "../engine/protocol.ts";
import type { CaseFiles } from "../engine/reduceCase.ts";
import type { CaseSheet, SheetFile } from "../sheet/caseSheet.ts";
import { expandPaths } from "../sheet/matchFiles.ts";
import { readCaseSheet } from "../sheet/readCaseSheet.ts";
import { candidateFiles } from "./candidateFiles.ts";

/** A case sheet with the files that it names. */
export interface LoadedCase extends CaseFiles {
  /** As the user named it on the command line. */
  readonly path: string;
  /** The sheet as written, every default filled in, `*` and all. */
  readonly settings: CaseSheet;
  readonly warnings: readonly string[];
  /** Paths of the sheet that no file answers to. */
  readonly failures: readonly PlainFailure[];
}

/**
 * Reads a case sheet from disk and finds its files, relative to it.
 * @param path   as given
 * @param folder what it is relative to
 * @throws missing-file, unreadable-file, sheet-not-json, sheet-invalid
 */
export function loadCase(path: string, folder: string): LoadedCase {
  const full = resolve(folder, path);
  const { sheet, warnings } = readCaseSheet(sheetText(path, full), path);
  const home = dirname(full);
  const patterns = sheet.files.map((entry) => entry.path);
  const available = [...new Set(patterns.flatMap((pattern) => candidateFiles(home, pattern)))];
  const matched = expandPaths(patterns, available);
  const entries = matched.flatMap(({ paths }, i) =>
    paths.map((each): SheetFile => ({ path: each, x: sheet.files[i].x })),
  );
  return {
    path,
    settings: sheet,
    sheet: { ...sheet, files: entries },
    files: entries.map((entry) => sourceFile(home, entry.path)),
    warnings,
    failures: matched.flatMap(({ pattern, paths }, i) =>
      paths.length > 0
        ? []
        : [taken(home, pattern) ? namedTwice(path, pattern, i) : notFound(path, pattern, i)],
    ),
  };
}

function sheetText(path: string, full: string): string {
  try {
    return readFileSync(full, "utf8");
  } catch (error) {
    const code = error instanceof Error && "code" in error ? String(error.code) : "unknown";
    const gone = code === "ENOENT";
    throw new ReductionFailure(
      gone ? "missing-file" : "unreadable-file",
      {
        message: gone ? "The case sheet is not there" : "The system would not let the case sheet be read",
        ...(gone ? {} : { found: code }),
        remedy: "Mend the path; it is taken from the folder the command was called in.",
      },
      { file: path },
    );
  }
}

function sourceFile(home: string, name: string): SourceFile {
  const path = resolve(home, name);
  const { size, mtimeMs } = statSync(path);
  return { name, bytes: size, fingerprint: `${path} ${size} ${mtimeMs}`, content: { path } };
}

function notFound(sheet: string, pattern: string, i: number): PlainFailure {
  const many = pattern.includes("*");
  return {
    code: "missing-file",
    message: many ? "No file answers to this path" : "The file is not there",
    found: pattern,
    remedy: "Mend the path; it is relative to the sheet.",
    where: { file: sheet, key: `files[${i}].path` },
  };
}

/** Files answer to a path, but an earlier one of the sheet has all of them. */
function taken(home: string, pattern: string): boolean {
  return candidateFiles(home, pattern).length > 0;
}

function namedTwice(sheet: string, pattern: string, i: number): PlainFailure {
  return {
    code: "duplicate-file",
    message: "An earlier path of the sheet names this file already, and the first holds",
    found: pattern,
    remedy: "Leave one of the two out; put the path of a single file before one with *.",
    where: { file: sheet, key: `files[${i}].path` },
  };
}
