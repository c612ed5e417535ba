import { describe, expect, it } from "vitest";
import type { LineGrid } from "../../src/core/station/lines/linePart.ts";
import { previewFile } from "../../src/read/previewFile.ts";
import { readLines } from "../../src/read/readLines.ts";
import { failureOf, plainSettings, sourceOf } from "./support.ts";

interface Taken {
  grid: LineGrid | null;
  readonly snapshots: { t: number; columns: number[][] }[];
}

async function taken(text: string, options: object = {}, settings: object = {}): Promise<Taken> {
  const found: Taken = { grid: null, snapshots: [] };
  const sink = {
    grid(grid: LineGrid) {
      found.grid = grid;
      return {
        add: (t: number, columns: readonly Float64Array[]) => {
          found.snapshots.push({ t, columns: columns.map((column) => [...column]) });
        },
      };
    },
  };
  await readLines(
    sourceOf("lines_x200mm.csv", text, [700]),
    { ...plainSettings, layout: "lines", ...settings },
    sink,
    options,
  );
  return found;
}

/** A value that tells its place: u = 100 t + y. */
const rowsOf = (times: readonly number[], ys: readonly number[]) =>
  times.flatMap((t) => ys.map((y) => `${y},${t},${100 * t + y}`));
const ys = [3, 1, 2, 5, 4, 8, 7, 6, 9];
const heading = "y [mm],t [ms],u [cm/s]";
const table = (rows: readonly string[]) => `${heading}\n${rows.join("\n")}\n`;
const times = Array.from({ length: 40 }, (_, i) => i);

describe("lines read from a table", () => {
  it("are put in order of place, in the units of the case, at the position in the file's name", async () => {
    const { grid, snapshots } = await taken(table(rowsOf([0, 1], ys)));
    expect(grid).toMatchObject({
      along: "y",
      stations: [0.2],
      position: "name",
      across: [{ y: null, z: null }],
    });
    expect([...(grid?.points ?? [])]).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9].map((y) => y / 1000));
    expect(snapshots[1]).toEqual({
      t: 0.001,
      columns: [[101, 102, 103, 104, 105, 106, 107, 108, 109].map((u) => u / 100)],
    });
  });

  it("are streamed from a table that is longer than what is held, with the same outcome", async () => {
    const text = table(rowsOf(times, ys));
    expect(await taken(text, { window: 50 })).toEqual(await taken(text));
  });

  it("are sorted as a whole where rows are not in order of time, up to a limit that is told", async () => {
    const backward = table(rowsOf([...times].reverse(), ys));
    expect(await taken(backward, { window: 50 })).toEqual(await taken(table(rowsOf(times, ys))));
    const found = await failureOf(taken(backward, { window: 50, mostRows: 200 }));
    expect([found.code, found.where]).toEqual(["not-a-record", { file: "lines_x200mm.csv", line: 202 }]);
  });

  it("are refused where time falls back in a table that is streamed", async () => {
    const found = await failureOf(taken(table(rowsOf([...times, 20], ys)), { window: 50 }));
    expect([found.code, found.where.line]).toEqual(["backward-time", 2 + 40 * 9]);
  });

  it("leave out the start-up", async () => {
    const { snapshots } = await taken(table(rowsOf(times, ys)), {}, { startup: 0.03 });
    expect(snapshots.map(({ t }) => t)).toEqual(times.slice(30).map((t) => t / 1000));
  });

  it("run along x where the points do, each of them a station", async () => {
    const rows = [0, 1].flatMap((t) =>
      [1, 2, 3, 4, 5, 6].flatMap((x) => [0, 1].map((z) => `${x},${z},${t},${x + z}`)),
    );
    const { grid, snapshots } = await taken(`x,z,t,u\n${rows.join("\n")}\n`, {}, { zero: 1 });
    expect(grid).toMatchObject({ along: "x", stations: [0, 1, 2, 3, 4, 5], across: [{ z: 0 }, { z: 1 }] });
    expect(snapshots[0].columns[0]).toEqual([1, 2, 2, 3, 3, 4, 4, 5, 5, 6, 6, 7]);
  });

  it("refuse one x of the sheet for several in the file", async () => {
    const rows = [1, 2].flatMap((x) => ys.map((y) => `${x},${y},0,1`));
    const found = await failureOf(taken(`x,y,t,u\n${rows.join("\n")}\n`, {}, { x: 1 }));
    expect([found.code, found.where.column]).toEqual(["ambiguous-columns", 1]);
  });
});

describe("a first look takes a table for lines", () => {
  const many = Array.from({ length: 20 }, (_, i) => i * 0.5);
  const seen = async (text: string) => (await previewFile(sourceOf("x0200mm.csv", text))).layout;
  const from = (rows: readonly string[]) => `y,t,u\n${rows.join("\n")}\n`;

  it("where many equally spaced y stand at one time, snapshot by snapshot or point by point", async () => {
    expect(await seen(from(rowsOf([0, 1, 2], many)))).toBe("lines");
    const rows = many.flatMap((y) => [0, 1, 2].map((t) => `${y},${t},${y + t}`));
    expect(await seen(from(rows))).toBe("lines");
  });

  it("and where a comment tells the time of one snapshot", async () => {
    expect(await seen(`# t = 0.3 s\ny,u\n${many.map((y) => `${y},1`).join("\n")}\n`)).toBe("lines");
  });

  it("and no rake of a few probes, nor probes that are unequally spaced", async () => {
    expect(await seen(from(rowsOf(times, [0, 1, 2, 3])))).toBe("series");
    expect(
      await seen(
        from(
          rowsOf(
            times,
            many.map((y) => y * y),
          ),
        ),
      ),
    ).toBe("series");
  });
});
