import { useCallback } from "react";
import type { FigureOptions } from "../../figures/figureSpec.ts";
import { invariantsFigure } from "../../figures/invariantsFigure.ts";
import { figureName } from "../page/figureNumbers.ts";
import type { CaseView } from "../session/caseView.ts";
import { FigureBlock } from "./FigureBlock.tsx";

/** The stress tensors of all stations among those that can be. */
export function InvariantsBlock({ cases }: { cases: readonly CaseView[] }) {
  const build = useCallback(
    (options: FigureOptions) => invariantsFigure(withTensor(cases), options),
    [cases],
  );
  if (withTensor(cases).length === 0) return null;
  return (
    <FigureBlock
      name={figureName("isotropy", true)}
      title="Invariants of the anisotropy tensor"
      widthMm={86}
      build={build}
      caption={caption}
    />
  );
}

const withTensor = (cases: readonly CaseView[]) =>
  cases.filter(({ stations }) => stations.some(({ routes }) => routes.anisotropy_xi?.value != null));

const caption = (
  <>
    Invariants of the anisotropy tensor; lines: axisymmetric and two-component turbulence, outside of which no
    stress tensor can lie. Lower corner: isotropic. Bars: 95 %.
  </>
);
