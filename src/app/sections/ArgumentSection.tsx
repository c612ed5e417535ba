import { type ReactNode, useCallback, useRef } from "react";
import type { Sentence } from "../../export/sentences/piece.ts";
import type { FigureOptions, FigureSpec } from "../../figures/figureSpec.ts";
import { type SectionId, sectionOf } from "../page/sectionList.ts";
import { useFigureCases } from "../page/useFigureCases.ts";
import type { CaseView } from "../session/caseView.ts";
import { FigureBlock } from "./FigureBlock.tsx";
import { Finding } from "./Finding.tsx";
import { type Note, SectionFrame } from "./SectionFrame.tsx";

export interface SectionFigure {
  /** "Figure 1". */
  readonly name: string;
  /** What it shows, in a few words. */
  readonly title: string;
  readonly widthMm: 86 | 178;
  /** The same function from one render to the next, or one remembered. */
  readonly build: (cases: readonly CaseView[], options: FigureOptions) => FigureSpec;
  readonly caption: ReactNode;
  /** What stands beside a figure of one column. */
  readonly beside?: (cases: readonly CaseView[]) => ReactNode;
}

/** A section of the argument: finding, figure, folds, notes. */
export function ArgumentSection({
  id,
  cases,
  sentences,
  stale,
  figure,
  notes = [],
  children,
}: {
  id: SectionId;
  cases: readonly CaseView[];
  sentences: readonly Sentence[];
  stale: boolean;
  figure?: SectionFigure | null;
  notes?: readonly Note[];
  children?: ReactNode;
}) {
  const ref = useRef<HTMLElement>(null);
  const shown = useFigureCases(ref, cases);
  return (
    <SectionFrame section={sectionOf(id)} notes={notes} ref={ref}>
      <Finding sentences={sentences} stale={stale} />
      {figure && <Drawn figure={figure} cases={shown} />}
      {children}
    </SectionFrame>
  );
}

function Drawn({ figure, cases }: { figure: SectionFigure; cases: readonly CaseView[] }) {
  const { name, title, widthMm, build, caption, beside } = figure;
  const draw = useCallback((options: FigureOptions) => build(cases, options), [build, cases]);
  const block = <FigureBlock name={name} title={title} widthMm={widthMm} build={draw} caption={caption} />;
  if (beside === undefined) return block;
  // one column of print holds the numbers of two cases; more stand under the figure
  return (
    <div className={cases.length <= 2 ? "pair" : undefined}>
      {block}
      <div className="beside">{beside(cases)}</div>
    </div>
  );
}
