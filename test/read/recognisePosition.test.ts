import { describe, expect, it } from "vitest";
import { recognisePosition } from "../../src/read/recognisePosition.ts";
import { collect, sourceOf } from "./support.ts";

describe("a position in a file's name", () => {
  it.each([
    ["x0200.csv", 0.2],
    ["x0350.csv", 0.35],
    ["run_x0700.csv.gz", 0.7],
    ["lauf_X1600.dat", 1.6],
    ["x0.20.csv", 0.2],
    ["x=0.2_run3.txt", 0.2],
    ["x_0p2m.csv", 0.2],
    ["probe-x200mm.csv", 0.2],
    ["x20cm.csv", 0.2],
    ["x=-0.1.csv", -0.1],
    ["screen/x0200/u.csv", 0.2],
  ])("%s is found, in metres", (name, x) => expect(recognisePosition(name, [], "SI")?.x).toBe(x));
  it.each(["box200.csv", "max0200.csv", "x12.csv", "run200.csv", "x0200a.csv", "xyz.csv", "matrix_2.csv"])(
    "%s is not taken for one",
    (name) => expect(recognisePosition(name, [], "SI")).toBeNull(),
  );
  it("is in the case's own unit where the case has no dimension", () => {
    expect(recognisePosition("x0200.csv", [], "nondimensional")?.x).toBe(200);
    expect(recognisePosition("x12.csv", [], "nondimensional")?.x).toBe(12);
  });
  it("comes with the piece of the name and the rule", () => {
    expect(recognisePosition("run_x0700.csv", [], "SI")).toMatchObject({
      source: "name",
      matched: "x0700",
      rule: "after x in the name, in mm",
    });
  });
});

describe("a position in a comment line", () => {
  it.each([
    ["x = 0.2", 0.2],
    ["x=200 mm", 0.2],
    ["X: 20 cm, y: 0", 0.2],
    ["hot wire, x = 0.2 m", 0.2],
    ["x = 0.2, U = 6", 0.2],
    ["x [mm] = 200", 0.2],
    ["x (cm): 20", 0.2],
    ["x [V] = 200", null],
    ["x = 0,2", 0.2],
    ["x = 0,200 m; y = 0,1", 0.2],
    ["x = 1,200", null], // 1.2 or 1200
    ["x = 0.2,0.3,0.4", null],
    ["x = 1.2.3", null],
    ["position: 0,2 0,0 0,0", 0.2],
    ["probe at (0.2,0.01,0)", 0.2],
    ["probe 12 0.2 0.01 0", null], // which of the four is x?
    ["station = 3", null], // the third, or at 3 m?
    ["station = 3 m", 3],
    ["station = 0.3", 0.3],
    ["position = 2e-1", 0.2],
    ["x = 200 [mm]", 0.2],
    ["probe at (0.2, 0.01, 0)", 0.2],
    ["x/M = 20", null],
    ["max = 3", null],
    ["x = unknown", null],
  ])("%s", (comment, x) => expect(recognisePosition("a.csv", [comment], "SI")?.x ?? null).toBe(x));
  it("goes before the name", () => {
    expect(recognisePosition("x0700.csv", ["x = 0.2"], "SI")).toMatchObject({ x: 0.2, source: "comment" });
  });
});

describe("where a record's position came from", () => {
  const rows = "t,u\n0,6\n1,7\n";
  it.each([
    ["sheet", { x: 0.9 }, "# x = 0.2\n", "x0700.csv", 0.9],
    ["comment", {}, "# x = 0.2\n", "x0700.csv", 0.2],
    ["name", {}, "", "x0700.csv", 0.7],
  ])("is told: %s", async (position, settings, comment, name, x) => {
    const { records, summary } = await collect(sourceOf(name, comment + rows), settings);
    expect([records[0].origin.x, records[0].origin.position]).toEqual([x, position]);
    expect(summary.sources).toEqual([{ name, bytes: (comment + rows).length, x, position }]);
  });
});
