import type { DecayResult } from "../../core/decayResult.ts";
import type { CaseView } from "../session/caseView.ts";

/**
 * The same list again while nothing but the body, or what is asked of development, differs in it: no figure but the
 * body's own shows either, and to draw all of them anew when a body is moved would take longer than all else.
 */
export function createStillCases(): (cases: readonly CaseView[]) => readonly CaseView[] {
  let kept: readonly CaseView[] = [];
  return (cases) => {
    if (cases.length !== kept.length || !cases.every((view, i) => sameButBody(view, kept[i]))) kept = cases;
    return kept;
  };
}

const ofBody = ["body", "development"];

function sameButBody(a: CaseView, b: CaseView): boolean {
  return (
    a === b ||
    (shallow(a, b, ["of", "decay", "argued"]) &&
      shallow(a.of, b.of, ["sheet"]) &&
      shallow(a.of.sheet, b.of.sheet, ofBody) &&
      sameDecay(a.decay, b.decay) &&
      sameDecay(a.argued, b.argued))
  );
}

function sameDecay(a: DecayResult | null | undefined, b: DecayResult | null | undefined): boolean {
  return shallow(a, b, ["argument"]) && shallow(a?.argument, b?.argument, ofBody);
}

/** Whether two objects hold the very same things under all keys but some. */
function shallow(
  a: object | null | undefined,
  b: object | null | undefined,
  but: readonly string[],
): boolean {
  if (a == null || b == null) return a === b;
  const [mine, theirs] = [a, b].map((each) => Object.entries(each).filter(([key]) => !but.includes(key)));
  return (
    mine.length === theirs.length &&
    mine.every(([key, value], i) => key === theirs[i][0] && value === theirs[i][1])
  );
}
