import type { Quantity } from "./quantity.ts";

/** Everything argued about a law beyond the fit itself: made once a change has come to rest, not in every frame. */
export interface DecayArgument {
  readonly scan: WindowScan;
  /** Null where x0 or n is held, or there is no law. */
  readonly region: JointRegion | null;
  /** Null where x0 or n is held, there is no law, or one start alone leaves five stations. */
  readonly everyStart: EveryStart | null;
  readonly bootstrap: Bootstrap | null;
  readonly routes: readonly DecayRoute[];
  readonly disagreements: readonly RouteDisagreement[];
  readonly originScan: OriginScan | null;
  readonly local: LocalDecay | null;
  readonly growths: readonly Growth[];
  readonly dissipationConstant: DissipationConstant;
  readonly development: Development;
  /** Null where no position of a body is given. */
  readonly body: BodyArgument | null;
  readonly narrowing: readonly Narrowing[];
  /** Null where U varies by no more than 1 %, or does not count. */
  readonly flight: FlightFit | null;
}

/** Union of the intervals over every start of the window that leaves five stations. */
export interface EveryStart {
  readonly starts: number;
  readonly n: Quantity;
  readonly x0: Quantity;
}

/** n and x0 against the first and the last station used; and what physics says of both ends. */
export interface WindowScan {
  /** Windows that end where the adopted one does, in order of their first station. */
  readonly first: readonly ScannedWindow[];
  /** Windows that begin where the adopted one does, in order of their last station. */
  readonly last: readonly ScannedWindow[];
  /** From where on physics allows a law. */
  readonly start: readonly Criterion[];
  /** Up to where it does. */
  readonly end: readonly Criterion[];
}

export interface ScannedWindow {
  /** x of the station that varies. */
  readonly x: number;
  readonly stations: number;
  readonly n: Quantity;
  readonly x0: Quantity;
  /** Probability of a larger chi-square; null with equal weights, and without a law. */
  readonly p: number | null;
  readonly adopted: boolean;
  /** Whether its intervals are among those whose union an automatic window's n and x0 carry. */
  readonly inUnion: boolean;
}

/** One condition on the stations, in its two readings. */
export interface Criterion {
  readonly key: string;
  /** What is asked, with its tolerance. */
  readonly words: string;
  /** The x from which (up to which) no interval contradicts it; its interval by resampling. */
  readonly notContradicted: Quantity;
  /** The x from which (up to which) every interval lies inside. */
  readonly inside: Quantity;
}

/** Development length by each criterion. */
export interface Development {
  /** Share by which a ratio may depart from 1. */
  readonly tolerance: number;
  readonly criteria: readonly Criterion[];
  /** The reference length, and L11 at the first station that carries one: what x may be counted in. */
  readonly length: number | null;
  readonly inflowL11: Quantity;
}

/** The joint region of n and x0 as the true contour of the profile, beside the ellipse of the covariance. */
export interface JointRegion {
  readonly contours: readonly Contour[];
}
export interface Contour {
  /** 0.68 or 0.95. */
  readonly level: number;
  readonly n: readonly number[];
  readonly x0: readonly number[];
  /** False where the contour runs upstream without end and is cut off. */
  readonly closed: boolean;
  readonly ellipse: { readonly n: readonly number[]; readonly x0: readonly number[] };
}

/** Refits of stations drawn anew about the law: shown, not adopted. */
export interface Bootstrap {
  readonly refits: number;
  /** Draws that fell like an exponential, or told n and x0 not apart. */
  readonly withoutLaw: number;
  readonly n: Quantity;
  readonly x0: Quantity;
  /** Some of the refits, for the eye. */
  readonly cloud: { readonly n: readonly number[]; readonly x0: readonly number[] };
}

export const routeKeys = [
  "joint",
  "origin-scan",
  "straight-line",
  "lambda",
  "epsilon",
  "origin-zero",
  "origin-held",
  "origin-other",
  "flight",
  "along-x",
] as const;
export type RouteKey = (typeof routeKeys)[number];

/** One way to n and x0. */
export interface DecayRoute {
  readonly key: RouteKey;
  readonly name: string;
  readonly n: Quantity;
  readonly x0: Quantity;
  /** What it holds, takes for granted, or lacks. */
  readonly note: string;
}

/** Two routes whose 95 % intervals of n or x0 have nothing in common. */
export interface RouteDisagreement {
  readonly routes: readonly [RouteKey, RouteKey];
  readonly of: "n" | "x0";
}

/** Scatter of ln q about the best line in ln(x - x0), against the x0 it is drawn from; equal weights. */
export interface OriginScan {
  readonly x0: readonly number[];
  readonly rms: readonly number[];
}

/** The law seen station by station, with the adopted origin. */
export interface LocalDecay {
  readonly x: readonly number[];
  /** -d ln q/d ln(x - x0) over a station and its two neighbours. */
  readonly exponent: readonly Quantity[];
  /** q ((x - x0)/ell)^n. */
  readonly compensated: readonly Quantity[];
}

/** How a scale grows from the origin, beside what the exponent of the energy implies. */
export interface Growth {
  readonly key: "L11" | "lambda" | "Re_lambda";
  readonly exponent: Quantity;
  readonly implied: Quantity;
  /** Whether the two intervals meet; null where either lacks one. */
  readonly agrees: boolean | null;
}

/** Whether C_epsilon stays the same along the window. */
export interface DissipationConstant {
  /** c of C_epsilon ~ (x - x0)^c. */
  readonly exponent: Quantity;
  /** Whether the interval of c holds 0; null where it has none. */
  readonly constant: boolean | null;
  /** Geometric mean over the window. */
  readonly mean: Quantity;
  /** Probability of a larger chi-square about that mean; null where stations carry no intervals. */
  readonly p: number | null;
}

/** What a body at a place meets. */
export interface BodyArgument {
  readonly x: number;
  readonly chord: number | null;
  readonly at: Readonly<Record<BodyKey, Quantity>>;
  /** L11 over the chord. */
  readonly L11_chord: Quantity;
  /** Value at x + chord over that at x. */
  readonly change: Readonly<Record<BodyKey, Quantity>>;
  /** The x that meets each target; missing with the reason why none does. */
  readonly targets: {
    readonly Tu: { readonly target: number; readonly x: Quantity } | null;
    readonly L11_chord: { readonly target: number; readonly x: Quantity } | null;
  };
  /** Where both targets are missed least, and by what factor each is; null without two targets. */
  readonly both: { readonly x: Quantity; readonly Tu: number; readonly L11_chord: number } | null;
  /** Intensity at the first station that would bring the target to the body on a law of the same n and x0: extrapolated. */
  readonly inflow: { readonly x: number; readonly Tu: Quantity; readonly extrapolated: true } | null;
}
export const bodyKeys = ["Tu", "L11", "lambda", "Re_lambda", "isotropy_uv", "isotropy_uw"] as const;
export type BodyKey = (typeof bodyKeys)[number];

/** What one more measurement would do to the intervals. */
export interface Narrowing {
  readonly kind: "station" | "record";
  /** Where the station would stand, or whose record would be doubled. */
  readonly x: number;
  /** Width of the interval of n and of x0 over the present one. */
  readonly n: number;
  readonly x0: number;
}

/** The law along the time of flight, as a length at the mean speed of the window: x1 + Us integral of dx/U from x1 on. */
export interface FlightFit {
  /** Share by which U varies along the window. */
  readonly variation: number;
  readonly speed: number;
  readonly x: readonly number[];
  readonly distance: readonly number[];
  readonly n: Quantity;
  /** Carried back to x; upstream of the first station of all with the speed there. */
  readonly x0: Quantity;
}
