// A document of all that the program writes for LaTeX, about the demo: node bundle.mjs > document.tex
import { argueCases } from "../../src/core/compare/argueCases.ts";
import { fitsTable } from "../../src/export/latex/fitsTable.ts";
import { stationsTable } from "../../src/export/latex/stationsTable.ts";
import { texText } from "../../src/export/latex/texText.ts";
import { methodsText } from "../../src/export/methodsText.ts";
import { compareSettings } from "../../src/sheet/compareSettings.ts";
import { decaySettings } from "../../src/sheet/decaySettings.ts";
import { reduceSheet } from "../sampleData/reduceSheet.ts";

const reduced = await Promise.all(
  ["screen.json", "simulation.json"].map((name) => reduceSheet(name, "sample-data")),
);
const { cases, comparisons } = argueCases(
  reduced.map(({ sheet, stations }) => ({ name: sheet.case, stations, settings: decaySettings(sheet) })),
  compareSettings(reduced[0].sheet),
);
const described = cases.map(({ name, stations, decay }, i) => ({
  name,
  stations,
  decay,
  settings: reduced[i].sheet,
  length: reduced[i].sheet.reference.length,
  symbol: reduced[i].sheet.reference.symbol,
}));
const methods = methodsText(described, comparisons);
const tex = [
  "\\documentclass{article}",
  "\\usepackage{booktabs}",
  "\\begin{document}",
  ...described.map(({ name, stations, settings, decay }) =>
    stationsTable(name, stations, settings, decay.window),
  ),
  fitsTable(described),
  texText(methods.text),
  "\\nocite{*}\\bibliographystyle{plain}\\bibliography{sources}",
  "\\end{document}",
].join("\n");
console.log(JSON.stringify({ tex, bib: methods.bibTeX }));
