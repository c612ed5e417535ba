import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { parseNumber } from "../../src/read/parseNumber.ts";

describe("a field of a file", () => {
  it("that is a decimal number is read exactly as Number() reads it", () => {
    const digits = fc.stringMatching(/^[0-9]{0,18}$/);
    const exponent = fc.option(
      fc.tuple(fc.constantFrom("e", "E"), fc.constantFrom("", "+", "-"), fc.integer({ min: 0, max: 320 })),
      {
        nil: null,
      },
    );
    const sign = fc.constantFrom("", "-", "+");
    const point = fc.constantFrom("", ".");
    fc.assert(
      fc.property(sign, digits, point, digits, exponent, (s, whole, dot, part, power) => {
        const text = s + whole + dot + part + (power ? power.join("") : "");
        const expected = text.trim() === "" ? Number.NaN : Number(text);
        const wanted = Number.isFinite(expected) ? expected : Number.NaN;
        expect(parseNumber(text, ".")).toBe(wanted);
        expect(parseNumber(text.replace(".", ","), ",")).toBe(wanted);
        expect(parseNumber(` ${text} `, ".")).toBe(wanted);
      }),
      { seed: 3, numRuns: 2000 },
    );
  });
  it("of any characters is never a number where Number() has none or an infinite one", () => {
    const odd = fc.string({ unit: fc.constantFrom(..."0123456789.+-eExXoObBnfiIa_ ,"), maxLength: 8 });
    fc.assert(
      fc.property(odd, (text) => {
        const found = parseNumber(text, ".");
        if (!Number.isNaN(found)) expect([Number(text), fortran(text)]).toContain(found);
      }),
      { seed: 5, numRuns: 5000 },
    );
  });
  it.each([
    "",
    " ",
    "0x10",
    "-0x10",
    " 0x1F",
    "0b1",
    "0o7",
    "Infinity",
    "-Infinity",
    "NaN",
    "1e999",
    "6.1.4",
    "1 2",
    "1_000",
    "--1",
    "1,5",
    "e5",
    ".",
    "+",
  ])("is no number when it is %j", (text) => expect(parseNumber(text, ".")).toBeNaN());
  it.each([
    ["1e-3", 0.001],
    ["-.5", -0.5],
    ["+1", 1],
    ["5.", 5],
    ["-0", -0],
    ["0", 0],
    ["\u22126.5", -6.5],
    ["1.0D-03", 0.001],
    [".196937d-02", 0.00196937],
    ["3.14-114", 3.14e-114],
    ["5.68713-304", 5.68713e-304],
    ["-1.5-100", -1.5e-100],
  ])("is a number when it is %j", (text, value) => expect(parseNumber(text, ".")).toBe(value));
  it("with a point is no number where the decimal sign is a comma: it may part thousands", () => {
    expect(parseNumber("1.234", ",")).toBeNaN();
    expect(parseNumber("1.234,5", ",")).toBeNaN();
  });
  it("that could be a date or a sum is no number", () => {
    for (const text of ["2024-01", "12-05", "1.5-3", "3.14-1140", "3.14+114", "3.-114"])
      expect(parseNumber(text, ".")).toBeNaN();
  });
});

function fortran(text: string): number {
  return Number(text.trim().replace(/(\.\d+)(-\d{3})$/, "$1e$2"));
}
