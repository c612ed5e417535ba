import type { Flag } from "./flag.ts";
import type { ProbeReading } from "./probeReading.ts";
import type { Quantity } from "./quantity.ts";
import type { RecordCut } from "./recordCut.ts";
import type { SourceNote } from "./records.ts";

/**
 * One station: all that is known at one x. Keys are those of the results file, to the letter.
 * What the decay law decides (`epsilon_decay`, `balance`, and with an adopted decay route `epsilon`,
 * `lambda`, `eta`, `Re_lambda`) is missing until derive has run.
 */
export interface StationResult {
  readonly x: number;
  readonly samples: number;
  /** Total time recorded; null for a profile. */
  readonly duration: number | null;
  readonly U: Quantity;
  readonly uu: Quantity;
  readonly vv: Quantity;
  readonly ww: Quantity;
  readonly uv: Quantity;
  readonly uw: Quantity;
  readonly vw: Quantity;
  readonly k: Quantity;
  readonly Tu: Quantity;
  /** u'/v' and u'/w'. */
  readonly isotropy_uv: Quantity;
  readonly isotropy_uw: Quantity;
  readonly T_int: Quantity;
  readonly L11: Quantity;
  /** lambda_g, the transverse Taylor microscale. */
  readonly lambda: Quantity;
  /** <(du/dx)²>. */
  readonly gradient: Quantity;
  /** The adopted route. */
  readonly epsilon: Quantity;
  readonly epsilon_gradient: Quantity;
  readonly epsilon_decay: Quantity;
  readonly epsilon_inertial: Quantity;
  readonly eta: Quantity;
  readonly Re_lambda: Quantity;
  readonly Re_L: Quantity;
  readonly C_epsilon: Quantity;
  readonly S_dudx: Quantity;
  /** epsilon (decay) / epsilon (gradient). */
  readonly balance: Quantity;
  /** A decaying quantity given as such in a profile; missing elsewhere. */
  readonly q: Quantity;
  /** Every estimator's value by its name; see routeNames. */
  readonly routes: Readonly<Record<string, Quantity>>;
  readonly flags: readonly Flag[];
  readonly sources: readonly SourceNote[];
  /** Null for a profile. */
  readonly curves: StationCurves | null;
  /** Null for a profile. */
  readonly blocks: BlockTable | null;
  readonly facts: StationFacts;
  /** Each probe by itself, where several stand at this x: in order of file and place. */
  readonly probes?: readonly ProbeReading[];
  /** Where its records were cut, in order of file and time; left out where nowhere. */
  readonly cuts?: readonly RecordCut[];
  /** Cuts beyond those that are listed. */
  readonly cuts_more?: number;
}

/** How the reduction went: the settings as they worked out, for the definition beside each number. */
export interface StationFacts {
  /** Time between samples; null for a profile. */
  readonly step: number | null;
  /** Record length in integral times. */
  readonly integralTimes: number | null;
  /** Groups behind the jackknife; 0: no intervals. */
  readonly groups: number;
  /** How often the record repeats itself; left out where it does not. */
  readonly repeats?: number;
  readonly segment: number | null;
  readonly segments: number;
  /** Integral of the Welch spectrum over the variance. */
  readonly recoveredVariance: number | null;
  /** k1 at which the gradient integral was cut, or null where it was not. */
  readonly cutoff: number | null;
  /** Level subtracted below the cut, in the unit of E11; null for none. */
  readonly noiseFloor: number | null;
  readonly shareBeyondCutoff: number | null;
  readonly taylorFactor: number | null;
  /** The same for the gradients of u, v and w. */
  readonly taylorFactors?: readonly number[];
  /** Largest relative change of lambda by moving the cut a twentieth of a decade; null without a cut. */
  readonly cutoffSensitivity?: number | null;
  /** Largest over smallest integral time of the routes that give one; null with fewer than two. */
  readonly integralScaleSpread?: number | null;
  /** Which route the adopted dissipation takes, and why. */
  readonly dissipationReason?: string;
  readonly k1max_eta: number | null;
  readonly lagLimit: number | null;
  readonly tauStar: number | null;
  readonly components: readonly ("u" | "v" | "w")[];
  /** Layout "lines" alone. */
  readonly lines?: LineFacts;
}

/** How a station on lines was sampled. Its step, lags and integral time are lengths over U. */
export interface LineFacts {
  readonly along: "x" | "y" | "z";
  readonly points: number;
  /** Null where the points are not equally spaced. */
  readonly spacing: number | null;
  /** Null for lines along x. */
  readonly length: number | null;
  readonly periodic: boolean;
  /** Parallel lines of one snapshot. */
  readonly parallel: number;
  readonly snapshots: number;
  readonly independentSnapshots: number;
  /** Independent snapshots times length/(2 L11), times parallel lines that are far enough apart. */
  readonly independentSamples: number;
  /** Correlation of point values between neighbouring snapshots. */
  readonly snapshotCorrelation: number | null;
}

/** Curves of one station, for figures; all arrays are plain doubles and transferred, not copied. */
export interface StationCurves {
  /** Wavenumber, rad/m (or its non-dimensional peer), ascending, without k1 = 0. */
  readonly k1: Float64Array;
  /** One-sided, ∫ E11 dk1 = uu. */
  readonly E11: Float64Array;
  readonly E22: Float64Array | null;
  readonly E33: Float64Array | null;
  /** Co-spectrum of u and v, ∫ E12 dk1 = uv; null without v. */
  readonly E12?: Float64Array | null;
  /** Slope of E11 and the test of isotropy scale by scale. */
  readonly local?: LocalSpectrum;
  /** Degrees of freedom of one bin's chi-square. */
  readonly freedom: number;
  /** The same at each k1: more where a point stands for several bins. */
  readonly freedoms?: Float64Array;
  /** Time lags of rho, from 0. */
  readonly lag: Float64Array;
  readonly rho_u: Float64Array;
  readonly rho_v: Float64Array | null;
  readonly rho_w: Float64Array | null;
  /** Of a replayed record: the correlation of u around the lag at which it comes back. */
  readonly revival?: {
    readonly period: number;
    readonly peak: number;
    readonly lag: Float64Array;
    readonly rho: Float64Array;
  };
}

/** Spectra averaged over bands of a twentieth of a decade, where they can be differentiated. */
export interface LocalSpectrum {
  /** rad/m, ascending. */
  readonly k1: Float64Array;
  readonly E11: Float64Array;
  /** d ln E11/d ln k1. */
  readonly slope: Float64Array;
  /** (E11 - k1 dE11/dk1)/2: what E22 is in isotropic flow. */
  readonly E22_isotropic: Float64Array;
  readonly E22: Float64Array | null;
  readonly E33: Float64Array | null;
}

/**
 * The record's blocks, a row each: sums that merge without loss. Row-major, `fields.length` numbers a row.
 * Blocks are counted from the start of the record and are of `blockSamples` samples, the last one shorter.
 */
export interface BlockTable {
  readonly fields: readonly string[];
  readonly rows: number;
  readonly data: Float64Array;
  readonly blockSamples: number;
  readonly step: number;
  readonly start: number;
}

/** What of a record's settings a reduction depends on; part of the key its result is kept under. */
export interface ReduceSettings {
  readonly kinematicViscosity: number | null;
  readonly referenceSpeed: number | null;
  readonly kind: "measurement" | "dns" | "les" | null;
  readonly simultaneous: boolean | "auto";
  /** Which of several probes at one x make the station: those that agree (the default), or all of them. */
  readonly probes?: "agreeing" | "all";
  readonly periodic: boolean | "auto";
  readonly sensorLength: number | null;
  readonly integralScale: IntegralScaleRoute;
  readonly correlation: "biased" | "unbiased";
  readonly detrend: "mean" | "linear";
  /** Samples a segment, a power of two; null: chosen from T_int. */
  readonly segment: number | null;
  readonly taylorCorrection: boolean;
  readonly dissipation: "auto" | "gradient" | "decay" | "inertial";
}
export type IntegralScaleRoute = "zero-crossing" | "one-over-e" | "exponential" | "low-frequency" | "model";

/**
 * Keys of `routes`. T_int_*: integral time by each route; epsilon_*: dissipation by each route;
 * gradient_*: <(du/dx)²>, <(dv/dx)²>, <(dw/dx)²> and the cross-checks by differences.
 */
export const routeNames = [
  "T_int_zero-crossing",
  "T_int_one-over-e",
  "T_int_exponential",
  "T_int_low-frequency",
  "T_int_model",
  "L_v",
  "L_w",
  "L_v_ratio",
  "L_w_ratio",
  "lambda_f",
  "lambda_gradient",
  "eta_gradient",
  "Re_lambda_gradient",
  "gradient_u",
  "gradient_v",
  "gradient_w",
  "gradient_difference2",
  "gradient_difference4",
  "gradient_difference2_expected",
  "gradient_difference4_expected",
  "epsilon_u-gradient",
  "epsilon_all-gradients",
  "epsilon_second-order",
  "epsilon_third-order",
  "skewness_u",
  "skewness_v",
  "skewness_w",
  "flatness_u",
  "flatness_v",
  "flatness_w",
  "K_v",
  "K_w",
  "rho_uv",
  "rho_uw",
  "rho_vw",
  "anisotropy_xi",
  "anisotropy_eta",
  "barycentric_1",
  "barycentric_2",
  "barycentric_3",
] as const;
