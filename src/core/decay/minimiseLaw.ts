import { evaluateLaw } from "./evaluateLaw.ts";
import { inverseOfSymmetric, times } from "./inverseOfSymmetric.ts";
import { type CentredLaw, type Held, kappaFloor, kappaLimit, type LawProblem } from "./lawProblem.ts";
import { type NormalMatrix, normalMatrix } from "./normalMatrix.ts";

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

/**
 * Least squares of a law by Gauss-Newton steps, damped where a full step does not descend (Levenberg, Marquardt);
 * at each step the numbers the law is linear in are solved exactly.
 * @param start     where the search begins; kappa inside its bracket
 * @param held      what is held
 * @param tolerance the search ends when a step is below this share of the standard error
 */
export function minimiseLaw(problem: LawProblem, start: CentredLaw, held: Held, tolerance: number): Minimum {
  let law = { ...start };
  let sum = evaluateLaw(problem, law, held);
  const nothingNonlinear = held.x0 !== null && (!problem.linear || held.n !== null);
  if (nothingNonlinear) return { law, sum, iterations: 1, converged: true, exponential: false };
  let damping = 0;
  let normal = normalMatrix(problem, law, held);
  for (let iteration = 1; iteration <= mostIterations; iteration++) {
    const step = dampedStep(normal, damping);
    if (step === null) return ended(problem, held, law, sum, iteration, false);
    const small = isSmall(problem, normal, step, law, sum, tolerance);
    const trial = stepped(problem, law, normal, step);
    const trialSum = evaluateLaw(problem, trial, held);
    // near the minimum the sum is flat to its last digits, and the step knows better than the sum
    const descends = trialSum <= sum + roundingOf(problem, sum);
    if (small && descends && damping < 1e-3) return ended(problem, held, trial, trialSum, iteration, true);
    if (descends) {
      [law, sum] = [trial, trialSum];
      damping = damping < 1e-6 ? 0 : damping / 10;
      normal = normalMatrix(problem, law, held);
    } else {
      damping = damping === 0 ? 1e-3 : damping * 10;
      if (damping > 1e12) return ended(problem, held, law, sum, iteration, false);
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

/** (J'J + damping · diagonal)⁻¹ J'r. */
function dampedStep({ matrix, gradient }: NormalMatrix, damping: number): number[] | null {
  const size = gradient.length;
  const damped = matrix.map((value, at) => (at % (size + 1) === 0 ? value * (1 + damping) : value));
  const inverse = inverseOfSymmetric(damped, size);
  return inverse === null ? null : times(inverse, gradient);
}

/** Whether the fall that the step promises is nothing beside what one standard error costs. */
function isSmall(
  problem: LawProblem,
  { matrix, gradient, free }: NormalMatrix,
  step: readonly number[],
  law: CentredLaw,
  sum: number,
  tolerance: number,
): boolean {
  const fall = step.reduce((total, value, i) => total + value * gradient[i], 0);
  const freedom = Math.max(problem.count - free.length, 1);
  const oneError = problem.errorsKnown ? Math.max(1, sum / freedom) : sum / freedom;
  if (fall <= tolerance ** 2 * oneError) return true;
  // data that lie on the law to the last digit: the step itself tells
  const at = free.indexOf("kappa");
  const last = matrix.length - 1;
  return at >= 0 && matrix[last] > 0 && Math.abs(step[at]) <= 4e-16 * law.kappa;
}

/** The law after a step; kappa goes at most half way to the end of its bracket. */
function stepped(
  problem: LawProblem,
  law: CentredLaw,
  { free }: NormalMatrix,
  step: readonly number[],
): CentredLaw {
  const next = { ...law };
  for (let i = 0; i < free.length; i++) next[free[i]] += step[i];
  const [low, high] = [kappaFloor(problem), kappaLimit(problem)];
  if (next.kappa <= low) next.kappa = (law.kappa + low) / 2;
  if (next.kappa >= high) next.kappa = (law.kappa + high) / 2;
  return next;
}
