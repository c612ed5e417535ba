import type { ArguedDecay } from "../../figures/arguedOf.ts";
import { type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { symbolOf, valueWithInterval } from "./shownValue.ts";
import { countWord } from "./words.ts";

/** Where a near field is suspected: what n would be over every later start, and why that is told. */
export function nearFieldSentence(of: SentenceCase, { decay, argument }: ArguedDecay): Sentence[] {
  const flag = decay.flags.find(({ code }) => code === "near-field");
  if (flag === undefined || argument.everyStart === null) return [];
  const { n, starts } = argument.everyStart;
  if (n.value === null) return [];
  return [
    say`A rest of a near field may hide in the window: over all ${countWord(starts)} starts that leave five stations ${symbolOf("n")} is ${valueWithInterval(n, "n", of.units)}.`,
  ];
}
