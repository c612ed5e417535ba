import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { afterAll, beforeAll, expect, it } from "vitest";
import { type BuiltBatch, buildBatch } from "./builtBatch.ts";
import { expectContract } from "./contract.ts";

const sheet = resolve(import.meta.dirname, "../../sample-data/simulation-lines.json");
let batch: BuiltBatch;
let out = "";
beforeAll(async () => {
  batch = await buildBatch();
  out = mkdtempSync(join(tmpdir(), "waneline-lines-"));
}, 60_000);
afterAll(() => {
  batch.remove();
  rmSync(out, { recursive: true });
});

it("the batch reduces a sheet of lines, on one thread or two, to the same results file", () => {
  const run = (jobs: string) => {
    const done = batch.run([sheet, "--out", join(out, jobs), "--jobs", jobs], out);
    expect(done, done.stderr).toMatchObject({ code: 0, stdout: "" });
    return readFileSync(join(out, jobs, "results.json"), "utf8");
  };
  const results = JSON.parse(run("1"));
  expect(JSON.parse(run("2"))).toEqual(results);
  expectContract(results);
  const [{ stations, settings, decay }] = results.cases;
  expect(settings.layout).toBe("lines");
  expect(stations).toHaveLength(5);
  expect(stations[0].facts.lines).toMatchObject({ along: "y", periodic: true, snapshots: 48 });
  expect(stations.every(({ L11 }: { L11: { low: unknown } }) => typeof L11.low === "number")).toBe(true);
  expect(typeof decay.n.value).toBe("number");
}, 60_000);
