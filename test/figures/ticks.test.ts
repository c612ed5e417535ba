import { describe, expect, it } from "vitest";
import { linearTicks, logTicks } from "../../src/figures/ticks.ts";

describe("ticks of a logarithmic axis", () => {
  it("are powers of ten over two decades or more, with true minus signs", () => {
    const { major, text, minor } = logTicks(3e-4, 4e-2);
    expect(major).toEqual([1e-3, 1e-2]);
    expect(text).toEqual(["10<sup>−3</sup>", "10<sup>−2</sup>"]);
    expect(minor).toContain(5e-4);
  });
  it("are plain numbers at 1, 2 and 5 below two decades", () => {
    expect(logTicks(3.6, 110).text).toEqual(["5", "10", "20", "50", "100"]);
  });
  it("become denser where 1, 2 and 5 mark fewer than three places", () => {
    expect(logTicks(45, 130).text.length).toBeGreaterThanOrEqual(3);
  });
  it("are those of a straight scale over a short stretch", () => {
    expect(logTicks(0.86, 0.99).text).toEqual(linearTicks(0.86, 0.99).text);
  });
  it("lie within the axis", () => {
    const { major, minor } = logTicks(0.013, 870);
    for (const value of [...major, ...minor]) expect(value >= 0.0129 && value <= 871).toBe(true);
  });
});

describe("ticks of a straight axis", () => {
  it("are round and carry no more decimals than they need", () => {
    expect(linearTicks(0, 2).text).toEqual(["0", "0.5", "1.0", "1.5", "2.0"]);
    expect(linearTicks(-8.5, 6.5, 6).text).toEqual(["−8", "−6", "−4", "−2", "0", "2", "4", "6"]);
  });
  it("hold zero as a plain zero", () => expect(linearTicks(-0.3, 0.3).text).toContain("0"));
});
