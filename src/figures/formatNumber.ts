/** No-break and narrow: before a unit, and between groups of three digits. */
export const thinSpace = "\u202f";
const minus = "\u2212";
const raised = ["⁰", "¹", "²", "³", "⁴", "⁵", "⁶", "⁷", "⁸", "⁹"];

/** A number with so many decimals, a true minus sign and groups of three digits from 1 000 up. */
export function formatNumber(value: number, decimals: number): string {
  const [whole, fraction] = Math.abs(value).toFixed(Math.max(decimals, 0)).split(".");
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, thinSpace);
  const digits = fraction === undefined ? grouped : `${grouped}.${fraction}`;
  // A negative number that rounds to zero has no sign.
  return value < 0 && /[1-9]/.test(digits) ? minus + digits : digits;
}

/** "1.20 to 1.31". */
export function formatRange(low: number, high: number, decimals: number): string {
  return `${formatNumber(low, decimals)} to ${formatNumber(high, decimals)}`;
}

/** A whole number of things: "48 213". */
export function formatCount(count: number): string {
  return formatNumber(count, 0);
}

/** An exponent of ten in raised digits: "⁻⁵". */
export function raisedDigits(exponent: number): string {
  const digits = [...String(Math.abs(exponent))].map((digit) => raised[Number(digit)]).join("");
  return exponent < 0 ? `⁻${digits}` : digits;
}

/** Decimals that show a number with so many significant digits. */
export function decimalsForDigits(value: number, digits: number): number {
  if (value === 0) return 0;
  const decimals = digits - 1 - Math.floor(Math.log10(Math.abs(value)));
  return Math.min(Math.max(decimals, 0), 15);
}

/** A number with so many significant digits, in powers of ten where it is very small or very large. */
export function formatDigits(value: number, digits: number): string {
  const power = powerOfTen(value);
  if (power === null) return formatNumber(value, decimalsForDigits(value, digits));
  const mantissa = formatNumber(value / 10 ** power, digits - 1);
  // Rounding may carry it into the next power: 0.9996 thousandths are 0.0010, not 10.0 ten-thousandths.
  const rounded = Number(value.toPrecision(digits));
  if (Math.abs(rounded) >= 10 ** (power + 1)) return formatDigits(rounded, digits);
  return `${mantissa}${thinSpace}×${thinSpace}10${raisedDigits(power)}`;
}

/** The power of ten to write a number with; null where it is written out: from 0.001 up to a million. */
export function powerOfTen(value: number): number | null {
  const size = Math.abs(value);
  return size === 0 || (size >= 1e-3 && size < 1e6) ? null : Math.floor(Math.log10(size));
}

/** A position: two decimals below ten, more only where four significant digits need them. */
export function formatPosition(x: number): string {
  const decimals = (String(Number(x.toPrecision(4))).split(".")[1] ?? "").length;
  return formatNumber(x, Math.abs(x) < 10 ? Math.max(decimals, 2) : decimals);
}

/** "p = 0.81", "p < 0.001": probabilities with two digits, never as zero. */
export function formatProbability(p: number): string {
  if (p < 0.001) return "<\u202f0.001";
  return formatNumber(p, p < 0.01 ? 3 : 2);
}

/** A value with its unit behind a narrow space; the bare value where there is no unit. */
export function withUnit(value: string, unit: string): string {
  return unit === "" ? value : `${value}${thinSpace}${unit}`;
}
