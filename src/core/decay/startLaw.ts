import { evaluateLaw } from "./evaluateLaw.ts";
import { type CentredLaw, type Held, kappaLimit, type LawProblem } from "./lawProblem.ts";

/** Distances of the origin upstream of the first station that are tried, in spans of the stations. */
const distances = [0.003, 0.02, 0.07, 0.2, 0.5, 1.2, 3, 10, 60];

/** The same law with a given origin and exponent, its level still unsolved. */
export function lawAbout(problem: LawProblem, x0: number, n: number): CentredLaw {
  const kappa = Math.min(1 / (problem.centre - x0), kappaLimit(problem));
  return { c: 0, b: n * kappa, kappa };
}

/**
 * Where a refinement may start: the best of a scan of virtual origins below the first station.
 * With log residuals the other numbers are solved exactly at each; with linear ones by the law of ln q first.
 * @param problem in log residuals (the scan needs no start itself)
 */
export function startLaw(problem: LawProblem, held: Held): CentredLaw {
  if (held.x0 !== null) {
    const law = lawAbout(problem, held.x0, held.n ?? 1);
    evaluateLaw(problem, law, held);
    return law;
  }
  let best: CentredLaw | null = null;
  let least = Number.POSITIVE_INFINITY;
  for (const distance of distances) {
    const law = lawAbout(problem, problem.first - distance * problem.span, held.n ?? 1);
    const sum = evaluateLaw(problem, law, held);
    if (sum < least) {
      best = law;
      least = sum;
    }
  }
  return best ?? lawAbout(problem, problem.first - problem.span, 1);
}
