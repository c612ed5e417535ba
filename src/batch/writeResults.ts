import type { Engine } from "../engine/protocol.ts";
import type { CaseReduction } from "../engine/reduceCase.ts";
import type { ResultsFile } from "../export/resultsFile.ts";
import { resultsFile, resultsText } from "../export/resultsFile.ts";
import { safeFileNames } from "../export/safeFileNames.ts";
import { stationsCsv } from "../export/stationsCsv.ts";
import { compareSettings } from "../sheet/compareSettings.ts";
import { decaySettings } from "../sheet/decaySettings.ts";
import { defaultCaseSheet } from "../sheet/defaultCaseSheet.ts";
import type { LoadedCase } from "./loadCase.ts";
import type { Output } from "./openOutput.ts";

/** Names of all that is written for some cases: the results, then one table each. */
export function resultNames(cases: readonly LoadedCase[]): string[] {
  const names = safeFileNames(cases.map(({ sheet }) => sheet.case));
  return ["results.json", ...names.map((name) => `${name}-stations.csv`)];
}

/** Fits and compares reduced cases, and writes what was found. */
export async function writeResults(
  cases: readonly LoadedCase[],
  reduced: readonly CaseReduction[],
  engine: Engine,
  output: Output,
): Promise<void> {
  const results = await argue(cases, reduced, engine);
  const [whole, ...tables] = resultNames(cases);
  for (const [i, { settings }] of cases.entries())
    output.write(tables[i], stationsCsv(settings.case, results.argued[i].stations, settings));
  output.write(whole, resultsText(results.file));
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
