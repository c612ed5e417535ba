import {
  type AlignedOrigins,
  type ComparedRatio,
  type ComparedStretch,
  type Comparison,
  comparedQuantities,
} from "../core/comparison.ts";
import { plainQuantity } from "./plainQuantity.ts";
import { beyondSentence } from "./sentences/beyondSentence.ts";
import { plainText } from "./sentences/piece.ts";
import type { SentenceCase } from "./sentences/sentenceCase.ts";

/**
 * One comparison as scripts read it.
 * @param cases the two compared, as sentences name them; null: without the statement
 */
export function plainComparison(comparison: Comparison, cases: readonly [SentenceCase, SentenceCase] | null) {
  const { align, tolerance, overlap, why, aligned_with, quantities, common_n, spectra } = comparison;
  const { equivalent_beyond: beyond, matched, origins } = comparison;
  return {
    cases: comparison.cases,
    align,
    tolerance,
    overlap,
    why,
    aligned_with,
    quantities: Object.fromEntries(comparedQuantities.map((key) => [key, plainRatio(quantities[key])])),
    equivalent_beyond: {
      quantities: beyond.quantities,
      from: beyond.from,
      why: beyond.why,
      statement: cases === null ? null : plainText(beyondSentence(comparison, cases)),
      stretches: beyond.stretches.map(plainStretch),
    },
    extra_distance: plainQuantity(comparison.extra_distance),
    matched_distance: plainQuantity(comparison.matched_distance),
    matched: { x: matched.x.map(plainQuantity), Tu: plainQuantity(matched.Tu) },
    common_n,
    ...(comparison.common_n_of_all ? { common_n_of_all: comparison.common_n_of_all } : {}),
    origins: { own: plainOrigins(origins.own), common: plainOrigins(origins.common) },
    spectra: {
      within: spectra.within,
      why: spectra.why,
      pairs: spectra.pairs.map((pair) => ({ ...pair, distance: plainQuantity(pair.distance) })),
    },
  };
}

function plainRatio({ ratio, largest, ...rest }: ComparedRatio) {
  const { verdict, p_equivalent, p_different, equivalent_from } = rest;
  return {
    ratio: plainQuantity(ratio),
    largest: plainQuantity(largest),
    verdict,
    p_equivalent,
    p_different,
    equivalent_from,
  };
}

function plainStretch({ from, to, equivalent, narrowest }: ComparedStretch) {
  const least = narrowest && { quantity: narrowest.quantity, ratio: plainQuantity(narrowest.ratio) };
  return { from, to, equivalent, narrowest: least };
}

function plainOrigins(origins: AlignedOrigins | null) {
  if (origins === null) return null;
  const { n, x0, extra_distance } = origins;
  return {
    n: n.map(plainQuantity),
    x0: x0.map(plainQuantity),
    extra_distance: plainQuantity(extra_distance),
  };
}
