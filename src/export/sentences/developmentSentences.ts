import { isNotHeld } from "../../core/decay/notHeld.ts";
import type { Criterion, Development } from "../../core/decayArgument.ts";
import type { Quantity } from "../../core/quantity.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { formatNumber, formatPosition } from "../../figures/formatNumber.ts";
import { type Piece, type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, percent, position, symbolOf } from "./shownValue.ts";
import { listed, reason } from "./words.ts";

type Reading = "notContradicted" | "inside";

/** From where on what is asked of a developed flow holds, in both readings; what never holds, and what cannot be judged. */
export function developmentSentences(cases: readonly SentenceCase[]): readonly Sentence[] {
  return cases.flatMap((of) => {
    const development = arguedOf(of)?.argument.development;
    return development === undefined
      ? []
      : [...heldSentences(of, development), ...unjudgedSentences(of, development)];
  });
}

/** "In screen all that is asked is contradicted by no interval from 0.30 m on, and borne out by every one from …" */
function heldSentences(of: SentenceCase, development: Development): Sentence[] {
  const words = (list: readonly Criterion[]) => listed(list.map((each) => criterionWords(each, development)));
  const judged = development.criteria.filter(isJudged);
  if (judged.length === 0)
    return [say`In ${caseOf(of)} nothing that is asked of a developed flow can be judged.`];
  const refuted = judged.filter(({ notContradicted }) => notContradicted.value === null);
  const open = judged.filter((each) => each.inside.value === null && !refuted.includes(each));
  const lost = say`In ${caseOf(of)} ${words(refuted)} ${refuted.length === 1 ? "does" : "do"} not hold at the last station.`;
  const [first, last] = [latest(judged, "notContradicted"), latest(judged, "inside")];
  if (first === null) return [lost];
  const all = judged.length === development.criteria.length ? "all that is asked" : "all that can be judged";
  const subject = refuted.length === 0 ? say`In ${caseOf(of)} ${all} is` : say`The rest is`;
  const possible = say`${subject} contradicted by no interval from ${placeOf(first, "notContradicted", of)} on`;
  return [...(refuted.length === 0 ? [] : [lost]), say`${possible}${certainPart(of, last, open, words)}.`];
}

function certainPart(
  of: SentenceCase,
  last: Criterion | null,
  open: readonly Criterion[],
  words: (list: readonly Criterion[]) => Sentence,
): Sentence {
  const from = last === null ? [] : say`from ${placeOf(last, "inside", of)} on${lastWords(last, of, words)}`;
  if (open.length === 0) return last === null ? [] : say`, and borne out by every interval ${from}`;
  const nowhere = say`; ${words(open)} ${open.length === 1 ? "is" : "are"} borne out by every interval nowhere`;
  return last === null ? nowhere : say`${nowhere}, the others ${from}`;
}

/** What cannot be judged, once for each reason. */
function unjudgedSentences(of: SentenceCase, development: Development): Sentence[] {
  const groups = new Map<string, Criterion[]>();
  for (const each of development.criteria) {
    const { notContradicted } = each;
    if (isJudged(each) || notContradicted.value !== null) continue;
    groups.set(notContradicted.why, [...(groups.get(notContradicted.why) ?? []), each]);
  }
  return [...groups].map(
    ([why, list]) =>
      say`In ${caseOf(of)} ${listed(list.map((each) => criterionWords(each, development)))} cannot be judged: ${reason(why)}.`,
  );
}

function isJudged({ notContradicted }: Criterion): boolean {
  return notContradicted.value !== null || isNotHeld(notContradicted);
}

/** The criterion that holds last; null where none holds. */
function latest(criteria: readonly Criterion[], reading: Reading): Criterion | null {
  const at = (each: Criterion) => each[reading].value ?? Number.NEGATIVE_INFINITY;
  const held = criteria.filter((each) => each[reading].value !== null);
  return held.length === 0 ? null : held.reduce((one, other) => (at(other) > at(one) ? other : one));
}

/** What holds last, where something holds before it. */
function lastWords(
  last: Criterion,
  { stations }: SentenceCase,
  words: (list: readonly Criterion[]) => Sentence,
): Sentence {
  return last.inside.value === stations[0]?.x ? [] : say`, ${words([last])} last`;
}

/** "0.30 m (0.20 to 0.40)": stations all of them, so that an interval of one station is none. */
function placeOf(criterion: Criterion, reading: Reading, of: SentenceCase): Sentence {
  const place = criterion[reading];
  if (place.value === null) return [];
  const strong: Piece = {
    kind: "strong",
    text: position(place.value, of),
    about: { key: developmentKey(of), quantity: place },
  };
  const interval = placeInterval(place);
  return interval === null ? [strong] : say`${strong} ${{ kind: "interval", text: `(${interval})` }}`;
}

/** "0.20 to 0.40" of a place among stations; "0.20, or never" where it is open; null where there is none. */
export function placeInterval(place: Quantity): string | null {
  if (place.value === null || place.low === null || place.low === place.high) return null;
  const low = formatPosition(place.low);
  return place.high === null ? `${low}, or never` : `${low} to ${formatPosition(place.high)}`;
}

/** Label of a development length, or of a time. */
export function developmentKey({ along }: Pick<SentenceCase, "along">): string {
  return along === "t" ? "development_time" : "development";
}

/** What is asked, with its symbol: "u′/v′ within 10 % of one". */
export function criterionWords({ key, words }: Criterion, { tolerance }: Development): Sentence {
  const within = percent(tolerance);
  switch (key) {
    case "isotropy_uv":
    case "isotropy_uw":
      return say`${symbolOf(key)} within ${within} of one`;
    case "isotropy_uv_settled":
    case "isotropy_uw_settled":
      return say`${symbolOf(key.replace("_settled", ""))} within ${within} of its last value`;
    case "balance":
      return say`the balance of dissipation within ${within} of one`;
    case "S_dudx":
      return say`${symbolOf(key)} below ${formatNumber(-0.3, 1)}`;
    case "window":
      return say`the window of the law`;
    default:
      return say`${words}`;
  }
}
