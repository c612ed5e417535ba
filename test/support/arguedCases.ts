import { argueCases } from "../../src/core/compare/argueCases.ts";
import type { DecaySettings } from "../../src/core/decayResult.ts";
import type { FigureCase } from "../../src/figures/figureSpec.ts";
import { type LawOfStations, lawStations, plainSettings, spacedFrom } from "./lawStations.ts";

/** Two laws of grid turbulence in air: M 25 mm, origins at 3 M and at 2 M upstream, exponents apart. */
export const screenLaw: LawOfStations = {
  ...{ A: 0.06, x0: 0.075, n: 1.25, ell: 0.025, U: 6, nu: 1.5e-5, B: 0.005, m: 0.375 },
};
export const inflowLaw: LawOfStations = { ...screenLaw, A: 0.09, x0: -0.05, n: 1.4, m: 0.3 };

/** A scatter without a seed: the same at every run, and of no trend. */
const moved = (error: number) => (i: number) => Math.exp(error * 1.3 * Math.sin(2.4 * i * i + 1));

/** Twelve stations on each law, fitted and argued as records would be; `change` goes into both cases' settings. */
export function arguedCases(change: Partial<DecaySettings> = {}, error = 0.01): FigureCase[] {
  const made = [
    { name: "screen", law: screenLaw },
    { name: "inflow", law: inflowLaw },
  ];
  const argued = argueCases(
    made.map(({ name, law }) => ({
      name,
      stations: lawStations(law, spacedFrom(law.x0, 0.25, 2.5, 12), error, moved(error)),
      settings: {
        ...plainSettings,
        ...{ referenceLength: law.ell, kinematicViscosity: law.nu, extent: 0.1 },
        ...change,
      },
    })),
    { align: "x0", tolerance: 0.1 },
  );
  return argued.cases.map(({ name, stations, decay }, mark) => ({
    ...{ name, mark, stations, decay, argued: decay, length: screenLaw.ell, symbol: "M" },
  }));
}
