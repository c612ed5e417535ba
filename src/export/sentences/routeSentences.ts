import type { DecayArgument, RouteDisagreement } from "../../core/decayArgument.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { type Sentence, say } from "./piece.ts";
import { routeWords } from "./routeWords.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, lengthValue, symbolOf, valueWithInterval } from "./shownValue.ts";
import { chained, counted } from "./words.ts";

/** So many pairs are named; the table has the rest. */
const named = 3;

/** Whether the routes of each case agree within their intervals, and which do not. */
export function routeSentences(cases: readonly SentenceCase[]): readonly Sentence[] {
  return cases.flatMap((of) => {
    const argued = arguedOf(of);
    return argued === null || argued.decay.law === null ? [] : ofCase(of, argued.argument);
  });
}

function ofCase(of: SentenceCase, argument: DecayArgument): Sentence[] {
  const { disagreements } = argument;
  const [exponent, origin] = [symbolOf("n"), symbolOf(of.along === "t" ? "t0" : "x0")];
  if (disagreements.length === 0)
    return [
      say`In ${caseOf(of)} no two routes part on ${exponent} or ${origin} beyond their 95 % intervals.`,
    ];
  const shown = disagreements.slice(0, named).map((one) => pair(of, argument, one));
  const more = disagreements.length - shown.length;
  const rest = more > 0 ? `; and ${counted(more, "further pair")}` : "";
  return [say`In ${caseOf(of)} these routes part beyond their 95 % intervals: ${chained(shown)}${rest}.`];
}

/** "on n the joint fit, 1.25 (1.20 to 1.31), and the fall of ε, 1.40 (1.35 to 1.45)" */
function pair(
  of: SentenceCase,
  { routes }: DecayArgument,
  { routes: keys, of: what }: RouteDisagreement,
): Sentence {
  const value = (key: (typeof keys)[number]) => {
    const quantity = routes.find((route) => route.key === key)?.[what];
    if (quantity === undefined) return routeWords(key);
    const number = what === "n" ? valueWithInterval(quantity, "n", of.units) : lengthValue(quantity, of);
    return say`${routeWords(key)}, ${number}`;
  };
  const symbol = symbolOf(what === "n" ? "n" : of.along === "t" ? "t0" : "x0");
  return say`on ${symbol} ${value(keys[0])}, and ${value(keys[1])}`;
}
