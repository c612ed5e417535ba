import { describe, expect, it } from "vitest";
import type { ReadSettings } from "../../src/core/records.ts";
import { collect, sourceOf } from "./support.ts";

/** One record, written in many ways; the numbers must come out the same to the last digit. */
const rows = Array.from({ length: 40 }, (_, i) => [
  (i * 5e-5).toFixed(5),
  (6 + 0.3 * Math.sin(i)).toFixed(4),
  (0.2 * Math.cos(2 * i)).toFixed(4),
  (-0.01 * i).toFixed(3),
]);
const truth = ["t", "u", "v", "w"].map((_, column) => rows.map((row) => Number(row[column])));
const table = (separator: string, end = "\n", edit = (field: string) => field) =>
  rows.map((row) => row.map(edit).join(separator) + end).join("");
const comma = (field: string) => field.replace(".", ",");
const fortran = (field: string) =>
  Number(field)
    .toExponential(8)
    .replace("e", "D")
    .replace(/D([+-])(\d)$/, "D$10$2");

const variants: Record<string, [text: string | Uint8Array, settings?: Partial<ReadSettings>]> = {
  "commas under a heading": [`t,u,v,w\n${table(",")}`],
  "a blank after each comma": [`Time, U, V, W\n${table(", ")}`],
  "semicolons with decimal points": [`t;u;v;w\n${table(";")}`],
  "semicolons with decimal commas": [`Zeit;u;v;w\n${table(";", "\n", comma)}`],
  "tabs with decimal commas": [`t\tu\tv\tw\n${table("\t", "\n", comma)}`],
  tabs: [`Time [s]\tu [m/s]\tv [m/s]\tw [m/s]\n${table("\t")}`],
  "runs of blanks, also before the first column": [
    `   t    u  v w\n${rows.map((row) => `  ${row.join("   ")} \n`).join("")}`,
  ],
  "blanks with decimal commas": [`t u v w\n${table(" ", "\n", comma)}`],
  "blank-parted names above commas": [`t   u   v   w\n${table(",")}`],
  "CR LF at the line ends": [`t,u,v,w\r\n${table(",", "\r\n")}`],
  "CR alone at the line ends": [`t,u,v,w\r${table(",", "\r")}`],
  "a byte-order mark": [`\ufefft,u,v,w\n${table(",")}`],
  "UTF-16 with its mark": [utf16(`\ufefft,u,v,w\n${table(",")}`)],
  "a separator at the end of each line": [`t,u,v,w,\n${table(",", ",\n")}`],
  "a separator at the end of the rows only": [`t,u,v,w\n${table(",", ",\n")}`],
  "no heading": [table(",")],
  "no heading, said so": [table(" "), { heading: 0 }],
  "a heading in a comment": [`# channel 3, run 12\n# t u v w\n${table(" ")}`],
  "a heading in a percent comment, with units": [`% t [s], u [m/s], v [m/s], w [m/s]\n${table(",")}`],
  "a row of units": [`t;u;v;w\ns;m/s;m/s;m/s\n${table(";")}`],
  "a row of units in brackets": [`t,u,v,w\n[s],[m/s],[m/s],[m/s]\n${table(",")}`],
  "lines of text above": [`Wind tunnel B, 3 May\n20.5 degrees\n1013\nt,u,v,w\n${table(",")}`],
  "a heading in a given line": [`a,b,c,d\nt,u,v,w\n${table(",")}`, { heading: 2 }],
  "columns by number": [`a,b,c,d\n${table(",")}`, { columns: byNumber(1, 2, 3, 4) }],
  "columns by name, in another order": [
    `w,t,v,u\n${rows.map(([t, u, v, w]) => `${w},${t},${v},${u}\n`).join("")}`,
  ],
  "columns renamed by the sheet": [
    `a,streamwise,b,c\n${table(",")}`,
    { columns: { t: { from: "a", unit: null }, v: { from: "b", unit: "m/s" }, w: { from: 4, unit: null } } },
  ],
  "quoted numbers": [`"t","u","v","w"\n${table(",", "\n", (field) => `"${field}"`)}`],
  "quoted numbers with decimal commas": [
    `"t","u","v","w"\n${table(",", "\n", (field) => `"${comma(field)}"`)}`,
  ],
  "Fortran's exponents": [`t u v w\n${table(" ", "\n", fortran)}`],
  "a column more than is needed": [`t,u,v,w,remark\n${table(",", ",ok\n")}`],
  "comments, blank lines and a repeated heading in between": [
    `t,u,v,w\n${table(",").split("\n").slice(0, 20).join("\n")}\n# pause\n\nt,u,v,w\n${table(",").split("\n").slice(20).join("\n")}`,
  ],
  "no line end after the last row": [`t,u,v,w\n${table(",").trimEnd()}`],
};

describe.each(Object.entries(variants))("a record written with %s", (_, [text, settings]) => {
  it("gives the same numbers", async () => {
    const { records } = await collect(sourceOf("run.csv", text), { x: 0.2, ...settings });
    expect(records.length).toBe(1);
    const [{ t, u, v, w }] = records;
    expect([t, u, v, w]).toEqual(truth);
  });
});

describe("units", () => {
  it("in the heading are turned into those of the case", async () => {
    const text = "t [ms],u (cm/s),v / mm/s\n0,600,10\n0.5,602,20\n";
    const [{ t, u, v }] = (await collect(sourceOf("x0.2.csv", text))).records;
    expect(t).toEqual([0, 0.0005]);
    expect(u).toEqual([6, 6.02]);
    expect(v).toEqual([0.01, 0.02]);
  });
  it("given by the sheet go before those of the heading", async () => {
    const columns = { u: { from: "u [m/s]", unit: "cm/s" } };
    const [{ u }] = (await collect(sourceOf("x0.2.csv", "t,u [m/s]\n0,600\n1,601\n"), { columns })).records;
    expect(u).toEqual([6, 6.01]);
  });
});

function byNumber(t: number, u: number, v: number, w: number): ReadSettings["columns"] {
  const column = (from: number) => ({ from, unit: null });
  return { t: column(t), u: column(u), v: column(v), w: column(w) };
}

function utf16(text: string): Uint8Array {
  const bytes = new Uint8Array(2 * text.length);
  for (let i = 0; i < text.length; i++) {
    bytes[2 * i] = text.charCodeAt(i) & 255;
    bytes[2 * i + 1] = text.charCodeAt(i) >> 8;
  }
  return bytes;
}
