import { memo, useCallback } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { unitOf } from "../../core/unitText.ts";
import { plainText } from "../../export/sentences/piece.ts";
import { routeSentences } from "../../export/sentences/routeSentences.ts";
import { routeWords } from "../../export/sentences/routeWords.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import type { FigureOptions } from "../../figures/figureSpec.ts";
import { routesFigure } from "../../figures/routesFigure.ts";
import { straightLineFigure } from "../../figures/straightLineFigure.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import { figureName } from "../page/figureNumbers.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { cellKeys } from "./cellKeys.ts";
import { FigureBlock } from "./FigureBlock.tsx";
import { NumberField } from "./NumberField.tsx";
import { PairCells } from "./PairCells.tsx";
import { PairHeads } from "./PairHeads.tsx";
import { RichText } from "./RichText.tsx";
import { SaidSentences } from "./SaidSentences.tsx";
import { SentenceText } from "./SentenceText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** Every way to n and x0 over the same window: drawn, tabled, and where they part said. */
export const RoutesBody = memo(function RoutesBody({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const build = useCallback((options: FigureOptions) => routesFigure(cases, options), [cases]);
  const buildLine = useCallback((options: FigureOptions) => straightLineFigure(cases, options), [cases]);
  return (
    <>
      {cases.map((view) => (
        <SaidSentences sentences={routeSentences(view)} key={view.id} />
      ))}
      <FigureBlock
        name={figureName("window", true)}
        title="Exponent and origin by every route"
        widthMm={178}
        build={build}
        caption={caption}
      />
      <RoutesTable cases={cases} />
      <FigureBlock
        name={figureName("window", true)}
        title="Straight line of the energy, n held"
        widthMm={86}
        build={buildLine}
        caption={lineCaption}
      />
      <div className="fields argued-fields">
        {cases.map(({ id, name, of }) => (
          <NumberField
            key={id}
            label={
              <>
                {name}: another <OriginSymbol along={of.sheet.along} /> to try
              </>
            }
            unit={unitOf(of.sheet.along === "t" ? "T" : "L", of.sheet.units)}
            placeholder="none"
            value={of.sheet.fit.otherX0}
            onChange={(otherX0) =>
              onChange({ kind: "edit-sheet", caseId: id, edit: { fit: { ...of.sheet.fit, otherX0 } } })
            }
          />
        ))}
      </div>
    </>
  );
});

function OriginSymbol({ along }: { along: "x" | "t" }) {
  return <SymbolText runs={labelOf(along === "t" ? "t0" : "x0").symbol} />;
}

const caption = (
  <>
    (<i>a</i>) Exponent and (<i>b</i>) origin by every route over the same window. Bars: 95 %; one that runs
    into the frame goes on beyond it, or has no end there. Open: held, not fitted. A row without a mark:
    refused, or not to be had; the table says why.
  </>
);

const lineCaption = (
  <>
    Straight line, <i>n</i> held as fitted: energy over <i>A</i> to the power −1/<i>n</i>. Line: the law, thin
    where it is extended. At zero: the origin of the straight line and its 95 % interval. Filled: inside the
    fit window. Bars: 95 %.
  </>
);

function RoutesTable({ cases }: { cases: readonly CaseView[] }) {
  return (
    <TableScroll label="Exponent and origin by every route">
      <table className="data dense" {...cellKeys}>
        <PairHeads view={cases[0]} first="Route" last="rests on" />
        {cases.map((view) => (
          <tbody key={view.id}>
            <tr>
              <th scope="rowgroup" colSpan={6}>
                <CaseMark mark={view.mark} /> {view.name}
              </th>
            </tr>
            <AdoptedRow view={view} />
            {(arguedOf(view)?.argument.routes ?? []).map(({ key, n, x0, note }) => (
              <tr key={key}>
                <th scope="row" className="text">
                  <SentenceText sentence={routeWords(key, view.along)} />
                </th>
                <PairCells
                  view={view}
                  n={n}
                  x0={x0}
                  rows={[
                    ["route", plainText(routeWords(key, view.along))],
                    ["rests on", note],
                  ]}
                />
                <td className="text wrap note-cell">
                  <RichText text={note} />
                </td>
              </tr>
            ))}
          </tbody>
        ))}
      </table>
    </TableScroll>
  );
}

function AdoptedRow({ view }: { view: CaseView }) {
  const decay = arguedOf(view)?.decay;
  if (decay === undefined) return null;
  const note =
    decay.windowChosen === "auto"
      ? "union of the intervals of later starts"
      : "joint fit in the window given";
  return (
    <tr>
      <th scope="row" className="text">
        adopted
      </th>
      <PairCells view={view} n={decay.n} x0={decay.x0} rows={[["interval", note]]} />
      <td className="text wrap note-cell">{note}</td>
    </tr>
  );
}
