import { basename, join, resolve } from "node:path";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { safeFileNames } from "../../src/export/safeFileNames.ts";

describe("file names made from case names", () => {
  it("keep what is harmless", () => {
    const names = ["screen-25mm", "LES with inflow A", "Gitter_7.5°".replace("°", ""), "格子", "a.b"];
    expect(safeFileNames(names)).toEqual(names);
  });

  it.each([
    "../../etc/passwd",
    "/etc/passwd",
    "..\\..\\x",
    "C:\\x",
    "a/b",
    ".hidden",
    "..",
    "x\0y",
    "con",
    "",
  ])("never lead out of the folder: %j", (name) => {
    const [file] = safeFileNames([name]);
    expect(resolve("/out", `${file}-stations.csv`)).toBe(join("/out", `${file}-stations.csv`));
    expect(file).not.toMatch(/[/\\:\0]|^\.|^con$/i);
    expect(file).not.toBe("");
  });

  it("differ where the cases differ, also where capitals do not count", () => {
    expect(safeFileNames(["a/b", "a:b", "A-B"])).toEqual(["a-b", "a-b-2", "A-B-3"]);
  });

  it("are plain, distinct and short for any names", () => {
    fc.assert(
      fc.property(fc.array(fc.string({ unit: "grapheme", maxLength: 100 }), { maxLength: 8 }), (names) => {
        const files = safeFileNames(names);
        expect(new Set(files.map((file) => file.toLowerCase())).size).toBe(names.length);
        for (const file of files) {
          expect(basename(file)).toBe(file);
          expect(Buffer.byteLength(`${file}-stations.csv`)).toBeLessThan(256);
        }
      }),
      { seed: 20260, numRuns: 300 },
    );
  });
});
