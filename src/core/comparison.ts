import type { DecayResult, DecaySettings } from "./decayResult.ts";
import type { Quantity } from "./quantity.ts";
import type { StationResult } from "./stationResult.ts";

/** One case as the comparison sees it: reduced, fitted and derived. */
export interface CaseInput {
  readonly name: string;
  readonly stations: readonly StationResult[];
  readonly decay: DecayResult;
  readonly decaySettings: DecaySettings;
}

export interface CompareSettings {
  readonly align: "x0" | "x" | "Tu";
  /** Tolerance d of the verdict: 0.1 is 10 %. */
  readonly tolerance: number;
  /** Exponents the cases are aligned with; "auto" or left out: a common one unless it is rejected at 5 %. */
  readonly exponent?: "auto" | "common" | "own";
}

export const comparedQuantities = ["Tu", "L11", "lambda", "eta", "Re_lambda", "isotropy_uv"] as const;
export type ComparedQuantity = (typeof comparedQuantities)[number];

export type Verdict = "equivalent" | "different" | "undecided";

export interface ComparedRatio {
  /** Geometric mean of second over first on the overlap, with its 95 % interval. */
  readonly ratio: Quantity;
  /** Largest departure along the overlap, as a ratio; shown, not tested. */
  readonly largest: Quantity;
  readonly verdict: Verdict | null;
  /** Holm-adjusted p of "equivalent" and of "different". */
  readonly p_equivalent: number | null;
  readonly p_different: number | null;
  /** The ratio along the overlap, for the figure. */
  readonly curve: {
    readonly xi: readonly number[];
    readonly ratio: readonly number[];
    readonly low: readonly (number | null)[];
    readonly high: readonly (number | null)[];
  };
}

/** One exponent for several cases. */
export interface CommonOfAll {
  readonly cases: readonly string[];
  readonly n: number;
  readonly low: number | null;
  readonly high: number | null;
  readonly p: number;
  readonly test: "chi-square" | "F";
  readonly AICc: { readonly common: number; readonly own: number } | null;
}

/** Two cases side by side; ratios and distances are second against first. */
export interface Comparison {
  readonly cases: readonly [string, string];
  readonly align: "x0" | "x" | "Tu";
  readonly tolerance: number;
  /** Common range of xi (or of x); null where there is none. */
  readonly overlap: readonly [number, number] | null;
  /** Why nothing could be compared; null where it could. */
  readonly why: string | null;
  readonly quantities: Readonly<Record<ComparedQuantity, ComparedRatio>>;
  /** x0_B - x0_A. */
  readonly extra_distance: Quantity;
  /** x_B - x_A at equal Tu. */
  readonly matched_distance: Quantity;
  readonly common_n: {
    readonly value: number | null;
    readonly low: number | null;
    readonly high: number | null;
    readonly p: number | null;
    readonly why?: string;
    readonly test?: "chi-square" | "F";
    /** Akaike's criterion for short samples, of one exponent and of one each; null with too few stations. */
    readonly AICc?: { readonly common: number; readonly own: number } | null;
  };
  /** One exponent for all cases at once against one each; left out with two cases, where it is common_n. */
  readonly common_n_of_all?: CommonOfAll;
  /** Exponents used for the alignment: the common one, or each its own where it was rejected. */
  readonly aligned_with: "common n" | "own n" | "none";
}
