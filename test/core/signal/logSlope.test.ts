import { describe, expect, it } from "vitest";
import { logSlope } from "../../../src/core/signal/logSlope.ts";
import { expectClose } from "../../support/expectClose.ts";

const rounding = { relative: 1e-12, because: "rounding" };

describe("the slope of a spectrum in logarithms", () => {
  it.each([-5 / 3, -7, 0, 2])("of a power law is its power, %d", (power) => {
    const y = Float64Array.from({ length: 200 }, (_, i) => 3 * i ** power);
    const slope = logSlope(y, 7, 150);
    expectClose(slope, power, { relative: 1e-11, absolute: 1e-13, because: "rounding of sums" });
  });

  it("weighs every bin by its share of the logarithm: weights 1, 1/2, 1/4 at bins 1, 2, 4", () => {
    // normal equations by hand for ln y = 0, 0, 1 at ln i = 0, a, 2a: slope 5/(13 a)
    const slope = logSlope(Float64Array.of(Number.NaN, 1, 1, 0, Math.E), 1, 4);
    expectClose(slope, 5 / (13 * Math.LN2), rounding);
  });

  it("passes over what has no logarithm, and reads nothing outside its range", () => {
    const y = Float64Array.from({ length: 40 }, (_, i) => i ** -2);
    [y[12], y[17], y[20], y[4], y[31]] = [0, -1, Number.NaN, 1e9, 1e9];
    expectClose(logSlope(y, 5, 30), -2, { relative: 1e-11, because: "rounding of sums" });
  });

  it("of fewer than two usable bins is minus infinity: steeper than any", () => {
    const y = Float64Array.of(0, 0, 5, 0, -1);
    expect(logSlope(y, 1, 4)).toBe(Number.NEGATIVE_INFINITY);
    expect(logSlope(y, 3, 4)).toBe(Number.NEGATIVE_INFINITY);
    expect(logSlope(Float64Array.of(1, 2, 3), 2, 1)).toBe(Number.NEGATIVE_INFINITY);
  });
});
