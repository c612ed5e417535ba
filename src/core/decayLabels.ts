import type { Label } from "./catalogue.ts";
import { label } from "./label.ts";

const corrsin = "Comte-Bellot and Corrsin (1966)";
const schuirmann = "Schuirmann (1987)";

/** The fitted law of a case, and two cases side by side. */
export const decayLabels: readonly Label[] = [
  label(
    "n",
    "n",
    "decay exponent of the energy",
    "1",
    "q = A ((x − x0)/ℓ)^(−n); Tu decays with n/2",
    {},
    corrsin,
  ),
  label("x0", "x_{0}", "virtual origin", "L", "where the fitted law would diverge", {}, corrsin),
  label(
    "t0",
    "t_{0}",
    "virtual origin in time",
    "T",
    "the time at which the fitted law would diverge",
    {},
    corrsin,
  ),
  label("A", "A", "coefficient of the decay law", "1", "q at (x − x0)/ℓ = 1 by the fitted law", {}, corrsin),
  label("m", "m", "growth exponent of L11", "1", "L₁₁ = B ((x − x0)/ℓ)^m; constant C_ε asks for 1 − n/2"),
  label(
    "correlation_n_x0",
    "ρ_{nx0}",
    "correlation of n and x0",
    "1",
    "covariance over both standard errors",
    {
      digits: 2,
    },
  ),
  label(
    "chi2_reduced",
    'χ^{2}/"ν"',
    "reduced chi-square",
    "1",
    "weighted squared residuals over degrees of freedom",
    {
      digits: 2,
    },
  ),
  label(
    "p",
    "p",
    "probability",
    "1",
    "probability of a statistic at least as large, if the hypothesis holds",
    {
      digits: 2,
    },
  ),
  label(
    "ratio",
    "B/A",
    "ratio, second case to first",
    "1",
    "geometric mean over the common range",
    {},
    schuirmann,
  ),
  label("largest", "B/A", "largest departure", "1", "the ratio farthest from one along the common range"),
  label("extra_distance", "Δx_{0}", "shift of the origin", "L", "x0 of the second case less x0 of the first"),
  label(
    "matched_distance",
    "Δx",
    "distance at equal intensity",
    "L",
    "x of the second case less x of the first where both have the same Tu",
  ),
  label("common_n", "n", "exponent common to the cases", "1", "one exponent fitted to all cases at once"),
];
