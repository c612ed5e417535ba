import { describe, expect, it } from "vitest";
import type { PlainFailure } from "../../src/core/failure.ts";
import type { Preview, Role } from "../../src/core/records.ts";
import { planDrop } from "../../src/sheet/planDrop.ts";

type Look = Preview | PlainFailure;
const looked = (file: string, roles: (Role | null)[], edit: Partial<Preview> = {}): Preview => ({
  file,
  bytes: 10,
  separator: ",",
  decimal: ".",
  heading: 1,
  layout: roles.includes("uu") ? "profile" : "series",
  columns: roles.map((role, i) => ({ heading: role ?? "p", number: i + 1, role, unit: null })),
  firstRows: [],
  comments: [],
  position: { x: 0.2, source: "name", matched: "x0200" },
  step: 1e-4,
  estimatedRows: 5,
  ...edit,
});
const series = (file: string) => looked(file, ["t", "u", "v", "w"]);
const unplaced = (file: string) =>
  looked(file, ["t", "u"], { position: { x: null, source: null, matched: null } });
const noRecord = (file: string): PlainFailure => ({
  code: "not-a-record",
  message: "No line of numbers was found",
  remedy: "Leave the file out.",
  where: { file },
});

function plan(looks: Look[], sheets: Record<string, object | string> = {}) {
  const nameOf = (look: Look) => ("code" in look ? (look.where.file ?? "") : look.file);
  const texts = Object.entries(sheets).map(([name, value]) => ({
    name,
    text: typeof value === "string" ? value : JSON.stringify(value),
  }));
  const files = [...looks.map(nameOf), ...Object.keys(sheets)].map((name) => ({ name, bytes: 10 }));
  return planDrop(files, texts, new Map(looks.map((look) => [nameOf(look), look])));
}
const short = ({ cases }: ReturnType<typeof plan>) => cases.map(({ sheet, names }) => [sheet.case, ...names]);

describe("a drop without sheets", () => {
  it("of two folders is two cases, named after them, with paths relative to the folder", () => {
    const found = plan([series("screen/x0400.csv"), series("screen/x0200.csv"), series("les/a/x0200.csv")]);
    expect(short(found)).toEqual([
      ["screen", "screen/x0200.csv", "screen/x0400.csv"],
      ["les", "les/a/x0200.csv"],
    ]);
    expect(found.cases.map(({ sheet }) => sheet.files.map(({ path }) => path))).toEqual([
      ["x0200.csv", "x0400.csv"],
      ["a/x0200.csv"],
    ]);
  });
  it("of loose files is one case with what their names share, or simply a case", () => {
    expect(plan([series("run_x0200.csv"), series("run_x0400.csv")]).cases[0].sheet.case).toBe("run");
    expect(plan([series("x0200.csv"), series("x0400.csv")]).cases[0].sheet.case).toBe("case");
  });
  it("of tables of lines is a case of that layout, and asks for no step", () => {
    const lines = (file: string) => looked(file, ["y", "t", "u"], { layout: "lines", step: null });
    const { cases, leftOut } = plan([lines("a/x1.csv"), lines("a/x2.csv"), series("a/x3.csv")]);
    expect(cases.map(({ sheet }) => [sheet.layout, sheet.files.length])).toEqual([["lines", 2]]);
    expect(cases[0].questions.map(({ key }) => key)).not.toContain("read.step");
    expect(leftOut).toMatchObject([
      { name: "a/x3.csv", reason: expect.stringContaining("among tables of lines") },
    ]);
  });
  it("asks for name, viscosity, reference and what no file tells", () => {
    const { cases } = plan([series("a/x0200.csv"), unplaced("a/end.csv")]);
    expect(cases[0].questions).toEqual([
      { key: "case" },
      { key: "kinematicViscosity" },
      { key: "reference.length" },
      { key: "reference.speed" },
      { key: "files.x", file: "a/end.csv" },
    ]);
  });
  it("asks for the step where a file has no time", () => {
    const { cases } = plan([looked("a/x0200.csv", ["u", "v"], { step: null })]);
    expect(cases[0].questions.at(-1)).toEqual({ key: "read.step", file: "a/x0200.csv" });
  });
  it("leaves out what is no record, with the reason", () => {
    const { cases, leftOut } = plan([
      series("a/x0200.csv"),
      noRecord("a/notes.txt"),
      looked("a/positions.csv", ["x", "y", "z"]),
    ]);
    expect(cases[0].names).toEqual(["a/x0200.csv"]);
    expect(leftOut.map(({ name }) => name)).toEqual(["a/notes.txt", "a/positions.csv"]);
    expect(leftOut[0].reason).toContain("No line of numbers");
    expect(leftOut[1].reason).toContain("x, y, z");
  });
  it("keeps tables in which nothing was recognised where there is nothing better, and asks for their columns", () => {
    const { cases } = plan([looked("a/m20.dat", [null, null, null])]);
    expect(cases[0].questions).toContainEqual({ key: "columns", file: "a/m20.dat" });
  });
  it("of profiles is a case of that layout, in time where there is no x", () => {
    expect(plan([looked("p.csv", ["x", "uu"])]).cases[0].sheet).toMatchObject({
      layout: "profile",
      along: "x",
    });
    expect(plan([looked("p.csv", ["t", "uu"])]).cases[0].sheet).toMatchObject({
      layout: "profile",
      along: "t",
    });
    expect(
      plan([looked("p.csv", ["x", "uu"], { position: { x: null, source: null, matched: null } })]).cases[0]
        .questions.length,
    ).toBe(4);
  });
  it("does not mix a profile into time series", () => {
    const { cases, leftOut } = plan([
      series("a/x1.csv"),
      series("a/x2.csv"),
      looked("a/truth.csv", ["x", "uu"]),
    ]);
    expect(cases[0].names).toEqual(["a/x1.csv", "a/x2.csv"]);
    expect(leftOut[0].name).toBe("a/truth.csv");
  });
  it("with nothing to read is no case", () => {
    expect(plan([noRecord("a.txt")])).toMatchObject({ cases: [], leftOut: [{ name: "a.txt" }] });
  });
  it("is not confused by a folder called __proto__", () => {
    expect(short(plan([series("__proto__/x0200.csv"), series("constructor/x0200.csv")]))).toEqual([
      ["__proto__", "__proto__/x0200.csv"],
      ["constructor", "constructor/x0200.csv"],
    ]);
  });
});

describe("a drop with sheets", () => {
  const sheet = (name: string, ...paths: string[]) => ({
    case: name,
    layout: "series",
    files: paths.map((path) => ({ path })),
  });
  it("takes their files by relative path, with * and ../", () => {
    const looks = [series("d/screen/x10.csv"), series("d/screen/x9.csv"), series("d/les/y.csv")];
    const found = plan(looks, { "d/sheets/screen.json": sheet("screen", "../screen/x*.csv") });
    expect(short(found)).toEqual([["screen", "d/screen/x9.csv", "d/screen/x10.csv"]]);
    expect(found.cases[0].sheet.files.map(({ path }) => path)).toEqual([
      "../screen/x9.csv",
      "../screen/x10.csv",
    ]);
    expect(found.leftOut).toEqual([{ name: "d/les/y.csv", reason: "No case sheet names it." }]);
    expect(found.cases[0].questions).toEqual([]);
  });
  it("gives every file of a pattern the position the sheet gives", () => {
    const { cases } = plan([series("a_1.csv"), series("a_2.csv")], {
      "a.json": { case: "a", layout: "series", files: [{ path: "a_*.csv", x: 0.4 }] },
    });
    expect(cases[0].sheet.files.map(({ x }) => x)).toEqual([0.4, 0.4]);
  });
  it("falls back to the files' own names where the folders were lost", () => {
    const found = plan([series("x0200.csv"), series("x0400.csv")], {
      "a.json": sheet("a", "runs/x0200.csv", "runs/x0400.csv"),
    });
    expect(short(found)).toEqual([["a", "x0200.csv", "x0400.csv"]]);
  });
  it("takes one of several files of a name from the sheet's own folder, and guesses at no other", () => {
    const looks = [series("a/data/x1.csv"), series("b/data/x1.csv")];
    expect(short(plan(looks, { "a/s.json": sheet("a", "x1.csv") }))[0]).toEqual(["a", "a/data/x1.csv"]);
    const lost = plan(looks, { "s.json": sheet("a", "x1.csv") });
    expect(lost.failures).toMatchObject([
      { code: "missing-file", where: { file: "s.json", key: "files[0].path" } },
    ]);
  });
  it("never leads out of the drop", () => {
    const { failures, cases } = plan([series("x1.csv")], { "s.json": sheet("a", "../../etc/passwd") });
    expect([cases.length, failures.map(({ code }) => code)]).toEqual([1, ["missing-file"]]);
    expect(cases[0].fromSheet).toBe(false);
  });
  it("says which file is missing and goes on with the rest", () => {
    const { cases, failures } = plan([series("x1.csv")], { "s.json": sheet("a", "x1.csv", "x2.csv") });
    expect(cases[0].names).toEqual(["x1.csv"]);
    expect(failures).toMatchObject([{ code: "missing-file", where: { key: "files[1].path" } }]);
  });
  it("reports a sheet that cannot be used, and the other cases stand", () => {
    const { cases, failures } = plan([series("a/x1.csv"), series("b/x1.csv")], {
      "a/s.json": '{"case": "a", "layout" "series"}',
      "b/s.json": { case: "b", layout: "series", files: [] },
    });
    expect(failures.map(({ code, where }) => [code, where.file])).toEqual([
      ["sheet-not-json", "a/s.json"],
      ["sheet-invalid", "b/s.json"],
    ]);
    expect(cases.map(({ sheet }) => sheet.case)).toEqual(["a", "b"]);
  });
  it("leaves out JSON that is no sheet", () => {
    expect(plan([series("a/x1.csv")], { "a/package.json": { name: "x" } }).leftOut[0].name).toBe(
      "a/package.json",
    );
  });
  it("tells two cases of one name apart", () => {
    const found = plan([series("a/x1.csv"), series("b/x1.csv")], {
      "a/s.json": sheet("run", "x1.csv"),
      "b/s.json": sheet("run", "x1.csv"),
    });
    expect(short(found).map(([name]) => name)).toEqual(["run", "run (2)"]);
    expect(found.warnings.length).toBe(1);
  });
  it("asks for a position that neither sheet nor file has", () => {
    const { cases } = plan([unplaced("end.csv")], { "s.json": sheet("a", "end.csv") });
    expect(cases[0].questions).toEqual([{ key: "files.x", file: "end.csv" }]);
  });
});
