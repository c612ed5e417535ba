import { describe, expect, it } from "vitest";
import { positionDecimals } from "../../src/figures/positionDecimals.ts";

describe("decimals of positions", () => {
  it("0.45 m is not printed as 0.5 m beside stations at 0.3 and 0.7 m", () => {
    expect(positionDecimals([0.2, 0.3, 0.45, 0.7, 1, 1.5])).toBe(2);
  });

  it("round positions get none, and millimetres between stations get three", () => {
    expect(positionDecimals([10, 20, 40])).toBe(0);
    expect(positionDecimals([1, 1.005, 2])).toBe(3);
  });

  it("a third of a metre is rounded where its neighbours are far", () => {
    expect(positionDecimals([1 / 3, 2 / 3, 1])).toBeLessThanOrEqual(3);
  });

  it("a station alone keeps four digits, and none asks for nothing", () => {
    expect(positionDecimals([0.4567])).toBe(4);
    expect(positionDecimals([])).toBe(0);
    expect(positionDecimals([0])).toBe(0);
  });

  it("two positions that differ never come out alike, down to a micrometre", () => {
    const xs = [0.1, 0.100_01, 0.3, 12];
    const decimals = positionDecimals(xs);
    expect(new Set(xs.map((x) => x.toFixed(decimals))).size).toBe(xs.length);
  });
});
