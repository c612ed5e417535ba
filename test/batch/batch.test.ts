import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from "node:fs";
import { tmpdir } from "node:os";
import { dirname, join } from "node:path";
import Papa from "papaparse";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { expectClose } from "../support/expectClose.ts";
import type { BuiltBatch, Ended } from "./builtBatch.ts";
import { buildBatch, runThroughNpm } from "./builtBatch.ts";
import { expectContract } from "./contract.ts";
import { fileOf, writeSyntheticCase } from "./syntheticCase.ts";

let batch: BuiltBatch;
let top = "";
const screen = {
  name: "screen",
  stations: [0.3, 0.5, 0.8, 1.2, 1.8],
  samples: 8000,
  n: 1.25,
  x0: 0.05,
  seed: 1,
};
/** For what does not depend on the numbers. */
const tiny = { ...screen, name: "tiny", samples: 800, seed: 3 };
const inflow = { ...screen, name: "inflow", n: 1.3, x0: 0.1, seed: 2 };

beforeAll(async () => {
  batch = await buildBatch();
  top = mkdtempSync(join(tmpdir(), "waneline-batch-"));
  for (const made of [screen, inflow, tiny]) {
    const sheet = writeSyntheticCase(join(top, made.name), made);
    write(`${made.name}/sheet.json`, sheet);
  }
}, 60_000);
afterAll(() => {
  batch.remove();
  rmSync(top, { recursive: true });
});

function write(path: string, content: unknown) {
  mkdirSync(dirname(join(top, path)), { recursive: true });
  writeFileSync(join(top, path), typeof content === "string" ? content : JSON.stringify(content));
}

const read = (path: string) => readFileSync(join(top, path), "utf8");
const results = (out: string) => JSON.parse(read(`${out}/results.json`));

function expectPlainWords({ stderr }: Ended) {
  expect(stderr).not.toMatch(/\n\s+at |node:internal|Error:|internal:/);
}

describe("two sheets given to the batch", () => {
  const sheets = ["screen/sheet.json", "inflow/sheet.json"];
  let done: Ended;
  beforeAll(() => {
    done = batch.run([...sheets, "--out", "both", "--jobs", "2"], top);
  }, 60_000);

  it("end with 0, progress on stderr and nothing on stdout", () => {
    expect(done, done.stderr).toMatchObject({ code: 0, stdout: "" });
    expect(done.stderr).toMatch(/10 of 10 files/);
    expectPlainWords(done);
  });

  it("leave a results file that keeps the contract key by key", () => {
    const found = results("both");
    expectContract(found);
    expect(found.cases.map((each: { case: string }) => each.case)).toEqual(["screen", "inflow"]);
    expect(found.comparisons.map(({ cases }: { cases: string[] }) => cases)).toEqual([["screen", "inflow"]]);
  });

  it("are reduced to the numbers that the records were made with", () => {
    const [first] = results("both").cases;
    expect(first.stations.map(({ x }: { x: number }) => x)).toEqual(screen.stations);
    for (const { x, samples, U, uu } of first.stations) {
      expect(samples).toBe(screen.samples);
      expectClose(U.value, 6, { relative: 0.01, because: "1000 integral times, Tu below 10 %" });
      const truth = 36 * 0.04 * ((x - screen.x0) / 0.025) ** -screen.n;
      expectClose(uu.value, truth, { relative: 0.2, because: "four standard errors at 500 integral times" });
    }
  });

  it("come back with every default of the sheet filled in and with their sources", () => {
    const [first] = results("both").cases;
    expect(first.settings).toMatchObject({ case: "screen", along: "x", zero: 0, startup: 0, body: null });
    expect(first.settings.fit).toMatchObject({ quantity: "auto", window: "auto", residuals: "log" });
    expect(first.settings.compare).toEqual({
      align: "x0",
      tolerance: 0.1,
      exponent: "auto",
      against: null,
      at: null,
      quantities: ["Tu", "lambda"],
    });
    expect(first.sources[0]).toEqual({
      name: fileOf(0.3),
      bytes: read(`screen/${fileOf(0.3)}`).length,
      x: 0.3,
      position: "sheet",
    });
  });

  it("leave one table per case with the numbers of the results file", () => {
    expect(readdirSync(join(top, "both")).sort()).toEqual([
      "inflow-stations.csv",
      "results.json",
      "screen-stations.csv",
    ]);
    const { data } = Papa.parse<Record<string, string>>(read("both/screen-stations.csv").trimEnd(), {
      header: true,
    });
    const { stations } = results("both").cases[0];
    expect(data.map((row) => Number(row["uu [m2/s2]"]))).toEqual(
      stations.map(({ uu }: { uu: { value: number } }) => uu.value),
    );
  });

  it("give the same bits on one thread as on two", () => {
    batch.run([...sheets, "--out", "one", "--jobs", "1"], top);
    expect(read("one/results.json")).toBe(read("both/results.json"));
    expect(read("one/screen-stations.csv")).toBe(read("both/screen-stations.csv"));
  }, 60_000);

  it("give the same stations in whatever order the files stand in the sheet", () => {
    const sheet = JSON.parse(read("screen/sheet.json"));
    write("screen/turned.json", { ...sheet, files: [...sheet.files].reverse() });
    batch.run(["screen/turned.json", "--out", "turned"], top);
    expect(results("turned").cases[0].stations).toEqual(results("both").cases[0].stations);
  }, 60_000);
});

describe("paths", () => {
  it("are taken from the folder that npm was called in", () => {
    const done = batch.run(["sheet.json", "--out", "here"], tmpdir(), { INIT_CWD: join(top, "tiny") });
    expect(done.code, done.stderr).toBe(0);
    expect(existsSync(join(top, "tiny/here/results.json"))).toBe(true);
  }, 60_000);

  it("work through npm from another folder", async () => {
    write("npm/sheet.json", { case: "a", layout: "series", files: [{ path: "nothing.csv", x: 1 }] });
    const done = await runThroughNpm(["sheet.json", "--out", "out"], join(top, "npm"));
    expect(done.code, done.stderr).toBe(1);
    expect(done.stderr).toMatch(/nothing\.csv/);
    expect(readdirSync(join(top, "npm")).sort()).toEqual(["out", "sheet.json"]);
  }, 60_000);

  it("of a sheet are seen from the sheet and may hold * and ..", () => {
    const { files: _, ...sheet } = JSON.parse(read("tiny/sheet.json"));
    write("sheets/all.json", { ...sheet, files: [{ path: "../tiny/x*.csv" }] });
    const done = batch.run(["sheets/all.json", "--out", "globbed"], top);
    expect(done.code, done.stderr).toBe(0);
    const [found] = results("globbed").cases;
    expect(found.stations.map(({ x }: { x: number }) => x)).toEqual(tiny.stations);
    expect(found.sources.map(({ position }: { position: string }) => position)).toEqual(
      tiny.stations.map(() => "name"),
    );
  }, 60_000);

  it("made from a case's name never lead out of the folder", () => {
    const sheet = JSON.parse(read("tiny/sheet.json"));
    const files = [sheet.files[0]];
    write("tiny/wicked.json", { ...sheet, case: "../../wicked", files });
    write("tiny/formula.json", { ...sheet, case: "=1+1", files });
    const done = batch.run(["tiny/wicked.json", "tiny/formula.json", "--out", "deep/out"], top);
    expect(done.code, done.stderr).toBe(0);
    expect(readdirSync(join(top, "deep"))).toEqual(["out"]);
    const tables = readdirSync(join(top, "deep/out")).filter((name) => name.endsWith(".csv"));
    expect(tables).toHaveLength(2);
    for (const table of tables) expect(read(`deep/out/${table}`)).not.toMatch(/(^|,|")[=+@]/m);
  }, 60_000);
});

describe("bad input", () => {
  it("in one file leaves the others standing and is told with its place", () => {
    const sheet = JSON.parse(read("tiny/sheet.json"));
    const lines = read(`tiny/${fileOf(0.8)}`).split("\n");
    lines[100] = lines[100].replace(/^([^,]*),[^,]*/, "$1,broken");
    write("bad/words.csv", lines.join("\n"));
    write("bad/empty.csv", "");
    write("bad/heading.csv", "t,u,v,w\n");
    const bad = ["words", "empty", "heading", "gone"].map((name, i) => ({ path: `${name}.csv`, x: 3 + i }));
    const good = sheet.files.map((file: { path: string; x: number }) => ({
      ...file,
      path: `../tiny/${file.path}`,
    }));
    write("bad/sheet.json", { ...sheet, files: [...bad, ...good] });
    const done = batch.run(["bad/sheet.json", "--out", "some"], top);
    expect(done.code).toBe(1);
    expectPlainWords(done);
    expect(done.stderr).toMatch(/words\.csv, line 101, column 2: .*broken/);
    for (const name of ["empty.csv", "heading.csv", "gone.csv"]) expect(done.stderr).toContain(name);
    expectContract(results("some"));
    expect(results("some").cases[0].stations).toHaveLength(5);
  }, 60_000);

  it.each([
    ["not json", "{ case: ", /line 1|JSON/],
    ["no case", { layout: "series", files: [{ path: "a.csv" }] }, /case/],
    ["a wrong layout", { case: "a", layout: "circles", files: [{ path: "a.csv" }] }, /layout/],
    ["no files", { case: "a", layout: "series", files: [] }, /files/],
  ])(
    "in a sheet is told with file and key: %s",
    (_, sheet, words) => {
      write("wrong/sheet.json", sheet);
      const done = batch.run(["wrong/sheet.json", "tiny/sheet.json", "--out", "wrong-out"], top);
      expect(done.code).toBe(1);
      expect(done.stderr).toMatch(/wrong\/sheet\.json/);
      expect(done.stderr).toMatch(words);
      expectPlainWords(done);
      expect(results("wrong-out").cases).toHaveLength(1);
    },
    60_000,
  );

  it("of a sheet that is not there, or two of one name, is told and the rest is done", () => {
    const done = batch.run(["gone.json", "tiny/sheet.json", "tiny/sheet.json", "--out", "twice"], top);
    expect(done.code).toBe(1);
    expect(done.stderr).toMatch(/gone\.json/);
    expect(done.stderr).toMatch(/two cases.*screen|tiny.*twice|name/i);
    expectPlainWords(done);
    expect(results("twice").cases).toHaveLength(1);
  }, 60_000);

  it("of a file that two paths name is told as that, and the first holds", () => {
    const files = [{ path: fileOf(0.8), x: 3 }, { path: `./${fileOf(0.8)}` }];
    write("tiny/double.json", { case: "double", layout: "series", files });
    const done = batch.run(["tiny/double.json", "--out", "double"], top);
    expect(done.code).toBe(1);
    expect(done.stderr).toMatch(/files\[1\]\.path.*names this file already/);
    expect(results("double").cases[0].sources.map(({ x }: { x: number }) => x)).toEqual([3]);
  }, 60_000);

  it("that leaves no station still gives a results file that says so", () => {
    write("none/sheet.json", { case: "none", layout: "series", files: [{ path: "gone.csv", x: 1 }] });
    const done = batch.run(["none/sheet.json", "--out", "none-out"], top);
    expect(done.code).toBe(1);
    expectPlainWords(done);
    expectContract(results("none-out"));
    expect(results("none-out").cases[0].stations).toEqual([]);
  }, 60_000);
});

describe("wrong arguments", () => {
  it.each([
    [["--out", "x"], /no case sheet/],
    [["tiny/sheet.json"], /--out/],
    [["tiny/sheet.json", "--out", "x", "--fast"], /--fast/],
    [["tiny/sheet.json", "--out", "tiny/sheet.json"], /--out/],
    [["tiny/sheet.json", "--out", "tiny/sheet.json/deeper"], /--out/],
    [["tiny/sheet.json", "--out", "x", "--jobs", "0"], /--jobs/],
  ])("end with 2 and the usage: %j", (args, words) => {
    const done = batch.run(args, top);
    expect(done.code).toBe(2);
    expect(done.stderr).toMatch(words);
    expect(done.stderr).toMatch(/SHEET\.json/);
    expectPlainWords(done);
  });

  it.runIf(existsSync("/proc/self"))("are told where the file system denies that a folder exists", () => {
    const done = batch.run(["tiny/sheet.json", "--out", "/proc/waneline/x"], top);
    expect(done.code).toBe(2);
    expect(done.stderr).toMatch(/--out/);
  });

  it("are told before the work where a folder stands in the place of a result", () => {
    mkdirSync(join(top, "held/results.json"), { recursive: true });
    const done = batch.run(["tiny/sheet.json", "--out", "held"], top);
    expect(done.code).toBe(2);
    expect(done.stderr).toMatch(/results\.json/);
    expect(readdirSync(join(top, "held"))).toEqual(["results.json"]);
  });

  it("never let an input be overwritten", () => {
    write("own/results.json", { ...JSON.parse(read("tiny/sheet.json")), files: [{ path: "a.csv", x: 1 }] });
    const before = read("own/results.json");
    const done = batch.run(["own/results.json", "--out", "own"], top);
    expect(done.code).toBe(2);
    expect(done.stderr).toMatch(/results\.json/);
    expect(read("own/results.json")).toBe(before);
  });
});
