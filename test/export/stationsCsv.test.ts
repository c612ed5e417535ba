import Papa from "papaparse";
import { describe, expect, it } from "vitest";
import { stationQuantities } from "../../src/export/resultsFile.ts";
import { stationsCsv } from "../../src/export/stationsCsv.ts";
import { exampleStation } from "./exampleResults.ts";

const si = { units: "SI", along: "x" } as const;

/** The table as an independent reader sees it. */
function readBack(text: string) {
  const { data, errors } = Papa.parse<Record<string, string>>(text.trimEnd(), { header: true });
  expect(errors).toEqual([]);
  return data;
}

const rows = readBack(stationsCsv("screen-25mm", [exampleStation(0.2), exampleStation(0.4)], si));

describe("the table of stations", () => {
  it("has one row per station and units in its headings", () => {
    expect(rows.map((row) => row["x [m]"])).toEqual(["0.2", "0.4"]);
    expect(rows[0]).toMatchObject({ "U [m/s]": "1", "U low [m/s]": "0.5", "U high [m/s]": "1.5" });
    expect(rows[0]).toMatchObject({ samples: "131072", "duration [s]": "8.192", case: "screen-25mm" });
  });

  it("has three columns for every quantity", () => {
    const headings = Object.keys(rows[0]).map((heading) => heading.replace(/ \[.*\]$/, ""));
    for (const key of stationQuantities)
      for (const end of ["", " low", " high"]) expect(headings).toContain(key + end);
    expect(new Set(headings).size).toBe(headings.length);
  });

  it("leaves a cell empty where there is no number and says why a value is missing", () => {
    expect(rows[0]["ww [m2/s2]"]).toBe("");
    expect(rows[0]["L11 high [m]"]).toBe("");
    expect(rows[0].missing).toBe("ww: there is no w column, or none that is known");
    expect(rows[0].flags).toBe("short-record");
  });

  it("has no units in a non-dimensional case, and t for a box that decays in time", () => {
    const [row] = readBack(stationsCsv("box", [exampleStation(1)], { units: "nondimensional", along: "t" }));
    expect(row.t).toBe("1");
    expect(row.U).toBe("1");
    const [timed] = readBack(stationsCsv("box", [exampleStation(1)], { units: "SI", along: "t" }));
    expect(timed["t [s]"]).toBe("1");
  });

  it.each(["=1+1", "+A1", "-A1", "@sum", " =1+1", "\t=1+1", "\r=2"])(
    "lets no name start a formula: %j",
    (name) => {
      const [row] = readBack(stationsCsv(name, [exampleStation(1)], si));
      expect(row.case).toBe(`'${name}`);
    },
  );

  it.each(["-12", "+3.5", "1e-3", "a,b", 'a "b"', "two\nlines"])("keeps the name %j as it is", (name) => {
    const [row] = readBack(stationsCsv(name, [exampleStation(1)], si));
    expect(row.case).toBe(name);
  });
});
