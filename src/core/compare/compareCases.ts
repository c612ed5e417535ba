import type { CaseInput, CommonOfAll, CompareSettings, Comparison } from "../comparison.ts";
import { commonExponent } from "./commonExponent.ts";
import { comparedCase } from "./comparedCase.ts";
import { comparePair } from "./comparePair.ts";

/**
 * The cases side by side, each against the first; with more than two also one exponent for all that have a law.
 * @param cases    fitted and derived, in order
 * @param settings alignment, and the tolerance of the verdicts
 * @returns        one comparison less than there are cases
 */
export function compareCases(cases: readonly CaseInput[], settings: CompareSettings): Comparison[] {
  const [first, ...others] = cases;
  const ofAll = others.length < 2 ? null : exponentOfAll(cases, settings);
  return others.map((other) => ({
    ...comparePair(first, other, settings),
    ...(ofAll === null ? {} : { common_n_of_all: ofAll }),
  }));
}

function exponentOfAll(cases: readonly CaseInput[], { align }: CompareSettings): CommonOfAll | null {
  const free = cases.flatMap((one) => {
    const { law, name } = comparedCase(one, align);
    return law === null || law.fitted.fit.held.n !== null ? [] : [{ name, fitted: law.fitted }];
  });
  if (free.length < 2) return null;
  const { n, low, high, p, test, AICc } = commonExponent(free.map(({ fitted }) => fitted));
  return { cases: free.map(({ name }) => name), n, low, high, p, test, AICc };
}
