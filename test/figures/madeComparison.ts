import type { ComparedRatio, Comparison, Verdict } from "../../src/core/comparison.ts";
import { bare, estimate, missing } from "../../src/core/quantity.ts";

function ratio(value: number, low: number, high: number, verdict: Verdict): ComparedRatio {
  const xi = [13, 18, 24, 31, 40, 52, 67];
  const along = xi.map((_, i) => value * (1 + 0.012 * Math.sin(3 * i)));
  return {
    ratio: estimate(value, low, high),
    largest: bare(Math.max(...along), "the largest departure is shown, not tested"),
    verdict,
    p_equivalent: 0.02,
    p_different: 0.3,
    equivalent_from: verdict === "equivalent" ? 13 : null,
    curve: {
      xi,
      ratio: along,
      low: along.map((one) => one * 0.96),
      high: along.map((one) => one * 1.04),
    },
  };
}

/** Two made-up cases side by side, one verdict of each kind and one quantity that is missing. */
export const madeComparison: Comparison = {
  cases: ["screen", "simulation"],
  align: "x0",
  tolerance: 0.1,
  overlap: [13, 67],
  why: null,
  quantities: {
    Tu: ratio(0.99, 0.96, 1.01, "equivalent"),
    L11: ratio(1.05, 0.99, 1.1, "undecided"),
    lambda: ratio(1.15, 1.11, 1.19, "different"),
    eta: {
      ...ratio(1, 1, 1, "undecided"),
      ratio: missing("the viscosity of the simulation is not known"),
      largest: missing("the viscosity of the simulation is not known"),
      verdict: null,
      curve: { xi: [], ratio: [], low: [], high: [] },
    },
    Re_lambda: ratio(1.1, 1.05, 1.14, "undecided"),
    isotropy_uv: ratio(0.93, 0.91, 0.95, "equivalent"),
  },
  extra_distance: estimate(-0.1525, -0.23, -0.08),
  matched_distance: estimate(-0.151, -0.22, -0.09),
  equivalent_beyond: {
    quantities: ["Tu", "L11"],
    from: 24,
    why: "the interval of the stretch before reaches beyond the tolerance",
    stretches: [
      { from: 13, to: 31, equivalent: true, narrowest: { quantity: "Tu", ratio: estimate(1, 0.98, 1.02) } },
      { from: 18, to: 40, equivalent: false, narrowest: { quantity: "L11", ratio: estimate(1.07, 1, 1.14) } },
      { from: 24, to: 67, equivalent: true, narrowest: { quantity: "L11", ratio: estimate(1.03, 1, 1.06) } },
    ],
  },
  matched: {
    x: [bare(0.6, "chosen, not measured"), estimate(0.449, 0.38, 0.51)],
    Tu: estimate(0.032, 0.031, 0.033),
  },
  common_n: {
    value: 1.26,
    low: 1.21,
    high: 1.31,
    p: 0.81,
    test: "chi-square",
    AICc: { common: 31, own: 34 },
  },
  origins: {
    own: {
      n: [estimate(1.25, 1.2, 1.31), estimate(1.27, 1.13, 1.41)],
      x0: [estimate(0.08, 0.055, 0.105), estimate(-0.0725, -0.145, 0)],
      extra_distance: estimate(-0.1525, -0.25, -0.06),
    },
    common: {
      n: [estimate(1.26, 1.21, 1.31), estimate(1.26, 1.21, 1.31)],
      x0: [estimate(0.078, 0.06, 0.096), estimate(-0.0745, -0.13, -0.02)],
      extra_distance: estimate(-0.1525, -0.23, -0.08),
    },
  },
  aligned_with: "common n",
  spectra: {
    within: 0.1,
    pairs: [
      {
        x: [0.5, 0.35],
        xi: [17, 17.2],
        range: [0.004, 0.9],
        bands: 22,
        distance: bare(0.21, "held against what chance makes of it"),
        chance: 0.1,
        chance_95: 0.13,
        p: 0.0001,
      },
      {
        x: [1, 0.85],
        xi: [37, 37.4],
        range: [0.005, 0.9],
        bands: 21,
        distance: bare(0.09, "held against what chance makes of it"),
        chance: 0.1,
        chance_95: 0.13,
        p: 0.6,
      },
    ],
    why: null,
  },
};
