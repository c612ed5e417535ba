import { describe, expect, it } from "vitest";
import { chiSquareQuantile } from "../../../src/core/signal/distributions/chiSquareQuantile.ts";
import { chiSquareTail } from "../../../src/core/signal/distributions/chiSquareTail.ts";
import { fQuantile } from "../../../src/core/signal/distributions/fQuantile.ts";
import { fTail } from "../../../src/core/signal/distributions/fTail.ts";
import { incompleteBeta } from "../../../src/core/signal/distributions/incompleteBeta.ts";
import { incompleteGamma } from "../../../src/core/signal/distributions/incompleteGamma.ts";
import { invertTail } from "../../../src/core/signal/distributions/invertTail.ts";
import { logGamma } from "../../../src/core/signal/distributions/logGamma.ts";
import { normalCdf } from "../../../src/core/signal/distributions/normalCdf.ts";
import { normalQuantile } from "../../../src/core/signal/distributions/normalQuantile.ts";
import { studentQuantile } from "../../../src/core/signal/distributions/studentQuantile.ts";
import { studentTail } from "../../../src/core/signal/distributions/studentTail.ts";
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
  it("the gamma function's logarithm, down to its pole", () => {
    for (const [a, value] of scipy.log_gamma)
      expectClose(logGamma(a), value, { relative: 1e-13, absolute: 1e-14, because: "some 15 digits" });
  });
  it("both parts of the incomplete gamma function, each to its last digits", () => {
    for (const [a, x, lower, upper] of scipy.incomplete_gamma) {
      const found = incompleteGamma(a, x);
      // the smaller part is computed, the other is what it leaves of one
      const [small, known] = x < a + 1 ? [found.lower, lower] : [found.upper, upper];
      expectClose(small, known, { relative: 1e-11, because: "no cancellation" });
      expectClose(found.lower + found.upper, 1, { relative: 1e-15, because: "they share one" });
    }
  });
  it("the incomplete beta function, on both sides of its mean", () => {
    for (const [x, a, b, value] of scipy.incomplete_beta)
      expectClose(incompleteBeta(x, a, b), value, { relative: 1e-11, absolute: 1e-15, because: "rounding" });
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
  it("quantiles at the ends are infinite, or zero on a positive axis, not NaN", () => {
    expect(normalQuantile(0)).toBe(-Infinity);
    expect(studentQuantile(1, 4)).toBe(Infinity);
    expect(normalQuantile(0.5)).toBe(0);
    expect([chiSquareQuantile(0, 3), chiSquareQuantile(1, 3)]).toEqual([0, Infinity]);
    expect([fQuantile(0, 3, 4), fQuantile(1, 3, 4)]).toEqual([0, Infinity]);
  });
  it("tails are one at zero and nothing at infinity", () => {
    expect([chiSquareTail(0, 3), chiSquareTail(Infinity, 3)]).toEqual([1, 0]);
    expect([fTail(0, 3, 4), studentTail(0, 5)]).toEqual([1, 1]);
    expect(incompleteGamma(2, 0)).toEqual({ lower: 0, upper: 1 });
    expect(incompleteGamma(2, Infinity)).toEqual({ lower: 1, upper: 0 });
    expect([incompleteBeta(0, 2, 3), incompleteBeta(1, 2, 3)]).toEqual([0, 1]);
  });
});

describe("distributions that become one another", () => {
  const exact = { relative: 1e-11, because: "identities (Abramowitz & Stegun 1964, 26.6 and 26.7)" };
  it.each([0.3, 1.96, 4])("Student's t is normal with unlimited freedom, and its square is F, at %d", (t) => {
    expectClose(studentTail(t, null), 2 * normalCdf(-t), exact);
    expect(studentTail(t, Infinity)).toBe(studentTail(t, null));
    expect(studentTail(-t, null)).toBe(studentTail(t, null));
    expectClose(studentTail(t, 7), fTail(t * t, 1, 7), exact);
    expect(studentTail(-t, 7)).toBe(studentTail(t, 7));
  });
  it("F over unlimited freedom is chi-square over its degrees", () => {
    expectClose(fTail(2.5, 4, Infinity), chiSquareTail(10, 4), exact);
    expectClose(fQuantile(0.95, 4, Infinity), chiSquareQuantile(0.95, 4) / 4, exact);
    expectClose(fQuantile(0.95, 4, 1e9), fQuantile(0.95, 4, Infinity), {
      relative: 1e-6,
      because: "1e9 degrees are nearly unlimited; the gamma functions cancel to seven digits",
    });
  });
  it("chi-square of two is an exponential, I_x(1, b) a power", () => {
    expectClose(chiSquareQuantile(0.95, 2), -2 * Math.log(0.05), exact);
    expectClose(incompleteBeta(0.3, 1, 4), 1 - 0.7 ** 4, exact);
    expectClose(incompleteBeta(1e-9, 3, 1), 1e-27, exact);
  });
});

describe("a tail turned round", () => {
  /** How often the tail of an exponential is asked for, and where the search ends. */
  function search(q: number, start: number) {
    let calls = 0;
    const tail = (x: number) => {
      calls++;
      return Math.exp(-x);
    };
    return { x: invertTail({ tail, density: (x) => Math.exp(-x) }, q, start), calls };
  }
  it.each([1e-9, 0.05, 0.5, 0.99, 1 - 1e-9])("finds %d from a guess near or far", (q) => {
    for (const start of [1e-6, 0.5, 3, 100]) {
      const { x } = search(q, start);
      expectClose(x, -Math.log(q), {
        relative: 1e-7,
        absolute: 1e-15,
        because: "q itself has nine digits near one",
      });
    }
  });
  it("asks a few times only where the guess is good: Newton's steps double the digits", () =>
    expect(search(0.05, 2.9).calls).toBeLessThan(8));
  it("ends where the tail is met exactly", () => expect(search(Math.exp(-2), 2)).toEqual({ x: 2, calls: 2 }));
});
