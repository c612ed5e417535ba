import { arguedOf } from "../../figures/arguedOf.ts";
import { probabilityText } from "./decaySentences.ts";
import { type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, equation, symbolOf } from "./shownValue.ts";

/** Whether C_epsilon, which the exponents implied for the lengths take as constant, is so along the window. */
export function dissipationConstantSentence(of: SentenceCase): Sentence[] {
  const found = arguedOf(of)?.argument.dissipationConstant;
  if (!found || found.mean.value === null) return [];
  const mean = equation(found.mean, "C_epsilon", of.units);
  if (found.constant === null || found.exponent.value === null)
    return [
      say`In ${caseOf(of)} ${mean} over the window; whether it stays so cannot be told without intervals.`,
    ];
  const scatter = found.p === null ? [] : say` (scatter about it: ${probabilityText(found.p)})`;
  return [
    found.constant
      ? say`In ${caseOf(of)} ${mean} all along the window${scatter}: no exponent but zero is asked for.`
      : say`In ${caseOf(of)} ${symbolOf("C_epsilon")} ${found.exponent.value > 0 ? "rises" : "falls"} along the window, by its interval, about ${mean}: the exponents implied for the lengths do not hold as they stand.`,
  ];
}
