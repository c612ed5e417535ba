import type { Comparison } from "../../core/comparison.ts";
import type { DecayResult } from "../../core/decayResult.ts";
import { estimate } from "../../core/quantity.ts";
import { formatProbability } from "../../figures/formatNumber.ts";
import { type Sentence, say } from "./piece.ts";
import { sensitivitySentence } from "./sensitivitySentence.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import {
  caseOf,
  coordinate,
  equated,
  equation,
  lengthValue,
  stretch,
  symbolOf,
  valueWithInterval,
} from "./shownValue.ts";
import { capitalised, chained, counted, listed, reason } from "./words.ts";

/** The law of every case with its intervals and window, the common exponent, and why a law is not given. */
export function decaySentences(
  cases: readonly SentenceCase[],
  comparison: Comparison | null = null,
): readonly Sentence[] {
  const fitted = cases.filter(({ decay }) => decay?.law);
  const laws = fitted.flatMap((of, i) => (of.decay === null ? [] : [lawPart(of, of.decay, i === 0)]));
  return [
    ...(laws.length === 0 ? [] : [say`${chained(laws)}.`]),
    ...fitted.flatMap(sensitivitySentence),
    ...(comparison === null ? [] : commonExponent(comparison)),
    ...cases.filter(({ decay }) => decay !== null && !decay.law).map(noLawSentence),
  ];
}

function lawPart(of: SentenceCase, decay: DecayResult, first: boolean): Sentence {
  const origin = equated(symbolOf(of.along === "t" ? "t0" : "x0"), lengthValue(decay.x0, of));
  const what = first ? `${quantityWord(decay)} decays ` : "";
  return say`${first ? "In" : "in"} ${caseOf(of)} ${what}with exponent ${equation(decay.n, "n", of.units)} from a virtual origin ${origin}, fitted ${decay.flight ? "along the time of flight " : ""}over ${coordinate(of)} = ${stretch(decay.window, of)}`;
}

function quantityWord({ quantity, assumption }: DecayResult): string {
  const taken = { none: "", axisymmetric: " (axisymmetry assumed)", isotropic: " (isotropy assumed)" }[
    assumption
  ];
  return { k: `the energy${taken}`, uu: "the streamwise variance", q: "the quantity given" }[quantity];
}

/** "One exponent for both cases, 1.26 (1.21 to 1.31), is not excluded (p = 0.81)." */
function commonExponent({ common_n: { value, low, high, p }, cases }: Comparison): Sentence[] {
  if (value === null || p === null) return [];
  const both = cases.length === 2 ? "both cases" : "all cases";
  const probability = probabilityText(p);
  if (p < 0.05)
    return [
      say`One exponent for ${both} is excluded by these data in these windows (${probability}): each keeps its own.`,
    ];
  const common = estimate(value, low ?? Number.NaN, high ?? Number.NaN);
  return [
    say`One exponent for ${both}, ${valueWithInterval(common, "common_n", "SI")}, is not excluded (${probability}).`,
  ];
}

/** "p = 0.81", "p < 0.001". */
export function probabilityText(p: number): Sentence {
  const text = formatProbability(p);
  return [
    { kind: "together", pieces: say`${symbolOf("p")}${text.startsWith("<") ? ` ${text}` : ` = ${text}`}` },
  ];
}

/** "No law is given for the simulation: three stations lie in the window, and …" */
export function noLawSentence(of: SentenceCase): Sentence {
  const why = of.decay?.n.value === null ? of.decay.n.why : "it has not been fitted yet";
  return say`No law is given for ${caseOf(of)}: ${reason(why)}.`;
}

/** Why the window is where it is, and how many stations it holds. */
export function windowSentence(of: SentenceCase): Sentence {
  const { decay } = of;
  if (decay === null) return [];
  const what = say`${caseOf(of)}: window ${stretch(decay.window, of)}`;
  const stations = counted(decay.stations, "station");
  return decay.windowChosen === "auto"
    ? say`${what}, automatic, ${stations}. ${capitalised(reason(decay.windowReason))}.`
    : say`${what}, set by hand, ${stations}.`;
}

/** "In screen n = 6/5 (Saffman, p = 0.06) is not excluded; 10/7 (Loitsyansky, p < 0.001) is excluded by these data …" */
export function hypothesisSentence(of: SentenceCase): Sentence {
  const tested = of.decay?.hypotheses.flatMap(({ p, ...rest }) => (p === null ? [] : [{ ...rest, p }])) ?? [];
  if (tested.length === 0) return [];
  const named = (those: typeof tested) =>
    listed(those.map(({ name, n, p }) => say`${exponentText(n)} (${name}, ${probabilityText(p)})`));
  const verbs = (those: typeof tested) => (those.length === 1 ? "is" : "are");
  const [kept, excluded] = [tested.filter(({ p }) => p >= 0.05), tested.filter(({ p }) => p < 0.05)];
  const parts = [
    ...(kept.length === 0 ? [] : [say`${named(kept)} ${verbs(kept)} not excluded`]),
    ...(excluded.length === 0
      ? []
      : [say`${named(excluded)} ${verbs(excluded)} excluded by these data in this window`]),
  ];
  return say`In ${caseOf(of)} ${symbolOf("n")} = ${chained(parts)}.`;
}

/** 6/5, 10/7 and the like as fractions, others with two decimals. */
export function exponentText(n: number): string {
  for (let bottom = 1; bottom <= 7; bottom++) {
    const top = n * bottom;
    if (Math.abs(top - Math.round(top)) < 1e-9)
      return bottom === 1 ? `${Math.round(top)}` : `${Math.round(top)}/${bottom}`;
  }
  return n.toFixed(2);
}
