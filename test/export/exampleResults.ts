import type { AlignedOrigins, CaseInput, ComparedRatio, Comparison } from "../../src/core/comparison.ts";
import { comparedQuantities } from "../../src/core/comparison.ts";
import type { DecayResult, DecaySettings } from "../../src/core/decayResult.ts";
import { bare, estimate, missing } from "../../src/core/quantity.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import { stationQuantities } from "../../src/export/resultsFile.ts";

/** A station with every kind of quantity: with an interval, without one, half open, and missing. */
export function exampleStation(x: number): StationResult {
  const each = Object.fromEntries(
    stationQuantities.map((key, i) => [
      key,
      estimate(i + 1, i + 0.5, i + 1.5, { standard: 0.25, freedom: 9, scale: "linear" }),
    ]),
  ) as Pick<StationResult, (typeof stationQuantities)[number]>;
  return {
    ...each,
    x,
    samples: 131072,
    duration: 8.192,
    ww: missing("there is no w column, or none that is known"),
    T_int: bare(0.004, "the record is shorter than 100 integral times"),
    L11: estimate(0.024, 0.02, Number.POSITIVE_INFINITY),
    routes: { lambda_f: estimate(0.004, 0.003, 0.005, { standard: 0.1, freedom: null, scale: "log" }) },
    flags: [{ code: "short-record", text: "The record is short", value: 12.3 }],
    sources: [],
    curves: null,
    blocks: null,
    facts: {
      step: 6.25e-5,
      integralTimes: 2048,
      groups: 50,
      segment: 8192,
      segments: 31,
      recoveredVariance: 0.998,
      cutoff: null,
      noiseFloor: null,
      shareBeyondCutoff: 0.001,
      taylorFactor: 1.004,
      k1max_eta: 1.6,
      lagLimit: 4096,
      tauStar: 0.02,
      components: ["u", "v"],
    },
  };
}

export const exampleDecay: DecayResult = {
  quantity: "k",
  assumption: "none",
  residuals: "log",
  weights: "sampling",
  window: [0.2, 2],
  windowChosen: "auto",
  windowReason: "the longest that the law describes",
  stations: 12,
  speed: 6,
  n: estimate(1.25, 1.2, 1.3, { standard: 0.02, freedom: null, scale: "linear" }),
  x0: estimate(0.05, Number.NEGATIVE_INFINITY, 0.1),
  A: estimate(0.04, 0.03, 0.05),
  correlation_n_x0: -0.97,
  chi2_reduced: 1.1,
  p: 0.3,
  given_window: { n: estimate(1.25, 1.22, 1.28), x0: estimate(0.05, 0.02, 0.08) },
  lambda_route: { n: estimate(1.2, 1.1, 1.3), x0: estimate(0.06, 0, 0.1) },
  epsilon_route: { n: missing("no dissipation"), x0: missing("no dissipation") },
  growth: { m: estimate(0.37, 0.3, 0.45) },
  hypotheses: [{ name: "Saffman", n: 1.2, p: 0.41 }],
  law: null,
  points: [],
  flags: [{ code: "half-open", text: "The interval of x0 has no lower end" }],
  iterations: 6,
  converged: true,
};

const decaySettings: DecaySettings = {
  quantity: "auto",
  window: "auto",
  x0: null,
  n: null,
  residuals: "log",
  weights: "sampling",
  along: "x",
  referenceLength: 0.025,
  referenceSpeed: null,
  kinematicViscosity: 1.5e-5,
  dissipation: "auto",
  kind: null,
};

export function exampleCase(name: string): CaseInput {
  return {
    name,
    stations: [exampleStation(0.2), exampleStation(0.4)],
    decay: exampleDecay,
    decaySettings,
  };
}

const ratio: ComparedRatio = {
  ratio: estimate(1.02, 0.98, 1.06),
  largest: bare(1.1, "shown, not tested"),
  verdict: "equivalent",
  p_equivalent: 0.01,
  p_different: 0.9,
  equivalent_from: 10,
  curve: { xi: [10, 20], ratio: [1.01, 1.03], low: [0.9, 0.9], high: [1.1, 1.1] },
};

const noPlace = missing("the cases share no intensity");
const origins: AlignedOrigins = {
  n: [estimate(1.22, 1.2, 1.24), estimate(1.22, 1.2, 1.24)],
  x0: [estimate(0.1, 0.05, 0.15), estimate(0.5, 0.4, 0.6)],
  extra_distance: estimate(0.4, 0.3, 0.5),
};

export const exampleComparison: Comparison = {
  cases: ["a", "b"],
  align: "x0",
  tolerance: 0.1,
  overlap: [10, 60],
  why: null,
  quantities: Object.fromEntries(comparedQuantities.map((key) => [key, ratio])) as Comparison["quantities"],
  extra_distance: estimate(0.4, 0.3, 0.5),
  matched_distance: noPlace,
  equivalent_beyond: {
    quantities: ["Tu", "lambda"],
    from: 20,
    why: "the stretch before departs by more than the tolerance",
    stretches: [
      {
        from: 10,
        to: 40,
        equivalent: false,
        narrowest: { quantity: "Tu", ratio: estimate(1.2, 1.15, 1.25) },
      },
      { from: 20, to: 60, equivalent: true, narrowest: { quantity: "Tu", ratio: estimate(1.02, 1, 1.04) } },
    ],
  },
  matched: { x: [noPlace, noPlace], Tu: noPlace },
  common_n: { value: 1.22, low: 1.2, high: 1.24, p: 0.4 },
  origins: { own: origins, common: origins },
  aligned_with: "common n",
  spectra: {
    within: 0.1,
    pairs: [
      {
        x: [0.4, 0.8],
        xi: [20, 21],
        range: [0.01, 0.8],
        bands: 18,
        distance: bare(0.08, "held against what chance makes of it"),
        chance: 0.07,
        chance_95: 0.09,
        p: 0.2,
      },
    ],
    why: null,
  },
};
