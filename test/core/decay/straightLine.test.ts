import { describe, expect, it } from "vitest";
import { relativeLine, zeroOfLine } from "../../../src/core/decay/relativeLine.ts";
import { straightLine } from "../../../src/core/decay/straightLine.ts";
import { isEstimate } from "../../../src/core/quantity.ts";
import numpy from "../../reference/scipy/lines.json" with { type: "json" };
import { expectClose } from "../../support/expectClose.ts";

const rounding = { relative: 1e-11, absolute: 1e-13, because: "two correct double computations" };

describe(`straight lines against ${numpy.made_with}`, () => {
  it.each(
    numpy.lines.map(
      (line) => [line.x.length, line.error === null ? "alike" : "by their errors", line] as const,
    ),
  )("through %d points, weighed %s", (_, _how, line) => {
    const found = straightLine(line.x, line.y, line.error);
    expectClose(found?.intercept, line.intercept, rounding);
    expectClose(found?.slope, line.slope, rounding);
    expectClose(found?.varianceOfIntercept, line.covariance[0], rounding);
    expectClose(found?.covariance, line.covariance[1], rounding);
    expectClose(found?.varianceOfSlope, line.covariance[3], rounding);
    expectClose(found?.sum, line.sum, { ...rounding, absolute: 1e-12 });
    expect(found?.freedom).toBe(line.x.length - 2);
  });
});

it("there is no line through points at one x", () => {
  expect(straightLine([2, 2, 2], [1, 2, 3], null)).toBeNull();
  expect(straightLine([2], [1], [0.1])).toBeNull();
});

describe("a line through values of known relative error", () => {
  const x = [1, 2, 3, 4, 5, 6];
  it("is exact on an exact line, its variances those of errors taken of the line", () => {
    const y = x.map((at) => 2 * (at - 0.5));
    const errors = x.map(() => 0.1);
    const found = relativeLine(x, y, errors);
    const plain = straightLine(
      x,
      y,
      y.map((value) => 0.1 * value),
    );
    expectClose(found?.slope, 2, rounding);
    expectClose(found?.varianceOfSlope, plain?.varianceOfSlope ?? 0, rounding);
  });
  it("is its own fixed point: another round with the errors of the line itself leaves it", () => {
    const y = [1.1, 2.7, 5.4, 6.6, 9.5, 10.6];
    const errors = [0.1, 0.12, 0.09, 0.1, 0.11, 0.1];
    const found = relativeLine(x, y, errors);
    if (found === null) throw new Error("no line");
    const again = straightLine(
      x,
      y,
      errors.map((error, i) => error * (found.intercept + found.slope * x[i])),
    );
    const close = { relative: 1e-3, because: "three rounds, each of which shrinks the change tenfold" };
    expectClose(again?.slope, found.slope, close);
    expectClose(again?.intercept, found.intercept, close);
    // with errors of the scattered values themselves low ones would weigh too much
    const naive = straightLine(
      x,
      y,
      errors.map((error, i) => error * y[i]),
    );
    expect(Math.abs((naive?.slope ?? 0) - found.slope)).toBeGreaterThan(0.005);
  });
  it("weighs alike without errors", () => {
    const y = [1, 3, 2, 5, 4, 7];
    expect(relativeLine(x, y, null)).toEqual(straightLine(x, y, null));
  });
  it("keeps its first weights where the line itself falls below zero among the points", () => {
    const y = [0.01, 0.02, 0.01, 3, 6, 9];
    const errors = [0.5, 0.5, 0.5, 0.01, 0.01, 0.01];
    const found = relativeLine(x, y, errors);
    expect(found?.slope).toBeGreaterThan(0);
    expect(Number.isFinite(found?.intercept)).toBe(true);
  });
});

describe("the zero of a line", () => {
  const line = straightLine([1, 2, 3, 4, 5], [1.2, 3.9, 6.1, 8.2, 9.7], [0.3, 0.3, 0.3, 0.3, 0.3]);
  if (line === null) throw new Error("no line");
  it.each([
    [1.96, 1],
    [3.18, 1.7],
  ])("lies between the x at which the line is %d errors from zero (Fieller 1954)", (t, variance) => {
    const zero = zeroOfLine(line, t, variance, "");
    if (!isEstimate(zero) || zero.low === null || zero.high === null) throw new Error("no interval");
    expectClose(line.intercept + line.slope * zero.value, 0, { absolute: 1e-12, because: "its definition" });
    expect(zero.low).toBeLessThan(zero.value);
    expect(zero.high).toBeGreaterThan(zero.value);
    for (const x of [zero.low, zero.high]) {
      const square = line.varianceOfIntercept + 2 * x * line.covariance + x * x * line.varianceOfSlope;
      expectClose((line.intercept + line.slope * x) ** 2, t * t * variance * square, {
        relative: 1e-9,
        because: "the definition of the interval",
      });
    }
  });
  it("has no ends where a slope of zero is not excluded, and says why", () => {
    const t = (1.01 * Math.abs(line.slope)) / Math.sqrt(line.varianceOfSlope);
    const zero = zeroOfLine(line, t, 1, "flat");
    expect(zero).toEqual({
      value: -line.intercept / line.slope,
      low: null,
      high: null,
      why_low: "flat",
      why_high: "flat",
    });
  });
});
