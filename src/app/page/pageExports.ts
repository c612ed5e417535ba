import { resultsFile, resultsText } from "../../export/resultsFile.ts";
import { safeFileNames } from "../../export/safeFileNames.ts";
import { stationsCsv } from "../../export/stationsCsv.ts";
import { decaySettings } from "../../sheet/decaySettings.ts";
import { writeCaseSheet } from "../../sheet/writeCaseSheet.ts";
import type { PageExports } from "../sections/TableSection.tsx";
import type { CaseView } from "../session/caseView.ts";
import type { Held } from "../session/session.ts";
import { download } from "./download.ts";

/** The files that are taken from the whole page: the same texts that the batch command writes. */
export function pageExports(cases: readonly CaseView[], held: Held): PageExports {
  const names = safeFileNames(cases.map(({ name }) => name));
  const nameOf = (view: CaseView) => names[cases.indexOf(view)] ?? "case";
  return {
    stations: (view) =>
      download(
        `${nameOf(view)}-stations.csv`,
        stationsCsv(view.name, view.stations, view.of.sheet),
        "text/csv",
      ),
    sheets: (view) => download(`${nameOf(view)}.json`, writeCaseSheet(view.of.sheet), "application/json"),
    results: () =>
      download(
        "results.json",
        resultsText(resultsFile(cases.flatMap(resultOf), held.argued?.comparisons ?? [])),
        "application/json",
      ),
  };
}

function resultOf({ name, stations, decay, of, reduced }: CaseView) {
  if (decay === null || reduced === null) return [];
  return [
    {
      argued: { name, stations, decay, decaySettings: decaySettings(of.sheet) },
      settings: of.sheet,
      sources: reduced.sources,
      flags: reduced.flags,
    },
  ];
}
