import { arguedOf } from "../../figures/arguedOf.ts";
import type { CaseView } from "../session/caseView.ts";

/** A case with the fit that was argued last, so that all numbers of a fold are of one fit. */
export function arguedView(view: CaseView): CaseView {
  const argued = arguedOf(view);
  return argued === null || argued.decay === view.decay ? view : { ...view, decay: argued.decay };
}
