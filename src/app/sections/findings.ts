import type { Comparison } from "../../core/comparison.ts";
import { balanceSentences } from "../../export/sentences/balanceSentences.ts";
import { compareSentences } from "../../export/sentences/compareSentences.ts";
import { decaySentences } from "../../export/sentences/decaySentences.ts";
import { isotropySentences } from "../../export/sentences/isotropySentences.ts";
import type { Sentence } from "../../export/sentences/piece.ts";
import { recordSentences } from "../../export/sentences/recordSentences.ts";
import { scaleSentences } from "../../export/sentences/scaleSentences.ts";
import type { CaseView } from "../session/caseView.ts";

/** The finding of every section, from the results as they are. */
export interface Findings {
  readonly records: readonly Sentence[];
  readonly decay: readonly Sentence[];
  readonly isotropy: readonly Sentence[];
  readonly scales: readonly Sentence[];
  readonly balance: readonly Sentence[];
  /** One finding for each comparison. */
  readonly compare: readonly (readonly Sentence[])[];
}

export function findingsOf(
  cases: readonly CaseView[],
  comparisons: readonly Comparison[],
  tolerance: number,
): Findings {
  const reduced = cases.filter((view) => view.stations.length > 0);
  const files = cases.reduce((sum, view) => sum + view.of.sources.length, 0);
  return {
    records: recordSentences(cases, { files, failed: failedFiles(cases) }),
    decay: decaySentences(reduced, reduced.length === 2 ? (comparisons[0] ?? null) : null),
    isotropy: isotropySentences(reduced, tolerance),
    scales: scaleSentences(reduced),
    balance: balanceSentences(reduced, tolerance),
    compare: comparisons.map((comparison) => comparedSentences(comparison, reduced)),
  };
}

function comparedSentences(comparison: Comparison, cases: readonly CaseView[]): readonly Sentence[] {
  const [first, second] = comparison.cases.map((name) => cases.find((view) => view.name === name));
  return first && second ? compareSentences(comparison, [first, second]) : [];
}

/** Files of which no probe was used. */
function failedFiles(cases: readonly CaseView[]): number {
  return cases.reduce((sum, { reduced }) => {
    if (reduced === null) return sum;
    const used = new Set(reduced.sources.map(({ name }) => name));
    const failed = reduced.failures.flatMap(({ where }) => (where.file === undefined ? [] : [where.file]));
    return sum + new Set(failed.filter((name) => !used.has(name))).size;
  }, 0);
}
