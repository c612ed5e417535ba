import { describe, expect, it } from "vitest";
import { failureText } from "../../src/core/failure.ts";
import type { ReadSettings } from "../../src/core/records.ts";
import { previewFile } from "../../src/read/previewFile.ts";
import { readProfile } from "../../src/read/readProfile.ts";
import { collect, failureOf, plainSettings, sourceOf } from "./support.ts";

const fails = (text: string, settings: Partial<ReadSettings> = {}, name = "x0200.csv") =>
  failureOf(collect(sourceOf(name, text), settings));
const good = "0,6,0,0\n0.1,6.1,0,0\n0.2,6.2,0,0\n";

describe("a bad record is refused by its code and place", () => {
  it.each<[string, string, string, object, Partial<ReadSettings>?]>([
    ["an empty file", "", "empty-file", {}],
    ["a file of blank lines", "\n  \n\n", "empty-file", {}],
    ["a heading alone", "t,u,v,w\n", "heading-only", { line: 1 }],
    ["a heading and a blank line", "t,u,v,w\n\n", "heading-only", { line: 1 }],
    ["comments alone", "# a\n# t u v\n", "heading-only", { line: 1 }],
    [
      "a letter",
      "Dear colleague,\nplease find enclosed\nthe records we spoke of.\nYours\n",
      "not-a-record",
      { line: 1 },
    ],
    ["binary bytes", "PK\u0003\u0004\0\0\0\b\0", "not-a-record", {}],
    ["JSON that is no table", '{"a": 1}', "not-a-record", { line: 1 }],
    [
      "a number beyond all measurement",
      `t,u,v,w\n${good}0.3,1e300,0,0\n${good}`,
      "not-a-number",
      { line: 5, column: 2 },
    ],
    [
      "a line of numbers called the heading",
      `t,u,v,w\n${good}`,
      "ambiguous-columns",
      { line: 3 },
      { heading: 3 },
    ],
    ["no velocity", `t,p,T,rho\n${good}`, "no-velocity", { line: 1 }],
    ["v and w without u", `t,v,w,p\n${good}`, "no-velocity", { line: 1 }],
    ["a word for a number", `t,u,v,w\n${good}0.3,six,0,0\n${good}`, "not-a-number", { line: 5, column: 2 }],
    ["a word in the first row", `t,u,v,w\n0,six,0,0\n${good}`, "not-a-number", { line: 2, column: 2 }],
    ["words in every row", "t,u\na,b\nc,d\ne,f\n", "not-a-number", { line: 2, column: 1 }],
    [
      "a number with two points",
      `t,u,v,w\n${good.repeat(20)}0.3,6,6.1.4,0\n`,
      "not-a-number",
      { line: 62, column: 3 },
    ],
    ["an empty field", `t,u,v,w\n${good}0.3,6,,0\n`, "not-a-number", { line: 5, column: 3 }],
    ["NaN", `t,u,v,w\n${good}0.3,NaN,0,0\n`, "not-a-number", { line: 5, column: 2 }],
    [
      "a value called missing",
      `t,u,v,w\n${good}0.3,6,0,-999.0\n`,
      "not-a-number",
      { line: 5, column: 4 },
      { missing: ["-999"] },
    ],
    ["a short row", `t,u,v,w\n${good}0.3,6\n${good}`, "not-a-number", { line: 5, column: 2 }],
    ["a long row", `t,u,v,w\n${good}0.3,6,0,0,7\n${good}`, "not-a-number", { line: 5, column: 5 }],
    ["no time and no step", "u,v,w\n6,0,0\n6.1,0,0\n6.2,0,0\n", "no-time", { line: 1 }],
    ["two columns for u", `t,u,u,w\n${good}`, "ambiguous-columns", { line: 1, column: 2 }],
    ["probes side by side", `u1,u2,v1,v2\n${good}`, "ambiguous-columns", { line: 1, column: 1 }, { step: 1 }],
    ["many columns without a heading", "0,1,2,3,4,5\n1,1,2,3,4,5\n2,3,4,5,6,7\n", "no-velocity", { line: 1 }],
    ["a comma for both", "t,u\n0,02375,0,19375\n0,02380,0,19377\n", "ambiguous-columns", { line: 3 }],
    ["a heading that fits no row", `t,u,v\n${good}`, "ambiguous-columns", { line: 1 }],
    ["volts", `t [s],u [V],v [V],w [V]\n${good}`, "ambiguous-columns", { line: 1, column: 2 }],
    ["a unit nobody knows", `t [s],u [furlong],v,w\n${good}`, "ambiguous-columns", { line: 1, column: 2 }],
    [
      "metres in a non-dimensional case",
      `t,u [m/s],v,w\n${good}`,
      "ambiguous-columns",
      { line: 1, column: 2 },
      { units: "nondimensional" },
    ],
    [
      "a column that is not there",
      `t,u,v,w\n${good}`,
      "ambiguous-columns",
      { line: 1 },
      { columns: { u: { from: "U1", unit: null } } },
    ],
    [
      "a column number beyond the last",
      `t,u,v,w\n${good}`,
      "ambiguous-columns",
      { line: 1 },
      { columns: { u: { from: 7, unit: null } } },
    ],
    ["a start-up longer than the record", `t,u,v,w\n${good}`, "too-few-samples", {}, { startup: 5 }],
  ])("%s", async (_, text, code, place, settings) => {
    const failure = await fails(text, settings);
    expect(failure.code).toBe(code);
    expect(failure.where).toEqual({ file: "x0200.csv", ...place });
    expect(failure.remedy).not.toBe("");
    expect(failureText(failure)).toMatch(/^x0200\.csv/);
  });

  it("without a position anywhere", async () => {
    const failure = await fails(`t,u,v,w\n${good}`, {}, "run_end.csv");
    expect([failure.code, failure.where.file]).toEqual(["no-position", "run_end.csv"]);
  });
  it("with one x in the sheet and several in the file", async () => {
    const failure = await fails("x,t,u\n0.1,0,6\n0.1,1,6\n0.2,0,6\n", { x: 0.1 });
    expect([failure.code, failure.where.line, failure.where.column]).toEqual(["ambiguous-columns", 4, 1]);
  });
  it("and a heading of eighty names is told by its first few", async () => {
    const names = Array.from({ length: 80 }, (_, i) => `p${i}`);
    const row = names.map((_, i) => i).join(",");
    const failure = await fails(`${names.join(",")}\n${row}\n${row}\n`);
    expect(failure.found).toBe("the headings p0, p1, p2, p3, p4, p5, p6, p7 and 72 more");
  });
  it("and what was found is shown as it stands in the file", async () => {
    const failure = await fails("t;u\n0,0;6,0\n0,1;6,1,4\n0,2;6,1\n");
    expect(failure.found).toBe("6,1,4");
  });
});

describe("a bad profile is refused by its code and place", () => {
  const profile = (text: string) =>
    failureOf(readProfile(sourceOf("p.csv", text), { ...plainSettings, layout: "profile" }));
  it("asks for what a profile holds, not for a velocity in time", async () => {
    expect((await profile("x,U\n0.1,6\n0.2,6\n")).expected).toBe("a column uu, u_rms or q");
  });
  it.each([
    [
      "a number beyond all measurement",
      "x,u_rms\n0.1,1e200\n0.2,1\n",
      "not-a-number",
      { line: 2, column: 2 },
    ],
    ["no coordinate", "U,uu\n6,0.3\n6,0.2\n", "no-position", { line: 1 }],
    ["no statistics", "x,U\n0.1,6\n0.2,6\n", "no-velocity", { line: 1 }],
    ["a word", "x,U,uu\n0.1,6,0.3\n0.2,6,little\n", "not-a-number", { line: 3, column: 3 }],
    ["no coordinate in a row", "x,U,uu\n0.1,6,0.3\n,6,0.2\n", "not-a-number", { line: 3, column: 1 }],
  ])("%s", async (_, text, code, place) => {
    const failure = await profile(text);
    expect(failure.code).toBe(code);
    expect(failure.where).toEqual({ file: "p.csv", ...place });
  });
});

describe("a file that ends within a row", () => {
  it.each(["0.3,6.3", "0.3,6.3,0,", "0.3,6.3,0,1e-"])("loses that row and says so: %s", async (cut) => {
    const { records, summary } = await collect(sourceOf("x0200.csv", `t,u,v,w\n${good}${cut}`));
    expect(records[0].u).toEqual([6, 6.1, 6.2]);
    expect(summary.flags.map(({ code, value }) => [code, value])).toEqual([["damaged-file", 5]]);
  });
});

describe("lines between the rows that hold none", () => {
  it("are counted and told, blank ones at the end are not", async () => {
    const text = `t,u,v,w\n${good}# restart\nt,u,v,w\n\n${good}\n\n`;
    const { summary } = await collect(sourceOf("x0200.csv", text));
    expect(summary.rows).toBe(6);
    expect(summary.leftOut).toBe(3);
    expect(summary.flags.map(({ code }) => code)).toEqual(["left-out-lines"]);
  });
});

describe("a first look", () => {
  it("does not refuse what can be mended", async () => {
    const preview = await previewFile(sourceOf("a.csv", `t,u,u,w\n${good}`));
    expect(preview.columns.map(({ role }) => role)).toEqual(["t", null, null, "w"]);
    expect(preview.clashes).toEqual([{ role: "u", columns: [2, 3] }]);
  });
});
