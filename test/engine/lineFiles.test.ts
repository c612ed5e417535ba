import { describe, expect, it } from "vitest";
import { reduceLines } from "../../src/core/station/lines/reduceLines.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import type { ReduceAsk } from "../../src/engine/protocol.ts";
import { reduceLineFile } from "../../src/engine/reduceLineFile.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";
import { readSettings } from "../../src/sheet/readSettings.ts";
import { lineSettings, madeSnapshots, type Snapshot } from "../core/station/lines/madeLines.ts";
import { failureOf, sourceOf } from "../read/support.ts";

const spacing = 9e-4;
const wish = { along: "y", size: 64, spacing, snapshots: 24, lines: 2, seed: 3 } as const;
const snapshots = madeSnapshots(wish);

interface Row {
  readonly t: number;
  readonly y: number;
  readonly z: number;
  readonly text: string;
}
const rows: Row[] = snapshots.flatMap((snapshot, s) =>
  Array.from({ length: 128 }, (_, i): Row => {
    const [t, y, z] = [s * 0.5, Number(((i % 64) * spacing).toPrecision(6)), i < 64 ? 0 : 2];
    return { t, y, z, text: `0.4,${y},${z},${t},${values(snapshot, i)}` };
  }),
);
const heading = "x,y,z,t,u,v,w";

function values(snapshot: Snapshot, i: number): string {
  return snapshot.map((column) => column[i].toFixed(6)).join();
}

const table = (some: readonly Row[]) => `${[heading, ...some.map(({ text }) => text)].join("\n")}\n`;
const sorted = (...keys: ("t" | "y" | "z")[]) =>
  [...rows].sort((a, b) => keys.reduce((order, key) => order || a[key] - b[key], 0));
const shuffled = [...rows].sort(
  (a, b) => ((a.t * 7919 + a.y * 1e5 + a.z) % 101) - ((b.t * 7919 + b.y * 1e5 + b.z) % 101),
);

function reductionOf(name: string, text: string) {
  const source = sourceOf(name, text, [10_000]);
  const sheet = { ...defaultCaseSheet, layout: "lines" as const };
  const ask: ReduceAsk = {
    file: { name, bytes: source.bytes, fingerprint: name, content: { path: name } },
    read: readSettings(sheet, { path: name, x: null }),
    reduce: lineSettings,
  };
  return reduceLineFile(source, ask, () => {});
}

async function stationOf(...files: readonly [string, string][]): Promise<StationResult> {
  const reduced = await Promise.all(files.map(([name, text]) => reductionOf(name, text)));
  return reduceLines(
    reduced.flatMap(({ lineParts = [] }) => lineParts),
    lineSettings,
  );
}

/** All numbers of a result; what is told of files is not among them. */
const numbers = ({ sources: _, ...rest }: StationResult) => rest;

describe("a table of lines", () => {
  const expected = stationOf(["lines.csv", table(rows)]);

  it("gives a station with all of its points", async () => {
    const { samples, x, facts, duration } = await expected;
    expect({ samples, x, duration }).toEqual({ samples: 24 * 128, x: 0.4, duration: 11.5 });
    expect(facts.lines).toMatchObject({ along: "y", points: 64, parallel: 2, snapshots: 24, periodic: true });
  });

  it.each([
    ["point by point", sorted("y", "z", "t")],
    ["line by line", sorted("z", "t", "y")],
    ["the points of a snapshot backward", [...rows].sort((a, b) => a.t - b.t || b.y - a.y)],
    ["in no order at all", shuffled],
  ])("gives the same numbers, bit for bit, %s", async (_, others) => {
    expect(numbers(await stationOf(["lines.csv", table(others)]))).toEqual(numbers(await expected));
  });

  const close = (found: StationResult, other: StationResult) => {
    for (const key of [
      "U",
      "uu",
      "vv",
      "ww",
      "k",
      "gradient",
      "epsilon",
      "L11",
      "lambda",
      "S_dudx",
    ] as const) {
      const [a, b] = [found[key], other[key]];
      for (const end of ["value", "low", "high"] as const) {
        const [one, two] = [a, b].map((quantity) => (end in quantity ? (quantity as never)[end] : null));
        expect(Math.abs((one ?? 0) / (two ?? 1) - (two === null ? 0 : 1)), `${key} ${end}`).toBeLessThan(
          1e-9,
        );
      }
    }
  };

  it("gives the same numbers with a file for each line", async () => {
    const of = (z: number) => table(rows.filter((row) => row.z === z));
    close(await stationOf(["a.csv", of(0)], ["b.csv", of(2)]), await expected);
  });

  it("gives the same numbers with a file for each snapshot, its time in a comment", async () => {
    const files = snapshots.map((_, s): [string, string] => {
      const own = rows.filter(({ t }) => t === s * 0.5);
      const text = own.map((row) => row.text.replace(/^([^,]*,[^,]*,[^,]*),[^,]*/, "$1")).join("\n");
      return [`s${s}.csv`, `# t = ${s * 500} ms\nx,y,z,u,v,w\n${text}\n`];
    });
    close(await stationOf(...files.reverse()), await expected);
  });
});

describe("a table that is no table of lines is refused in its place", () => {
  const refused = (text: string) => failureOf(reductionOf("bad.csv", text));

  it("for the column of y or z that is not there", async () => {
    const found = await refused("# x = 0.4\nt,u,v\n0,1,2\n0,2,1\n0,1,1\n");
    expect([found.code, found.where]).toEqual(["no-position", { file: "bad.csv", line: 2 }]);
  });

  it("for rows of one point and time, where a column that tells the lines apart was left out", async () => {
    const flat = rows.map(({ text }) => text.replace(/^([^,]*,[^,]*),[^,]*/, "$1"));
    const found = await refused(`x,y,t,u,v,w\n${flat.join("\n")}\n`);
    expect([found.code, found.where]).toEqual(["different-points", { file: "bad.csv", line: 66 }]);
  });

  it("for a snapshot with other points than the first", async () => {
    const moved = rows.map((row, i) =>
      i === 200 ? { ...row, text: row.text.replace(/^0.4,/, "0.4,9") } : row,
    );
    const found = await refused(table(moved));
    expect([found.code, found.where.file]).toEqual(["different-points", "bad.csv"]);
    expect(found.where.line).toBe(202);
  });

  it("for a snapshot that lacks a point", async () => {
    const found = await refused(table(rows.filter((_, i) => i !== 300)));
    expect(found.code).toBe("different-points");
    expect(found.found).toBe("127");
  });

  it("for single probes", async () => {
    const found = await refused("x,y,t,u\n0.4,0,0,1\n0.4,0,1,2\n0.4,0,2,1\n");
    expect([found.code, found.where.line]).toEqual(["not-a-record", 2]);
  });

  it("for snapshots without a time", async () => {
    const found = await refused("# x = 0.4\ny,u\n1,1\n2,3\n3,4\n");
    expect([found.code, found.where.line]).toEqual(["no-time", 2]);
  });
});

it("a file that ends within a snapshot keeps those that are whole, and says so", async () => {
  const { lineParts = [] } = await reductionOf("cut.csv", table(rows.slice(0, -30)));
  expect(lineParts[0].snapshots).toBe(23);
  expect(lineParts[0].flags.map(({ code }) => code)).toEqual(["damaged-file"]);
});
