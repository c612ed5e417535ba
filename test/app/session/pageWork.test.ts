import { describe, expect, it } from "vitest";
import { createPageStore } from "../../../src/app/session/pageStore.ts";
import { startPageWork } from "../../../src/app/session/pageWork.ts";
import type { Held } from "../../../src/app/session/session.ts";
import { ReductionFailure } from "../../../src/core/failure.ts";
import type { Preview } from "../../../src/core/records.ts";
import type { Engine, FileReduction, Tasks } from "../../../src/engine/protocol.ts";
import { decayOf, stationAt } from "../fixtures.ts";

type Reduce = Tasks["reduce"]["ask"];

/** An engine whose reductions wait until the test lets them end; all else is answered at once. */
function heldEngine() {
  const waiting: { ask: Reduce; end: (answer: FileReduction) => void }[] = [];
  const asked: string[] = [];
  const run = (task: string, ask: unknown, options?: { signal?: AbortSignal }): Promise<unknown> => {
    asked.push(task);
    if (task === "preview") return Promise.resolve(previewOf((ask as Tasks["preview"]["ask"]).file.name));
    if (task === "argue") return Promise.resolve(argumentOf(ask as Tasks["argue"]["ask"]));
    return new Promise((end, refuse) => {
      options?.signal?.addEventListener("abort", () =>
        refuse(new ReductionFailure("cancelled", { message: "cancelled", remedy: "Start again" })),
      );
      waiting.push({ ask: ask as Reduce, end });
    });
  };
  return { engine: { run, close: () => {} } as Engine, waiting, asked };
}

function previewOf(file: string): Preview {
  const x = Number(/x(\d+)/.exec(file)?.[1]) / 1000;
  return {
    file,
    bytes: 10,
    separator: ",",
    decimal: ".",
    heading: 1,
    layout: "profile",
    columns: [
      { heading: "x", number: 1, role: "x", unit: null },
      { heading: "u_rms", number: 2, role: "u_rms", unit: null },
    ],
    firstRows: [],
    comments: [],
    position: { x, source: "name", matched: null },
    step: null,
    estimatedRows: 1,
  };
}

function argumentOf({ cases }: Tasks["argue"]["ask"]): Tasks["argue"]["answer"] {
  return {
    cases: cases.map(({ name, stations, settings }) => ({
      name,
      stations,
      decay: decayOf(stations),
      decaySettings: settings,
    })),
    comparisons: [],
  };
}

function reductionOf({ file }: Reduce): FileReduction {
  const x = previewOf(file.name).position.x ?? 0;
  return {
    parts: [],
    stations: [stationAt(x)],
    sources: [{ name: file.name, bytes: 10, x, position: "name" }],
    flags: [],
  };
}

const files = (...names: string[]) =>
  Promise.resolve(names.map((path) => ({ path, file: new File([path], path) })));
const turn = () => new Promise((next) => setTimeout(next, 5));

async function dropped(...names: string[]) {
  const store = createPageStore();
  const { engine, waiting, asked } = heldEngine();
  const work = startPageWork(store, engine);
  await work.drop(files(...names));
  await turn();
  const held = (): Held => {
    const { session } = store.getState();
    if (session.kind !== "ready" && session.kind !== "reducing")
      throw new Error(`session is ${session.kind}`);
    return session.held;
  };
  const only = () => held().history.present.cases[0];
  return { store, work, waiting, asked, held, only };
}

describe("the work behind the page", () => {
  it("reduces what was dropped, then asks for its argument", async () => {
    const { store, waiting, asked, held, only } = await dropped("x0200.csv", "x0400.csv");
    expect(store.getState().session.kind).toBe("reducing");
    expect(waiting).toHaveLength(2);
    for (const { ask, end } of waiting) end(reductionOf(ask));
    await turn();
    expect(store.getState().session.kind).toBe("ready");
    expect(held().reductions[only().id].stations.map(({ x }) => x)).toEqual([0.2, 0.4]);
    expect(asked.filter((task) => task === "argue")).toHaveLength(1);
    expect(held().argued?.cases[only().id].decay.n.value).toBe(1.25);
  });

  it("keeps the files that are done when the rest is cancelled, and reads on when asked to", async () => {
    const { work, waiting, held, only } = await dropped("x0200.csv", "x0400.csv", "x0800.csv");
    waiting[0].end(reductionOf(waiting[0].ask));
    await turn();
    work.cancel();
    await turn();
    const cut = held().reductions[only().id];
    expect(cut.complete).toBe(false);
    expect(cut.stations.map(({ x }) => x)).toEqual([0.2]);
    work.resume(only().id);
    await turn();
    // the file that was done is not read again
    expect(waiting.slice(3).map(({ ask }) => ask.file.name)).toEqual(["x0400.csv", "x0800.csv"]);
    for (const { ask, end } of waiting.slice(3)) end(reductionOf(ask));
    await turn();
    expect(held().reductions[only().id].stations.map(({ x }) => x)).toEqual([0.2, 0.4, 0.8]);
  });

  it("starts again with a new viscosity and does not mistake the end of the old work for its own", async () => {
    const { store, waiting, only } = await dropped("x0200.csv");
    const edit = { kinematicViscosity: 1.5e-5 };
    store.getState().dispatch({ kind: "changed", change: { kind: "edit-sheet", caseId: only().id, edit } });
    await turn();
    expect(store.getState().session.kind).toBe("reducing");
    expect(waiting).toHaveLength(2);
    expect(waiting[1].ask.reduce.kinematicViscosity).toBe(1.5e-5);
    waiting[1].end(reductionOf(waiting[1].ask));
    await turn();
    expect(store.getState().session.kind).toBe("ready");
  });

  it("reads nothing again for a new name or a new window", async () => {
    const { store, waiting, asked, only } = await dropped("x0200.csv");
    waiting[0].end(reductionOf(waiting[0].ask));
    await turn();
    const { dispatch } = store.getState();
    dispatch({ kind: "changed", change: { kind: "edit-sheet", caseId: only().id, edit: { case: "grid" } } });
    dispatch({ kind: "changed", change: { kind: "set-window", caseId: only().id, window: [0.1, 0.3] } });
    await turn();
    expect(asked.filter((task) => task === "reduce")).toHaveLength(1);
    expect(asked.filter((task) => task === "argue").length).toBeGreaterThan(1);
  });

  it("adds further files of a folder to the case that folder made, and leaves those out that are in it", async () => {
    const { store, work, waiting, held, only } = await dropped("grid/x0200.csv", "grid/x0400.csv");
    for (const { ask, end } of waiting) end(reductionOf(ask));
    await turn();
    const again = work.drop(files("grid/x0400.csv", "grid/x0800.csv"));
    await again;
    await turn();
    // what is reduced stays in sight, and is not read again
    expect(held().reductions[only().id].stations.map(({ x }) => x)).toEqual([0.2, 0.4]);
    expect(waiting.slice(2).map(({ ask }) => ask.file.name)).toEqual(["grid/x0800.csv"]);
    waiting[2].end(reductionOf(waiting[2].ask));
    await turn();
    expect(held().history.present.cases).toHaveLength(1);
    expect(held().reductions[only().id].stations.map(({ x }) => x)).toEqual([0.2, 0.4, 0.8]);
    expect(held().aside.leftOut.map(({ name }) => name)).toEqual(["grid/x0400.csv"]);
    expect(held().aside.warnings.join()).toContain("grid/x0800.csv was added");
    store.getState().dispatch({ kind: "undone" });
    expect(only().sources).toHaveLength(2);
  });

  it("makes a second case of a folder whose files have other contents than those of the same name", async () => {
    const { work, waiting, held } = await dropped("grid/x0200.csv");
    waiting[0].end(reductionOf(waiting[0].ask));
    await turn();
    const other = new File(["another content"], "grid/x0200.csv");
    await work.drop(Promise.resolve([{ path: "grid/x0200.csv", file: other }]));
    await turn();
    expect(held().history.present.cases.map(({ sheet }) => sheet.case)).toEqual(["grid", "grid (2)"]);
    expect(held().aside.warnings.join()).toContain("called grid (2)");
  });

  it("tells of a drop in which nothing was a record", async () => {
    const store = createPageStore();
    const { engine } = heldEngine();
    const refuse: Engine = {
      ...engine,
      run: () =>
        Promise.reject(new ReductionFailure("not-a-record", { message: "No numbers", remedy: "Leave it" })),
    };
    await startPageWork(store, refuse).drop(files("notes.txt"));
    expect(store.getState().session).toMatchObject({
      kind: "failed",
      aside: { leftOut: [{ name: "notes.txt" }] },
    });
  });
});
