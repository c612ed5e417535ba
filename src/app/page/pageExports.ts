import { fitsTable } from "../../export/latex/fitsTable.ts";
import { stationsTable } from "../../export/latex/stationsTable.ts";
import { methodsText } from "../../export/methodsText.ts";
import { resultsFile, resultsText } from "../../export/resultsFile.ts";
import { safeFileNames } from "../../export/safeFileNames.ts";
import { stationsCsv } from "../../export/stationsCsv.ts";
import type { ArchiveFile } from "../../export/zipFiles.ts";
import { decaySettings } from "../../sheet/decaySettings.ts";
import { writeCaseSheet } from "../../sheet/writeCaseSheet.ts";
import { keptPage } from "../keeping/keptPage.ts";
import type { PageExports } from "../sections/TableSection.tsx";
import type { CaseView } from "../session/caseView.ts";
import type { Held } from "../session/session.ts";
import { download } from "./download.ts";

/** The files that are taken from the whole page: the same texts that the batch command writes, and those for a paper. */
export function pageExports(cases: readonly CaseView[], held: Held): PageExports {
  const names = safeFileNames(cases.map(({ name }) => name));
  const nameOf = (view: CaseView) => names[cases.indexOf(view)] ?? "case";
  const comparisons = held.argued?.comparisons ?? [];
  const methods = () => methodsText(cases.map(methodsCase), comparisons);
  const resultsJson = () => resultsText(resultsFile(cases.flatMap(resultOf), comparisons));
  return {
    everything: async () => {
      const [{ zipFiles }, { figureFiles }, { workspaceText }] = await Promise.all([
        import("../../export/zipFiles.ts"),
        import("./figureFiles.ts"),
        import("../keeping/workspaceFile.ts"),
      ]);
      const { text, bibTeX } = methods();
      const ofCase = (view: CaseView): ArchiveFile[] => [
        { path: `${nameOf(view)}.json`, content: writeCaseSheet(view.of.sheet) },
        {
          path: `${nameOf(view)}-stations.csv`,
          content: stationsCsv(view.name, view.stations, view.of.sheet),
        },
        { path: `${nameOf(view)}-stations.tex`, content: stationsLatex(view) },
      ];
      const archive = zipFiles([
        ...cases.flatMap(ofCase),
        { path: "results.json", content: resultsJson() },
        { path: "fits.tex", content: fitsLatex(cases) },
        { path: "methods.txt", content: text },
        { path: "sources.bib", content: bibTeX },
        { path: "page.workspace.json", content: workspaceText(keptPage(held)) },
        ...(await figureFiles()),
      ]);
      download("waneline.zip", new Blob([archive.slice()], { type: "application/zip" }));
    },
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
    results: () => download("results.json", resultsJson(), "application/json"),
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
