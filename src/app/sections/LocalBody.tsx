import { memo, useCallback } from "react";
import type { FigureOptions } from "../../figures/figureSpec.ts";
import { localDecayFigure } from "../../figures/localDecayFigure.ts";
import { figureName } from "../page/figureNumbers.ts";
import type { CaseView } from "../session/caseView.ts";
import { FigureBlock } from "./FigureBlock.tsx";

/** The law seen station by station. */
export const LocalBody = memo(function LocalBody({ cases }: { cases: readonly CaseView[] }) {
  const build = useCallback((options: FigureOptions) => localDecayFigure(cases, options), [cases]);
  return (
    <FigureBlock
      name={figureName("decay", true)}
      title="Local exponent and compensated energy"
      widthMm={178}
      build={build}
      caption={caption}
    />
  );
});

const caption = (
  <>
    (<i>a</i>) Local exponent over each station and its two neighbours; line and shading: the exponent adopted
    and its 95 % interval over the window. (<i>b</i>) Energy over its law: a level of one where one law holds.
    Filled: inside the fit window. Bars: 95 %, the origin taken as known.
  </>
);
