import { describe, expect, it } from "vitest";
import { expandPaths, naturalOrder, pathFrom } from "../../src/sheet/matchFiles.ts";

const matched = (patterns: string[], available: string[]) =>
  expandPaths(patterns, available).map(({ paths }) => paths);

describe("paths of a sheet", () => {
  it("name a file as it is, with ./ and ../ taken out", () => {
    expect(matched(["./a.csv", "b/../c.csv", "../d.csv"], ["a.csv", "c.csv", "../d.csv"])).toEqual([
      ["a.csv"],
      ["c.csv"],
      ["../d.csv"],
    ]);
  });
  it("with * name all that fit, in natural order, within one folder", () => {
    expect(matched(["x*.csv"], ["x10.csv", "x2.csv", "y1.csv", "sub/x3.csv", "x.dat"])).toEqual([
      ["x2.csv", "x10.csv"],
    ]);
    expect(matched(["*/u.csv"], ["x1/u.csv", "x2/u.csv", "u.csv", "x1/v.csv"])).toEqual([
      ["x1/u.csv", "x2/u.csv"],
    ]);
    expect(matched(["a*b*c"], ["abc", "aXbYc", "acb", "ac", "abbc"])).toEqual([["aXbYc", "abbc", "abc"]]);
  });
  it("never name a file twice: the first that fits has it", () => {
    expect(matched(["x1.csv", "x*.csv"], ["x1.csv", "x2.csv"])).toEqual([["x1.csv"], ["x2.csv"]]);
  });
  it("take signs for themselves, not for a pattern", () => {
    expect(matched(["a.c", "b+(1).csv"], ["abc", "b+(1).csv"])).toEqual([[], ["b+(1).csv"]]);
  });
  it("with a hundred stars are matched at once", () => {
    const start = "a".repeat(2000);
    expect(matched([`${"a*".repeat(100)}b`], [start])).toEqual([[]]);
  });
  it("are joined to the folder they are written in", () => {
    expect(pathFrom("a/b", "../x.csv")).toBe("a/x.csv");
    expect(pathFrom("", "../x.csv")).toBe("../x.csv");
    expect(pathFrom("a", "..\\x.csv")).toBe("x.csv");
  });
});

it("natural order counts numbers by value", () => {
  expect(["x10", "x9", "x09", "a", "x1y2", "x1y10"].sort(naturalOrder)).toEqual([
    "a",
    "x1y2",
    "x1y10",
    "x09",
    "x9",
    "x10",
  ]);
});
