import type { Label } from "../core/catalogue.ts";
import type { Estimate, Quantity } from "../core/quantity.ts";
import { displayOf, type Units } from "../core/unitText.ts";
import {
  decimalsForDigits,
  formatNumber,
  formatRange,
  powerOfTen,
  raisedDigits,
  thinSpace,
} from "./formatNumber.ts";

/** A quantity as it is shown: strings that share their decimals. */
export interface FormattedQuantity {
  /** "1.25"; "–" where there is no value. */
  readonly value: string;
  /** "1.20 to 1.31", "above 1.20", "below 1.31"; null where there is none. */
  readonly interval: string | null;
  /** "m/s"; empty where there is none. */
  readonly unit: string;
  /** Value and interval are multiples of this power of ten; null: of one. */
  readonly power: number | null;
  /** Why there is no value, or no interval, or why it is open on one side. */
  readonly why?: string;
}

/** So many digits are asked for where a count is shown as it is. */
const everyDigit = 12;

/** Formats by the catalogue: percent, mm and digits where no interval sets them. */
export function formatQuantity(quantity: Quantity, label: Label, units: Units): FormattedQuantity {
  const { factor, unit } = displayOf(label, units);
  return formatScaled(quantity, { factor, unit, digits: label.digits });
}

/** The same with the factor and the unit given: a length in multiples of M, say. */
export function formatScaled(
  quantity: Quantity,
  { factor, unit, digits = 3 }: { factor: number; unit: string; digits?: number },
): FormattedQuantity {
  if (quantity.value === null) return { value: "–", interval: null, unit, power: null, why: quantity.why };
  const { value, low, high } = multiplied(quantity, factor);
  const power = powerOfTen(Math.max(Math.abs(value), Math.abs(low ?? 0), Math.abs(high ?? 0)));
  const ten = power === null ? 1 : 10 ** power;
  const shown = { value: value / ten, low: end(low, ten), high: end(high, ten) };
  const decimals = digits >= everyDigit && Number.isInteger(shown.value) ? 0 : decimalsOf(shown, digits);
  const why = quantity.why_low ?? quantity.why_high;
  return {
    value: formatNumber(shown.value, decimals),
    interval: intervalText(shown, decimals),
    unit,
    power,
    ...(why === undefined ? {} : { why }),
  };
}

/** "13.2 mm (12.5 to 13.9)" in one string, powers of ten included. */
export function quantityText(shown: FormattedQuantity): string {
  const times = shown.power === null ? "" : `${thinSpace}×${thinSpace}10${raisedDigits(shown.power)}`;
  const unit = shown.unit === "" || shown.value === "–" ? "" : thinSpace + shown.unit;
  const interval = shown.interval === null ? "" : ` (${shown.interval})`;
  return shown.value + times + unit + interval;
}

type Ends = Pick<Estimate, "value" | "low" | "high">;

/**
 * Decimals that show two leading digits of the interval's width; of twice its half where one side is open;
 * significant digits of the value where there is no interval.
 */
export function decimalsOf({ value, low, high }: Ends, digits: number): number {
  const width = low !== null && high !== null ? high - low : 2 * Math.abs(value - (low ?? high ?? value));
  if (!(width > 0)) return decimalsForDigits(value, digits);
  return Math.min(Math.max(1 - Math.floor(Math.log10(width)), 0), 15);
}

function multiplied({ value, low, high }: Estimate, factor: number): Ends {
  return { value: value * factor, low: end(low, 1 / factor), high: end(high, 1 / factor) };
}

const end = (value: number | null, ten: number) => (value === null ? null : value / ten);

function intervalText({ low, high }: Ends, decimals: number): string | null {
  if (low !== null && high !== null) return formatRange(low, high, decimals);
  if (low !== null) return `above ${formatNumber(low, decimals)}`;
  return high === null ? null : `below ${formatNumber(high, decimals)}`;
}
