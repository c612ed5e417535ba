import type { DecayResult, DecaySettings } from "../decayResult.ts";
import { chiSquareTail } from "../signal/distributions/chiSquareTail.ts";
import { fTail } from "../signal/distributions/fTail.ts";
import { inflation, type Refusal, type WindowFit } from "./fitWindow.ts";
import { minimiseLaw } from "./minimiseLaw.ts";

/** Exponents of the energy that theory gives, with the names they go by. */
export const namedExponents = [
  { name: "self-similar", n: 1 },
  { name: "Saffman", n: 6 / 5 },
  { name: "Loitsyansky", n: 10 / 7 },
  { name: "final period, Saffman", n: 3 / 2 },
  { name: "bounded domain", n: 2 },
  { name: "final period", n: 5 / 2 },
] as const;

/**
 * How well each named exponent agrees with the stations: likelihood-ratio test of n held there against n free,
 * by chi-square where errors are known and by F where the residuals tell them.
 * @param windows the law of each window that counts; the largest p over them is given
 * @returns       p of each with the test it came from; null where n was held, or there is no law
 * @see           Saffman (1967), Phys. Fluids 10, 1349; Kolmogorov (1941); Batchelor & Townsend (1948);
 *                Touil, Bertoglio & Shao (2002), J. Turbulence 3, 049
 */
export function hypotheses(
  windows: readonly (WindowFit | Refusal)[],
  settings: DecaySettings,
): DecayResult["hypotheses"] {
  return namedExponents.map(({ name, n }) => {
    const found = windows.flatMap((window) => ("refused" in window ? [] : [probability(window, n)]));
    if (settings.n !== null || found.length === 0) return { name, n, p: null, test: null };
    const largest = found.reduce((best, one) => (one.p > best.p ? one : best));
    return { name, n, ...largest };
  });
}

function probability(window: WindowFit, n: number): { p: number; test: "chi-square" | "F" } {
  const { fit, variance } = window;
  const { problem, law, held } = fit;
  // along the ridge of equal slope at the centre: kappa = b/n
  const start = held.x0 === null ? { ...law, kappa: law.kappa * Math.min(fit.n / n, 1) } : law;
  const rise = Math.max(minimiseLaw(problem, start, { ...held, n }, 1e-4).sum - fit.residualSum, 0);
  const { ratio, freedom } = inflation(window, "n");
  if (freedom === null) return { p: chiSquareTail(rise, 1), test: "chi-square" };
  return { p: variance * ratio > 0 ? fTail(rise / (variance * ratio), 1, freedom) : 0, test: "F" };
}
