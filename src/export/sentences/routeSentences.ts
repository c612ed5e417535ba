import type { DecayRoute, RouteDisagreement, RouteKey } from "../../core/decayArgument.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { type Sentence, say } from "./piece.ts";
import { routeWords } from "./routeWords.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, lengthValue, symbolOf, valueWithInterval } from "./shownValue.ts";
import { listed } from "./words.ts";

/** Whether the routes of a case agree within their intervals, and which part from which. */
export function routeSentences(of: SentenceCase): readonly Sentence[] {
  const argued = arguedOf(of);
  if (argued === null || argued.decay.law === null) return [];
  const { routes, disagreements } = argued.argument;
  const [exponent, origin] = [symbolOf("n"), symbolOf(originKey(of))];
  if (disagreements.length === 0)
    return [
      say`In ${caseOf(of)} no two routes part on ${exponent} or ${origin} beyond their 95 % intervals.`,
    ];
  return (["n", "x0"] as const).flatMap((what) => {
    const pairs = disagreements.filter((one) => one.of === what);
    return partedFrom(pairs).map(({ route, others }) => {
      const value = (key: RouteKey) => shownOf(of, routes, key, what);
      return say`In ${caseOf(of)} the route “${routeWords(route, of.along)}” gives ${symbolOf(what === "n" ? "n" : originKey(of))} = ${value(route)}, beyond the interval of ${listed(others.map((key) => say`${routeWords(key, of.along)}, ${value(key)}`))}.`;
    });
  });
}

const originKey = ({ along }: SentenceCase) => (along === "t" ? "t0" : "x0");

/** The fewest routes that stand on one side of all pairs: each with those it parts from. */
function partedFrom(pairs: readonly RouteDisagreement[]): { route: RouteKey; others: RouteKey[] }[] {
  if (pairs.length === 0) return [];
  const counts = new Map<RouteKey, number>();
  for (const { routes } of pairs) for (const key of routes) counts.set(key, (counts.get(key) ?? 0) + 1);
  // of two that stand in as many pairs the later route is the one that assumes more
  const route = [...counts].reduce((best, one) => (one[1] >= best[1] ? one : best))[0];
  const own = pairs.filter(({ routes }) => routes.includes(route));
  const others = own.map(({ routes: [a, b] }) => (a === route ? b : a));
  return [{ route, others }, ...partedFrom(pairs.filter((pair) => !own.includes(pair)))];
}

function shownOf(of: SentenceCase, routes: readonly DecayRoute[], key: RouteKey, what: "n" | "x0"): Sentence {
  const quantity = routes.find((route) => route.key === key)?.[what];
  if (quantity === undefined) return [];
  return what === "n" ? valueWithInterval(quantity, "n", of.units) : lengthValue(quantity, of);
}
