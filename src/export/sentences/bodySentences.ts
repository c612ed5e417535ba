import type { BodyArgument } from "../../core/decayArgument.ts";
import type { Quantity } from "../../core/quantity.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { formatDigits, withUnit } from "../../figures/formatNumber.ts";
import { type Piece, type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, coordinate, position, symbolOf, valueWithInterval } from "./shownValue.ts";
import { capitalised, chained, listed, reason } from "./words.ts";

/** One case with what a body meets in it. */
interface Placed {
  readonly of: SentenceCase;
  readonly body: BodyArgument;
}

/** Intensity and length at the body in every case, and where its targets are met. */
export function bodySentences(cases: readonly SentenceCase[]): readonly Sentence[] {
  const placed = placedOf(cases);
  return [
    ...metSentences(placed),
    ...missingSentences(placed),
    ...targetSentences(placed, "Tu"),
    ...targetSentences(placed, "L11_chord"),
  ];
}

/** What the targets ask for: the smallest miss of both, and the intensity that the inflow would have to bring. */
export function beyondTargetSentences(cases: readonly SentenceCase[]): readonly Sentence[] {
  const placed = placedOf(cases);
  return [...bothSentences(placed), ...inflowSentences(placed)];
}

function placedOf(cases: readonly SentenceCase[]): readonly Placed[] {
  return cases.flatMap((of): Placed[] => {
    const body = arguedOf(of)?.argument.body ?? null;
    return body === null ? [] : [{ of, body }];
  });
}

/** "At the body, x = 0.90 m, Tu is 3.34 % (…) and L11/c 1.32 (…) in screen; 2.89 % (…) and 1.35 (…) in simulation." */
function metSentences(placed: readonly Placed[]): Sentence[] {
  const met = placed.filter(({ body }) => body.at.Tu.value !== null || lengthOf(body).value !== null);
  if (met.length === 0) return [];
  const places = new Set(met.map(({ body }) => body.x));
  const chords = new Set(met.map(({ body }) => body.chord !== null));
  const [alike, named] = [places.size === 1, places.size === 1 && chords.size === 1];
  const parts = met.map(({ of, body }, i) => {
    const name = i === 0 || !named;
    const numbers = [
      ...(body.at.Tu.value === null ? [] : [numberPart(body.at.Tu, "Tu", of, name, true)]),
      ...(lengthOf(body).value === null
        ? []
        : [numberPart(lengthOf(body), lengthKey(body), of, name, body.at.Tu.value === null)]),
    ];
    return say`${listed(numbers)} in ${caseOf(of)}${alike ? "" : say`, ${placeOf(of, body.x)}`}`;
  });
  const place = alike ? say`, ${placeOf(met[0].of, met[0].body.x)},` : "";
  return [say`At the body${place} ${chained(parts)}.`];
}

function numberPart(
  quantity: Quantity,
  key: string,
  { units }: SentenceCase,
  named: boolean,
  verb: boolean,
): Sentence {
  const value = valueWithInterval(quantity, key, units);
  return named ? say`${symbolOf(key)} ${verb ? "is " : ""}${value}` : value;
}

/** L11 in chords where there is a chord. */
const lengthOf = (body: BodyArgument) => (body.chord === null ? body.at.L11 : body.L11_chord);
const lengthKey = (body: BodyArgument) => (body.chord === null ? "L11" : "L11_chord");

/** "Tu and L11 cannot be given at x = 3.00 m in screen and simulation: the place lies beyond …" */
function missingSentences(placed: readonly Placed[]): Sentence[] {
  const lacking = placed.flatMap(({ of, body }) =>
    (["Tu", "L11"] as const).flatMap((key) => {
      const found = body.at[key];
      return found.value === null ? [{ of, x: body.x, key, why: reason(found.why) }] : [];
    }),
  );
  const groups = [...new Set(lacking.map(({ x, why }) => `${x} ${why}`))].map((group) =>
    lacking.filter(({ x, why }) => `${x} ${why}` === group),
  );
  return groups.map((group) => {
    const { of, x, why } = group[0];
    const symbols = [...new Set(group.map(({ key }) => key))].map(symbolOf);
    const names = [...new Set(group.map((each) => each.of))].map(caseOf);
    return say`${listed(symbols)} cannot be given at ${placeOf(of, x)} in ${listed(names)}: ${why}.`;
  });
}

/** "The target Tu = 2.5 % is met at 1.37 m (…) in screen, and is not in simulation: it is 1.2 times …" */
function targetSentences(placed: readonly Placed[], key: keyof BodyArgument["targets"]): Sentence[] {
  const targets = placed.flatMap(({ of, body }) => {
    const wanted = body.targets[key];
    return wanted === null ? [] : [{ of, ...wanted }];
  });
  return [...new Set(targets.map(({ target }) => target))].map((target) => {
    const alike = targets.filter((each) => each.target === target);
    const met = alike.filter(({ x }) => x.value !== null);
    const reached = met.map(({ of, x }) => say`at ${placeValue(x, of)} in ${caseOf(of)}`);
    const missed = alike.flatMap(({ of, x }) =>
      x.value === null ? [say`in ${caseOf(of)} it is not: ${reason(x.why)}`] : [],
    );
    const wanted = say`The target ${targetText(key, target)}`;
    if (reached.length === 0)
      return say`${wanted} is met nowhere ${chained(alike.map(({ of, x }) => say`in ${caseOf(of)}: ${x.value === null ? reason(x.why) : ""}`))}.`;
    return say`${wanted} is met ${chained([listed(reached), ...missed])}.`;
  });
}

/** "Tu = 2.5 %", never broken. */
export function targetText(key: keyof BodyArgument["targets"], target: number): Piece {
  return { kind: "together", pieces: say`${symbolOf(key)} = ${targetNumber(key, target)}` };
}

/** "2.5 %", "1.2". */
export function targetNumber(key: keyof BodyArgument["targets"], target: number): string {
  return key === "Tu"
    ? withUnit(trimmed(formatDigits(100 * target, 4)), "%")
    : trimmed(formatDigits(target, 4));
}

/** A target is a number somebody typed: no zeros behind it that say nothing. */
const trimmed = (text: string) => text.replace(/(\.\d*?)0+(?=\D|$)/, "$1").replace(/\.(?=\D|$)/, "");

function placeValue(x: Quantity, of: SentenceCase): Sentence {
  return valueWithInterval(x, targetKey(of), of.units);
}

/** Label of a place that meets a target, or of a time. */
export function targetKey({ along }: Pick<SentenceCase, "along">): string {
  return along === "t" ? "target_time" : "target_place";
}

/** A place among two thousand that were tried: three digits are what it has. */
export function leastMissPlace(x: number): number {
  return Number(x.toPrecision(3));
}

function bothSentences(placed: readonly Placed[]): Sentence[] {
  const parts = placed.flatMap(({ of, body: { both } }) => {
    if (both === null || both.x.value === null) return [];
    const at: Piece = {
      kind: "strong",
      text: position(leastMissPlace(both.x.value), of),
      about: { key: "least_miss", quantity: both.x },
    };
    const times = (factor: number) => formatDigits(factor, 3);
    return [
      say`in ${caseOf(of)} at ${at}, where ${symbolOf("Tu")} is ${times(both.Tu)} times and ${symbolOf("L11_chord")} ${times(both.L11_chord)} times the target`,
    ];
  });
  return parts.length === 0 ? [] : [say`Both targets together are missed least ${chained(parts)}.`];
}

/** "For its Tu at the body the first station, 0.15 m, would need 12.1 % (…) in screen: extrapolated by the law." */
function inflowSentences(placed: readonly Placed[]): Sentence[] {
  const parts = placed.flatMap(({ of, body: { inflow } }) =>
    inflow === null || inflow.Tu.value === null
      ? []
      : [
          say`${valueWithInterval(inflow.Tu, "Tu_inflow", of.units)} at ${placeOf(of, inflow.x)} in ${caseOf(of)}`,
        ],
  );
  if (parts.length === 0) return [];
  return [
    say`For the wanted ${symbolOf("Tu")} at the body the inflow would need ${listed(parts)}: extrapolated by the law, whose ${symbolOf("n")} and origin are taken to stay.`,
  ];
}

function placeOf(of: SentenceCase, x: number): Piece {
  return { kind: "together", pieces: say`${coordinate(of)} = ${position(x, of)}` };
}

/** What to do where no body stands yet. */
export function noBodySentence(of: SentenceCase, last: number | null): Sentence {
  const set = say`No body is placed: type where it stands`;
  return last === null
    ? say`${set}, and what it should meet there.`
    : say`${set}, or take the last station, ${placeOf(of, last)}, and move it on the ruler.`;
}

/** The small print: whose judgement these numbers do not replace. */
export const bodyCaution = `${capitalised("intensity")} and length at a body feed judgements of transition, heat transfer and load. Where safety hangs on them, local codes and licensed practice decide.`;
