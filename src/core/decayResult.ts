import type { DecayArgument } from "./decayArgument.ts";
import type { Flag } from "./flag.ts";
import type { Quantity } from "./quantity.ts";

/** What the user decided about a fit; the sheet's `fit` with its surroundings. */
export interface DecaySettings {
  readonly quantity: "auto" | "k" | "uu" | "q";
  readonly window: "auto" | readonly [number, number];
  readonly x0: number | null;
  readonly n: number | null;
  readonly residuals: "log" | "linear";
  readonly weights: "sampling" | "equal";
  readonly along: "x" | "t";
  /** Left out: SI. */
  readonly units?: "SI" | "nondimensional";
  /** What the law runs along; "auto" or left out: the time of flight where U varies, else x. */
  readonly coordinate?: "auto" | "x" | "flight";
  /** Another origin, to see the exponent it would give: a route, not the fit; null or left out: none. */
  readonly otherX0?: number | null;
  readonly referenceLength: number | null;
  readonly referenceSpeed: number | null;
  readonly kinematicViscosity: number | null;
  /** Which dissipation is adopted: what derive needs. */
  readonly dissipation: "auto" | "gradient" | "decay" | "inertial";
  readonly kind: "measurement" | "dns" | "les" | null;
  /** Lateral size of the domain; null or left out: not given. */
  readonly extent?: number | null;
  /** Where a body is to stand, and what it is to meet there. */
  readonly body?: BodySettings | null;
  /** Share by which a ratio may depart from 1, or from its last value, where the flow has developed; left out: 0.1. */
  readonly developmentTolerance?: number;
  /** Whether the stations were sampled at the same times; "auto" or left out: told by their correlation. */
  readonly simultaneous?: boolean | "auto";
}

/** A body's position and chord, and its targets. */
export interface BodySettings {
  readonly x: number;
  readonly chord: number | null;
  readonly Tu: number | null;
  /** L11 over the chord. */
  readonly L11: number | null;
}

/** One station as the fit sees it. */
export interface DecayPoint {
  readonly x: number;
  /** k/Us², uu/Us² or the given column. */
  readonly q: number;
  /** Standard error of ln q from the station's own sampling; null where there is none. */
  readonly error: number | null;
  /** The error the fit weighted with: smoothed along x; null with equal weights. */
  readonly smoothedError: number | null;
  readonly used: boolean;
}

/** The time of flight of a stream as a length s along x, Us times it: what a law runs along where U varies. */
export interface Flight {
  /** Stations that carry a U, in order of x; U there, and s. */
  readonly x: readonly number[];
  readonly U: readonly number[];
  readonly s: readonly number[];
  /** Us, the mean U of the window. */
  readonly speed: number;
}

/** q = A ((x - x0)/ell)^(-n), with what is needed to draw its band. */
export interface PowerLaw {
  readonly A: number;
  readonly x0: number;
  readonly n: number;
  /** ell; 1 where the case has no reference length. */
  readonly length: number;
  /** Covariance of (ln A, x0, n), row-major 3 × 3; rows and columns of what was held are zero. */
  readonly covariance: readonly number[];
  /** Student's t (or the normal's) 97.5 % point that belongs to the covariance. */
  readonly quantile: number;
  /** Degrees of freedom behind it; null: the normal's. */
  readonly freedom?: number | null;
  /** Where the law runs along the time of flight, s - s(x0) stands for x - x0; null or left out: along x. */
  readonly flight?: Flight | null;
}

/** What speaks for a near field of which a rest remains in the window. */
export interface NearFieldSigns {
  /** Stations upstream of an automatic window that its chi-square left out. */
  readonly left_out: number;
  /** By how much the last of them departs from the law, as a share of q; null: none was left out. */
  readonly departure: number | null;
  /** A term that dies out along the window: its share of q at the first station, and that in its standard errors. */
  readonly term: number | null;
  readonly term_size: number | null;
  /** Probability of a term at least that large on a pure law; null where the stations cannot tell one. */
  readonly p: number | null;
}

/** A named exponent, and how probable data so far from it are. */
export interface Hypothesis {
  readonly name: string;
  readonly n: number;
  readonly p: number | null;
  /** Chi-square where errors are known, F where residuals or common blocks tell them. */
  readonly test?: "chi-square" | "F" | null;
}

/** The decay of one case. Keys are those of the results file, to the letter; the rest is for the page. */
export interface DecayResult {
  readonly quantity: "k" | "uu" | "q";
  /** What was taken for granted of the components that were not measured. */
  readonly assumption: "none" | "axisymmetric" | "isotropic";
  readonly residuals: "log" | "linear";
  /** As it worked out: "equal" where no standard errors were to be had. */
  readonly weights: "sampling" | "equal";
  readonly window: readonly [number, number];
  readonly windowChosen: "auto" | "given";
  /** Why this window, one sentence. */
  readonly windowReason: string;
  /** Stations inside the window that were fitted. */
  readonly stations: number;
  /** Us of q = k/Us²; null in a q profile. */
  readonly speed: number | null;
  /** What the law runs along; left out: x. x0 is a place in x all the same. */
  readonly coordinate?: "x" | "t" | "flight";
  readonly flight?: Flight | null;
  readonly n: Quantity;
  readonly x0: Quantity;
  readonly A: Quantity;
  readonly correlation_n_x0: number | null;
  readonly chi2_reduced: number | null;
  /** Probability of a larger chi-square; null with equal weights. */
  readonly p: number | null;
  readonly given_window: { readonly n: Quantity; readonly x0: Quantity };
  readonly lambda_route: { readonly n: Quantity; readonly x0: Quantity };
  readonly epsilon_route: { readonly n: Quantity; readonly x0: Quantity };
  readonly growth: { readonly m: Quantity };
  readonly hypotheses: readonly Hypothesis[];
  readonly law: PowerLaw | null;
  readonly points: readonly DecayPoint[];
  /** Null or left out: there is no law. */
  readonly near_field?: NearFieldSigns | null;
  /** Groups of common blocks behind the intervals, and the mean correlation of neighbours; null: each station for itself. */
  readonly together?: { readonly groups: number; readonly correlation: number } | null;
  /** Left out by a fit in the frame. */
  readonly argument?: DecayArgument;
  readonly flags: readonly Flag[];
  readonly iterations: number;
  readonly converged: boolean;
}
