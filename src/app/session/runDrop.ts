import { type PlainFailure, ReductionFailure } from "../../core/failure.ts";
import type { Preview } from "../../core/records.ts";
import type { Engine, SourceFile } from "../../engine/protocol.ts";
import type { DropPlan } from "../../sheet/dropPlan.ts";
import type { WorkspaceCase } from "../../sheet/workspace.ts";
import { isWorkspaceFile } from "../keeping/isWorkspaceFile.ts";
import { freshToken } from "./freshToken.ts";
import { joinCases } from "./joinCases.ts";
import { heldOf } from "./nextSession.ts";
import { asSources, type DroppedFile } from "./openDrop.ts";
import type { PageStore } from "./pageStore.ts";
import type { Plan } from "./session.ts";

/** No case sheet is longer; a longer JSON file is data, and read as any other file. */
const longestSheet = 4e6;

/**
 * A drop from its files to cases in the workspace: a first look at each, then the plan. A drop that comes while
 * another is worked on waits for its end.
 */
export async function runDrop(
  store: PageStore,
  engine: Engine,
  dropped: Promise<DroppedFile[]>,
): Promise<void> {
  const files = await dropped;
  if (files.length === 0) return store.getState().setNotice("The drop held no files.");
  await untilIdle(store);
  store.getState().setNotice(null);
  const records = await withoutWorkspace(store, files);
  if (records.length === 0) return;
  try {
    await planRecords(store, engine, records);
  } catch (error) {
    // the page does not wait for what will not come
    store.getState().dispatch({ kind: "planned", plan: emptyPlan });
    throw error;
  }
}

const emptyPlan: Plan = {
  cases: [],
  files: [],
  previews: [],
  aside: { leftOut: [], failures: [], warnings: [] },
};

/** Opens the workspace of a drop, if it holds one; what else it holds. */
async function withoutWorkspace(store: PageStore, files: readonly DroppedFile[]): Promise<DroppedFile[]> {
  const rest: DroppedFile[] = [];
  for (const each of files) {
    if (/\.json$/i.test(each.path) && (await isWorkspaceFile(each.file))) {
      const { openWorkspaceFile } = await import("../keeping/openWorkspaceFile.ts");
      await openWorkspaceFile(store, each);
    } else rest.push(each);
  }
  return rest;
}

async function planRecords(store: PageStore, engine: Engine, files: readonly DroppedFile[]): Promise<void> {
  const { dispatch } = store.getState();
  dispatch({
    kind: "offered",
    files: files.length,
    bytes: files.reduce((sum, { file }) => sum + file.size, 0),
  });
  // a sheet's schema is needed at a drop and not before
  const planning = import("../../sheet/planDrop.ts");
  const sources = await asSources(files);
  const isSheet = ({ path, file }: DroppedFile) => /\.json$/i.test(path) && file.size <= longestSheet;
  const sheets = await Promise.all(
    files.filter(isSheet).map(async ({ path, file }) => ({ name: path, text: await file.text() })),
  );
  const sheetNames = new Set(sheets.map(({ name }) => name));
  let looked = sheets.length;
  const tell = () => dispatch({ kind: "looked", looked: ++looked });
  const looks = await Promise.all(
    sources
      .filter(({ name }) => !sheetNames.has(name))
      .map(async (file): Promise<[string, Preview | PlainFailure]> => {
        const look = await firstLook(engine, file);
        tell();
        return [file.name, look];
      }),
  );
  const { planDrop } = await planning;
  const plan = planDrop(sources, sheets, new Map(looks));
  const here = heldOf(store.getState().session)?.history.present.cases ?? [];
  dispatch({ kind: "planned", plan: asPlan(plan, sources, looks, here) });
}

async function firstLook(engine: Engine, file: SourceFile): Promise<Preview | PlainFailure> {
  try {
    return await engine.run("preview", { file, settings: {} });
  } catch (error) {
    if (error instanceof ReductionFailure) return error.plain();
    throw error;
  }
}

function asPlan(
  planned: DropPlan,
  sources: readonly SourceFile[],
  looks: readonly (readonly [string, Preview | PlainFailure])[],
  here: readonly WorkspaceCase[],
): Plan {
  const byName = new Map(sources.map((source) => [source.name, source]));
  const { cases, additions, leftOut, warnings } = joinCases(planned, here, byName, freshToken());
  const used = new Set([...cases, ...additions].flatMap((each) => each.sources.map(({ name }) => name)));
  return {
    cases,
    additions,
    files: sources.filter((source) => used.has(source.name) || isOfCase(source, here)),
    previews: looks.flatMap(([name, look]) => ("code" in look || !used.has(name) ? [] : [look])),
    aside: { leftOut, failures: planned.failures, warnings },
  };
}

/** A file of a case whose records were not here: it comes back to it. */
function isOfCase({ name, fingerprint }: SourceFile, here: readonly WorkspaceCase[]): boolean {
  return here.some(({ sources }) =>
    sources.some((source) => source.name === name && source.fingerprint === fingerprint),
  );
}

function untilIdle(store: PageStore): Promise<void> {
  const isIdle = () => !["reading", "reducing"].includes(store.getState().session.kind);
  if (isIdle()) return Promise.resolve();
  return new Promise((resolve) => {
    const stop = store.subscribe(() => {
      if (!isIdle()) return;
      stop();
      resolve();
    });
  });
}
