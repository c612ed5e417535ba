import { describe, expect, it } from "vitest";
import { stretchesOf } from "../../../src/core/compare/stretchesOf.ts";

describe("the stretches of a common range", () => {
  it("hold three stations of either case each, and end where the range ends", () => {
    const sides = [
      [0, 1, 2, 3, 4],
      [0.5, 1.5, 2.5, 3.5, 4.5],
    ];
    expect(stretchesOf(sides, [0.5, 4])).toEqual([
      [0.5, 3],
      [1, 3.5],
      [1.5, 4],
    ]);
  });
  it("are as wide as the sparser case makes them", () => {
    const dense = Array.from({ length: 41 }, (_, i) => i / 10);
    const widths = stretchesOf([dense, [0, 1, 2, 3, 4]], [0, 4]).map(([from, to]) => to - from);
    expect(Math.min(...widths)).toBe(2);
  });
  it("leave no part of the range behind the first of them untested", () => {
    const found = stretchesOf(
      [
        [0, 0.1, 0.2, 3],
        [0, 0.15, 0.3, 2.9, 3],
      ],
      [0, 3],
    );
    expect(found[0][0]).toBe(0);
    expect(found.at(-1)?.[1]).toBe(3);
    found.slice(1).forEach(([from], i) => {
      expect(from).toBeLessThanOrEqual(found[i][1]);
    });
  });
  it("are none where a case has fewer than three stations in the range", () => {
    expect(
      stretchesOf(
        [
          [0, 1, 2, 3],
          [1, 2],
        ],
        [1, 2],
      ),
    ).toEqual([]);
  });
});
