/**
 * The currency of the program: a value with its 95 % interval, or the reason why there is none.
 * Nothing that leaves core is NaN or infinite.
 */
export type Quantity = Estimate | Missing;

export interface Estimate {
  readonly value: number;
  /** Lower end of the 95 % interval; null where none can be given or where that side is open. */
  readonly low: number | null;
  readonly high: number | null;
  /** Why `low` (or `high`) is null. */
  readonly why_low?: string;
  readonly why_high?: string;
  /** The error behind the interval, where there is one: what weights a fit and is propagated. */
  readonly error?: StandardError;
}

export interface StandardError {
  /** Relative (the error of ln value) on the scale "log"; in the value's own unit on "linear". */
  readonly standard: number;
  /** Degrees of freedom of Student's t; Infinity is written as null. */
  readonly freedom: number | null;
  readonly scale: "log" | "linear";
}

export interface Missing {
  readonly value: null;
  readonly why: string;
}

/** A value with its interval. An end that cannot be given is null and carries its reason. */
export function estimate(value: number, low: number, high: number, error?: StandardError): Quantity {
  if (!Number.isFinite(value)) return missing("the number cannot be represented");
  const ends = {
    low: Number.isFinite(low) ? low : null,
    high: Number.isFinite(high) ? high : null,
    ...(Number.isFinite(low) ? {} : { why_low: "no lower limit" }),
    ...(Number.isFinite(high) ? {} : { why_high: "no upper limit" }),
  };
  return error ? { value, ...ends, error } : { value, ...ends };
}

/** A value that has no interval, with the reason. */
export function bare(value: number, why: string): Quantity {
  if (!Number.isFinite(value)) return missing("the number cannot be represented");
  return { value, low: null, high: null, why_low: why, why_high: why };
}

export function missing(why: string): Missing {
  return { value: null, why };
}

export function isEstimate(quantity: Quantity): quantity is Estimate {
  return quantity.value !== null;
}

/** u -> c u, ends and error included. */
export function scaled(quantity: Quantity, factor: number): Quantity {
  if (!isEstimate(quantity)) return quantity;
  const ends = [quantity.low, quantity.high].map((end) => (end === null ? null : end * factor));
  const [low, high] = factor < 0 ? [ends[1], ends[0]] : ends;
  const { low: _low, high: _high, value, error, ...whys } = quantity;
  const rescaled =
    error === undefined || error.scale === "log"
      ? error
      : { ...error, standard: error.standard * Math.abs(factor) };
  return { ...whys, value: value * factor, low, high, ...(rescaled ? { error: rescaled } : {}) };
}
