import { isNotHeld } from "../../core/decay/notHeld.ts";
import type { Criterion, ScannedWindow } from "../../core/decayArgument.ts";
import { type ArguedDecay, arguedOf } from "../../figures/arguedOf.ts";
import { probabilityText, windowSentence } from "./decaySentences.ts";
import { nearFieldSentence } from "./nearFieldSentence.ts";
import { type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { coordinate, position, symbolOf, valueWithInterval } from "./shownValue.ts";
import { listed } from "./words.ts";

/** Why a window is where it is, what a station more upstream would do, and what physics says of its start and end. */
export function scanSentences(of: SentenceCase): readonly Sentence[] {
  const argued = arguedOf(of);
  if (argued === null) return [];
  const { scan } = argued.argument;
  const whole = { ...of, decay: argued.decay };
  return [
    windowSentence(whole),
    ...earlierStart(whole, argued),
    ...nearFieldSentence(whole, argued),
    ...sideOf(whole, scan.start, argued.decay.window[0], "start"),
    ...sideOf(whole, scan.end, argued.decay.window[1], "end"),
  ];
}

/** "One station earlier, from 0.25 m, n would be 1.31 (1.27 to 1.35), outside the interval adopted (p = 0.002)." */
function earlierStart(of: SentenceCase, { decay, argument }: ArguedDecay): Sentence[] {
  const { first } = argument.scan;
  const at = first.findIndex((window) => window.adopted);
  if (at < 0) return [];
  if (at === 0) return [say`It begins at the first station there is: no earlier start can be tried.`];
  const earlier = first[at - 1];
  const from = position(earlier.x, of);
  if (earlier.n.value === null) return [say`One station earlier, from ${from}, there would be no law.`];
  const { low = null, high = null } = decay.n.value === null ? {} : decay.n;
  const below = low !== null && earlier.n.value < low;
  const above = high !== null && earlier.n.value > high;
  const where = below || above ? ", outside the interval adopted" : ", within the interval adopted";
  const p = misfit(earlier);
  return [
    say`One station earlier, from ${from}, ${symbolOf("n")} would be ${valueWithInterval(earlier.n, "n", of.units)}${where}${p}.`,
  ];
}

function misfit({ p }: ScannedWindow): Sentence {
  if (p === null) return [];
  const verdict =
    p < 0.05 ? "the scatter exceeds the sampling errors" : "the scatter agrees with the sampling errors";
  return say`; ${verdict} (${probabilityText(p)})`;
}

/** Conditions that hold only within the window, those that never hold, and whether the rest allows the end chosen. */
function sideOf(
  of: SentenceCase,
  criteria: readonly Criterion[],
  end: number,
  side: "start" | "end",
): Sentence[] {
  const outside = (x: number) => (side === "start" ? x > end : x < end);
  const asked = criteria.filter(
    ({ notContradicted }) => notContradicted.value !== null || isNotHeld(notContradicted),
  );
  if (asked.length === 0) return [];
  const late = asked.flatMap(({ words, notContradicted }) =>
    notContradicted.value !== null && outside(notContradicted.value)
      ? [`${words} (${side === "start" ? "from" : "up to"} ${position(notContradicted.value, of)})`]
      : [],
  );
  const never = asked
    .filter(({ notContradicted }) => notContradicted.value === null)
    .map(({ words }) => words);
  const ends = side === "start" ? "last" : "first";
  if (late.length === 0 && never.length === 0)
    return [
      say`What physics asks of the ${side} is contradicted by no interval at ${coordinate(of)} = ${position(end, of)}.`,
    ];
  return [
    ...(late.length === 0
      ? []
      : [say`Physics puts the ${side} in doubt: inside the window only is held ${listed(late)}.`]),
    ...(never.length === 0 ? [] : [say`Not held at the ${ends} station: ${listed(never)}.`]),
  ];
}
