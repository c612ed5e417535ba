import type { ComparedQuantity } from "../core/comparison.ts";
import type { Layout, Role, RoundedTimes, Separator } from "../core/records.ts";
import type { IntegralScaleRoute } from "../core/stationResult.ts";

/**
 * A case sheet with every default filled in: what the results file prints as `settings`.
 * What a user writes is checked and completed by readCaseSheet; keys are those of the contract, to the letter.
 */
export interface CaseSheet {
  readonly case: string;
  readonly kinematicViscosity: number | null;
  readonly units: "SI" | "nondimensional";
  readonly reference: SheetReference;
  readonly layout: Layout;
  readonly along: "x" | "t";
  /** Role to heading, 1-based column number, or either with a unit; null: recognised. */
  readonly columns: Readonly<Partial<Record<Role, SheetColumn>>> | null;
  readonly files: readonly SheetFile[];
  readonly fit: SheetFit;
  readonly kind: "measurement" | "dns" | "les" | null;
  readonly read: SheetRead;
  readonly zero: number;
  readonly simultaneous: boolean | "auto";
  readonly periodic: boolean | "auto";
  readonly startup: number;
  readonly extent: number | null;
  readonly sensorLength: number | null;
  readonly reduce: SheetReduce;
  readonly body: SheetBody | null;
  /** Share by which a ratio may depart from 1, or from its last value, where the flow has developed. */
  readonly development: { readonly tolerance: number };
  readonly compare: SheetCompare;
}

export interface SheetReference {
  readonly length: number | null;
  readonly symbol: string;
  readonly speed: number | null;
}
export type SheetColumn = string | number | { readonly from: string | number; readonly unit: string };
export interface SheetFile {
  readonly path: string;
  readonly x: number | null;
}
export interface SheetFit {
  readonly quantity: "auto" | "k" | "uu" | "q";
  readonly window: "auto" | readonly [number, number];
  readonly x0: number | null;
  readonly n: number | null;
  readonly residuals: "log" | "linear";
  readonly weights: "sampling" | "equal";
  /** What the law runs along: x, the time of flight, or that of the two which U asks for. */
  readonly coordinate: "auto" | "x" | "flight";
  /** Another origin, to see beside the fit which exponent it would give. */
  readonly otherX0: number | null;
}
export interface SheetRead {
  readonly separator: Separator | null;
  readonly decimal: "." | "," | null;
  readonly heading: number | null;
  readonly step: number | null;
  /** What time stamps with too few digits are taken for. */
  readonly times: RoundedTimes;
  readonly missing: readonly string[];
}
export interface SheetReduce {
  readonly integralScale: IntegralScaleRoute;
  readonly correlation: "biased" | "unbiased";
  readonly detrend: "mean" | "linear";
  readonly segment: number | null;
  readonly taylorCorrection: boolean;
  readonly dissipation: "auto" | "gradient" | "decay" | "inertial";
  /** Which of several probes at one x make the station. */
  readonly probes: "agreeing" | "all";
}
export interface SheetCompare {
  readonly align: "x0" | "x" | "Tu";
  readonly tolerance: number;
  /** Exponents the cases are laid over one another with. */
  readonly exponent: "auto" | "common" | "own";
  /** Name of the case that the others are held against; null: the first. */
  readonly against: string | null;
  /** x in that case at which equal Tu is looked for; null: the body's, else the middle. */
  readonly at: number | null;
  /** What has to agree for the cases to count as equivalent from a place on. */
  readonly quantities: readonly ComparedQuantity[];
}
export interface SheetBody {
  readonly x: number;
  readonly chord: number | null;
  readonly Tu: number | null;
  /** Target of L11 over the chord, not of L11 itself. */
  readonly L11: number | null;
}
