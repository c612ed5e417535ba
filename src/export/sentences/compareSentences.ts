import { type ComparedQuantity, type Comparison, comparedQuantities } from "../../core/comparison.ts";
import type { Quantity } from "../../core/quantity.ts";
import { formatNumber, formatRange, withUnit } from "../../figures/formatNumber.ts";
import { decimalsOf } from "../../figures/formatQuantity.ts";
import { beyondSentence } from "./beyondSentence.ts";
import { distanceSentences } from "./distanceSentences.ts";
import { type Piece, type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { caseOf, percent, symbolOf } from "./shownValue.ts";
import { spectralDistanceSentences } from "./spectralDistanceSentences.ts";
import { chained, listed, reason } from "./words.ts";

/**
 * From where on the cases are equivalent, the verdicts, what is not compared, the distances and the spectra; the cases are
 * those of the comparison, in its order.
 */
export function compareSentences(
  comparison: Comparison,
  cases: readonly [SentenceCase, SentenceCase],
): readonly Sentence[] {
  const [first, second] = cases;
  const distances = distanceSentences(comparison, cases);
  if (comparison.why !== null)
    return [
      say`${caseOf(first)} and ${caseOf(second)} cannot be compared: ${reason(comparison.why)}.`,
      ...distances,
    ];
  const of = (verdict: string | null) =>
    comparedQuantities.filter((key) => comparison.quantities[key].verdict === verdict);
  return [
    beyondSentence(comparison, cases),
    ...verdictSentence(comparison, of("equivalent"), second),
    ...of("different").map((key) => differenceSentence(key, comparison, second)),
    ...undecidedSentence(comparison, of("undecided")),
    ...missingSentences(comparison),
    ...distances,
    ...spectralDistanceSentences(comparison, cases),
  ];
}

const places = {
  x0: "equal distance from their origins",
  x: "equal position",
  Tu: "equal intensity",
} as const;

function verdictSentence(
  { align, tolerance }: Comparison,
  keys: readonly ComparedQuantity[],
  second: SentenceCase,
): Sentence[] {
  const at = places[align];
  if (keys.length === 0)
    return [
      say`Averaged at ${at}, nothing of ${caseOf(second)} is shown to be equivalent within ${percent(tolerance)}.`,
    ];
  return [
    say`Averaged at ${at}, the cases are equivalent within ${percent(tolerance)} in ${listed(keys.map(symbolOf))}.`,
  ];
}

/** "λ_g is different: 15 % (11 to 19) larger in the simulation." */
function differenceSentence(
  key: ComparedQuantity,
  { quantities }: Comparison,
  second: SentenceCase,
): Sentence {
  const { ratio } = quantities[key];
  if (ratio.value === null) return [];
  const { value, interval, larger } = asChange(ratio);
  const strong: Piece = { kind: "strong", text: "different" };
  return say`${symbolOf(key)} is ${strong}: ${value} ${interval}${larger ? "larger" : "smaller"} in ${caseOf(second)}.`;
}

/** A ratio as a change in per cent with its interval, both counted in the direction of the change. */
function asChange(ratio: Quantity & { value: number }): {
  value: Piece;
  interval: Sentence;
  larger: boolean;
} {
  const larger = ratio.value >= 1;
  const sign = larger ? 100 : -100;
  const { low, high } = "low" in ratio ? ratio : { low: null, high: null };
  const ends = [low, high].map((end) => (end === null ? null : sign * (end - 1)));
  const [least, most] = larger ? ends : [ends[1], ends[0]];
  const value = sign * (ratio.value - 1);
  const decimals = decimalsOf({ value, low: least, high: most }, 2);
  return {
    larger,
    value: {
      kind: "strong",
      text: withUnit(formatNumber(value, decimals), "%"),
      about: { key: "ratio", quantity: ratio },
    },
    interval:
      least === null || most === null
        ? []
        : say`${{ kind: "interval", text: `(${formatRange(least, most, decimals)})` }} `,
  };
}

function undecidedSentence({ tolerance }: Comparison, keys: readonly ComparedQuantity[]): Sentence[] {
  if (keys.length === 0) return [];
  const verb = keys.length === 1 ? "is" : "are";
  return [
    say`${listed(keys.map(symbolOf))} ${verb} undecided: the data are too few for ${percent(tolerance)}.`,
  ];
}

function missingSentences({ quantities }: Comparison): Sentence[] {
  const whys = new Map<string, ComparedQuantity[]>();
  for (const key of comparedQuantities) {
    const { ratio } = quantities[key];
    if (ratio.value === null) whys.set(ratio.why, [...(whys.get(ratio.why) ?? []), key]);
  }
  return [...whys].map(
    ([why, keys]) =>
      say`${listed(keys.map(symbolOf))} ${keys.length === 1 ? "is" : "are"} not compared: ${reason(why)}.`,
  );
}

/** Words for the note beside the tolerance. */
export function toleranceNote(tolerance: number): Sentence {
  return chained([
    say`Two one-sided tests at 5\u202f% each against ${percent(tolerance)}, corrected for their number`,
    say`${{ kind: "symbol", runs: [{ text: "undecided" }] }} means that the data are too few, not that the cases agree`,
  ]);
}
