import type { Growth } from "../../core/decayArgument.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, symbolOf, valueWithInterval } from "./shownValue.ts";
import { listed } from "./words.ts";

const exponents = { L11: "m", lambda: "m_lambda", Re_lambda: "m_Re_lambda" } as const;

/** Which scales of a case grow as the exponent of the energy asks, and which part from it. */
export function growthSentences(of: SentenceCase): readonly Sentence[] {
  const growths = arguedOf(of)?.argument.growths.filter(({ agrees }) => agrees !== null) ?? [];
  const agreed = growths.filter(({ agrees }) => agrees === true);
  const parted = growths.filter(({ agrees }) => agrees === false);
  const names = listed(agreed.map(({ key }) => symbolOf(key)));
  return [
    ...(agreed.length === 0
      ? []
      : [
          say`In ${caseOf(of)} ${names} ${agreed.length === 1 ? "grows" : "grow"} as ${symbolOf("n")} and a constant ${symbolOf("C_epsilon")} ask, within the intervals.`,
        ]),
    ...parted.map((growth) => partedSentence(of, growth)),
  ];
}

function partedSentence(of: SentenceCase, { key, exponent, implied }: Growth): Sentence {
  const shown = (quantity: Growth["exponent"]) => valueWithInterval(quantity, exponents[key], of.units);
  return say`In ${caseOf(of)} ${symbolOf(key)} grows with exponent ${shown(exponent)}, where ${symbolOf("n")} and a constant ${symbolOf("C_epsilon")} ask for ${shown(implied)}.`;
}
