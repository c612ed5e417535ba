import { crossing } from "../decay/crossing.ts";
import { inflation, type WindowFit } from "../decay/fitWindow.ts";
import { type CentredLaw, kappaLimit, type LawProblem } from "../decay/lawProblem.ts";
import { minimiseLaw } from "../decay/minimiseLaw.ts";
import { chiSquareQuantile } from "../signal/distributions/chiSquareQuantile.ts";
import { chiSquareTail } from "../signal/distributions/chiSquareTail.ts";
import { fQuantile } from "../signal/distributions/fQuantile.ts";
import { fTail } from "../signal/distributions/fTail.ts";

/** One case as the joint fit sees it. */
export interface JointCase {
  readonly problem: LawProblem;
  /** Where the search begins. */
  readonly law: CentredLaw;
  /** A number where the virtual origin is held. */
  readonly x0: number | null;
  /** Variance of one weighted residual as n sees it: 1 where errors are known. */
  readonly variance: number;
  /** Curvature of half the sum of squares along n. */
  readonly curvature: number;
}

/** Laws of several cases with one exponent. */
export interface JointFit {
  readonly n: number;
  readonly laws: readonly CentredLaw[];
  /** Sum over the cases of squared residuals over their variance. */
  readonly sum: number;
}

/** The search ends when n moves by less than this share of its standard error. */
const fine = 1e-6;
const mostSteps = 40;

export function jointCase(window: WindowFit): JointCase {
  const { fit, variance } = window;
  // stations sampled together know n worse, or better, than each for itself would
  const floor = fit.residualSum > 0 ? variance * inflation(window, "n").ratio : 1;
  const spread = fit.unitCovariance?.[8] ?? 0;
  return {
    problem: fit.problem,
    law: fit.law,
    x0: fit.held.x0,
    variance: floor > 0 ? floor : 1,
    curvature: spread > 0 ? 1 / spread : 0,
  };
}

/**
 * The exponent that serves all cases best, each with its own A and x0: the zero of
 *     dS/dn = -2 sum over cases and stations of r (dr/dn)/variance, at the best A and x0 for that n
 * by Newton's method with the curvatures of the free fits, then secants.
 * @param start     n to begin with
 * @param tolerance the search ends when n moves by less than this share of its standard error
 */
export function jointFit(cases: readonly JointCase[], start: number, tolerance = fine): JointFit {
  const curvature = cases.reduce((sum, { curvature, variance }) => sum + curvature / variance, 0);
  const smallest = tolerance / Math.sqrt(curvature);
  let now = sloped(cases, start, tolerance);
  let before = now;
  for (let step = 0; step < mostSteps; step++) {
    const secant = (now.slope - before.slope) / (now.n - before.n);
    const falls = Number.isFinite(secant) && secant < 0;
    const move = now.slope / (falls ? -secant : curvature);
    // one step at most halves or doubles the exponent
    const next = Math.min(Math.max(now.n + move, now.n / 2), now.n * 2);
    if (!(Math.abs(next - now.n) > smallest)) break;
    before = now;
    now = sloped(cases, next, tolerance, now.laws);
  }
  return now;
}

/** Best laws for a given n, and half the fall of the sum as n grows. */
function sloped(
  cases: readonly JointCase[],
  n: number,
  tolerance: number,
  laws: readonly CentredLaw[] | null = null,
): JointFit & { slope: number } {
  let sum = 0;
  let slope = 0;
  const found = cases.map(({ problem, law, x0, variance }, at) => {
    const from = laws?.[at] ?? law;
    // the slope at the centre hardly changes with n: kappa = b/n
    const kappa = Math.min(from.b / n, kappaLimit(problem) * (1 - 1e-6));
    const start = x0 === null ? { ...from, kappa } : from;
    const minimum = minimiseLaw(problem, start, { lnA: null, x0, n }, tolerance);
    sum += minimum.sum / variance;
    let product = 0;
    for (let i = 0; i < problem.count; i++) product += problem.residual[i] * problem.byB[i];
    slope += (product * minimum.law.kappa) / variance;
    return minimum.law;
  });
  return { n, laws: found, sum, slope };
}

/** One exponent for all cases against one each. */
export interface CommonExponent extends JointFit {
  readonly low: number | null;
  readonly high: number | null;
  /** Probability of a larger rise of the sum of squares if all decay alike. */
  readonly p: number;
  readonly test: "chi-square" | "F";
  /** Akaike's criterion for short samples, of one exponent and of one each; null with too few stations. */
  readonly AICc: { readonly common: number; readonly own: number } | null;
}

/**
 * Whether one exponent serves all cases: the rise of the sum of squares over that of each with its own, by chi-square
 * with one freedom less than there are cases where all know their errors, else by F with the freedom of those whose
 * scatter tells them; and beside it AICc, whose smaller value foretells new stations better.
 * @param fits free fits of the cases, two or more, none with n held
 * @see        Hurvich & Tsai (1989), Biometrika 76, 297
 */
export function commonExponent(fits: readonly WindowFit[]): CommonExponent {
  const cases = fits.map(jointCase);
  const weights = cases.map(({ curvature, variance }) => curvature / variance);
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const start = fits.reduce((sum, { fit }, i) => sum + (weights[i] / total) * fit.n, 0);
  const joint = jointFit(cases, start);
  const separate = fits.reduce((sum, { fit }, i) => sum + fit.residualSum / cases[i].variance, 0);
  const freedom = fits.reduce((sum, window) => sum + (inflation(window, "n").freedom ?? 0), 0);
  const rise = Math.max(joint.sum - separate, 0);
  const fewer = fits.length - 1;
  const drop = freedom === 0 ? chiSquareQuantile(0.95, 1) : fQuantile(0.95, 1, freedom);
  const root = Math.sqrt(drop);
  const excess = (n: number) => Math.sqrt(Math.max(sloped(cases, n, fine).sum - joint.sum, 0)) - root;
  const step = root / Math.sqrt(total);
  return {
    ...joint,
    low: crossing(excess, joint.n, -Math.min(step, joint.n / 4), joint.n / 100, -root),
    high: crossing(excess, joint.n, step, joint.n * 100, -root),
    p: freedom === 0 ? chiSquareTail(rise, fewer) : fTail(rise / fewer, fewer, freedom),
    test: freedom === 0 ? "chi-square" : "F",
    AICc: akaike(fits, joint.sum, separate, freedom > 0),
  };
}

/**
 * AICc of both: S + 2 p + 2 p (p + 1)/(N - p - 1) where errors are known; N ln(S/N) takes the place of S where the scatter
 * tells them, which is one number more.
 */
function akaike(fits: readonly WindowFit[], common: number, own: number, scattered: boolean) {
  const stations = fits.reduce((sum, { fit }) => sum + fit.problem.count, 0);
  const free = stations - fits.reduce((sum, { fit }) => sum + fit.freedom, 0) + (scattered ? 1 : 0);
  const value = (sum: number, parameters: number) =>
    (scattered ? stations * Math.log(sum / stations) : sum) +
    2 * parameters +
    (2 * parameters * (parameters + 1)) / (stations - parameters - 1);
  const both = { common: value(common, free - fits.length + 1), own: value(own, free) };
  const sound = stations - free - 1 > 0 && Number.isFinite(both.common) && Number.isFinite(both.own);
  return sound ? both : null;
}
