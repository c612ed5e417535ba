import { crossing } from "./crossing.ts";
import type { PowerLawFit } from "./fitPowerLaw.ts";
import { type CentredLaw, type Held, kappaFloor, kappaLimit } from "./lawProblem.ts";
import { minimiseLaw } from "./minimiseLaw.ts";

/** An interval by profile likelihood; a side that is never reached is null and says why. */
export interface ProfileEnds {
  readonly low: number | null;
  readonly high: number | null;
  readonly why_low?: string;
  readonly why_high?: string;
}

/** Fine enough for a fit inside a profile: the sum is flat to second order. */
const innerTolerance = 1e-4;

const whys = {
  x0: {
    low: "the fit hardly worsens as the origin moves away without end: too short a span to bound it",
    high: "the fit hardly worsens up to the first station: these stations do not bound the origin from above",
  },
  n: {
    low: "an exponent near zero fits nearly as well: these stations do not bound it from below",
    high: "the fit hardly worsens as the exponent grows without end: too short a span to bound it",
  },
  A: {
    low: "the fit hardly worsens as A falls without end: too short a span to bound it",
    high: "the fit hardly worsens as A grows without end: too short a span to bound it",
  },
};

/**
 * Profile likelihood interval: all values of one number for which the best of the others raises the sum of
 * squared residuals by less than `drop`.
 * @param fit       a fit with that number free
 * @param parameter which one
 * @param drop      3.84 where errors are known, s² F(1, N - p) where the residuals tell them
 * @returns         ends in the number's own unit; null with a reason where the sum never rises that far
 * @see             Venzon & Moolgavkar (1988), Appl. Statist. 37, 87
 */
export function profileInterval(fit: PowerLawFit, parameter: "n" | "x0" | "A", drop: number): ProfileEnds {
  const path = pathOf(fit, parameter, Math.sqrt(drop));
  const excess = (at: number) => Math.sqrt(Math.max(path.sum(at) - fit.residualSum, 0)) - Math.sqrt(drop);
  const below = crossing(excess, path.centre, -path.step, path.low, -Math.sqrt(drop));
  const above = crossing(excess, path.centre, path.step, path.high, -Math.sqrt(drop));
  const [low, high] = (path.falling ? [above, below] : [below, above]).map((at) =>
    at === null ? null : representable(path.value(at), parameter),
  );
  return {
    low,
    high,
    ...(low === null ? { why_low: whys[parameter].low } : {}),
    ...(high === null ? { why_high: whys[parameter].high } : {}),
  };
}

/** An end of A that over- or underflows is no end. */
function representable(value: number, parameter: "n" | "x0" | "A"): number | null {
  return Number.isFinite(value) && (parameter !== "A" || value > 0) ? value : null;
}

/** A coordinate in which the root of the profile is nearly straight, with its range. */
interface Path {
  readonly centre: number;
  /** Where an ellipse would have the crossing. */
  readonly step: number;
  readonly low: number;
  readonly high: number;
  /** Whether the number falls as the coordinate grows. */
  readonly falling: boolean;
  readonly value: (at: number) => number;
  /** Least sum with the number held there. */
  readonly sum: (at: number) => number;
}

function pathOf(fit: PowerLawFit, parameter: "n" | "x0" | "A", root: number): Path {
  const { problem, law, held, n } = fit;
  const error = (at: number) => Math.sqrt(Math.max(fit.unitCovariance?.[at] ?? 0, 0)) * root;
  const least = (start: CentredLaw, fixed: Partial<Held>) =>
    minimiseLaw(problem, start, { ...held, ...fixed }, innerTolerance).sum;
  const within = (kappa: number) =>
    Math.min(Math.max(kappa, 2 * kappaFloor(problem)), kappaLimit(problem) * (1 - 1e-6));
  if (parameter === "x0") {
    const value = (kappa: number) => problem.centre - 1 / kappa;
    const sum = (kappa: number) => least({ ...law, kappa }, { x0: value(kappa) });
    const range = { low: kappaFloor(problem), high: kappaLimit(problem) };
    return { centre: law.kappa, step: error(4) * law.kappa ** 2, ...range, falling: false, value, sum };
  }
  if (parameter === "A") {
    const sum = (lnA: number) => least(law, { lnA });
    const centre = Math.log(fit.A);
    return { centre, step: error(0), ...unbounded, falling: false, value: Math.exp, sum };
  }
  if (held.x0 !== null) {
    const sum = (at: number) => least({ ...law, b: at * law.kappa }, { n: at });
    return { centre: n, step: error(8), ...unbounded, falling: false, value: (at) => at, sum };
  }
  // along 1/n the slope at the centre stays put while the origin moves upstream: kappa = b/n
  const sum = (inverse: number) => least({ ...law, kappa: within(law.b * inverse) }, { n: 1 / inverse });
  const value = (inverse: number) => 1 / inverse;
  const range = { low: 1e-4 / n, high: 100 / n };
  return { centre: 1 / n, step: error(8) / n ** 2, ...range, falling: true, value, sum };
}

const unbounded = { low: Number.NEGATIVE_INFINITY, high: Number.POSITIVE_INFINITY };
