import type { Contour, JointRegion } from "../decayArgument.ts";
import { chiSquareQuantile } from "../signal/distributions/chiSquareQuantile.ts";
import { fQuantile } from "../signal/distributions/fQuantile.ts";
import { crossing } from "./crossing.ts";
import { evaluateLaw } from "./evaluateLaw.ts";
import { inflation, type WindowFit } from "./fitWindow.ts";
import { placeBack } from "./flightCourse.ts";
import { kappaFloor, kappaLimit } from "./lawProblem.ts";

const levels = [0.68, 0.95];
const rays = 96;
/** A contour is cut off where the origin lies this many spans of the stations upstream of their centre. */
const farthest = 50;

/**
 * The joint region of n and x0: all pairs for which the best A raises the sum of squares by less than the drop of two
 * numbers, drawn as the contour of the profile itself; beside it the ellipse that the covariance has in its place.
 * Points lie on rays about the minimum in the slope at the centre and kappa = 1/(x_c - x0), where the region is
 * nearly an ellipse.
 * @param window a law with n and x0 free
 * @returns      closed polygons, n (1) and x0 (unit of x); null where n or x0 is held
 * @see          Bates & Watts (1988), Nonlinear Regression Analysis, §6.1
 */
export function jointRegion(window: WindowFit): JointRegion | null {
  const { fit } = window;
  if (fit.held.n !== null || fit.held.x0 !== null || fit.unitCovariance === null) return null;
  const axes = axesOf(window);
  if (axes === null) return null;
  return { contours: levels.map((level) => contour(window, axes, level, dropOf(window, level))) };
}

/** Rise of the sum of squares at a joint level of two numbers. */
function dropOf(window: WindowFit, level: number): number {
  const [n, x0] = [inflation(window, "n"), inflation(window, "x0")];
  const { ratio, freedom } = n.ratio > x0.ratio ? n : x0;
  if (freedom === null) return chiSquareQuantile(level, 2);
  return 2 * fQuantile(level, 2, freedom) * ratio * window.variance;
}

/** Two independent directions of unit rise in (slope b, kappa), from the profile's curvature. */
interface Axes {
  readonly b: readonly [number, number];
  readonly kappa: readonly [number, number];
}

function axesOf({ fit }: WindowFit): Axes | null {
  // the covariance of (b, kappa) from that of (n, x0): kappa = 1/(x_c - x0), b = n kappa
  const { kappa, b } = fit.law;
  const [, , , , x0x0, x0n, , , nn] = fit.unitCovariance ?? [];
  const kk = kappa ** 4 * x0x0;
  const bk = kappa ** 3 * (x0n + b * x0x0);
  const bb = kappa ** 2 * (nn + 2 * b * x0n + b * b * x0x0);
  const l00 = Math.sqrt(bb);
  const l10 = bk / l00;
  const l11 = Math.sqrt(kk - l10 * l10);
  return [l00, l10, l11].every((value) => Number.isFinite(value)) && l00 > 0 && l11 > 0
    ? { b: [l00, 0], kappa: [l10, l11] }
    : null;
}

function contour(window: WindowFit, axes: Axes, level: number, drop: number): Contour {
  const { fit } = window;
  const { problem, law } = fit;
  const root = Math.sqrt(drop);
  const least = Math.max(kappaFloor(problem) * 2, 1 / (farthest * problem.span));
  const most = kappaLimit(problem) * (1 - 1e-6);
  const n: number[] = [];
  const x0: number[] = [];
  let closed = true;
  for (let ray = 0; ray < rays; ray++) {
    const angle = (2 * Math.PI * ray) / rays;
    const byB = axes.b[0] * Math.cos(angle);
    const byKappa = axes.kappa[0] * Math.cos(angle) + axes.kappa[1] * Math.sin(angle);
    const limit = Math.min(
      byKappa > 0 ? (most - law.kappa) / byKappa : byKappa < 0 ? (least - law.kappa) / byKappa : 1e3 * root,
      byB < 0 ? (-0.999 * law.b) / byB : 1e3 * root,
    );
    const excess = (at: number) => {
      const kappa = law.kappa + at * byKappa;
      const b = law.b + at * byB;
      const sum = evaluateLaw(
        problem,
        { c: law.c, b, kappa },
        { lnA: null, x0: problem.centre - 1 / kappa, n: b / kappa },
      );
      return Math.sqrt(Math.max(sum - fit.residualSum, 0)) - root;
    };
    const at = crossing(excess, 0, Math.min(root, limit), limit, -root);
    if (at === null) closed = false;
    const reach = at ?? limit;
    const kappa = law.kappa + reach * byKappa;
    n.push((law.b + reach * byB) / kappa);
    x0.push(placeBack(window.flight, problem.centre - 1 / kappa));
  }
  return { level, n, x0, closed, ellipse: ellipse(window, drop) };
}

/** The ellipse of the covariance about the best n and x0 at the same drop. */
function ellipse(window: WindowFit, drop: number): Contour["ellipse"] {
  const { fit, variance } = window;
  const plain = (fit.unitCovariance ?? []).map((value) => value * drop);
  const own = window.together?.covariance;
  const scale = drop / variance / Math.max(inflation(window, "n").ratio, inflation(window, "x0").ratio);
  const [, , , , x0x0, x0n, , , nn] = own ? own.map((value) => value * scale) : plain;
  const [sx, sn] = [Math.sqrt(x0x0), Math.sqrt(nn)];
  // rounding may carry a correlation past one, and exact data leave no variance at all
  const rho = sx * sn > 0 ? Math.min(Math.max(x0n / (sx * sn), -1), 1) : 0;
  const angles = Array.from({ length: rays }, (_, ray) => (2 * Math.PI * ray) / rays);
  return {
    x0: angles.map((angle) => placeBack(window.flight, fit.x0 + sx * Math.cos(angle))),
    n: angles.map(
      (angle) => fit.n + sn * (rho * Math.cos(angle) + Math.sqrt(1 - rho * rho) * Math.sin(angle)),
    ),
  };
}
