import type { ReadSettings } from "../core/records.ts";

type Decimal = NonNullable<ReadSettings["decimal"]>;

/**
 * The number a field of a file stands for, exactly as Number() would give it; NaN where it is none.
 * Refused although Number() takes them: nothing at all, other bases, infinity.
 * Taken although Number() does not: a decimal comma where the file has one, and what Fortran writes:
 * D for E, and no letter at all before a negative exponent of three digits (`3.14-114`).
 * @param text    the field, blanks around it allowed
 * @param decimal the file's decimal sign; the other one makes a field no number
 */
export function parseNumber(text: string, decimal: Decimal): number {
  if (decimal === ",") {
    if (text.includes(".")) return Number.NaN;
    text = text.replace(",", ".");
  }
  if (text.charCodeAt(0) <= blank || text.charCodeAt(1) > nine) return carefully(text);
  const value = Number(text);
  return value !== 0 && value - value === 0 ? value : carefully(text);
}

const blank = 32;
const nine = 57;
const plain = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/;
const fortran = /^([+-]?(?:\d+\.?\d*|\.\d+))[dD]([+-]?\d+)$/;
const letterless = /^([+-]?\d*\.\d+)(-\d{3})$/;

function carefully(text: string): number {
  const token = text.trim().replace("\u2212", "-");
  if (plain.test(token)) return finite(token);
  const written = fortran.exec(token) ?? letterless.exec(token);
  return written === null ? Number.NaN : finite(`${written[1]}e${written[2]}`);
}

function finite(token: string): number {
  const value = Number(token);
  return Number.isFinite(value) ? value : Number.NaN;
}
