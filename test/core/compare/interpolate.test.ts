import { describe, expect, it } from "vitest";
import { interpolate, meanBetween } from "../../../src/core/compare/interpolate.ts";
import { expectClose } from "../../support/expectClose.ts";

describe("interpolation of ln q on ln xi", () => {
  it("is exact for a power law, between its stations and just beyond", () => {
    const s = [0, 0.7, 1.1, 2, 3.2];
    const at = [-0.1, 0, 0.5, 1.1, 1.9, 3.2, 3.3];
    const out = new Float64Array(at.length);
    interpolate(
      s,
      s.map((value) => 2 - 1.25 * value),
      at,
      out,
    );
    at.forEach((value, i) => {
      expectClose(out[i], 2 - 1.25 * value, { absolute: 1e-14, because: "a straight line" });
    });
  });
  it("has the mean of a straight line in the middle of its range, however its places lie", () => {
    const s = [1, 1.01, 1.02, 3];
    const y = s.map((value) => 5 * value);
    const because = "the trapezoid is exact";
    expectClose(meanBetween(s, y, 1, 3), 10, { relative: 1e-14, because });
    expectClose(meanBetween(s, y, 1.015, 2), 5 * 1.5075, { relative: 1e-14, because });
    expectClose(meanBetween(s, y, 1.5, 1.5), 7.5, { relative: 1e-14, because });
    expect(meanBetween([2], [7], 2, 2)).toBe(7);
  });
});
