import type { CaseInput, CompareSettings, Comparison } from "../comparison.ts";
import { argueDecay } from "../decay/argueDecay.ts";
import { deriveStations } from "../decay/deriveStations.ts";
import { fitDecay } from "../decay/fitDecay.ts";
import type { DecaySettings } from "../decayResult.ts";
import type { StationResult } from "../stationResult.ts";
import { compareCases } from "./compareCases.ts";

/** One case as reduction left it, with what the user decided about its decay. */
export interface ReducedCase {
  readonly name: string;
  readonly stations: readonly StationResult[];
  readonly settings: DecaySettings;
}

/**
 * Everything that follows from reduced stations: each case's law is fitted, what the law fixes is derived from it, all
 * that speaks for and against the law is gathered, and the cases are compared with the first.
 * @param cases   stations as reduction left them, in any order; they come back in order of x
 * @param compare alignment and tolerance
 */
export function argueCases(
  cases: readonly ReducedCase[],
  compare: CompareSettings,
): { cases: CaseInput[]; comparisons: Comparison[] } {
  const argued = cases.map(({ name, stations, settings }): CaseInput => {
    const inOrder = [...stations].sort((a, b) => a.x - b.x);
    const decay = fitDecay(inOrder, settings);
    const derived = deriveStations(inOrder, decay, settings);
    const argument = argueDecay(derived, decay, settings);
    return { name, stations: derived, decay: { ...decay, argument }, decaySettings: settings };
  });
  return { cases: argued, comparisons: compareCases(argued, compare) };
}
