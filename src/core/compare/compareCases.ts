import type { CaseInput, CompareSettings, Comparison } from "../comparison.ts";
import { comparePair } from "./comparePair.ts";

/**
 * The cases side by side, each against the first.
 * @param cases    fitted and derived, in order
 * @param settings alignment, and the tolerance of the verdicts
 * @returns        one comparison less than there are cases
 */
export function compareCases(cases: readonly CaseInput[], settings: CompareSettings): Comparison[] {
  const [first, ...others] = cases;
  return others.map((other) => comparePair(first, other, settings));
}
