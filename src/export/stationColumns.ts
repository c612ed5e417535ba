import { labelOf } from "../core/catalogue.ts";
import type { Estimate, Quantity } from "../core/quantity.ts";
import { isEstimate } from "../core/quantity.ts";
import type { StationResult } from "../core/stationResult.ts";
import { displayOf, type Units } from "../core/unitText.ts";
import { decimalsForDigits, formatNumber } from "../figures/formatNumber.ts";
import { decimalsOf } from "../figures/formatQuantity.ts";

/** The quantities of the page's station table, in order; the files for scripts hold all of them. */
export const tableKeys = [
  "Tu",
  "isotropy_uv",
  "L11",
  "lambda",
  "eta",
  "Re_lambda",
  "epsilon",
  "balance",
] as const satisfies readonly (keyof StationResult)[];
export type TableKey = (typeof tableKeys)[number];

export interface StationColumn {
  readonly key: TableKey;
  readonly unit: string;
  readonly cells: readonly StationCell[];
  /** Why the column is empty, where it is empty throughout for one reason. */
  readonly why: string | null;
}

export interface StationCell {
  readonly value: string;
  /** "± 0.30"; "–" without an interval; null without a value. */
  readonly error: string | null;
  /** Full precision, or the reason of the gap. */
  readonly title: string;
  readonly quantity: Quantity;
}

/** One column of the table: all its numbers with the same decimals, those the middle interval asks for. */
export function stationColumn(
  stations: readonly StationResult[],
  key: TableKey,
  units: Units,
): StationColumn {
  const label = labelOf(key);
  const { factor, unit } = displayOf(label, units);
  const quantities = stations.map((station) => station[key]);
  const estimates = quantities.filter(isEstimate);
  const common = columnDecimals(estimates, factor, label.digits);
  const decimalsFor = (quantity: Quantity) =>
    isEstimate(quantity) && spansDecades(estimates) ? ownDecimals(quantity, factor, label.digits) : common;
  const reasons = new Set(quantities.map((quantity) => (isEstimate(quantity) ? null : quantity.why)));
  const [only] = reasons;
  return {
    key,
    unit,
    cells: quantities.map((quantity) => cell(quantity, factor, decimalsFor(quantity))),
    why: reasons.size === 1 && only !== null ? only : null,
  };
}

function cell(quantity: Quantity, factor: number, decimals: number): StationCell {
  if (!isEstimate(quantity)) return { value: "–", error: null, title: quantity.why, quantity };
  const { value, low, high, why_low, why_high } = quantity;
  const error =
    low === null || high === null ? "–" : `±\u202f${formatNumber(((high - low) / 2) * factor, decimals)}`;
  const interval =
    low === null || high === null ? (why_low ?? why_high ?? "no interval") : `${low} to ${high}`;
  return { value: formatNumber(value * factor, decimals), error, title: `${value} (${interval})`, quantity };
}

/** Values that fall by more than this along the stream are each written with their own decimals. */
const decades = 100;

function spansDecades(estimates: readonly Estimate[]): boolean {
  const sizes = estimates.map(({ value }) => Math.abs(value));
  return Math.max(...sizes) > decades * Math.min(...sizes);
}

function ownDecimals({ value, low, high }: Estimate, factor: number, digits: number): number {
  return low === null || high === null
    ? decimalsForDigits(value * factor, digits)
    : decimalsOf({ value: value * factor, low: low * factor, high: high * factor }, digits);
}

function columnDecimals(estimates: readonly Estimate[], factor: number, digits: number): number {
  const each = estimates.map((one) => ownDecimals(one, factor, digits)).sort((a, b) => a - b);
  return each.length === 0 ? 0 : each[Math.floor(each.length / 2)];
}
