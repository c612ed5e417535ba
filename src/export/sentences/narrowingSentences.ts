import type { Narrowing } from "../../core/decayArgument.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { formatNumber, withUnit } from "../../figures/formatNumber.ts";
import { type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, coordinate, position, symbolOf } from "./shownValue.ts";
import { chained, listed } from "./words.ts";

/** What one more station, or one doubled record, would do to the intervals where it does most. */
export function narrowingSentences(cases: readonly SentenceCase[]): readonly Sentence[] {
  return cases.flatMap((of) => {
    const plans = arguedOf(of)?.argument.narrowing ?? [];
    const parts = bestPlans(plans).map((plan) => planPart(plan, of));
    return parts.length === 0 ? [] : [say`In ${caseOf(of)} ${chained(parts)}.`];
  });
}

/** Of each kind the plan that narrows n and x0 together most: the list is in that order. */
export function bestPlans(plans: readonly Narrowing[]): readonly Narrowing[] {
  return (["station", "record"] as const).flatMap(
    (wanted) => plans.find(({ kind }) => kind === wanted) ?? [],
  );
}

function planPart(plan: Narrowing, of: SentenceCase): Sentence {
  const what = plan.kind === "station" ? "one more station at" : "a record twice as long at";
  const gains = (["n", "x0"] as const)
    .filter((key) => plan[key] < 1)
    .map(
      (key) =>
        say`of ${symbolOf(key === "x0" && of.along === "t" ? "t0" : key)} by ${{ kind: "strong", text: gainText(plan[key]) }}`,
    );
  const would =
    gains.length === 0 ? say`would narrow nothing` : say`would narrow the interval ${listed(gains)}`;
  return say`${what} ${coordinate(of)} = ${position(plan.x, of)} ${would}`;
}

/** A width over the present one as a gain: "12 %". */
export function gainText(width: number): string {
  const gain = 100 * (1 - width);
  return withUnit(formatNumber(gain, gain < 10 ? 1 : 0), "%");
}
