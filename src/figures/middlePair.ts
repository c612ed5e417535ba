import type { Comparison, SpectrumPair } from "../core/comparison.ts";

/** The pair of spectra that stands for all: the middle one along the stream; null where there are none. */
export function middlePair({ spectra: { pairs } }: Comparison): SpectrumPair | null {
  return pairs[Math.floor(pairs.length / 2)] ?? null;
}
