import { evaluateLaw } from "./evaluateLaw.ts";
import { type CentredLaw, type Held, kappaFloor, kappaLimit, type LawProblem } from "./lawProblem.ts";
import { normalMatrix } from "./normalMatrix.ts";
import { solveSymmetric } from "./solveSymmetric.ts";

export interface Minimum {
  readonly law: CentredLaw;
  /** Sum of squared weighted residuals at the minimum. */
  readonly sum: number;
  readonly iterations: number;
  readonly converged: boolean;
  /** The search ran upstream without end: the stations fall like an exponential. */
  readonly exponential: boolean;
}

const mostIterations = 200;
/** A minimum found on a step damped more than this is none. */
const littleDamping = 1e-3;

/**
 * Least squares of a law by Gauss-Newton steps, damped where a full step does not descend (Levenberg, Marquardt);
 * at each step the numbers the law is linear in are solved exactly.
 * @param start     where the search begins; kappa inside its bracket
 * @param held      what is held
 * @param tolerance the search ends when a step is below this share of the standard error
 */
export function minimiseLaw(problem: LawProblem, start: CentredLaw, held: Held, tolerance: number): Minimum {
  let law = { c: start.c, b: start.b, kappa: start.kappa };
  let sum = evaluateLaw(problem, law, held);
  const nothingNonlinear = held.x0 !== null && (!problem.linear || held.n !== null);
  if (nothingNonlinear) return { law, sum, iterations: 1, converged: true, exponential: false };
  const { matrix, gradient, step } = problem;
  let damping = 0;
  normalMatrix(problem, law, held);
  for (let iteration = 1; iteration <= mostIterations && damping < 1e12; iteration++) {
    if (!solveSymmetric(matrix, damping, gradient, step)) {
      damping = Math.max(10 * damping, littleDamping);
      continue;
    }
    const small = damping < littleDamping && isSmall(problem, sum, tolerance);
    const trial = stepped(problem, law);
    const trialSum = evaluateLaw(problem, trial, held);
    // near the minimum the sum is flat to its last digits, and the step knows better than the sum
    if (trialSum <= sum + roundingOf(problem, sum)) {
      if (small) return ended(problem, held, trial, trialSum, iteration, true);
      law = trial;
      sum = trialSum;
      damping = damping < 1e-6 ? 0 : damping / 10;
      normalMatrix(problem, law, held);
    } else {
      damping = Math.max(10 * damping, littleDamping);
    }
  }
  return ended(problem, held, law, sum, mostIterations, false);
}

function ended(
  problem: LawProblem,
  held: Held,
  law: CentredLaw,
  sum: number,
  iterations: number,
  converged: boolean,
): Minimum {
  const exponential = held.x0 === null && law.kappa < 2 * kappaFloor(problem);
  return { law, sum, iterations, converged: converged && !exponential, exponential };
}

/** What rounding of the stations' own size may add to a sum of squared residuals. */
function roundingOf({ magnitude }: LawProblem, sum: number): number {
  return 2e-15 * Math.sqrt(sum * magnitude) + 1e-30 * magnitude;
}

/** Whether the fall that the step promises is nothing beside what one standard error costs, or beside rounding. */
function isSmall(problem: LawProblem, sum: number, tolerance: number): boolean {
  const { step, gradient, count, errorsKnown, magnitude } = problem;
  const fall = step[0] * gradient[0] + step[1] * gradient[1] + step[2] * gradient[2];
  const variance = sum / Math.max(count - 3, 1);
  const worth = tolerance ** 2 * (errorsKnown ? Math.max(1, variance) : variance);
  return fall <= Math.max(worth, 1e-30 * magnitude);
}

/** The law after a step; kappa goes at most half way to the end of its bracket. */
function stepped(problem: LawProblem, law: CentredLaw): CentredLaw {
  const { step } = problem;
  let kappa = law.kappa + step[2];
  const low = kappaFloor(problem);
  const high = kappaLimit(problem);
  if (kappa <= low) kappa = (law.kappa + low) / 2;
  if (kappa >= high) kappa = (law.kappa + high) / 2;
  return { c: law.c + step[0], b: law.b + step[1], kappa };
}
