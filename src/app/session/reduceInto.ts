import { type PlainFailure, ReductionFailure } from "../../core/failure.ts";
import type { Engine, SourceFile } from "../../engine/protocol.ts";
import { type CaseFiles, type ReductionCache, reduceCase } from "../../engine/reduceCase.ts";
import type { WorkspaceCase } from "../../sheet/workspace.ts";
import type { PageStore } from "./pageStore.ts";
import type { Held, Reduced } from "./session.ts";

/** Between two tellings of the progress, ms: a bar need not know more often. */
const pause = 80;

/**
 * Reduces one case and tells the session of it from start to end. What goes wrong with a file is told beside the
 * result; cancelled, the files that were done are kept.
 */
export async function reduceInto(
  store: PageStore,
  engine: Engine,
  cache: ReductionCache,
  { of, key, signal }: { of: WorkspaceCase; key: string; signal: AbortSignal },
): Promise<void> {
  const { dispatch, session } = store.getState();
  const files = session.kind === "ready" || session.kind === "reducing" ? filesOf(of, session.held) : [];
  const bytes = files.reduce((sum, file) => sum + file.bytes, 0);
  const work = { key, files: files.length, filesDone: 0, bytes, bytesDone: 0 };
  dispatch({ kind: "started", caseId: of.id, work });
  const done: SourceFile[] = [];
  const progress = progressOf(store, of.id, done);
  const whole = { sheet: of.sheet, files };
  try {
    const reduced = await run(engine, cache, whole, {
      signal,
      onProgress: (more) => progress(more),
      onFile: (file) => {
        done.push(file);
        progress(0);
      },
    });
    dispatch({ kind: "reduced", caseId: of.id, reduced: { key, ...reduced, complete: true } });
  } catch (error) {
    if (!signal.aborted) dispatch({ kind: "reduced", caseId: of.id, reduced: failedWith(key, error) });
    else if (signal.reason === keepDone && done.length > 0) {
      // what is done is in the cache: this reads nothing again
      const reduced = await run(engine, cache, onlyThose(whole, done), {});
      dispatch({ kind: "reduced", caseId: of.id, reduced: { key, ...reduced, complete: false } });
    } else if (signal.reason !== superseded) dispatch({ kind: "stopped", caseId: of.id });
  }
}

/** Why a reduction is aborted: the user cancelled and keeps what is done. */
export const keepDone = "keep what is done";
/** Why a reduction is aborted: another of the same case has begun, and the session hears of that one. */
export const superseded = "superseded";

type Options = NonNullable<Parameters<typeof reduceCase>[2]>;

async function run(engine: Engine, cache: ReductionCache, files: CaseFiles, options: Options) {
  const { stations, sources, flags, failures } = await reduceCase(engine, files, { ...options, cache });
  return { stations, sources, flags, failures };
}

/** The case's files, one for each entry of its sheet. */
function filesOf({ sources }: WorkspaceCase, { files }: Held): SourceFile[] {
  return sources.flatMap(
    ({ name, fingerprint }) =>
      files.find((file) => file.name === name && file.fingerprint === fingerprint) ?? [],
  );
}

function onlyThose({ sheet, files }: CaseFiles, done: readonly SourceFile[]): CaseFiles {
  const kept = files.map((file) => done.includes(file));
  return {
    sheet: { ...sheet, files: sheet.files.filter((_, i) => kept[i]) },
    files: files.filter((_, i) => kept[i]),
  };
}

/** Tells of bytes now and then, and of every file that is done at once. */
function progressOf(store: PageStore, caseId: string, done: readonly SourceFile[]): (bytes: number) => void {
  let [bytesDone, told, toldFiles] = [0, 0, 0];
  return (bytes) => {
    bytesDone += bytes;
    const now = performance.now();
    if (done.length === toldFiles && now - told < pause) return;
    [told, toldFiles] = [now, done.length];
    const progress = { filesDone: done.length, bytesDone, done: done.map(({ name }) => name) };
    store.getState().dispatch({ kind: "progressed", caseId, ...progress });
  };
}

function failedWith(key: string, error: unknown): Reduced {
  const failure: PlainFailure =
    error instanceof ReductionFailure
      ? error.plain()
      : {
          code: "crashed",
          message: "the work on this case stopped because of a fault in the program",
          found: error instanceof Error ? error.message : String(error),
          remedy: "Please report it with the files, if they may be shown",
          where: {},
        };
  return { key, stations: [], sources: [], flags: [], failures: [failure], complete: false };
}
