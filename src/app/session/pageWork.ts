import type { Engine } from "../../engine/protocol.ts";
import type { ReductionCache } from "../../engine/reduceCase.ts";
import type { WorkspaceCase } from "../../sheet/workspace.ts";
import { type ArgumentAsk, argueCases, argumentAsk } from "./argueCases.ts";
import { caseKey } from "./caseKey.ts";
import type { DroppedFile } from "./openDrop.ts";
import type { PageStore } from "./pageStore.ts";
import { keepDone, reduceInto, superseded } from "./reduceInto.ts";
import { runDrop } from "./runDrop.ts";
import type { Held } from "./session.ts";

/** Numbers older than this are shown as such, ms. */
const moment = 100;

/** The work behind the page: it follows the session and does what that asks for. */
export interface PageWork {
  drop(files: Promise<DroppedFile[]>): Promise<void>;
  /** Ends what is being reduced; files that are done are kept. */
  cancel(): void;
  /** Reads on where a case was cancelled. */
  resume(caseId: string): void;
  close(): void;
}

/**
 * Whatever the workspace asks for and is not there is worked out: stations of cases whose settings changed, then
 * fits and comparison of all. One argument is under way at a time; of those asked for meanwhile, the last.
 */
export function startPageWork(store: PageStore, engine: Engine): PageWork {
  const cache: ReductionCache = { files: new Map(), stations: new Map() };
  const running = new Map<string, { key: string; abort: AbortController }>();
  const resumed = new Set<string>();
  /** Keys of cases that cannot be reduced anew: it is said once. */
  const lacking = new Set<string>();
  let arguing: string | null = null;

  function reduceWhatIsAsked(held: Held): void {
    const { cases } = held.history.present;
    for (const [id, { abort }] of running) if (!cases.some((of) => of.id === id)) abort.abort();
    for (const of of cases) {
      const key = caseKey(of);
      const known = held.reductions[of.id];
      const wanted = known?.key !== key || (resumed.has(of.id) && !known.complete);
      const at = running.get(of.id);
      if (!wanted || at?.key === key) continue;
      if (lacksRecords(of, held)) {
        if (!lacking.has(key)) store.getState().setNotice(lackingText(of.sheet.case));
        lacking.add(key);
        continue;
      }
      at?.abort.abort(superseded);
      const abort = new AbortController();
      const run = { key, abort };
      running.set(of.id, run);
      resumed.delete(of.id);
      void reduceInto(store, engine, cache, { of, key, signal: abort.signal }).finally(() => {
        if (running.get(of.id) === run) running.delete(of.id);
        follow();
      });
    }
  }

  function argueWhatIsAsked(held: Held): void {
    const ask = argumentAsk(held);
    if (ask === null || arguing !== null || held.argued?.key === ask.key) return;
    arguing = ask.key;
    void argue(ask).finally(() => {
      arguing = null;
      follow();
    });
  }

  async function argue(ask: ArgumentAsk): Promise<void> {
    const { dispatch, setLate, setNotice } = store.getState();
    const timer = setTimeout(() => setLate(ask.key), moment);
    try {
      dispatch({ kind: "argued", argued: await argueCases(engine, ask) });
    } catch (error) {
      refused.add(ask.key);
      setNotice(
        `Fits and comparison could not be worked out: ${error instanceof Error ? error.message : error}.`,
      );
    } finally {
      clearTimeout(timer);
      setLate(null);
    }
  }
  /** Asks that failed are not asked again. */
  const refused = new Set<string>();

  function follow(): void {
    const { session } = store.getState();
    if (session.kind !== "ready" && session.kind !== "reducing") return;
    reduceWhatIsAsked(session.held);
    const now = store.getState().session;
    if (now.kind !== "ready" && now.kind !== "reducing") return;
    const ask = argumentAsk(now.held);
    if (ask !== null && !refused.has(ask.key)) argueWhatIsAsked(now.held);
  }

  const stop = store.subscribe((state, before) => {
    if (state.session !== before.session) follow();
  });
  return {
    drop: (files) => runDrop(store, engine, files),
    cancel: () => {
      for (const { abort } of running.values()) abort.abort(keepDone);
    },
    resume: (caseId) => {
      resumed.add(caseId);
      follow();
    },
    close: () => {
      stop();
      for (const { abort } of running.values()) abort.abort();
      engine.close();
    },
  };
}

/** A page that came back, or a colleague's, may be without the bytes of its records. */
function lacksRecords({ sources }: WorkspaceCase, { files }: Held): boolean {
  return sources.some(
    ({ name, fingerprint }) => !files.some((file) => file.name === name && file.fingerprint === fingerprint),
  );
}

function lackingText(name: string): string {
  return `The records of ${name} are not in this browser, so the numbers shown are those of the settings before. Drop the same files again, and they are reduced anew.`;
}
