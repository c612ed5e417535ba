import { describe, expect, it } from "vitest";
import { readArguments, WrongArguments } from "../../src/batch/readArguments.ts";

describe("the command line of the batch", () => {
  it("takes sheets, a folder and a number of threads in any order", () => {
    const asked = { sheets: ["a.json", "b.json"], out: "results", jobs: 3 };
    expect(readArguments(["a.json", "b.json", "--out", "results", "--jobs", "3"])).toEqual(asked);
    expect(readArguments(["--jobs=3", "--out=results", "a.json", "b.json"])).toEqual(asked);
  });

  it("uses at least one thread where none is asked for", () => {
    expect(readArguments(["a.json", "--out", "results"])).toMatchObject({ jobs: expect.any(Number) });
    expect(readArguments(["--help"])).toBe("help");
  });

  it.each([
    [["--out", "results"], /no case sheet/],
    [["a.json"], /--out DIR/],
    [["a.json", "--out", ""], /--out DIR/],
    [["a.json", "--out"], /--out/],
    [["a.json", "--out", "r", "--jobs", "0"], /--jobs.*found 0/],
    [["a.json", "--out", "r", "--jobs", "two"], /--jobs.*found two/],
    [["a.json", "--out", "r", "--jobs", "1.5"], /--jobs.*found 1.5/],
    [["a.json", "--out", "r", "--colour"], /--colour/],
    [["a.json", "--out", "r", "--shard", "1/2"], /--shard is not there yet/],
    [["--merge", "a", "--out", "r"], /--merge is not there yet/],
  ])("refuses %j and says why", (argv, why) => {
    expect(() => readArguments(argv)).toThrow(WrongArguments);
    expect(() => readArguments(argv)).toThrow(why);
  });
});
