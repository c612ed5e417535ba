import { describe, expect, it } from "vitest";
import { logEstimate, powerProduct } from "../../../src/core/decay/powerProduct.ts";
import { relativeError } from "../../../src/core/decay/relativeError.ts";
import { bare, estimate, isEstimate, missing } from "../../../src/core/quantity.ts";
import { expectClose } from "../../support/expectClose.ts";

const rounding = { relative: 1e-12, because: "closed form" };
const z = 1.959963984540054;

describe("the relative error of a quantity", () => {
  it("is its own on the scale of logarithms, and its error over its value on the linear one", () => {
    expect(relativeError(estimate(4, 3, 5, { standard: 0.1, freedom: 9, scale: "log" }))).toBe(0.1);
    expect(relativeError(estimate(4, 3, 5, { standard: 0.1, freedom: 9, scale: "linear" }))).toBe(0.025);
  });
  it("follows from the ends of an interval that brings no error: 1.96 of them either way", () => {
    expectClose(relativeError(estimate(1, Math.exp(-z * 0.07), Math.exp(z * 0.07))), 0.07, rounding);
  });
  it("is none for a quantity without interval, with an open one, one that holds zero, or of no width", () => {
    expect(relativeError(bare(4, "held"))).toBeNull();
    expect(relativeError(missing("not measured"))).toBeNull();
    expect(relativeError(estimate(4, 3, Infinity))).toBeNull();
    expect(relativeError(estimate(4, -Infinity, 5))).toBeNull();
    expect(relativeError(estimate(4, -1, 9))).toBeNull();
    expect(relativeError(estimate(4, 0, 9))).toBeNull();
    expect(relativeError(estimate(4, 4, 4))).toBeNull();
    expect(relativeError(estimate(-4, -5, -3, { standard: 0.1, freedom: null, scale: "linear" }))).toBeNull();
    expect(relativeError(estimate(0, 0, 0, { standard: 0.1, freedom: null, scale: "linear" }))).toBeNull();
    expect(relativeError(estimate(4, 3, 5, { standard: 0, freedom: null, scale: "log" }))).toBeNull();
  });
});

describe("a product of powers", () => {
  const a = estimate(2, 1, 3, { standard: 0.03, freedom: 10, scale: "log" });
  const b = estimate(5, 4, 6, { standard: 0.2, freedom: 10, scale: "linear" });
  it("adds relative errors in squares, each times its power", () => {
    const found = powerProduct(3, [
      [a, 2],
      [b, -1 / 2],
    ]);
    if (!isEstimate(found)) throw new Error("missing");
    expectClose(found.value, (3 * 4) / Math.sqrt(5), rounding);
    expectClose(found.error?.standard, Math.hypot(2 * 0.03, 0.04 / 2), rounding);
    // Welch and Satterthwaite: (0.0036 + 0.0004)² over (0.0036² + 0.0004²)/10
    expectClose(found.error?.freedom, (10 * 0.004 ** 2) / (0.0036 ** 2 + 0.0004 ** 2), rounding);
    expectClose((found.low ?? 0) * (found.high ?? 0), found.value ** 2, rounding);
  });
  it("of two parts as well known has twice the degrees of freedom; a part known beforehand adds none", () => {
    const twice = powerProduct(1, [
      [a, 1],
      [a, -1],
    ]);
    expectClose(isEstimate(twice) ? twice.error?.freedom : null, 20, rounding);
    const exact = estimate(2, 1, 3, { standard: 0.03, freedom: null, scale: "log" });
    const known = powerProduct(1, [[exact, 1]]);
    expect(isEstimate(known) ? known.error?.freedom : 0).toBeNull();
    expectClose(isEstimate(known) ? known.high : null, 2 * Math.exp(z * 0.03), {
      relative: 1e-9,
      because: "normal",
    });
  });
  it("has Student's interval in the logarithm: 2.228 errors at ten degrees of freedom (table; from memory)", () => {
    const found = logEstimate(7, 0.1, 10);
    const reach = { relative: 2e-5, because: "four printed digits" };
    expectClose(isEstimate(found) ? found.high : null, 7 * Math.exp(0.2228), reach);
    expectClose(isEstimate(found) ? found.low : null, 7 * Math.exp(-0.2228), reach);
  });
  it("has no interval where a part has none, and is missing where one is missing or not positive", () => {
    const held = powerProduct(1, [
      [bare(3, "held, not fitted"), 1],
      [a, 1],
    ]);
    expect(held).toEqual(bare(6, "held, not fitted"));
    expect(powerProduct(1, [[missing("not measured"), 1]])).toEqual(missing("not measured"));
    expect(powerProduct(1, [[estimate(-1, -2, 0), 1]]).value).toBeNull();
    expect(powerProduct(1, [[estimate(0, -2, 2), 1]]).value).toBeNull();
  });
});
