import { describe, expect, it } from "vitest";
import { ReductionFailure } from "../../src/core/failure.ts";
import type { StationPart } from "../../src/core/station/stationPart.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import type { Engine, FileReduction, ReduceAsk, SourceFile } from "../../src/engine/protocol.ts";
import type { ReductionCache } from "../../src/engine/reduceCase.ts";
import { reduceCase } from "../../src/engine/reduceCase.ts";
import type { CaseSheet } from "../../src/sheet/caseSheet.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";

/** An engine that answers at once or late, as each file's delay says, and notes what it was asked. */
function fakeEngine(delays: Readonly<Record<string, number>> = {}, bad: readonly string[] = []) {
  const asked: string[] = [];
  const wait = (ms: number) => new Promise<void>((resolve) => setTimeout(resolve, ms));
  const run = async (task: string, ask: unknown, options?: { signal?: AbortSignal }) => {
    if (options?.signal?.aborted) throw failure("cancelled");
    if (task === "reduce") {
      const { file, read } = ask as ReduceAsk;
      asked.push(file.name);
      await wait(delays[file.name] ?? 0);
      if (bad.includes(file.name)) throw failure("not-a-number");
      return {
        parts: [part(file, read.x ?? 0)],
        stations: [],
        sources: [],
        flags: [],
      } satisfies FileReduction;
    }
    const { parts } = ask as { parts: StationPart[] };
    asked.push(`finish ${parts.map(({ origin }) => origin.file).join("+")}`);
    await wait(delays[`finish ${parts[0].origin.x}`] ?? 0);
    return { x: parts[0].origin.x, sources: parts.map(({ origin }) => ({ name: origin.file })) };
  };
  return { engine: { run, close: () => {} } as unknown as Engine, asked };
}

function failure(code: "cancelled" | "not-a-number") {
  return new ReductionFailure(code, { message: "no", remedy: "Mend it" }, { line: 3 });
}

function part(file: SourceFile, x: number): StationPart {
  return { origin: { file: file.name, x, y: null, z: null, position: "sheet", step: null } } as StationPart;
}

const file = (name: string): SourceFile => ({
  name,
  bytes: 10,
  fingerprint: name,
  content: { path: name },
});

function caseOf(places: Readonly<Record<string, number>>, edit: Partial<CaseSheet> = {}) {
  const files = Object.entries(places).map(([path, x]) => ({ path, x }));
  return {
    sheet: { ...defaultCaseSheet, case: "a", files, ...edit },
    files: files.map(({ path }) => file(path)),
  };
}

const seen = (stations: readonly StationResult[]) =>
  stations.map(({ x, sources }) => `${x}: ${sources.map(({ name }) => name).join("+")}`);

describe("a case made of its files", () => {
  it("joins what stands at one x, in the order of the sheet, and puts stations in order of x", async () => {
    const made = caseOf({ "p2.csv": 0.4, "q.csv": 0.2, "p1.csv": 0.4 * (1 + 1e-12) });
    const { stations } = await reduceCase(fakeEngine().engine, made);
    expect(seen(stations)).toEqual(["0.2: q.csv", "0.4: p2.csv+p1.csv"]);
  });

  it("does not depend on which file or station is done first", async () => {
    const made = caseOf({ "a.csv": 0.4, "b.csv": 0.2, "c.csv": 0.4, "d.csv": 0.1 });
    const slow = fakeEngine({ "a.csv": 20, "b.csv": 10, "finish 0.1": 15 });
    expect(await reduceCase(slow.engine, made)).toEqual(await reduceCase(fakeEngine().engine, made));
    expect(slow.asked.filter((ask) => ask.startsWith("finish"))).toContain("finish a.csv+c.csv");
  });

  it("leaves a bad file out, says so with its place and goes on", async () => {
    const heard: string[] = [];
    const { stations, failures } = await reduceCase(
      fakeEngine({}, ["b.csv"]).engine,
      caseOf({ "a.csv": 0.4, "b.csv": 0.2 }),
      { onFailure: ({ code }) => heard.push(code) },
    );
    expect(seen(stations)).toEqual(["0.4: a.csv"]);
    expect(failures).toMatchObject([{ code: "not-a-number", where: { file: "b.csv", line: 3 } }]);
    expect(heard).toEqual(["not-a-number"]);
  });

  it("is cancelled as a whole, not file by file", async () => {
    const stop = new AbortController();
    stop.abort();
    const heard: string[] = [];
    const options = { signal: stop.signal, onFailure: () => heard.push("failure") };
    await expect(reduceCase(fakeEngine().engine, caseOf({ "a.csv": 1 }), options)).rejects.toMatchObject({
      code: "cancelled",
    });
    expect(heard).toEqual([]);
  });

  it("does again only what a change of settings touches", async () => {
    const cache: ReductionCache = { files: new Map(), stations: new Map() };
    const { engine, asked } = fakeEngine();
    const first = await reduceCase(engine, caseOf({ "a.csv": 1, "b.csv": 2 }), { cache });
    const times = asked.length;
    const again = await reduceCase(engine, caseOf({ "a.csv": 1, "b.csv": 2 }), { cache });
    expect(again).toEqual(first);
    expect(asked).toHaveLength(times);
    await reduceCase(engine, caseOf({ "a.csv": 1, "b.csv": 3 }), { cache });
    expect(asked.slice(times)).toEqual(["b.csv", "finish b.csv"]);
    const viscous = caseOf({ "a.csv": 1, "b.csv": 2 }, { kinematicViscosity: 1e-5 });
    await reduceCase(engine, viscous, { cache });
    expect(asked).toHaveLength(2 * times + 2);
  });
});
