import { join, resolve } from "node:path";
import type { PlainFailure } from "../core/failure.ts";
import { failureText } from "../core/failure.ts";
import type { Engine } from "../engine/protocol.ts";
import { reduceCase } from "../engine/reduceCase.ts";
import { keptText, keptWork } from "./keptWork.ts";
import type { LoadedCase } from "./loadCase.ts";
import { loadCases } from "./loadCases.ts";
import { openOutput } from "./openOutput.ts";
import { progressLine } from "./progressLine.ts";
import type { BatchArguments } from "./readArguments.ts";
import { resultNames, writeResults } from "./writeResults.ts";

export interface BatchSurroundings {
  /** What paths are relative to. */
  readonly folder: string;
  readonly engine: Engine;
  /** Takes one line for the person who waits. */
  tell(line: string): void;
  now(): number;
}

/** What a run that was stopped left of its work, in the folder of the results. */
export const unfinishedName = "unfinished.bin";

/**
 * Sheets in, results out: every case read, reduced, fitted and compared with the first, then written. Files that an
 * earlier run into the same folder had reduced before it was stopped are not read again.
 * @returns true where all that was asked for could be used
 * @throws WrongArguments before any work, where the output cannot be written
 */
export async function runBatch(asked: BatchArguments, around: BatchSurroundings): Promise<boolean> {
  let sound = true;
  const fail = (failure: PlainFailure) => {
    sound = false;
    around.tell(failureText(failure));
  };
  const cases = loadCases(asked.sheets, around, fail);
  const folder = resolve(around.folder, asked.out);
  const output = openOutput(folder, resultNames(cases), inputsOf(asked.sheets, cases, around.folder));
  const kept = keptWork(join(folder, unfinishedName), around.tell);
  if (kept.found > 0) around.tell(keptText(kept.found));
  const progress = progressLine(around.tell, around.now);
  const files = cases.flatMap((each) => each.files);
  progress.expect(
    files.length,
    files.reduce((sum, { bytes }) => sum + bytes, 0),
  );
  const reduced = await Promise.all(
    cases.map((each) =>
      reduceCase(around.engine, each, {
        onProgress: progress.read,
        onFile: progress.fileDone,
        onFailure: (failure) => fail(inSheetsFolder(failure, each)),
        cache: { files: kept, stations: new Map() },
      }),
    ),
  );
  await writeResults(cases, reduced, around.engine, output);
  kept.clear();
  return sound;
}

/** Absolute paths of all that a run reads. */
export function inputsOf(sheets: readonly string[], cases: readonly LoadedCase[], folder: string): string[] {
  const records = cases.flatMap(({ files }) =>
    files.flatMap(({ content }) => ("path" in content ? [content.path] : [])),
  );
  return [...sheets.map((path) => resolve(folder, path)), ...records];
}

/** Names of files are relative to their sheet: with several sheets it is said which. */
export function inSheetsFolder(failure: PlainFailure, { path }: LoadedCase): PlainFailure {
  const file = failure.where.file === undefined ? path : `${path}: ${failure.where.file}`;
  return { ...failure, where: { ...failure.where, file } };
}
