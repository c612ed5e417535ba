import { describe, expect, it } from "vitest";
import { splineAt, splineSecond } from "../../../src/core/signal/cubicSpline.ts";
import scipy from "../../reference/scipy/splines.json" with { type: "json" };
import { expectClose } from "../../support/expectClose.ts";

const rounding = { relative: 1e-11, absolute: 1e-12, because: "two correct double computations" };

function spline(x: readonly number[], y: readonly number[]) {
  const [places, values] = [Float64Array.from(x), Float64Array.from(y)];
  const second = new Float64Array(x.length).fill(Number.NaN);
  splineSecond(places, values, x.length, second, new Float64Array(x.length).fill(Number.NaN));
  const at = (place: number) => {
    const i = Math.max(
      0,
      x.findLastIndex((start, k) => start <= place && k < x.length - 1),
    );
    return splineAt(places, values, second, i, place);
  };
  return { second, at };
}

describe(`natural splines through unequal places against ${scipy.made_with}`, () => {
  it.each(scipy.splines.map((one) => [one.x.length, one] as const))("of %d points", (_, one) => {
    const found = spline(one.x, one.y);
    for (const [i, value] of one.second.entries()) expectClose(found.second[i], value, rounding);
    for (const [i, place] of one.places.entries()) expectClose(found.at(place), one.values[i], rounding);
  });
});

describe("a natural spline", () => {
  it("of a straight line is that line, however unequal the places", () => {
    const x = [0, 0.1, 0.15, 2, 2.7, 9];
    const found = spline(
      x,
      x.map((place) => 4 - 3 * place),
    );
    for (const place of [0, 0.12, 1.4, 8.5, 9]) expectClose(found.at(place), 4 - 3 * place, rounding);
  });
  it("through the first points of longer arrays reads and writes none beyond", () => {
    const [x, y] = [Float64Array.of(0, 1, 3, 99, 100), Float64Array.of(2, 1, 4, 7, -7)];
    const [second, work] = [new Float64Array(5).fill(8), new Float64Array(5).fill(9)];
    splineSecond(x, y, 3, second, work);
    const short = new Float64Array(3);
    splineSecond(x.subarray(0, 3), y.subarray(0, 3), 3, short, new Float64Array(3));
    expect(Array.from(second)).toEqual([...short, 8, 8]);
    expect([short[0], short[2]]).toEqual([0, 0]);
    expect(Array.from(work.subarray(3))).toEqual([9, 9]);
  });
  it("over a tent of three points bends by -3 at its top, and stands at 11/16 half way up", () => {
    const tent = spline([0, 1, 2], [0, 1, 0]);
    expectClose(tent.second[1], -3, rounding);
    expectClose(tent.at(0.5), 11 / 16, rounding);
    expectClose(tent.at(1.5), 11 / 16, rounding);
  });
});
