import { useState } from "react";
import { say } from "../../export/sentences/piece.ts";
import { sectionOf } from "../page/sectionList.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Finding } from "./Finding.tsx";
import { SectionFrame } from "./SectionFrame.tsx";
import { StationTable } from "./StationTable.tsx";

const lead = say`Every number of this page, with its interval and the choices behind it, can be taken along.`;

/** What can be taken from the whole page. */
export interface PageExports {
  readonly stations: (view: CaseView) => void;
  readonly sheets: (view: CaseView) => void;
  readonly results: () => void;
  /** All of it in one archive, the figures too. */
  readonly everything: () => Promise<void>;
  readonly stationsLatex: (view: CaseView) => void;
  readonly fitsLatex: () => void;
  readonly methodsText: () => void;
  readonly bibTeX: () => void;
  /** The methods paragraphs themselves. */
  readonly methods: () => string;
}

/** The stations of one case after the other, and the files to take along. */
export function TableSection({
  cases,
  exports,
  onHover,
}: {
  cases: readonly CaseView[];
  exports: PageExports;
  onHover: (caseId: string, x: number | null) => void;
}) {
  const [chosen, choose] = useState<string | null>(null);
  const view = cases.find(({ id }) => id === chosen) ?? cases[0];
  const [packing, setPacking] = useState<string | null>(null);
  const pack = async () => {
    setPacking("at work");
    try {
      await exports.everything();
      setPacking(null);
    } catch (error) {
      setPacking(`The archive could not be made: ${error instanceof Error ? error.message : error}.`);
    }
  };
  return (
    <SectionFrame section={sectionOf("table")} notes={[figureNote]}>
      <Finding sentences={[lead]} />
      <div className="table-lead">
        <div className="case-switch">
          {cases.map(({ id, name, mark }) => (
            <button
              type="button"
              className="action"
              key={id}
              aria-pressed={id === view.id}
              onClick={() => choose(id)}
            >
              <CaseMark mark={mark} line={id === view.id} /> {name}
            </button>
          ))}
        </div>
        <span>grey: outside the fit window · –: no interval</span>
      </div>
      <StationTable view={view} onHover={(x) => onHover(view.id, x)} />
      <div className="exports">
        <button type="button" className="action" onClick={() => exports.stations(view)}>
          Stations of {view.name}, CSV
        </button>
        <button type="button" className="action" onClick={() => exports.sheets(view)}>
          Case sheet of {view.name}, JSON
        </button>
        <button type="button" className="action" onClick={exports.results}>
          Results, JSON
        </button>
        <button type="button" className="action" onClick={() => exports.stationsLatex(view)}>
          Stations of {view.name}, LaTeX
        </button>
        <button type="button" className="action" onClick={exports.fitsLatex}>
          Fits, LaTeX
        </button>
        <button type="button" className="action" onClick={exports.methodsText}>
          Methods, text
        </button>
        <button type="button" className="action" onClick={exports.bibTeX}>
          Sources, BibTeX
        </button>
        <button type="button" className="action" onClick={() => void pack()} disabled={packing === "at work"}>
          {packing === "at work" ? "Everything is being packed" : "Everything, zip"}
        </button>
        {packing !== null && packing !== "at work" && <span role="alert">{packing}</span>}
      </div>
      <h3 className="methods-head">Methods</h3>
      <div className="methods-text">
        {exports
          .methods()
          .trim()
          .split("\n\n")
          .map((paragraph) => (
            <p key={paragraph}>{paragraph}</p>
          ))}
      </div>
    </SectionFrame>
  );
}

const figureNote = {
  name: "Figures",
  body: (
    <>
      <dl className="choice-list">
        <dt>widths</dt>
        <dd>86 and 178 mm</dd>
        <dt>formats</dt>
        <dd>SVG, PNG 600 dpi, CSV</dd>
      </dl>
      <p>
        The archive holds the figures that stand on the page: those of an open fold too, those of a closed one
        not.
      </p>
      <p>Always in the light colours. The screen shows a figure at 5 px for each millimetre of paper.</p>
    </>
  ),
};
