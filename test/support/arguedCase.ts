import { argueDecay } from "../../src/core/decay/argueDecay.ts";
import { deriveStations } from "../../src/core/decay/deriveStations.ts";
import { fitDecay } from "../../src/core/decay/fitDecay.ts";
import type { DecaySettings } from "../../src/core/decayResult.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import type { SentenceCase } from "../../src/export/sentences/sentenceCase.ts";
import { type LawOfStations, lawStations, plainSettings, spacedFrom } from "./lawStations.ts";

const mesh = 0.025;
/** k/U² = 0.06 ((x - 3 M)/M)^-1.25, L11 = 5 mm ((x - 3 M)/M)^0.375. */
export const screenLaw: LawOfStations = {
  ...{ A: 0.06, x0: 3 * mesh, n: 1.25, ell: mesh, U: 6, nu: 1.5e-5 },
  ...{ B: 0.005, m: 0.375 },
};

/** A case of exact stations on a law, errors of 1 % on everything, fitted and argued as the worker does it. */
export function arguedCase(
  change: Partial<Pick<SentenceCase, "name" | "mark">> & {
    readonly law?: LawOfStations;
    readonly settings?: Partial<DecaySettings>;
    readonly edit?: (station: StationResult) => Partial<StationResult>;
  } = {},
): SentenceCase & { readonly settings: DecaySettings } {
  const { name = "screen", mark = 0, law = screenLaw, edit = () => ({}) } = change;
  const settings: DecaySettings = {
    ...plainSettings,
    referenceLength: mesh,
    kinematicViscosity: law.nu,
    window: [0, 9],
    ...change.settings,
  };
  const measured = lawStations(law, spacedFrom(law.x0, 0.2, 2, 14), 0.01).map((station) => ({
    ...station,
    ...edit(station),
  }));
  const decay = fitDecay(measured, settings);
  const stations = deriveStations(measured, decay, settings);
  const argument = argueDecay(stations, decay, settings);
  return {
    ...{ name, mark, stations, settings },
    decay: { ...decay, argument },
    ...{ length: mesh, symbol: "M", units: "SI" },
  };
}
