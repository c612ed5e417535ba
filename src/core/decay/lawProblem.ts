import { assert } from "../failure.ts";

/** Stations of a fit, as arrays of one length. */
export interface PowerLawData {
  readonly x: ArrayLike<number>;
  /** The decaying quantity; > 0. */
  readonly q: ArrayLike<number>;
  /** Standard error of ln q at each station; null: equal weights. */
  readonly error: ArrayLike<number> | null;
}

export interface PowerLawOptions {
  /** Residuals of ln q, or of q itself. */
  readonly residuals: "log" | "linear";
  /** A number holds the virtual origin; it lies below the first station. */
  readonly x0: number | null;
  /** A number holds the exponent. */
  readonly n: number | null;
  /** ell. */
  readonly length: number;
  /** Where the refinement starts; null: from a scan of x0. */
  readonly start: { readonly x0: number; readonly n: number } | null;
  /** The refinement ends when a step is below this share of the standard error. */
  readonly tolerance: number;
}

export const powerLawDefaults: PowerLawOptions = {
  residuals: "log",
  x0: null,
  n: null,
  length: 1,
  start: null,
  tolerance: 1e-8,
};

/**
 * The law about the centre x_c of its stations, where its three numbers hardly depend on one another:
 *     ln q = c - b g(d),   g = ln(1 + kappa d)/kappa,   d = x - x_c
 * with kappa = 1/(x_c - x0), b = n kappa the logarithmic slope at the centre, c = ln q there.
 * kappa = 0 is the exponential, the limit of a virtual origin far upstream.
 */
export interface CentredLaw {
  c: number;
  b: number;
  kappa: number;
}

/** Which of the three are held; null: free. A is held only along its own profile. */
export interface Held {
  readonly lnA: number | null;
  readonly x0: number | null;
  readonly n: number | null;
}

/** Everything a fit needs, with scratch that every evaluation overwrites. */
export interface LawProblem {
  readonly count: number;
  readonly linear: boolean;
  readonly length: number;
  readonly centre: number;
  readonly first: number;
  readonly span: number;
  /** x - x_c. */
  readonly d: Float64Array;
  /** ln q or q. */
  readonly y: Float64Array;
  /** One over the standard error of y; 1 with equal weights. */
  readonly w: Float64Array;
  readonly errorsKnown: boolean;
  /** Sum of (w y)², to tell a fall of the residuals from rounding. */
  readonly magnitude: number;
  /** Scratch: g, the weighted residual, and the weighted derivatives of the law by c, b and kappa. */
  readonly g: Float64Array;
  readonly residual: Float64Array;
  readonly byC: Float64Array;
  readonly byB: Float64Array;
  readonly byKappa: Float64Array;
  /** Scratch: the normal equations, row-major 3 × 3, and their solution. */
  readonly matrix: Float64Array;
  readonly gradient: Float64Array;
  readonly step: Float64Array;
}

/**
 * Stations and options made ready for evaluation.
 * @param data    stations in any order; every q > 0
 * @param options residuals, length
 */
export function lawProblem(data: PowerLawData, options: PowerLawOptions): LawProblem {
  const count = data.x.length;
  assert(count > 1 && data.q.length === count, "a law needs two stations or more, each with its q");
  const linear = options.residuals === "linear";
  const { centre, first, last } = placesOf(data.x);
  assert(last > first, "all stations of a law stand at one x");
  const arrays = arraysOf(count);
  const { d, y, w } = arrays;
  let magnitude = 0;
  for (let i = 0; i < count; i++) {
    const q = data.q[i];
    d[i] = data.x[i] - centre;
    y[i] = linear ? q : Math.log(q);
    w[i] = data.error === null ? 1 : 1 / (data.error[i] * (linear ? q : 1));
    magnitude += (w[i] * y[i]) ** 2;
  }
  return {
    count,
    linear,
    length: options.length,
    centre,
    first,
    span: last - first,
    errorsKnown: data.error !== null,
    magnitude,
    ...arrays,
  };
}

function placesOf(x: ArrayLike<number>): { centre: number; first: number; last: number } {
  let first = Number.POSITIVE_INFINITY;
  let last = Number.NEGATIVE_INFINITY;
  let sum = 0;
  for (let i = 0; i < x.length; i++) {
    sum += x[i];
    first = Math.min(first, x[i]);
    last = Math.max(last, x[i]);
  }
  return { centre: sum / x.length, first, last };
}

/** All arrays of a problem in one buffer: a refit is short enough for each allocation to show. */
function arraysOf(count: number) {
  const buffer = new ArrayBuffer(8 * (8 * count + 15));
  let used = 0;
  const array = (size = count) => {
    const view = new Float64Array(buffer, 8 * used, size);
    used += size;
    return view;
  };
  return {
    d: array(),
    y: array(),
    w: array(),
    g: array(),
    residual: array(),
    byC: array(),
    byB: array(),
    byKappa: array(),
    matrix: array(9),
    gradient: array(3),
    step: array(3),
  };
}

/** The largest kappa a law may have: its origin just below the first station. */
export function kappaLimit(problem: LawProblem): number {
  return (1 - 1e-9) / (problem.centre - problem.first);
}

/** The kappa below which a law cannot be told from an exponential. */
export function kappaFloor(problem: LawProblem): number {
  return 1e-5 / problem.span;
}
