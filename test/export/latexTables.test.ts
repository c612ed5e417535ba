import { describe, expect, it } from "vitest";
import { labelOf } from "../../src/core/catalogue.ts";
import { missing } from "../../src/core/quantity.ts";
import { fitsTable } from "../../src/export/latex/fitsTable.ts";
import { stationsTable } from "../../src/export/latex/stationsTable.ts";
import { texSymbol, texText } from "../../src/export/latex/texText.ts";
import { tableKeys } from "../../src/export/stationColumns.ts";
import { decayOf, stationAt } from "../app/fixtures.ts";

const settings = { units: "SI", along: "x" } as const;
const stations = [0.2, 0.4, 0.8].map((x) => stationAt(x));

/** Rows between the rules, each as the columns that its cells span. */
function spans(table: string): number[] {
  const rows = table.split("\n").filter((line) => line.endsWith("\\\\"));
  return rows.map((row) =>
    row
      .replace(/\\\\$/, "")
      .split(" & ")
      .reduce((sum, cell) => sum + Number(/\\multicolumn\{(\d)\}/.exec(cell)?.[1] ?? 1), 0),
  );
}
const columnsOf = (table: string) =>
  (/\\begin\{tabular\}\{(.*)\}/.exec(table)?.[1] ?? "").replace(/@\{[^}]*\}/g, "").length;

describe("a table of stations in LaTeX", () => {
  const table = stationsTable("screen_25 & #1", stations, settings, [0.3, 1]);

  it("has as many cells in every row as it has columns", () => {
    expect(columnsOf(table)).toBe(1 + 2 * tableKeys.length);
    expect(new Set(spans(table))).toEqual(new Set([columnsOf(table)]));
  });

  it("sets names as text, units in the head, and the same decimals throughout a column", () => {
    expect(table).toContain("screen\\_25 \\& \\#1");
    expect(table).toContain("[m$^{2}$/s$^{3}$]");
    const lambda = tableKeys.indexOf("lambda");
    const rows = table.split("\n").filter((line) => /^0\.\d/.test(line));
    const decimals = rows.map((row) => row.split(" & ")[1 + 2 * lambda].split(".")[1].length);
    expect(new Set(decimals).size).toBe(1);
  });

  it("marks stations outside the window, and leaves out what no station has", () => {
    expect(table.match(/rlap/g)).toHaveLength(1);
    const without = stations.map((station) => ({ ...station, eta: missing("no viscosity") }));
    const narrower = stationsTable("a", without, settings, null);
    expect(narrower).not.toContain(texSymbol(labelOf("eta").symbol));
    expect(new Set(spans(narrower))).toEqual(new Set([1 + 2 * (tableKeys.length - 1)]));
  });

  it("writes a value without an interval, and a gap, across the pair of cells", () => {
    const gaps = [stations[0], { ...stations[1], Re_lambda: missing("too short") }];
    expect(stationsTable("a", gaps, settings, null)).toContain("\\multicolumn{2}{c}{--}");
  });
});

describe("text in LaTeX", () => {
  it("holds nothing that would be a command", () => {
    expect(texText("50 % of a_b\\end{x} $ ~ ^ # &")).toBe(
      "50 \\% of a\\_b\\textbackslash{}end\\{x\\} \\$ \\textasciitilde{} \\textasciicircum{} \\# \\&",
    );
  });
  it("sets minus signs, thin spaces, powers and Greek letters", () => {
    expect(texText("−1.5 × 10⁻⁵ m²/s, λ")).toBe("$-$1.5 $\\times$ 10$^{-5}$ m$^{2}$/s, $\\lambda$");
  });
  it("sets every symbol of the table as mathematics with balanced braces", () => {
    for (const key of tableKeys) {
      const symbol = texSymbol(labelOf(key).symbol);
      expect(symbol).toMatch(/^\$[^$]+\$$/);
      expect(symbol.split("{").length).toBe(symbol.split("}").length);
      expect(
        [...symbol].every((sign) => sign.charCodeAt(0) < 128),
        symbol,
      ).toBe(true);
    }
  });
});

describe("a table of fits in LaTeX", () => {
  it("gives window, exponent and origin of each case with their intervals", () => {
    const decay = decayOf(stations);
    const table = fitsTable([{ name: "a", decay, length: 0.025, symbol: "M", settings }]);
    expect(new Set(spans(table))).toEqual(new Set([7]));
    expect(table).toMatch(/ to .*\\,\$M\$/);
  });
});
