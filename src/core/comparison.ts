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

export const comparedQuantities = ["Tu", "L11", "lambda", "eta", "Re_lambda", "isotropy_uv"] as const;
export type ComparedQuantity = (typeof comparedQuantities)[number];

export interface CompareSettings {
  readonly align: "x0" | "x" | "Tu";
  /** Tolerance d of the verdict: 0.1 is 10 %. */
  readonly tolerance: number;
  /** Exponents the cases are aligned with; "auto": a common one unless it is rejected at 5 %. */
  readonly exponent?: "auto" | "common" | "own";
  /** Name of the case that all others are held against; null, or none of the cases: the first. */
  readonly against?: string | null;
  /** x in that case at which the others' places of equal Tu are looked for; null: its body's, else the middle. */
  readonly at?: number | null;
  /** Quantities for which it is told from where on the cases are equivalent. */
  readonly quantities?: readonly ComparedQuantity[];
}

/** What is taken where a setting is left out. */
export const compareDefaults = {
  exponent: "auto",
  against: null,
  at: null,
  quantities: ["Tu", "lambda"],
} as const satisfies Omit<CompareSettings, "align" | "tolerance">;

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
  /** Where the stretch begins from which on this quantity by itself is equivalent; null: nowhere, or not to be told. */
  readonly equivalent_from: number | null;
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

/** One stretch of the common range: what is tested to tell from where on two cases are equivalent. */
export interface ComparedStretch {
  readonly from: number;
  readonly to: number;
  /** Whether all chosen quantities are equivalent along it, each at 5 %. */
  readonly equivalent: boolean;
  /** The quantity that keeps least room within the tolerance, and its mean ratio; null where one cannot be told. */
  readonly narrowest: { readonly quantity: ComparedQuantity; readonly ratio: Quantity } | null;
}

/** From where on two cases are equivalent in all chosen quantities at once. */
export interface EquivalentBeyond {
  readonly quantities: readonly ComparedQuantity[];
  /** Begin of the farthest-reaching run of equivalent stretches that ends the common range; null: there is none. */
  readonly from: number | null;
  /** Why there is none, or why it begins no earlier; null where it covers the common range. */
  readonly why: string | null;
  /** In order of the stream. */
  readonly stretches: readonly ComparedStretch[];
}

/** Virtual origins of two cases by one way of fitting them, and how far they lie apart. */
export interface AlignedOrigins {
  readonly n: readonly [Quantity, Quantity];
  readonly x0: readonly [Quantity, Quantity];
  readonly extra_distance: Quantity;
}

/** Spectra of one station of each case at nearly equal distance from their origins, in Kolmogorov form. */
export interface SpectrumPair {
  readonly x: readonly [number, number];
  readonly xi: readonly [number, number];
  /** Common range of k1 eta. */
  readonly range: readonly [number, number];
  readonly bands: number;
  /** Root mean square of ln (second/first) over the bands. */
  readonly distance: Quantity;
  /** What it would be by the errors of both spectra alone: its mean, and what 95 in 100 stay below. */
  readonly chance: number;
  readonly chance_95: number;
  /** Probability of a distance at least as large by chance. */
  readonly p: number;
}

export interface ComparedSpectra {
  /** Largest ratio of xi of two stations that are held against each other, less one. */
  readonly within: number;
  readonly pairs: readonly SpectrumPair[];
  /** Why there are none; null where there are. */
  readonly why: string | null;
}

/** Two cases side by side; ratios and distances are second against first. */
export interface Comparison {
  readonly cases: readonly [string, string];
  readonly align: "x0" | "x" | "Tu";
  readonly tolerance: number;
  /** Common range of xi (or of x, or of Tu); null where there is none. */
  readonly overlap: readonly [number, number] | null;
  /** Why nothing could be compared; null where it could. */
  readonly why: string | null;
  readonly quantities: Readonly<Record<ComparedQuantity, ComparedRatio>>;
  readonly equivalent_beyond: EquivalentBeyond;
  /** x0_B - x0_A by the exponents used for the alignment. */
  readonly extra_distance: Quantity;
  /** x_B - x_A at equal Tu. */
  readonly matched_distance: Quantity;
  /** The places that are so far apart: x in the first case, where Tu was asked for, Tu there, and x in the second. */
  readonly matched: { readonly x: readonly [Quantity, Quantity]; readonly Tu: Quantity };
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
  /** Origins with each case's own exponent and with one for all: both are shown, whichever was used. */
  readonly origins: { readonly own: AlignedOrigins | null; readonly common: AlignedOrigins | null };
  /** Exponents used for the alignment: the common one, or each its own where it was rejected or asked for. */
  readonly aligned_with: "common n" | "own n" | "none";
  readonly spectra: ComparedSpectra;
}
