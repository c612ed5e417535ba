import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { dirname, join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { candidateFiles } from "../../src/batch/candidateFiles.ts";
import { expandPaths } from "../../src/sheet/matchFiles.ts";

let top = "";
beforeAll(() => {
  top = mkdtempSync(join(tmpdir(), "waneline-"));
  for (const path of ["sheets/s.json", "data/x1.csv", "data/x2.csv", "data/deep/x3.csv", "data/b/p1.csv"]) {
    mkdirSync(dirname(join(top, path)), { recursive: true });
    writeFileSync(join(top, path), "");
  }
  symlinkSync(join(top, "data/x1.csv"), join(top, "sheets/linked.csv"));
});
afterAll(() => rmSync(top, { recursive: true }));

describe("files that a path of a sheet may mean", () => {
  it.each([
    ["../data/x1.csv", ["../data/x1.csv"]],
    ["../data/x*.csv", ["../data/x1.csv", "../data/x2.csv"]],
    ["../data/*/*.csv", ["../data/b/p1.csv", "../data/deep/x3.csv"]],
    ["..\\data\\x1.csv", ["../data/x1.csv"]],
    ["*.csv", ["linked.csv"]],
    ["nothing.csv", []],
    ["nowhere/*.csv", []],
    ["../data", []],
  ])("%s, seen from the sheet's folder", (path, expected) => {
    const found = candidateFiles(join(top, "sheets"), path);
    expect(expandPaths([path], found)[0].paths).toEqual(expected); // which files the sheet then takes
  });
});
