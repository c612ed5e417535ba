import { describe, expect, it } from "vitest";
import { chiSquareQuantile } from "../../../src/core/signal/distributions/chiSquareQuantile.ts";
import { chiSquareTail } from "../../../src/core/signal/distributions/chiSquareTail.ts";
import { fQuantile } from "../../../src/core/signal/distributions/fQuantile.ts";
import { fTail } from "../../../src/core/signal/distributions/fTail.ts";
import { normalCdf } from "../../../src/core/signal/distributions/normalCdf.ts";
import { normalQuantile } from "../../../src/core/signal/distributions/normalQuantile.ts";
import { studentQuantile } from "../../../src/core/signal/distributions/studentQuantile.ts";
import scipy from "../../reference/scipy/distributions.json" with { type: "json" };
import { expectClose } from "../../support/expectClose.ts";

const tight = {
  relative: 1e-10,
  absolute: 1e-13,
  because: "SciPy's own routines agree with tables to 1e-11",
};

describe(`quantiles and tails against ${scipy.made_with}`, () => {
  it("normal", () => {
    for (const [p, x] of scipy.normal) expectClose(normalQuantile(p), x, tight);
    for (const [x, p] of scipy.normal_cdf)
      expectClose(normalCdf(x), p, { relative: 1e-10, because: "tails keep digits" });
  });
  it("Student's t", () => {
    for (const [p, freedom, t] of scipy.student) expectClose(studentQuantile(p, freedom), t, tight);
  });
  it("chi-square", () => {
    for (const [p, freedom, x] of scipy.chi_square) expectClose(chiSquareQuantile(p, freedom), x, tight);
    for (const [x, freedom, q] of scipy.chi_square_tail)
      expectClose(chiSquareTail(x, freedom), q, {
        relative: 1e-10,
        absolute: 1e-290,
        because: "tails keep digits",
      });
  });
  it("F", () => {
    for (const [p, d1, d2, x] of scipy.f) expectClose(fQuantile(p, d1, d2), x, tight);
    for (const [x, d1, d2, q] of scipy.f_tail)
      expectClose(fTail(x, d1, d2), q, { relative: 1e-10, because: "tails keep digits" });
  });
});

describe("quantiles against printed tables (Abramowitz & Stegun 1964, tables 26.1, 26.8-26.10; from memory)", () => {
  const printed = { absolute: 5.1e-4, because: "three decimals are printed" };
  it.each([
    [studentQuantile(0.975, 9), 2.262],
    [studentQuantile(0.975, 19), 2.093],
    [studentQuantile(0.975, null), 1.96],
    [chiSquareQuantile(0.95, 1), 3.841],
    [chiSquareQuantile(0.95, 2), 5.991],
    [fQuantile(0.95, 1, 10), 4.965],
  ])("%d is printed as %d", (found, expected) => expectClose(found, expected, printed));
  it("quantiles at the ends are infinite, not NaN", () => {
    expect(normalQuantile(0)).toBe(-Infinity);
    expect(studentQuantile(1, 4)).toBe(Infinity);
  });
});
