import type { CentredLaw, Held, LawProblem } from "./lawProblem.ts";

/** Below this kappa d the series replaces the closed form, which loses digits there. */
const seriesBelow = 1e-3;

/**
 * Weighted sum of squared residuals of a law, with the numbers it is linear in solved exactly
 * (separable least squares): c and b with log residuals, the level e^c with linear ones.
 * Fills the problem's scratch with residuals and derivatives, and `law` with what was solved.
 * @param law  in: kappa (and b with linear residuals); out: consistent with what is held
 * @returns    sum of (residual/error)², or of residual² with equal weights
 * @see        Golub & Pereyra (1973), SIAM J. Numer. Anal. 10, 413
 */
export function evaluateLaw(problem: LawProblem, law: CentredLaw, held: Held): number {
  const { count, d, g, byKappa } = problem;
  const { kappa } = law;
  for (let i = 0; i < count; i++) {
    const t = kappa * d[i];
    if (Math.abs(t) < seriesBelow) {
      g[i] = d[i] * (1 - t * (1 / 2 - t * (1 / 3 - t / 4)));
      byKappa[i] = d[i] * d[i] * (-1 / 2 + t * (2 / 3 - t * (3 / 4 - (4 / 5) * t)));
    } else {
      g[i] = Math.log1p(t) / kappa;
      byKappa[i] = (d[i] / (1 + t) - g[i]) / kappa;
    }
  }
  if (held.n !== null) law.b = held.n * kappa;
  if (problem.linear) solveLevel(problem, law, held);
  else solveLine(problem, law, held);
  return fillResiduals(problem, law);
}

/** c of the law whose A is held: ln A = c - n ln(kappa ell). */
function levelOfHeldA(problem: LawProblem, law: CentredLaw, lnA: number): number {
  return lnA + (law.b / law.kappa) * Math.log(law.kappa * problem.length);
}

/** b of the law whose A is held, log residuals: a line through one point. */
function slopeOfHeldA({ count, y, w, g, length }: LawProblem, { kappa }: CentredLaw, lnA: number): number {
  const shift = Math.log(kappa * length);
  let top = 0;
  let bottom = 0;
  for (let i = 0; i < count; i++) {
    const h = kappa * g[i] - shift;
    const weight = w[i] * w[i];
    top -= weight * h * (y[i] - lnA);
    bottom += weight * h * h;
  }
  return (top / bottom) * kappa;
}

/** Log residuals: c and b (as far as free) by weighted linear least squares in g. */
function solveLine(problem: LawProblem, law: CentredLaw, held: Held): void {
  const { count, y, w, g } = problem;
  if (held.lnA !== null) {
    if (held.n === null) law.b = slopeOfHeldA(problem, law, held.lnA);
    law.c = levelOfHeldA(problem, law, held.lnA);
    return;
  }
  let weights = 0;
  let meanY = 0;
  let meanG = 0;
  for (let i = 0; i < count; i++) {
    const weight = w[i] * w[i];
    weights += weight;
    meanY += weight * y[i];
    meanG += weight * g[i];
  }
  meanY /= weights;
  meanG /= weights;
  if (held.n === null) {
    let top = 0;
    let bottom = 0;
    for (let i = 0; i < count; i++) {
      const weighted = w[i] * w[i] * (g[i] - meanG);
      top -= weighted * (y[i] - meanY);
      bottom += weighted * (g[i] - meanG);
    }
    law.b = top / bottom;
  }
  law.c = meanY + law.b * meanG;
}

/** Linear residuals: the level e^c alone. */
function solveLevel(problem: LawProblem, law: CentredLaw, held: Held): void {
  if (held.lnA !== null) {
    law.c = levelOfHeldA(problem, law, held.lnA);
    return;
  }
  const { count, y, w, g } = problem;
  let top = 0;
  let bottom = 0;
  for (let i = 0; i < count; i++) {
    const shape = Math.exp(-law.b * g[i]) * w[i];
    top += shape * y[i] * w[i];
    bottom += shape * shape;
  }
  law.c = Math.log(top / bottom);
}

function fillResiduals(problem: LawProblem, law: CentredLaw): number {
  const { count, linear, y, w, g, residual, byC, byB, byKappa } = problem;
  let sum = 0;
  for (let i = 0; i < count; i++) {
    const logarithm = law.c - law.b * g[i];
    const value = linear ? Math.exp(logarithm) : logarithm;
    const scale = linear ? value * w[i] : w[i];
    residual[i] = w[i] * (y[i] - value);
    byC[i] = scale;
    byB[i] = -scale * g[i];
    byKappa[i] *= -scale * law.b;
    sum += residual[i] * residual[i];
  }
  return sum;
}
