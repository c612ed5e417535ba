import { assert } from "../failure.ts";
import { evaluateLaw } from "./evaluateLaw.ts";
import { lawCovariance } from "./lawCovariance.ts";
import {
  type CentredLaw,
  type Held,
  type LawProblem,
  lawProblem,
  type PowerLawData,
  type PowerLawOptions,
  powerLawDefaults,
} from "./lawProblem.ts";
import { minimiseLaw } from "./minimiseLaw.ts";
import { lawAbout, startLaw } from "./startLaw.ts";

/** A fitted law and how the fit ended. */
export interface PowerLawFit {
  readonly A: number;
  readonly x0: number;
  readonly n: number;
  readonly length: number;
  /** Null where nothing is left over to tell an error from; 0 for what was held. */
  readonly standardError: { readonly A: number; readonly x0: number; readonly n: number } | null;
  /** Of (ln A, x0, n), row-major 3 × 3. */
  readonly covariance: readonly number[] | null;
  /** The same for weighted residuals of variance one. */
  readonly unitCovariance: readonly number[] | null;
  /** Of n and x0; null where either is held. */
  readonly correlation: number | null;
  /** Sum of squared residuals: chi-square where errors are known. */
  readonly residualSum: number;
  /** Stations less free numbers. */
  readonly freedom: number;
  readonly errorsKnown: boolean;
  /** What the covariance was multiplied with: 1 where errors are known, else the residual variance. */
  readonly variance: number;
  readonly iterations: number;
  readonly converged: boolean;
  /** The best origin is infinitely far upstream: the stations fall like an exponential. */
  readonly exponential: boolean;
  /** What a profile starts from. */
  readonly problem: LawProblem;
  readonly law: CentredLaw;
  readonly held: Held;
  readonly tolerance: number;
}

/**
 * The decay law by separable least squares: for a given origin it is linear in ln A and n (log residuals)
 * or in A (linear residuals), so that the search itself is over x0 alone, or over x0 and n.
 *     q = A ((x - x0)/ell)^(-n)
 * @param data    stations in any order, x in the case's length; q > 0; error of ln q or null for equal weights
 * @param options residuals, what is held, ell, start; see powerLawDefaults
 * @returns       A in the unit of q, x0 in the unit of x, n; errors, correlation, and whether it converged
 * @see           Golub & Pereyra (1973), SIAM J. Numer. Anal. 10, 413; Mohamed & LaRue (1990), J. Fluid Mech. 219, 195
 */
export function fitPowerLaw(data: PowerLawData, options: Partial<PowerLawOptions> = {}): PowerLawFit {
  const choice = { ...powerLawDefaults, ...options };
  const held: Held = { lnA: null, x0: choice.x0, n: choice.n };
  const problem = lawProblem(data, choice);
  assert(held.x0 === null || held.x0 < problem.first, "a held origin lies below the first station");
  const start = choice.start
    ? lawAbout(problem, held.x0 ?? choice.start.x0, held.n ?? choice.start.n)
    : firstGuess(problem, data, choice, held);
  const minimum = minimiseLaw(problem, start, held, choice.tolerance);
  const { law, sum, iterations, converged, exponential } = minimum;
  evaluateLaw(problem, law, held);
  const parameters = 1 + (held.x0 === null ? 1 : 0) + (held.n === null ? 1 : 0);
  const freedom = problem.count - parameters;
  const variance = problem.errorsKnown ? 1 : freedom > 0 ? sum / freedom : 0;
  const unit = freedom > 0 || problem.errorsKnown ? lawCovariance(problem, law, held) : null;
  const covariance = unit === null ? null : unit.map((value) => value * variance);
  const n = held.n ?? law.b / law.kappa;
  const A = Math.exp(law.c - n * Math.log(law.kappa * problem.length));
  return {
    A,
    x0: held.x0 ?? problem.centre - 1 / law.kappa,
    n,
    length: problem.length,
    ...errorsOf(covariance, A),
    unitCovariance: unit,
    residualSum: sum,
    freedom,
    errorsKnown: problem.errorsKnown,
    variance,
    iterations,
    converged,
    exponential,
    problem,
    law,
    held,
    tolerance: choice.tolerance,
  };
}

/** With linear residuals the fit of ln q shows the way. */
function firstGuess(
  problem: LawProblem,
  data: PowerLawData,
  choice: PowerLawOptions,
  held: Held,
): CentredLaw {
  if (!problem.linear) return startLaw(problem, held);
  const logarithmic = lawProblem(data, { ...choice, residuals: "log" });
  return minimiseLaw(logarithmic, startLaw(logarithmic, held), held, 1e-3).law;
}

function errorsOf(
  covariance: readonly number[] | null,
  A: number,
): Pick<PowerLawFit, "standardError" | "covariance" | "correlation"> {
  if (covariance === null) return { standardError: null, covariance: null, correlation: null };
  const [ofLnA, ofX0, ofN] = [covariance[0], covariance[4], covariance[8]].map(Math.sqrt);
  return {
    standardError: { A: A * ofLnA, x0: ofX0, n: ofN },
    covariance,
    correlation: ofX0 > 0 && ofN > 0 ? covariance[5] / (ofX0 * ofN) : null,
  };
}
