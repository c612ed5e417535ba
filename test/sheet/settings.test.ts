import { describe, expect, it } from "vitest";
import { compareSettings } from "../../src/sheet/compareSettings.ts";
import { decaySettings } from "../../src/sheet/decaySettings.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";
import { readSettings } from "../../src/sheet/readSettings.ts";
import { reduceSettings } from "../../src/sheet/reduceSettings.ts";
import { resultKey } from "../../src/sheet/resultKey.ts";

const sheet = {
  ...defaultCaseSheet,
  kinematicViscosity: 1.5e-5,
  reference: { length: 0.025, symbol: "M", speed: 6 },
  columns: { t: "Zeit", u: 2, w: { from: "w", unit: "cm/s" } },
  read: { ...defaultCaseSheet.read, step: 1e-4 },
};

describe("the settings of each stage", () => {
  it("of reading hold the file's own position and every column with its unit", () => {
    expect(readSettings(sheet, { path: "a", x: 0.2 })).toMatchObject({
      x: 0.2,
      step: 1e-4,
      layout: "series",
      columns: {
        t: { from: "Zeit", unit: null },
        u: { from: 2, unit: null },
        w: { from: "w", unit: "cm/s" },
      },
    });
  });
  it("of reducing, fitting and comparing carry what the sheet says", () => {
    expect(reduceSettings(sheet)).toMatchObject({
      kinematicViscosity: 1.5e-5,
      referenceSpeed: 6,
      taylorCorrection: true,
      probes: "agreeing",
    });
    expect(decaySettings(sheet)).toMatchObject({
      referenceLength: 0.025,
      window: "auto",
      along: "x",
      dissipation: "auto",
    });
    expect(compareSettings(sheet)).toEqual({
      align: "x0",
      tolerance: 0.1,
      exponent: "auto",
      against: null,
      at: null,
      quantities: ["Tu", "lambda"],
    });
  });
});

describe("the key of a result", () => {
  const key = (edit: object, print = "f", x: number | null = 0.2) => {
    const edited = { ...sheet, ...edit };
    return resultKey(print, readSettings(edited, { path: "a", x }), reduceSettings(edited));
  };
  it("changes with the file, its reading and its reducing", () => {
    const keys = [
      key({}),
      key({}, "g"),
      key({}, "f", 0.3),
      key({ zero: 0.1 }),
      key({ columns: null }),
      key({ kinematicViscosity: 1e-5 }),
      key({ reduce: { ...sheet.reduce, segment: 1024 } }),
    ];
    expect(new Set(keys).size).toBe(keys.length);
  });
  it("stays when only the fit or the name changes, and whatever the order of the keys", () => {
    expect(key({ case: "b", fit: { ...sheet.fit, x0: 1 } })).toBe(key({}));
    const read = readSettings(sheet, { path: "a", x: 0.2 });
    const turned = Object.fromEntries(Object.entries(read).reverse()) as unknown as typeof read;
    expect(resultKey("f", turned, reduceSettings(sheet))).toBe(key({}));
  });
});
