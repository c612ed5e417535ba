import { useCallback } from "react";
import type { Comparison } from "../../core/comparison.ts";
import type { Sentence } from "../../export/sentences/piece.ts";
import { comparisonFigure } from "../../figures/comparisonFigure.ts";
import type { FigureOptions } from "../../figures/figureSpec.ts";
import { formatNumber } from "../../figures/formatNumber.ts";
import type { SheetCompare } from "../../sheet/caseSheet.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import { sectionOf } from "../page/sectionList.ts";
import type { CaseView } from "../session/caseView.ts";
import { CompareTable } from "./CompareTable.tsx";
import { FigureBlock } from "./FigureBlock.tsx";
import { Finding } from "./Finding.tsx";
import { Fold } from "./Fold.tsx";
import { SectionFrame } from "./SectionFrame.tsx";
import { ToleranceControl } from "./ToleranceControl.tsx";

/** Number of the first ratio figure. */
const firstFigure = 6;

/** Every later case against the first, at equal distance from their origins. */
export function CompareSection({
  cases,
  stale,
  sentences,
  comparisons,
  settings,
  onChange,
}: {
  cases: readonly CaseView[];
  stale: boolean;
  sentences: readonly (readonly Sentence[])[];
  comparisons: readonly Comparison[];
  settings: SheetCompare;
  onChange: (change: WorkspaceChange) => void;
}) {
  const notes = [
    {
      name: "Tolerance",
      fact: `${formatNumber(settings.tolerance * 100, 0)}\u202f%`,
      body: <ToleranceControl settings={settings} onChange={onChange} />,
    },
  ];
  return (
    <SectionFrame section={sectionOf("compare")} notes={cases.length > 1 ? notes : []}>
      {cases.length < 2 && (
        <p className="finding serif">A second case is needed for a comparison: drop one, or add its files.</p>
      )}
      {comparisons.map((comparison, i) => (
        <div className="comparison" key={comparison.cases.join(" ")}>
          <Finding sentences={sentences[i] ?? []} stale={stale} />
          <ComparisonBlock comparison={comparison} symbol={cases[0].symbol} number={firstFigure + i} />
        </div>
      ))}
    </SectionFrame>
  );
}

function ComparisonBlock({
  comparison,
  symbol,
  number,
}: {
  comparison: Comparison;
  symbol: string;
  number: number;
}) {
  const build = useCallback(
    (options: FigureOptions) => comparisonFigure(comparison, symbol, options),
    [comparison, symbol],
  );
  const [first, second] = comparison.cases;
  if (comparison.overlap === null) return null;
  const [from, to] = comparison.overlap;
  return (
    <>
      <FigureBlock
        name={`Figure ${number}`}
        title={`Ratios of ${second} to ${first}`}
        widthMm={178}
        build={build}
        caption={
          <>
            Ratio of {second} to {first} over the common range, {formatNumber(from, 1)} to{" "}
            {formatNumber(to, 1)} {comparison.align === "x0" ? `${symbol} from the origins` : ""}. Dot and
            bar: geometric mean, 95 %. Shaded: tolerance. Open dot: undecided.
          </>
        }
      />
      <Fold name="Ratios" fact={`${second} to ${first}`}>
        <CompareTable comparison={comparison} />
      </Fold>
    </>
  );
}
