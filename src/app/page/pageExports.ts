import { fitsTable } from "../../export/latex/fitsTable.ts";
import { stationsTable } from "../../export/latex/stationsTable.ts";
import { methodsText } from "../../export/methodsText.ts";
import { resultsFile, resultsText } from "../../export/resultsFile.ts";
import { safeFileNames } from "../../export/safeFileNames.ts";
import { stationsCsv } from "../../export/stationsCsv.ts";
import { decaySettings } from "../../sheet/decaySettings.ts";
import { writeCaseSheet } from "../../sheet/writeCaseSheet.ts";
import type { PageExports } from "../sections/TableSection.tsx";
import type { CaseView } from "../session/caseView.ts";
import type { Held } from "../session/session.ts";
import { download } from "./download.ts";

/** The files that are taken from the whole page: the same texts that the batch command writes, and those for a paper. */
export function pageExports(cases: readonly CaseView[], held: Held): PageExports {
  const names = safeFileNames(cases.map(({ name }) => name));
  const nameOf = (view: CaseView) => names[cases.indexOf(view)] ?? "case";
  const methods = () => methodsText(cases.map(methodsCase), held.argued?.comparisons ?? []);
  return {
    stationsLatex: (view) =>
      download(`${nameOf(view)}-stations.tex`, stationsLatex(view), "application/x-tex"),
    fitsLatex: () => download("fits.tex", fitsLatex(cases), "application/x-tex"),
    methods: () => methods().text,
    methodsText: () => download("methods.txt", methods().text),
    bibTeX: () => download("sources.bib", methods().bibTeX, "application/x-bibtex"),
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

function stationsLatex({ name, stations, decay, of }: CaseView): string {
  return stationsTable(name, stations, of.sheet, decay?.law ? decay.window : null);
}

function fitsLatex(cases: readonly CaseView[]): string {
  return fitsTable(
    cases.flatMap(({ name, decay, length, symbol, of }) =>
      decay?.law ? [{ name, decay, length, symbol, settings: of.sheet }] : [],
    ),
  );
}

const methodsCase = ({ name, stations, decay, of }: CaseView) => ({
  name,
  settings: of.sheet,
  stations,
  decay,
});
