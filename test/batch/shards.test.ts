import { once } from "node:events";
import {
  appendFileSync,
  copyFileSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  writeFileSync,
} from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { setTimeout as pause } from "node:timers/promises";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type BuiltBatch, buildBatch } from "./builtBatch.ts";
import { writeSyntheticCase } from "./syntheticCase.ts";

let batch: BuiltBatch;
let top = "";
const sheets = ["screen.json", "inflow.json"];

beforeAll(async () => {
  batch = await buildBatch();
  top = mkdtempSync(join(tmpdir(), "waneline-shards-"));
  const screen = writeSyntheticCase(join(top, "screen"), {
    name: "screen",
    stations: [0.3, 0.5, 0.8, 1.2, 1.8],
    samples: 4000,
    n: 1.25,
    x0: 0.05,
    seed: 1,
  });
  // a second probe at one x, and a file that cannot be read
  const again = writeSyntheticCase(join(top, "second"), { ...plain, stations: [0.8], seed: 9 });
  writeFileSync(join(top, "screen/broken.csv"), "t,u\n0,1\n1,none\n2,3\n");
  const files = [
    ...screen.files.map(({ path, x }) => ({ path: `screen/${path}`, x })),
    ...again.files.map(({ path, x }) => ({ path: `second/${path}`, x })),
    { path: "screen/broken.csv", x: 2.5 },
  ];
  writeFileSync(join(top, "screen.json"), JSON.stringify({ ...screen, files }));
  const inflow = writeSyntheticCase(join(top, "inflow"), {
    ...plain,
    name: "inflow",
    stations: [0.2, 0.4, 0.9, 1.5],
  });
  const unplaced = inflow.files.map(({ path }) => ({ path: `inflow/${path}` }));
  writeFileSync(join(top, "inflow.json"), JSON.stringify({ ...inflow, files: unplaced }));
}, 60_000);
afterAll(() => {
  batch.remove();
  rmSync(top, { recursive: true });
});

const plain = { name: "second", samples: 4000, n: 1.3, x0: 0.1, seed: 2 };
const read = (path: string) => readFileSync(join(top, path), "utf8");
const written = (out: string) => readdirSync(join(top, out)).sort();

function expectSame(out: string, other: string) {
  expect(written(out)).toEqual(written(other));
  for (const name of written(other))
    expect(read(`${out}/${name}`) === read(`${other}/${name}`), name).toBe(true);
}

describe("shares of the work", () => {
  const of = 3;
  beforeAll(() => {
    expect(batch.run([...sheets, "--out", "whole"], top).code).toBe(1); // one file cannot be read
    for (let part = 1; part <= of; part++)
      batch.run([...sheets, "--out", `part${part}`, "--shard", `${part}/${of}`, "--jobs", "1"], top);
  }, 120_000);
  const folders = Array.from({ length: of }, (_, i) => `part${i + 1}`);

  it("write one shard each and nothing else", () => {
    expect(folders.map(written)).toEqual(folders.map((_, i) => [`shard-${i + 1}-of-${of}.bin`]));
  });

  it("join to the results of the whole, bit for bit, in whatever order the folders are named", () => {
    const done = batch.run(["--merge", ...[...folders].reverse(), "--out", "merged"], top);
    expect(done.code).toBe(1); // the broken file is told once more
    expect(done.stderr).toContain("broken.csv, line 3, column 2");
    expectSame("merged", "whole");
  }, 60_000);

  it("that are more than there are stations join all the same", () => {
    for (let part = 1; part <= 14; part++)
      batch.run(["inflow.json", "--out", "many", "--shard", `${part}/14`, "--jobs", "1"], top);
    expect(batch.run(["--merge", "many", "--out", "many-merged"], top).code).toBe(0);
    batch.run(["inflow.json", "--out", "inflow-whole"], top);
    expectSame("many-merged", "inflow-whole");
  }, 120_000);

  it("of which one is missing are not joined: it is named", () => {
    const done = batch.run(["--merge", "part1", "part3", "--out", "gap"], top);
    expect(done.code).toBe(1);
    expect(done.stderr).toContain("shard-2-of-3.bin");
    expect(existsSync(join(top, "gap/results.json"))).toBe(false);
  });

  it("of which one is damaged, or of another run, are not joined: it is named", () => {
    mkdirSync(join(top, "damaged"));
    const bytes = readFileSync(join(top, "part2/shard-2-of-3.bin"));
    bytes[bytes.length >> 1] ^= 1;
    writeFileSync(join(top, "damaged/shard-2-of-3.bin"), bytes);
    const damaged = batch.run(["--merge", "part1", "damaged", "part3", "--out", "no"], top);
    expect(damaged).toMatchObject({
      code: 1,
      stderr: expect.stringMatching(/damaged.shard-2-of-3\.bin: .*damaged/),
    });
    batch.run(["inflow.json", "--out", "other", "--shard", "2/3"], top);
    const other = batch.run(["--merge", "part1", "other", "part3", "--out", "no"], top);
    expect(other).toMatchObject({ code: 1, stderr: expect.stringContaining("another run") });
    copyFileSync(join(top, "many/shard-2-of-14.bin"), join(top, "other/shard-2-of-14.bin"));
    const mixed = batch.run(["--merge", "part1", "other", "part3", "--out", "no"], top);
    expect(mixed).toMatchObject({ code: 1, stderr: expect.stringContaining("3 and 14") });
  }, 60_000);
});

describe("a run that was stopped", () => {
  it("is continued by the same command, to the same results, and leaves nothing of its own behind", async () => {
    const kept = join(top, "stopped/unfinished.bin");
    const first = batch.begin(["screen.json", "--out", "stopped", "--jobs", "1"], top);
    const ended = once(first, "exit");
    while (!existsSync(kept) && first.exitCode === null) await pause(2);
    first.kill("SIGTERM");
    await ended;
    expect(first.exitCode).toBe(143);
    expect(statSync(kept).size).toBeGreaterThan(0);
    appendFileSync(kept, "a record that the end of the run cut");
    const second = batch.run(["screen.json", "--out", "stopped"], top);
    expect(second.stderr).toMatch(/\d files? (was|were) reduced by a run that was stopped/);
    batch.run(["screen.json", "--out", "unstopped"], top);
    expectSame("stopped", "unstopped");
  }, 60_000);

  it("is not continued with files that have changed since", () => {
    const kept = join(top, "changed/unfinished.bin");
    mkdirSync(join(top, "changed"));
    writeFileSync(kept, "not what the program writes");
    const done = batch.run(["inflow.json", "--out", "changed"], top);
    expect(done.code).toBe(0);
    expect(done.stderr).not.toContain("stopped");
    expect(existsSync(kept)).toBe(false);
  }, 60_000);
});
