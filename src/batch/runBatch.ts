import { resolve } from "node:path";
import type { PlainFailure } from "../core/failure.ts";
import { failureText, ReductionFailure } from "../core/failure.ts";
import type { Engine } from "../engine/protocol.ts";
import type { CaseReduction } from "../engine/reduceCase.ts";
import { reduceCase } from "../engine/reduceCase.ts";
import type { ResultsFile } from "../export/resultsFile.ts";
import { resultsFile, resultsText } from "../export/resultsFile.ts";
import { safeFileNames } from "../export/safeFileNames.ts";
import { stationsCsv } from "../export/stationsCsv.ts";
import { compareSettings } from "../sheet/compareSettings.ts";
import { decaySettings } from "../sheet/decaySettings.ts";
import { defaultCaseSheet } from "../sheet/defaultCaseSheet.ts";
import type { LoadedCase } from "./loadCase.ts";
import { loadCase } from "./loadCase.ts";
import { openOutput } from "./openOutput.ts";
import { progressLine } from "./progressLine.ts";
import type { BatchArguments } from "./readArguments.ts";

export interface BatchSurroundings {
  /** What paths are relative to. */
  readonly folder: string;
  readonly engine: Engine;
  /** Takes one line for the person who waits. */
  tell(line: string): void;
  now(): number;
}

/**
 * Sheets in, results out: every case read, reduced, fitted and compared with the first, then written.
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
  const names = safeFileNames(cases.map(({ sheet }) => sheet.case));
  const inputs = [
    ...asked.sheets.map((path) => resolve(around.folder, path)),
    ...cases.flatMap(({ files }) =>
      files.flatMap(({ content }) => ("path" in content ? [content.path] : [])),
    ),
  ];
  const tables = names.map((name) => `${name}-stations.csv`);
  const output = openOutput(resolve(around.folder, asked.out), ["results.json", ...tables], inputs);
  const reduced = await reduceAll(cases, around, fail);
  const results = await argue(cases, reduced, around.engine);
  for (const [i, { settings }] of cases.entries())
    output.write(tables[i], stationsCsv(settings.case, results.argued[i].stations, settings));
  output.write("results.json", resultsText(results.file));
  return sound;
}

function loadCases(
  sheets: readonly string[],
  { folder, tell }: BatchSurroundings,
  fail: (failure: PlainFailure) => void,
): LoadedCase[] {
  const loaded = new Map<string, LoadedCase>();
  for (const path of sheets) {
    try {
      const each = loadCase(path, folder);
      each.warnings.forEach(tell);
      const same = loaded.get(each.sheet.case);
      if (same) throw twice(each, same);
      loaded.set(each.sheet.case, each);
      each.failures.forEach(fail);
    } catch (error) {
      if (!(error instanceof ReductionFailure)) throw error;
      fail(error.at({ file: path }).plain());
    }
  }
  return [...loaded.values()];
}

function twice(later: LoadedCase, earlier: LoadedCase): ReductionFailure {
  return new ReductionFailure(
    "duplicate-case",
    {
      message: `Two cases have one name, and ${earlier.path} has it already`,
      found: later.sheet.case,
      remedy: "Give this case another name.",
    },
    { file: later.path, key: "case" },
  );
}

function reduceAll(
  cases: readonly LoadedCase[],
  { engine, tell, now }: BatchSurroundings,
  fail: (failure: PlainFailure) => void,
): Promise<CaseReduction[]> {
  const progress = progressLine(tell, now);
  const files = cases.flatMap((each) => each.files);
  progress.expect(
    files.length,
    files.reduce((sum, { bytes }) => sum + bytes, 0),
  );
  return Promise.all(
    cases.map((each) =>
      reduceCase(engine, each, {
        onProgress: progress.read,
        onFile: progress.fileDone,
        onFailure: (failure) => fail(inSheetsFolder(failure, each)),
      }),
    ),
  );
}

/** Names of files are relative to their sheet: with several sheets it is said which. */
function inSheetsFolder(failure: PlainFailure, { path }: LoadedCase): PlainFailure {
  const file = failure.where.file === undefined ? path : `${path}: ${failure.where.file}`;
  return { ...failure, where: { ...failure.where, file } };
}

async function argue(cases: readonly LoadedCase[], reduced: readonly CaseReduction[], engine: Engine) {
  const argument = await engine.run("argue", {
    cases: cases.map(({ sheet }, i) => ({
      name: sheet.case,
      stations: reduced[i].stations,
      settings: decaySettings(sheet),
    })),
    compare: compareSettings(cases[0]?.sheet ?? defaultCaseSheet),
  });
  const file: ResultsFile = resultsFile(
    argument.cases.map((argued, i) => ({
      argued,
      settings: cases[i].settings,
      sources: reduced[i].sources,
      flags: reduced[i].flags,
    })),
    argument.comparisons,
  );
  return { argued: argument.cases, file };
}
