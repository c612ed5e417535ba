import type { Comparison } from "../../core/comparison.ts";
import { formatNumber } from "../../figures/formatNumber.ts";
import { sources } from "../bibliography.ts";
import type { MethodsPart } from "../methodsText.ts";

const alignments = {
  x0: (which: string) =>
    `at equal distance from the virtual origins${which || " of their laws"}, in reference lengths`,
  x: () => "at equal x",
  Tu: () => "at equal intensity",
} as const;

const exponents = {
  "common n": " that the laws have with one common exponent",
  "own n": " that each law has with its own exponent",
  none: "",
} as const;

/** How cases were held against each other. */
export function compareMethods({ align, tolerance, aligned_with }: Comparison): MethodsPart {
  return {
    text: `Cases were compared ${alignments[align](exponents[aligned_with])}, over the range that they share, by the geometric mean of the ratio of each quantity; sampling errors and those of both origins enter its interval by resampling. A quantity is called equivalent where the 90 % interval of the ratio lies within ${formatNumber(100 * tolerance, 0)} % (two one-sided tests), different where it lies wholly outside, and undecided else; the levels are Holm's over all quantities.`,
    sources: [sources.schuirmann, sources.holm],
  };
}
