import type { DecayResult, DecaySettings } from "../decayResult.ts";
import { isEstimate, type Quantity } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { relativeError } from "./relativeError.ts";

/** What decays: which quantity is fitted, and what it takes for granted. */
export interface DecayQuantity {
  readonly quantity: DecayResult["quantity"];
  readonly assumption: DecayResult["assumption"];
}

/** A value at one station with the standard error of its logarithm. */
export interface DecayValue {
  readonly value: number;
  readonly error: number | null;
  /** Degrees of freedom behind the error; null: it is known. */
  readonly freedom: number | null;
}

/**
 * Which quantity a case's decay is fitted to, the same at all its stations: q in a q profile; else
 * k with three components, k = (uu + 2 vv)/2 with one lateral component (axisymmetry), uu with u alone.
 */
export function decayQuantity(
  stations: readonly StationResult[],
  wanted: DecaySettings["quantity"],
): DecayQuantity {
  const count = (of: (station: StationResult) => boolean) => stations.filter(of).length;
  const withU = count((station) => isEstimate(station.uu));
  if (wanted === "q" || (wanted === "auto" && withU === 0 && count((s) => isEstimate(s.q)) > 0))
    return { quantity: "q", assumption: "none" };
  const whole = count((s) => isEstimate(s.uu) && isEstimate(s.vv) && isEstimate(s.ww));
  const lateral = count((s) => isEstimate(s.uu) && (isEstimate(s.vv) || isEstimate(s.ww)));
  if (wanted === "uu") return { quantity: "uu", assumption: "none" };
  if (whole > 0 && whole === withU) return { quantity: "k", assumption: "none" };
  if (lateral > 0 && lateral === withU) return { quantity: "k", assumption: "axisymmetric" };
  return { quantity: wanted === "k" ? "k" : "uu", assumption: "isotropic" };
}

/**
 * The decaying quantity at one station, in its own unit.
 *     k = (uu + vv + ww)/2;   axisymmetric: (uu + 2 vv)/2;   isotropic: 3 uu/2
 * @returns null where the station lacks it
 */
export function decayValue(
  station: StationResult,
  { quantity, assumption }: DecayQuantity,
): DecayValue | null {
  if (quantity === "q") return positiveValue(station.q);
  if (quantity === "uu") return positiveValue(station.uu);
  if (isEstimate(station.k) && (assumption === "none" || lacksWhole(station)))
    return positiveValue(station.k);
  const lateral = isEstimate(station.vv) ? station.vv : station.ww;
  if (assumption === "none") return summed([station.uu, station.vv, station.ww], [0.5, 0.5, 0.5]);
  if (assumption === "axisymmetric") return summed([station.uu, lateral], [0.5, 1]);
  return summed([station.uu], [1.5]);
}

/** Whether the station's own k rests on the same assumption as the case's. */
function lacksWhole({ vv, ww }: StationResult): boolean {
  return !isEstimate(vv) || !isEstimate(ww);
}

function positiveValue(quantity: Quantity): DecayValue | null {
  if (!isEstimate(quantity) || !(quantity.value > 0)) return null;
  return {
    value: quantity.value,
    error: relativeError(quantity),
    freedom: quantity.error?.freedom ?? null,
  };
}

/** A sum of variances measured apart; their errors are taken as independent. */
function summed(parts: readonly Quantity[], factors: readonly number[]): DecayValue | null {
  const values = parts.map(positiveValue).filter((part) => part !== null);
  if (values.length < parts.length) return null;
  const value = values.reduce((sum, part, i) => sum + factors[i] * part.value, 0);
  const known = values.every((part) => part.error !== null);
  const square = values.reduce((sum, part, i) => sum + (factors[i] * part.value * (part.error ?? 0)) ** 2, 0);
  const freedoms = values.map((part) => part.freedom).filter((freedom) => freedom !== null);
  return {
    value,
    error: known ? Math.sqrt(square) / value : null,
    freedom: freedoms.length > 0 ? Math.min(...freedoms) : null,
  };
}
