/** Powers of ten that a double holds exactly: 10^0 to 10^22. */
export const exactPowers = Float64Array.from({ length: 23 }, (_, i) => Number(`1e${i}`));

/** 2^27 + 1: parts a double into two halves whose products are exact. */
const splitter = 134217729;

/** Relative error allowed to the double-double arithmetic below; its own is some 2^-100. */
const doubt = 2 ** -90;

/**
 * A decimal of up to 30 digits, correctly rounded:
 *     (high * 10^lowDigits + low) * 10^exponent
 * in double-double arithmetic (Dekker 1971). Its error is far below half a unit in the last place, so the rounding is
 * certain unless the value lies that close to the middle between two doubles.
 * @param high,low whole numbers below 10^15, each exact
 * @param lowDigits digits of `low`, 0 to 15
 * @returns the double nearest to the decimal; NaN where the rounding is not certain or the exponent is beyond 22
 */
export function longDecimal(high: number, low: number, lowDigits: number, exponent: number): number {
  if (exponent > 22 || exponent < -22) return Number.NaN;
  const power = exactPowers[lowDigits];
  const product = high * power;
  const sum = product + low;
  const kept = sum - product;
  const tail = productError(high, power, product) + (product - (sum - kept) + (low - kept));
  if (exponent === 0) return rounded(sum, tail);
  const scale = exactPowers[Math.abs(exponent)];
  if (exponent > 0) {
    const head = sum * scale;
    return rounded(head, productError(sum, scale, head) + tail * scale);
  }
  const head = sum / scale;
  const back = head * scale;
  return rounded(head, (sum - back - productError(head, scale, back) + tail) / scale);
}

/** What the rounding of a product lost. */
function productError(a: number, b: number, product: number): number {
  const a1 = splitter * a - (splitter * a - a);
  const b1 = splitter * b - (splitter * b - b);
  const a2 = a - a1;
  const b2 = b - b1;
  return a1 * b1 - product + a1 * b2 + a2 * b1 + a2 * b2;
}

/** The double nearest to head + tail, if it is the same for all that the doubt leaves open. */
function rounded(head: number, tail: number): number {
  const error = head * doubt;
  const most = head + (tail + error);
  return most === head + (tail - error) ? most : Number.NaN;
}
