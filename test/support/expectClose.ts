import { expect } from "vitest";

export interface Tolerance {
  /** |found - expected| <= relative |expected|. */
  readonly relative?: number;
  /** Only where the expected value is zero or nearly so. */
  readonly absolute?: number;
  /** Why this much is allowed. */
  readonly because: string;
}

/** Fails unless `found` agrees with `expected` within a stated and reasoned tolerance. */
export function expectClose(found: number | null | undefined, expected: number, tolerance: Tolerance): void {
  const allowed = (tolerance.relative ?? 0) * Math.abs(expected) + (tolerance.absolute ?? 0);
  const error = Math.abs((found ?? Number.NaN) - expected);
  expect(
    error <= allowed,
    `found ${found}, expected ${expected} within ${allowed} (${tolerance.because}); off by ${error}`,
  ).toBe(true);
}
