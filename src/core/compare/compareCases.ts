import {
  type CaseInput,
  type CommonOfAll,
  type CompareSettings,
  type Comparison,
  compareDefaults,
} from "../comparison.ts";
import { alignment, usedOrigins } from "./alignment.ts";
import { commonExponent } from "./commonExponent.ts";
import { type ComparedCase, comparedCase } from "./comparedCase.ts";
import { comparePair } from "./comparePair.ts";
import { overlay } from "./overlay.ts";
import { type LaidPair, resampleCases } from "./resampleCases.ts";

/**
 * The cases side by side, all others against a chosen one, in their order. With more than two, one exponent for all
 * that have a law decides how they are laid over one another, so that each has one origin in all pairs.
 * @param inputs   fitted and derived, in order
 * @param settings alignment, the case held against, and the tolerance of the verdicts
 * @returns        one comparison less than there are cases
 */
export function compareCases(inputs: readonly CaseInput[], settings: CompareSettings): Comparison[] {
  if (inputs.length < 2) return [];
  const cases = inputs.map((input) => comparedCase(input, settings.align));
  const aligned = alignment(cases, settings);
  const origins = usedOrigins(aligned, aligned.origins);
  const base = baseOf(inputs, settings);
  const others = inputs.map((_, i) => i).filter((i) => i !== base);
  const pairs = others.map((other): LaidPair => {
    const { align, at = compareDefaults.at } = settings;
    const laying = { align, at, origins: [origins[base], origins[other]] as const };
    const laid = overlay([cases[base], cases[other]], laying, [inputs[base], inputs[other]]);
    return { of: [base, other], laid };
  });
  const resampled = resampleCases(cases, aligned, pairs);
  const ofAll = inputs.length > 2 ? exponentOfAll(cases) : null;
  return pairs.map((pair, at) => ({
    ...comparePair({ inputs, cases, aligned, resampled, pair, at }, settings),
    ...(ofAll === null ? {} : { common_n_of_all: ofAll }),
  }));
}

/** The case that all others are held against: the one named, else the first. */
function baseOf(inputs: readonly CaseInput[], { against }: CompareSettings): number {
  return Math.max(
    inputs.findIndex(({ name }) => name === against),
    0,
  );
}

function exponentOfAll(cases: readonly ComparedCase[]): CommonOfAll | null {
  const free = cases.flatMap(({ name, law }) =>
    law === null || law.fitted.fit.held.n !== null ? [] : [{ name, fitted: law.fitted }],
  );
  if (free.length < 2) return null;
  const { n, low, high, p, test, AICc } = commonExponent(free.map(({ fitted }) => fitted));
  return { cases: free.map(({ name }) => name), n, low, high, p, test, AICc };
}
