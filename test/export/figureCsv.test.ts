import { describe, expect, it } from "vitest";
import { figureCsv } from "../../src/export/figureCsv.ts";

describe("a figure's numbers as CSV", () => {
  it("keep full precision, and a missing one is an empty field", () => {
    expect(figureCsv({ heading: ["x", "k"], rows: [[0.1 + 0.2, null]] })).toBe(
      "x,k\r\n0.30000000000000004,\r\n",
    );
  });
  it("quote names with commas and quotation marks", () => {
    expect(figureCsv({ heading: ["case"], rows: [['a "b", c']] })).toBe('case\r\n"a ""b"", c"\r\n');
  });
  it("do not let a name become a formula in a spreadsheet", () => {
    expect(figureCsv({ heading: ["case"], rows: [["=1+1"], ["@x"]] })).toBe("case\r\n'=1+1\r\n'@x\r\n");
  });
});
