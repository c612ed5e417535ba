/** When a step between two time stamps counts as that of the record. */
export interface StepRule {
  readonly step: number;
  /** Last digit the stamps are printed with; 0 where none was found. */
  readonly quantum: number;
  /** The stamps are known to have too few digits: a step may be a digit off. */
  readonly rounded?: boolean;
}

/** A step over so many of the usual ones is a gap: the record is cut there. */
export const gapSteps = 10;

/**
 * Whether a step is that of the record: within 1/1000 of it, and a printed digit more where the stamps are
 * rounded, since either may be by half of one.
 */
export function isEqualStep(step: number, rule: StepRule): boolean {
  const digit = rule.rounded ? rule.quantum : 0;
  return Math.abs(step - rule.step) <= 1e-3 * rule.step + 1.001 * digit;
}

/**
 * Last digit the time stamps are printed with: the largest power of ten that divides them all.
 * @param t      time stamps, s
 * @param from   first index looked at
 * @param to     index after the last
 * @returns      a power of ten; 0 where the stamps have no last digit that a double can tell
 */
export function printQuantum(t: Float64Array, from: number, to: number): number {
  let largest = 0;
  for (let i = from; i < to; i++) largest = Math.max(largest, Math.abs(t[i]));
  for (let exponent = 3; exponent >= -15; exponent--) {
    const quantum = 10 ** exponent;
    if (largest / quantum > 1e11) return 0;
    // what rounding leaves of a whole number; a time far below the digit is no multiple of it
    const allowed = Math.min(1e-4, (2 ** -46 * largest) / quantum);
    let divides = true;
    for (let i = from; i < to && divides; i++) {
      const digits = t[i] / quantum;
      divides = Math.abs(digits - Math.round(digits)) <= allowed;
    }
    if (divides) return quantum;
  }
  return 0;
}
