import type { Comparison } from "../../core/comparison.ts";
import { bare, type Quantity } from "../../core/quantity.ts";
import { formatDigits } from "../../figures/formatNumber.ts";
import { middlePair } from "../../figures/middlePair.ts";
import { comparedPlace } from "./comparedPlace.ts";
import { probabilityText } from "./decaySentences.ts";
import { type Piece, type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { symbolOf } from "./shownValue.ts";
import { counted, countWord, reason } from "./words.ts";

/** How far the spectra of both lie apart at equal distance from the origins, and how far they would by chance. */
export function spectralDistanceSentences(
  comparison: Comparison,
  cases: readonly [SentenceCase, SentenceCase],
): Sentence[] {
  const { spectra } = comparison;
  const middle = middlePair(comparison);
  if (middle === null)
    return spectra.why === null ? [] : [say`The spectra are not compared: ${reason(spectra.why)}.`];
  const at = comparedPlace(middle.xi[0], { align: "x0" }, cases);
  const apart = number(middle.distance, "spectral_distance");
  const chance = number(bare(middle.chance, "a mean"), "spectral_chance");
  const more = middle.p < 0.05;
  const verdict = more ? "more than chance makes" : "no more than chance makes";
  const one = say`In Kolmogorov form the spectra at ${at} lie ${symbolOf("spectral_distance")} = ${apart} apart, ${verdict} of two spectra of one turbulence (${chance}, ${probabilityText(middle.p)})`;
  const count = spectra.pairs.length;
  if (count < 2) return [say`${one}.`];
  const far = spectra.pairs.filter(({ p }) => p < 0.05).length;
  return [
    say`${one}; of ${counted(count, "such pair")} of stations ${farText(far, count)} farther apart than 95 in 100 would by chance.`,
  ];
}

function number(quantity: Quantity, key: string): Piece {
  return { kind: "strong", text: formatDigits(quantity.value ?? 0, 2), about: { key, quantity } };
}

function farText(far: number, count: number): string {
  if (far === 0) return "none lies";
  if (far === count) return "all lie";
  return far === 1 ? "one lies" : `${countWord(far)} lie`;
}
