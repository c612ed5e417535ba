import { describe, expect, it } from "vitest";
import { readArguments, WrongArguments } from "../../src/batch/readArguments.ts";

describe("the command line of the batch", () => {
  it("takes sheets, a folder and a number of threads in any order", () => {
    const asked = { sheets: ["a.json", "b.json"], out: "results", jobs: 3, share: null };
    expect(readArguments(["a.json", "b.json", "--out", "results", "--jobs", "3"])).toEqual(asked);
    expect(readArguments(["--jobs=3", "--out=results", "a.json", "b.json"])).toEqual(asked);
  });

  it("uses at least one thread where none is asked for", () => {
    expect(readArguments(["a.json", "--out", "results"])).toMatchObject({ jobs: expect.any(Number) });
    expect(readArguments(["--help"])).toBe("help");
  });

  it("takes a share of the work, or folders of shards to be joined", () => {
    expect(readArguments(["a.json", "--out", "r", "--shard", "2/12"])).toMatchObject({
      share: { part: 2, of: 12 },
    });
    const merge = { folders: ["a", "b"], out: "r", jobs: 2 };
    expect(readArguments(["--merge", "a", "b", "--out", "r", "--jobs", "2"])).toEqual(merge);
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
    [["a.json", "--out", "r", "--shard", "3/2"], /--shard.*found 3\/2/],
    [["a.json", "--out", "r", "--shard", "0/2"], /--shard.*found 0\/2/],
    [["a.json", "--out", "r", "--shard", "2"], /--shard.*found 2/],
    [["--merge", "--out", "r"], /no folder of shards/],
    [["--merge", "a"], /--out DIR/],
    [["--merge", "a", "--out", "r", "--shard", "1/2"], /do not go together/],
  ])("refuses %j and says why", (argv, why) => {
    expect(() => readArguments(argv)).toThrow(WrongArguments);
    expect(() => readArguments(argv)).toThrow(why);
  });
});
