import fc from "fast-check";
import Papa from "papaparse";
import { describe, expect, it } from "vitest";
import { RowScanner } from "../../src/read/rowScanner.ts";
import { collect, sourceOf } from "./support.ts";

const seeded = { seed: 31, numRuns: 20_000 };

/** One field read as a number; null where it is not plain. */
function scanned(token: string, decimal: "." | "," = "."): number | null {
  const scanner = new RowScanner({ separator: ";", decimal, width: 1, slots: Int32Array.of(0) });
  const bytes = new TextEncoder().encode(`${token}\n`);
  const end = scanner.scan(bytes, 0);
  if (end < 0) return null;
  expect(end).toBe(bytes.length);
  return scanner.values[0];
}

function expectAsNumber(token: string): void {
  const value = scanned(token);
  if (value === null) expect(Number.isFinite(Number(token)), token).toBe(false);
  else expect(Object.is(value, Number(token)), `${token} read as ${value}`).toBe(true);
}

const sign = fc.constantFrom("", "-", "+");
const digits = (max: number) =>
  fc.array(fc.integer({ min: 0, max: 9 }), { minLength: 1, maxLength: max }).map((each) => each.join(""));
const power = fc.oneof(
  fc.constant(""),
  fc
    .tuple(fc.constantFrom("e", "E", "e+", "E-", "e-"), fc.integer({ min: 0, max: 330 }))
    .map(([letter, value]) => `${letter}${value}`),
);

describe("a decimal is read from its bytes as the double that Number() gives, to the last bit", () => {
  it("for any digits, point, sign and power", () => {
    fc.assert(
      fc.property(
        sign,
        digits(24),
        fc.option(digits(24), { nil: "" }),
        power,
        (before, whole, fraction, exponent) =>
          expectAsNumber(`${before}${whole}${fraction === "" ? "" : `.${fraction}`}${exponent}`),
      ),
      seeded,
    );
  });
  it("for doubles as programs write them: shortest, 15, 16, 17 and 21 significant digits, fixed", () => {
    const written = [String, ...[14, 15, 16, 20].map((n) => (x: number) => x.toExponential(n))];
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        for (const write of written) expectAsNumber(write(value));
        if (Math.abs(value) < 1e15) for (const n of [1, 6, 12, 17]) expectAsNumber(value.toFixed(n));
      }),
      { seed: 37, numRuns: 5000 },
    );
  });
  it("for decimals in the very middle between two doubles, and a hair beside it", () => {
    fc.assert(
      fc.property(
        fc.bigInt({ min: 2n ** 52n, max: 2n ** 53n - 1n }),
        fc.integer({ min: 1, max: 40 }),
        (m, shift) => {
          const middle = ((2n * m + 1n) * 2n ** BigInt(shift)) / 2n;
          for (const beside of [-1n, 0n, 1n]) {
            expectAsNumber(`${middle + beside}`);
            expectAsNumber(`${middle + beside}e-12`);
            expectAsNumber(`${middle}.0000000001`);
          }
        },
      ),
      { seed: 41, numRuns: 3000 },
    );
  });
  it.each([
    "0",
    "-0",
    "0.000",
    "-.0e5",
    ".5",
    "5.",
    "1e22",
    "1e23",
    "123456789012345678e-30",
    "4.9e-324",
    "1e-400",
  ])("for %s", (token) => expectAsNumber(token));
  it("with a decimal comma too", () => {
    expect(scanned("-12,5e-1", ",")).toBe(-1.25);
    expect(scanned("0,12345678901234567", ",")).toBe(Number("0.12345678901234567"));
    expect(scanned("1.5", ",")).toBeNull();
  });
});

describe("what is no plain decimal is left to the slower reader", () => {
  it.each([
    "",
    "-",
    "+-1",
    ".",
    "e5",
    "1e",
    "1e+",
    "1.2.3",
    "0x10",
    "1_000",
    "1e99999",
    "1e999",
    "NaN",
    "Infinity",
    '"1"',
    "1.5D3",
    "1 2",
    "\u22121",
  ])("%s", (token) => expect(scanned(token)).toBeNull());
  it("a row that is short, long, or begins as a comment", () => {
    const scanner = new RowScanner({ separator: ",", decimal: ".", width: 2, slots: Int32Array.of(-1, 0) });
    const end = (row: string) => scanner.scan(new TextEncoder().encode(`${row}\n`), 0);
    for (const row of ["1", "1,2,3", "#1,2", " % 1,2", '"a",2', "1,2,,"]) expect(end(row), row).toBe(-1);
    for (const row of ["1,2", " 1 , 2 ", "a,2", ",2", "1,2,", "1,2\t,\r"])
      expect(end(row), row).toBeGreaterThan(0);
  });
});

const rowOf = (token: fc.Arbitrary<string>) => fc.tuple(token, token, token);
const plainToken = fc.oneof(
  fc.double({ min: -50, max: 50, noNaN: true }).map(String),
  fc.double({ min: -50, max: 50, noNaN: true }).map((value) => value.toFixed(5)),
);

describe("a table read from its bytes", () => {
  it("has the numbers that splitting its lines and Number() give, whatever separators, line ends and blanks it has", async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.array(rowOf(plainToken), { minLength: 3, maxLength: 40 }),
        fc.constantFrom(",", ";", "\t"),
        fc.constantFrom("\n", "\r\n", "\r"),
        fc.constantFrom("", " ", "  "),
        fc.constantFrom("plain", "ends", "quoted"),
        fc.integer({ min: 1, max: 70 }),
        async (rows, separator, end, pad, form, size) => {
          const dressed = (token: string) => (form === "quoted" ? `"${token}"` : `${pad}${token}`);
          const lines = rows.map(
            (row) => row.map(dressed).join(separator) + (form === "ends" ? separator : ""),
          );
          const text = [["u", "v", "w"].join(separator), ...lines, ""].join(end);
          const { records } = await collect(sourceOf("a.csv", text, [size]), { x: 0, step: 1 });
          const expected = Papa.parse<string[]>(lines.join("\n"), { delimiter: separator }).data;
          (["u", "v", "w"] as const).forEach((role, i) => {
            expect(records[0][role]).toEqual(expected.map((row) => Number(row[i])));
          });
        },
      ),
      { seed: 43, numRuns: 400 },
    );
  });
  it("tells the same line of the first fault whether the rows before it were plain or not", async () => {
    const rows = Array.from({ length: 9000 }, (_, i) => `${i},${i % 7}.25,1`);
    rows[7000] = "7000,x,1";
    for (const quoted of [false, true]) {
      const text = [
        "t,u,v",
        ...rows.map((row, i) => (quoted && i < 6000 ? row.replace(/[^,]+/g, '"$&"') : row)),
        "",
      ];
      await expect(collect(sourceOf("x0.1.csv", text.join("\n")))).rejects.toMatchObject({
        code: "not-a-number",
        where: { line: 7002, column: 2 },
      });
    }
  });
});
