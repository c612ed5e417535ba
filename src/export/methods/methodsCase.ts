import type { DecayResult } from "../../core/decayResult.ts";
import type { Layout } from "../../core/records.ts";
import type { ReduceSettings, StationResult } from "../../core/stationResult.ts";
import type { Units } from "../../core/unitText.ts";

/** A case as the methods text needs it: settings as in its sheet, and what they led to. */
export interface MethodsCase {
  readonly name: string;
  readonly settings: {
    readonly units: Units;
    readonly layout: Layout;
    readonly along: "x" | "t";
    readonly kind: "measurement" | "dns" | "les" | null;
    readonly startup: number;
    readonly kinematicViscosity: number | null;
    readonly reference: {
      readonly length: number | null;
      readonly symbol: string;
      readonly speed: number | null;
    };
    readonly reduce: Pick<
      ReduceSettings,
      "integralScale" | "correlation" | "detrend" | "segment" | "taylorCorrection" | "dissipation"
    >;
    readonly fit: { readonly x0: number | null; readonly n: number | null };
  };
  readonly stations: readonly StationResult[];
  readonly decay: DecayResult | null;
}
