import type { Narrowing } from "../decayArgument.ts";
import { evaluateLaw } from "./evaluateLaw.ts";
import type { FitPoint, WindowFit } from "./fitWindow.ts";
import { placeAlong, placeBack } from "./flightCourse.ts";
import { lawCovariance } from "./lawCovariance.ts";
import { lawProblem, powerLawDefaults } from "./lawProblem.ts";
import { studentReach } from "./studentReach.ts";

/** One station of a plan: where it stands along the law, and the standard error of its ln q up to a common factor. */
interface Planned {
  readonly x: number;
  readonly error: number;
}

/**
 * What would narrow the intervals of n and x0 most: one more station half way between two neighbours (in ln(x - x0)) or a
 * step beyond the last, as well measured as those beside it; or a record twice as long at a station there is. The law is
 * taken as found, and its covariance formed anew for each plan.
 * @param points of the window, in order of x
 * @param window their law
 * @returns      width of the interval after over before, the greatest gain of n first; empty where n and x0 are held
 * @see          Fedorov (1972), Theory of Optimal Experiments, ch. 2
 */
export function narrowing(points: readonly FitPoint[], window: WindowFit): Narrowing[] {
  const { fit, flight, scattered } = window;
  const { problem, x0, held } = fit;
  if (held.n !== null && held.x0 !== null) return [];
  const present = points.map(
    ({ x, q, smoothedError }): Planned => ({
      x: placeAlong(flight, x),
      error: smoothedError ?? (problem.linear ? 1 / q : 1),
    }),
  );
  const before = variances(present, window);
  if (before === null) return [];
  const widths = (kind: Narrowing["kind"], x: number, plan: readonly Planned[]): Narrowing[] => {
    const after = variances(plan, window);
    if (after === null) return [];
    // one station more also tells the scatter better
    const freedom = fit.freedom + plan.length - present.length;
    const quantile = scattered ? studentReach(freedom) / studentReach(fit.freedom) : 1;
    const width = (key: "n" | "x0") => (before[key] > 0 ? quantile * Math.sqrt(after[key] / before[key]) : 1);
    return [{ kind, x: placeBack(flight, x), n: width("n"), x0: width("x0") }];
  };
  const between = present.slice(1).map((right, i): Planned => {
    const left = present[i];
    const x = x0 + Math.sqrt(left.x - x0) * Math.sqrt(right.x - x0);
    return { x, error: Math.sqrt(left.error * right.error) };
  });
  const [last, previous] = [present[present.length - 1], present[present.length - 2]];
  const beyond = { x: x0 + (last.x - x0) ** 2 / (previous.x - x0), error: last.error };
  const stations = [...between, beyond].flatMap((added) => widths("station", added.x, [...present, added]));
  const records = present.flatMap((one, i) =>
    widths(
      "record",
      one.x,
      present.map((other, j) => (i === j ? { ...other, error: other.error / Math.SQRT2 } : other)),
    ),
  );
  return [...stations, ...records].sort((a, b) => a.n * a.x0 - b.n * b.x0);
}

/** Variances of n and x0 on the found law for a plan of stations; null where it cannot tell them. */
function variances(plan: readonly Planned[], { fit }: WindowFit): { n: number; x0: number } | null {
  const { x0, n, A, length, held } = fit;
  const problem = lawProblem(
    {
      x: plan.map(({ x }) => x),
      q: plan.map(({ x }) => A * ((x - x0) / length) ** -n),
      error: plan.map(({ error }) => error),
    },
    { ...powerLawDefaults, residuals: fit.problem.linear ? "linear" : "log", length },
  );
  const kappa = 1 / (problem.centre - x0);
  const law = { c: 0, b: n * kappa, kappa };
  evaluateLaw(problem, law, { lnA: null, x0, n });
  const covariance = lawCovariance(problem, law, held);
  return covariance === null ? null : { n: covariance[8], x0: covariance[4] };
}
