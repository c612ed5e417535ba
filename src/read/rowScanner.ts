import { exactPowers, longDecimal } from "./longDecimal.ts";

/** Which fields of a row are numbers to be read, and how rows are written. */
export interface RowShape {
  readonly separator: string;
  readonly decimal: "." | ",";
  /** Fields in a row. */
  readonly width: number;
  /** For each field the place of its number among those read, -1: not read. */
  readonly slots: Int32Array;
}

const [tab, lineFeed, carriageReturn, blank, quote, plus, minus] = [9, 10, 13, 32, 34, 43, 45];
const code = (text: string) => text.charCodeAt(0);

/** What begins a comment, and what no row of numbers begins with. */
const comments = [..."#%!/;"].map(code);

/**
 * Reads plain rows of numbers from bytes, without a string in between. Plain is a row of the table's width whose
 * fields to be read are decimals, each with the double that Number() gives; blanks around them and one separator at
 * the end of the row are allowed. Whatever else a row may be, it is told as not plain and left to a slower reader.
 */
export class RowScanner {
  /** The numbers of the last plain row. */
  readonly values: Float64Array;
  private at = 0;
  private readonly separator: number;
  private readonly point: number;
  private readonly spaced: boolean;

  constructor(private readonly shape: RowShape) {
    this.values = new Float64Array(shape.slots.reduce((most, slot) => Math.max(most, slot + 1), 0));
    this.separator = code(shape.separator);
    this.point = code(shape.decimal);
    this.spaced = shape.separator === " ";
  }

  /**
   * One row.
   * @param bytes lines; the last byte that may be reached ends a line
   * @param from where the row begins
   * @returns where the next row begins; -1 where this one is not plain
   */
  scan(bytes: Uint8Array, from: number): number {
    const { width, slots } = this.shape;
    this.at = from;
    if (comments.includes(bytes[this.skipBlanks(bytes)])) return -1;
    for (let field = 0; field < width; field++) {
      if (field > 0 && !this.passSeparator(bytes)) return -1;
      this.skipBlanks(bytes);
      const slot = slots[field];
      if (slot < 0) {
        if (!this.passField(bytes)) return -1;
        continue;
      }
      const value = this.number(bytes);
      if (!(value - value === 0)) return -1;
      this.values[slot] = value;
    }
    return this.passEnd(bytes);
  }

  private skipBlanks(bytes: Uint8Array): number {
    let at = this.at;
    while (bytes[at] === blank || (bytes[at] === tab && this.separator !== tab)) at++;
    this.at = at;
    return at;
  }

  private passSeparator(bytes: Uint8Array): boolean {
    const before = this.at;
    this.skipBlanks(bytes);
    if (this.spaced) return this.at > before;
    if (bytes[this.at] !== this.separator) return false;
    this.at++;
    return true;
  }

  /** A field that is not read: up to the next separator or line end. */
  private passField(bytes: Uint8Array): boolean {
    const { separator, spaced } = this;
    let at = this.at;
    for (; ; at++) {
      const byte = bytes[at];
      if (byte === separator || byte === lineFeed || byte === carriageReturn) break;
      if (byte === quote) return false;
      if (spaced && byte === tab) break;
    }
    const empty = at === this.at;
    this.at = at;
    return !(spaced && empty);
  }

  private passEnd(bytes: Uint8Array): number {
    this.skipBlanks(bytes);
    if (bytes[this.at] === this.separator && !this.spaced) {
      this.at++;
      this.skipBlanks(bytes);
    }
    const byte = bytes[this.at];
    if (byte === lineFeed) return this.at + 1;
    if (byte !== carriageReturn) return -1;
    return bytes[this.at + 1] === lineFeed ? this.at + 2 : this.at + 1;
  }

  /** The number that begins here; NaN where none does. Its digits make a whole number, scaled by a power of ten. */
  private number(bytes: Uint8Array): number {
    const from = this.at;
    let at = from;
    const negative = bytes[at] === minus;
    if (negative || bytes[at] === plus) at++;
    const first = at;
    let whole = 0;
    // "0" to "9" are 48 to 57, so that these bits leave the digit and any other byte ten or more
    for (let digit = bytes[at] ^ 48; digit < 10; digit = bytes[++at] ^ 48) whole = whole * 10 + digit;
    let digits = at - first;
    let exponent = 0;
    if (bytes[at] === this.point) {
      const behind = ++at;
      for (let digit = bytes[at] ^ 48; digit < 10; digit = bytes[++at] ^ 48) whole = whole * 10 + digit;
      exponent = behind - at;
      digits -= exponent;
    }
    if (digits === 0) return Number.NaN;
    this.at = at;
    if ((bytes[at] | 32) === 101) exponent += this.exponent(bytes);
    // each of the two operations on exact doubles rounds once: then the result is the nearest double
    if (whole > Number.MAX_SAFE_INTEGER || exponent > 22 || exponent < -22)
      return this.long(bytes, from, first, exponent);
    const size = exponent < 0 ? whole / exactPowers[-exponent] : whole * exactPowers[exponent];
    return negative ? -size : size;
  }

  /** What follows an E; NaN where it is no whole number of up to four digits. */
  private exponent(bytes: Uint8Array): number {
    let at = this.at + 1;
    const negative = bytes[at] === minus;
    if (negative || bytes[at] === plus) at++;
    const first = at;
    let power = 0;
    for (let digit = bytes[at] ^ 48; digit < 10; digit = bytes[++at] ^ 48) power = power * 10 + digit;
    this.at = at;
    if (at === first || at - first > 4) return Number.NaN;
    return negative ? -power : power;
  }

  /** A number of more digits than a double holds, or of an extreme size: the token as such is known to be one. */
  private long(bytes: Uint8Array, from: number, first: number, exponent: number): number {
    if (Number.isNaN(exponent)) return Number.NaN;
    let [high, low, highDigits, lowDigits] = [0, 0, 0, 0];
    for (let at = first; at < this.at; at++) {
      const digit = bytes[at] ^ 48;
      if (digit < 10) {
        if (high === 0 && digit === 0 && highDigits === 0) continue;
        if (highDigits < 15) {
          high = high * 10 + digit;
          highDigits++;
        } else {
          low = low * 10 + digit;
          lowDigits++;
        }
      } else if (bytes[at] !== this.point) break;
    }
    const size = lowDigits <= 15 ? longDecimal(high, low, lowDigits, exponent) : Number.NaN;
    if (Number.isNaN(size)) return Number(this.token(bytes, from));
    return bytes[from] === minus ? -size : size;
  }

  private token(bytes: Uint8Array, from: number): string {
    const text = String.fromCharCode(...bytes.subarray(from, this.at));
    return this.point === code(",") ? text.replace(",", ".") : text;
  }
}
