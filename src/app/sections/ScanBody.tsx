import { memo, useCallback } from "react";
import { scanSentences } from "../../export/sentences/scanSentences.ts";
import type { FigureOptions } from "../../figures/figureSpec.ts";
import { scanFigure } from "../../figures/scanFigure.ts";
import { figureName } from "../page/figureNumbers.ts";
import type { CaseView } from "../session/caseView.ts";
import { ConditionsTable } from "./ConditionsTable.tsx";
import { FigureBlock } from "./FigureBlock.tsx";
import { SaidSentences } from "./SaidSentences.tsx";

/** n and x0 against the ends of the window; what physics asks of them. */
export const ScanBody = memo(function ScanBody({ cases }: { cases: readonly CaseView[] }) {
  const build = useCallback((options: FigureOptions) => scanFigure(cases, options), [cases]);
  return (
    <>
      {cases.map((view) => (
        <SaidSentences sentences={scanSentences(view)} key={view.id} />
      ))}
      <FigureBlock
        name={figureName("window")}
        title="Exponent and origin against the first and the last station used"
        widthMm={178}
        build={build}
        caption={caption}
      />
      <ConditionsTable cases={cases} />
    </>
  );
});

const caption = (
  <>
    Exponent and origin (<i>a</i>, <i>b</i>) against the first station used, up to the last one of the window,
    and (<i>c</i>, <i>d</i>) against the last, from the first one on. Filled: the window adopted. Bars: 95 %
    given the window; those of few stations run out of the frame. Block: the starts whose intervals an
    automatic window unites, and the interval they give. Ticks at the foot: where a condition of the table
    below is first (last) contradicted by no interval.
  </>
);
