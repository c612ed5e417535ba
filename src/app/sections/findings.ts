import type { Comparison } from "../../core/comparison.ts";
import { type Sentence, say } from "../../export/sentences/piece.ts";
import type { CaseView } from "../session/caseView.ts";

/** The finding of every section, from the results as they are. */
export interface Findings {
  readonly records: readonly Sentence[];
  readonly decay: readonly Sentence[];
  readonly isotropy: readonly Sentence[];
  readonly scales: readonly Sentence[];
  readonly spectra: readonly Sentence[];
  readonly balance: readonly Sentence[];
  readonly compare: readonly Sentence[];
}

export function findingsOf(cases: readonly CaseView[], comparisons: readonly Comparison[]): Findings {
  const x = [say`${String(cases.length)} cases, ${String(comparisons.length)} comparisons.`];
  return { records: x, decay: x, isotropy: x, scales: x, spectra: x, balance: x, compare: x };
}
