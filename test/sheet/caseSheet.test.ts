import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { failureText, ReductionFailure } from "../../src/core/failure.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";
import { jsonFault } from "../../src/sheet/jsonFault.ts";
import { readCaseSheet } from "../../src/sheet/readCaseSheet.ts";
import { writeCaseSheet } from "../../src/sheet/writeCaseSheet.ts";

const least = { case: "a", layout: "series", files: [{ path: "x0200.csv" }] };
const read = (value: unknown) => readCaseSheet(JSON.stringify(value), "a.json");

function failure(text: string) {
  try {
    readCaseSheet(text, "a.json");
  } catch (error) {
    if (error instanceof ReductionFailure) return error.plain();
    throw error;
  }
  throw new Error("no failure where one was expected");
}

describe("a case sheet", () => {
  it("needs case, layout and files; all else has its default", () => {
    const { sheet, warnings } = read(least);
    expect(sheet).toEqual({ ...defaultCaseSheet, case: "a", files: [{ path: "x0200.csv", x: null }] });
    expect(warnings).toEqual([]);
  });
  it("has the defaults of the published format", () => {
    const { fit, compare, development, units, along, zero, startup, extent, simultaneous, periodic } =
      read(least).sheet;
    expect(fit).toEqual({
      quantity: "auto",
      window: "auto",
      x0: null,
      n: null,
      residuals: "log",
      weights: "sampling",
      coordinate: "auto",
      otherX0: null,
    });
    expect(compare).toEqual({
      align: "x0",
      tolerance: 0.1,
      exponent: "auto",
      against: null,
      at: null,
      quantities: ["Tu", "lambda"],
    });
    expect(development).toEqual({ tolerance: 0.1 });
    expect({ units, along, zero, startup, extent, simultaneous, periodic }).toEqual({
      units: "SI",
      along: "x",
      zero: 0,
      startup: 0,
      extent: null,
      simultaneous: "auto",
      periodic: "auto",
    });
  });
  it("keeps everything it says", () => {
    const columns = { t: "Zeit", u: 2, w: { from: "w", unit: "cm/s" }, v: 0 };
    const said = {
      ...least,
      kinematicViscosity: 1.5e-5,
      reference: { length: 0.025, symbol: "M" },
      columns,
      fit: { window: [0.3, 2], x0: 0.08 },
      read: { separator: ";", decimal: ",", times: "even", missing: ["-999"] },
      reduce: { taylorCorrection: false, probes: "all" },
      body: { x: 1.2, chord: 0.3 },
      kind: "les",
    };
    const { sheet } = read(said);
    expect(sheet.columns).toEqual(columns);
    expect(sheet.reference).toEqual({ length: 0.025, symbol: "M", speed: null });
    expect(sheet.fit).toMatchObject({ window: [0.3, 2], x0: 0.08, n: null });
    expect(sheet.read).toEqual({
      separator: ";",
      decimal: ",",
      heading: null,
      step: null,
      times: "even",
      missing: ["-999"],
    });
    expect(sheet.reduce).toMatchObject({ taylorCorrection: false, probes: "all" });
    expect(sheet.body).toEqual({ x: 1.2, chord: 0.3, Tu: null, L11: null });
  });
  it("warns of every key that it does not know, by name", () => {
    const odd = {
      ...least,
      nu: 1,
      fit: { windw: 3 },
      files: [{ path: "a", y: 2 }],
      columns: { u: { from: "u", unit: "m/s", scale: 2 }, p: "p" },
    };
    expect(read(odd).warnings.map((text) => /key (\S+) /.exec(text)?.[1])).toEqual([
      "files[0].y",
      "nu",
      "fit.windw",
      "columns.u.scale",
      "columns.p",
    ]);
  });
});

describe("a position for a whole profile", () => {
  it("is not used, and that is said", () => {
    const { warnings } = read({ ...least, layout: "profile", files: [{ path: "a" }, { path: "b", x: 1 }] });
    expect(warnings.map((text) => /key (\S+) was not used/.exec(text)?.[1])).toEqual(["files[1].x"]);
    expect(read({ ...least, files: [{ path: "b", x: 1 }] }).warnings).toEqual([]);
  });
});

describe("a value that cannot be used is refused with file and key", () => {
  it.each<[string, object, string]>([
    ["no case", { layout: "series", files: [{ path: "a" }] }, "case"],
    ["an empty case", { ...least, case: " " }, "case"],
    ["no layout", { case: "a", files: [{ path: "a" }] }, "layout"],
    ["an unknown layout", { ...least, layout: "tables" }, "layout"],
    ["no files", { case: "a", layout: "series" }, "files"],
    ["an empty list of files", { ...least, files: [] }, "files"],
    ["a file without a path", { ...least, files: [{ path: "a" }, { x: 1 }] }, "files[1].path"],
    ["a file that is a text", { ...least, files: ["a.csv"] }, "files[0]"],
    ["a viscosity in words", { ...least, kinematicViscosity: "1.5e-5" }, "kinematicViscosity"],
    ["a viscosity of zero", { ...least, kinematicViscosity: 0 }, "kinematicViscosity"],
    ["a window of one number", { ...least, fit: { window: [1] } }, "fit.window"],
    ["a window that runs backward", { ...least, fit: { window: [2, 1] } }, "fit.window"],
    ["a fit that is a list", { ...least, fit: [] }, "fit"],
    ["columns that are a list", { ...least, columns: [] }, "columns"],
    ["a body without a place", { ...least, body: { chord: 1 } }, "body.x"],
    ["residuals nobody knows", { ...least, fit: { residuals: "cubic" } }, "fit.residuals"],
    ["a negative column", { ...least, columns: { u: -1 } }, "columns.u"],
    ["a segment that is no power of two", { ...least, reduce: { segment: 1000 } }, "reduce.segment"],
    ["a coordinate nobody knows", { ...least, fit: { coordinate: "t" } }, "fit.coordinate"],
    ["a development within nothing", { ...least, development: { tolerance: 0 } }, "development.tolerance"],
    [
      "a quantity that is not compared",
      { ...least, compare: { quantities: ["U"] } },
      "compare.quantities[0]",
    ],
    ["no quantity at all", { ...least, compare: { quantities: [] } }, "compare.quantities"],
    ["a tolerance of zero", { ...least, compare: { tolerance: 0 } }, "compare.tolerance"],
    ["a decay in time of a series", { ...least, along: "t" }, "along"],
    ["a list", [], "(the whole sheet)"],
  ])("%s", (_, value, key) => {
    const found = failure(JSON.stringify(value));
    expect([found.code, found.where]).toEqual(["sheet-invalid", { file: "a.json", key }]);
    expect(failureText(found)).toContain(`key ${key}`);
    expect(failureText(found)).not.toMatch(/undefined|Invalid/);
  });
  it("and what JSON reads as infinite is called so", () => {
    expect(failure(JSON.stringify({ ...least, zero: 5 }).replace("5", "1e999")).found).toBe("Infinity");
  });
});

describe("a sheet that is not JSON", () => {
  it.each([
    ['{"case": "a",\n  "layout" "series"}', 2, 12],
    ['{"case": "a",\n}', 2, 1],
    ['{"case": "a"', 1, 13],
    ["", 1, 1],
    ["case: a", 1, 1],
    ['{"a": 01}', 1, 7],
    ['{"a": [1, 2,, 3]}', 1, 13],
    ['{"a": 1} {', 1, 10],
    ['{"a": "b\nc"}', 1, 7],
    ["{'a': 1}", 1, 2],
    ['{"a": NaN}', 1, 7],
  ])("is refused at its place: %j", (text, line, column) => {
    expect(failure(text)).toMatchObject({ code: "sheet-not-json", where: { file: "a.json", line, column } });
  });
  it("is found to be wrong at the end of what is valid, wherever it was cut", () => {
    const text = JSON.stringify({ ...defaultCaseSheet, name: 'a"\\\u00e9' }, null, 1);
    fc.assert(
      fc.property(fc.integer({ min: 0, max: text.length - 1 }), (end) => {
        const { line, column } = jsonFault(text.slice(0, end));
        const lines = text.slice(0, end).split("\n");
        expect(line).toBeLessThanOrEqual(lines.length);
        expect(column).toBeLessThanOrEqual(lines[line - 1].length + 1);
      }),
      { seed: 1, numRuns: 300 },
    );
  });
  it("is no danger when it is nested a hundred thousand deep", () => {
    expect(failure("[".repeat(100_000)).code).toBe("sheet-not-json");
    const deep = `${"[".repeat(100_000)}${"]".repeat(100_000)}`;
    for (const [key, text] of [
      ["(the whole sheet)", deep],
      ["files[0].path", `{"case": "a", "layout": "series", "files": [{"path": ${deep}}]}`],
      ["fit.window", JSON.stringify({ ...least, fit: { window: 0 } }).replace(":0", `:${deep}`)],
    ]) {
      expect(failure(text)).toMatchObject({ code: "sheet-invalid", where: { key } });
    }
  });
  it("or is saved in another encoding, is told so", () => {
    const text = JSON.stringify(least).replace(/./g, "$&\0");
    expect(failure(text)).toMatchObject({
      code: "sheet-not-json",
      message: "The case sheet is not UTF-8 text",
    });
  });
});

describe("writing a sheet", () => {
  it("leaves out what equals the default", () => {
    const { sheet } = read({ ...least, fit: { x0: 1 }, reference: { length: 2 } });
    expect(JSON.parse(writeCaseSheet(sheet))).toEqual({ ...least, fit: { x0: 1 }, reference: { length: 2 } });
  });
  it("and reading it again gives the same sheet, whatever the names", () => {
    const name = fc
      .oneof(fc.string({ minLength: 1 }), fc.constantFrom("__proto__", "constructor", "=1+1", "<b>"))
      .filter((text) => text.trim() === text && text !== "");
    const number = fc.double({ noNaN: true, noDefaultInfinity: true, min: 1e-9, max: 1e9 });
    const value = fc.record({
      case: name,
      layout: fc.constantFrom("series", "profile"),
      kinematicViscosity: fc.option(number),
      files: fc.array(fc.record({ path: name, x: fc.option(number) }), { minLength: 1, maxLength: 4 }),
      columns: fc.option(fc.record({ t: name, u: fc.record({ from: name, unit: name }) })),
      zero: number,
      read: fc.record({ missing: fc.array(name, { maxLength: 3 }), step: fc.option(number) }),
      body: fc.option(fc.record({ x: number, chord: fc.option(number) })),
    });
    fc.assert(
      fc.property(value, (each) => {
        const { sheet } = read(each);
        const again = readCaseSheet(writeCaseSheet(sheet), "b.json");
        expect(again.sheet).toEqual(sheet);
        expect(again.warnings.filter((text) => /not known/.test(text))).toEqual([]);
      }),
      { seed: 9, numRuns: 200 },
    );
  });
  it("is safe with a key called __proto__", () => {
    const { sheet, warnings } = readCaseSheet(
      '{"case":"__proto__","layout":"series","files":[{"path":"a"}],"__proto__":{"zero":5}}',
      "a.json",
    );
    expect([sheet.case, sheet.zero, warnings.length]).toEqual(["__proto__", 0, 1]);
    expect(({} as { zero?: number }).zero).toBeUndefined();
  });
});
