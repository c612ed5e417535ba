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
  common_n: { value: 1.26, low: 1.21, high: 1.31, p: 0.81 },
  aligned_with: "common n",
};
