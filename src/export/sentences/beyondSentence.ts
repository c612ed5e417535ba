import type { Comparison } from "../../core/comparison.ts";
import { isEstimate, scaled } from "../../core/quantity.ts";
import { about } from "./about.ts";
import { comparedPlace, comparedRange } from "./comparedPlace.ts";
import { type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, lengthValue, percent, symbolOf } from "./shownValue.ts";
import { listed, reason } from "./words.ts";

type Compared = readonly [SentenceCase, SentenceCase];

/**
 * From where on two cases are equivalent, and how much more stream the second one needs: "Beyond (x − x0)/M = 20 screen
 * and simulation are equivalent within 10 % in Tu and λ_g, and simulation needs 9 M (7 to 11) more."
 */
export function beyondSentence(comparison: Comparison, cases: Compared): Sentence {
  const { tolerance, equivalent_beyond: beyond, overlap, align } = comparison;
  const [first, second] = cases;
  const what = listed(beyond.quantities.map(symbolOf));
  const both = say`${caseOf(first)} and ${caseOf(second)}`;
  if (beyond.from === null || overlap === null) {
    const why = beyond.why === null ? "" : `: ${reason(beyond.why)}`;
    const together = beyond.quantities.length > 1 ? " at once" : "";
    return say`From no place on are ${both} shown to be equivalent within ${percent(tolerance)} in ${what}${together}${why}.`;
  }
  const begin = align === "Tu" ? overlap[1] : overlap[0];
  const where = isBegin(beyond.from, begin)
    ? say`Over the whole common range, ${comparedRange(overlap, comparison, cases)},`
    : say`${align === "Tu" ? "Below" : "Beyond"} ${comparedPlace(beyond.from, comparison, cases)}`;
  return say`${where} ${both} are equivalent within ${percent(tolerance)} in ${what}${needed(comparison, cases)}.`;
}

/** The same number up to the rounding of its way through logarithms. */
function isBegin(from: number, begin: number): boolean {
  return Math.abs(from - begin) <= 1e-9 * Math.abs(begin);
}

/** ", and simulation needs 9 M (7 to 11) more": said where an origin is what sets them apart. */
function needed({ align, extra_distance: extra, aligned_with }: Comparison, [, second]: Compared): Sentence {
  if (align !== "x0" || !isEstimate(extra)) return [];
  const { value, low, high } = extra;
  const size = about(lengthValue(scaled(extra, value < 0 ? -1 : 1), second), "extra_distance", extra);
  if (low === null || high === null || (low <= 0 && high >= 0))
    return say`, and no difference of the way they need is shown: ${about(lengthValue(extra, second), "extra_distance", extra)}`;
  return say`, and ${caseOf(second)} needs ${size} ${value < 0 ? "less" : "more"}${exponents[aligned_with]}`;
}

/** What the distance rests on: with other exponents it is another one. */
const exponents = {
  "own n": ", each with its own exponent",
  "common n": ", with one exponent for all",
  none: "",
} as const;
