import { memo } from "react";
import type { Comparison } from "../../core/comparison.ts";
import { hypothesisSentence } from "../../export/sentences/decaySentences.ts";
import { dissipationConstantSentence } from "../../export/sentences/dissipationConstantSentence.ts";
import { growthSentences } from "../../export/sentences/growthSentences.ts";
import type { CaseView } from "../session/caseView.ts";
import { arguedView } from "./arguedView.ts";
import { CommonExponentTable } from "./CommonExponentTable.tsx";
import { FitTable } from "./FitTable.tsx";
import { GrowthTable } from "./GrowthTable.tsx";
import { HypothesisTable } from "./HypothesisTable.tsx";
import { SaidSentences } from "./SaidSentences.tsx";

/** The fits, the named exponents, one exponent for all cases against one each, and how the scales grow. */
export const FitsBody = memo(function FitsBody({
  cases,
  comparisons,
}: {
  cases: readonly CaseView[];
  comparisons: readonly Comparison[];
}) {
  const argued = cases.map(arguedView);
  return (
    <>
      <FitTable cases={argued} />
      {argued.map((view) => (
        <SaidSentences sentences={[hypothesisSentence(view)]} key={view.id} />
      ))}
      <HypothesisTable cases={argued} />
      <CommonExponentTable cases={argued} comparisons={comparisons} />
      <SaidSentences
        sentences={argued.flatMap((view) => [...growthSentences(view), ...dissipationConstantSentence(view)])}
      />
      <GrowthTable cases={argued} />
    </>
  );
});
