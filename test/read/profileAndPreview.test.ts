import { describe, expect, it } from "vitest";
import { previewFile } from "../../src/read/previewFile.ts";
import { readProfile } from "../../src/read/readProfile.ts";
import { failureOf, plainSettings, sourceOf } from "./support.ts";

const settings = { ...plainSettings, layout: "profile" as const };

describe("a profile", () => {
  it("gives each row its line, position and what it holds", async () => {
    const text = "# screen, 6 m/s\nx [mm],U,uu,lambda [mm]\n200,6,0.09,\n400,6.01,0.04,5.5\n";
    const { rows, source, flags } = await readProfile(sourceOf("p.csv", text), settings);
    expect(rows).toEqual([
      { file: "p.csv", line: 3, x: 0.2, values: { U: 6, uu: 0.09 } },
      { file: "p.csv", line: 4, x: 0.4, values: { U: 6.01, uu: 0.04, lambda: 0.0055 } },
    ]);
    expect(source).toEqual({ name: "p.csv", bytes: text.length, x: null, position: "column" });
    expect(flags).toEqual([]);
  });
  it("may lack values: they are absent, never zero", async () => {
    const text = "x,uu,vv\n1,0.3,NaN\n2,-999,0.1\n3,n/a,\n4,0.1,0.1\n";
    const { rows } = await readProfile(sourceOf("p.csv", text), { ...settings, missing: ["-999"] });
    expect(rows.map(({ values }) => values)).toEqual([{ uu: 0.3 }, { vv: 0.1 }, {}, { uu: 0.1, vv: 0.1 }]);
  });
  it("in time takes t in place of x", async () => {
    const { rows } = await readProfile(sourceOf("p.csv", "time,K\n2.5,0.3\n3,0.2\n"), {
      ...settings,
      along: "t",
      zero: 0.5,
    });
    expect(rows.map(({ x, values }) => [x, values.q])).toEqual([
      [2, 0.3],
      [2.5, 0.2],
    ]);
  });
  it("keeps its last row though the file has no line end there", async () => {
    expect((await readProfile(sourceOf("p.csv", "x,q\n1,2\n3,4"), settings)).rows.length).toBe(2);
  });
});

describe("a first look", () => {
  it("tells dialect, columns, position, step and rows", async () => {
    const text = `# hot wire\nZeit [ms];u;v\n${Array.from({ length: 5 }, (_, i) => `${i},5;6,0;0,1\n`).join("")}`;
    expect(await previewFile(sourceOf("lauf_x0200.csv", text))).toEqual({
      file: "lauf_x0200.csv",
      bytes: text.length,
      separator: ";",
      decimal: ",",
      heading: 2,
      layout: "series",
      columns: [
        { heading: "Zeit", number: 1, role: "t", unit: "ms" },
        { heading: "u", number: 2, role: "u", unit: null },
        { heading: "v", number: 3, role: "v", unit: null },
      ],
      firstRows: Array.from({ length: 5 }, (_, i) => [`${i},5`, "6,0", "0,1"]),
      comments: ["hot wire"],
      position: { x: 0.2, source: "name", matched: "x0200", rule: "after x in the name, in mm" },
      step: 0.001,
      estimatedRows: 5,
    });
  });
  it("takes what the settings give and looks again", async () => {
    const columns = { u: { from: 3, unit: "cm/s" }, v: { from: 2, unit: null } };
    const preview = await previewFile(sourceOf("a.csv", "t,u,v\n0,1,2\n1,1,2\n2,1,2\n"), { columns });
    expect(preview.columns.map(({ role, unit }) => [role, unit])).toEqual([
      ["t", null],
      ["v", null],
      ["u", "cm/s"],
    ]);
  });
  it("reads only the head and estimates the rows", async () => {
    const row = "0.00005,6.0412,0.1130\n";
    const source = sourceOf("x0200.csv", `t,u,v\n${row.repeat(40_000)}`);
    let read = 0;
    const counted = {
      ...source,
      stream: async function* () {
        for await (const chunk of source.stream()) {
          read += chunk.length;
          yield chunk;
        }
      },
    };
    const { estimatedRows } = await previewFile(counted);
    expect(read).toBeLessThan(400_000);
    expect(Math.abs(estimatedRows - 40_000)).toBeLessThan(40);
  });
  it("finds the step of one probe in a table written time by time", async () => {
    const text = "x,t,u\n0.1,0,6\n0.2,0,6\n0.1,0.5,6\n0.2,0.5,6\n";
    const preview = await previewFile(sourceOf("all.csv", text));
    expect([preview.step, preview.position.x, preview.position.source]).toEqual([0.5, null, "column"]);
  });
  it("refuses what is no record", async () => {
    expect((await failureOf(previewFile(sourceOf("a.txt", "Notes\non the run\nof Monday\n")))).code).toBe(
      "not-a-record",
    );
  });
});
