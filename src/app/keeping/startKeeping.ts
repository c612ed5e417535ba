import { heldOf } from "../session/nextSession.ts";
import type { PageStore } from "../session/pageStore.ts";
import type { Held } from "../session/session.ts";
import { heldFrom, type KeptPage, keptPage, nothingKept } from "./keptPage.ts";
import type { PageDatabase } from "./pageDatabase.ts";
import type { RecordFolder } from "./recordFolder.ts";
import { renewed } from "./renewed.ts";

/** What a page is kept in. */
export interface KeepingPlaces {
  readonly database: PageDatabase;
  readonly records: RecordFolder | null;
}

/** A change is written when nothing further has happened for this long, ms. */
const restMs = 400;

/**
 * Brings back the page as it was left, and from then on keeps it as it changes. What cannot be kept is said once;
 * the page works on all the same.
 * @returns when what was kept is on the page
 */
export async function startKeeping(store: PageStore, { database, records }: KeepingPlaces): Promise<void> {
  await bringBack(store, { database, records });
  let kept = heldOf(store.getState().session);
  let timer: ReturnType<typeof setTimeout> | undefined;
  let working = false;
  let told = false;

  async function keep(): Promise<void> {
    const { session } = store.getState();
    const held = heldOf(session);
    if (working || held === kept || session.kind === "reading") return;
    working = true;
    try {
      await database.write(held === null ? nothingKept : keptPage(held));
      if (session.kind === "ready") await keepRecords(records, held, kept);
      kept = held;
      told = false;
    } catch (error) {
      kept = held; // tried again with the next change, and said once
      if (!told) store.getState().setNotice(refusal(error));
      told = true;
    } finally {
      working = false;
      if (heldOf(store.getState().session) !== kept) later();
    }
  }
  function later(): void {
    clearTimeout(timer);
    timer = setTimeout(() => void keep(), restMs);
  }
  store.subscribe((state, before) => {
    if (state.session !== before.session) later();
  });
  document.addEventListener("visibilitychange", () => {
    if (document.visibilityState === "hidden") void keep();
  });
}

async function bringBack(store: PageStore, { database, records }: KeepingPlaces): Promise<void> {
  const { dispatch, setNotice } = store.getState();
  let page: KeptPage | null = null;
  try {
    page = await database.read();
    if (page === null || page.history.present.cases.length + page.history.past.length === 0) return;
    const whole = renewed(page);
    const files = (await records?.find(whole.files)) ?? [];
    // files may have been dropped in the meantime
    if (store.getState().session.kind === "empty")
      dispatch({ kind: "restored", held: heldFrom(whole, files) });
    await records?.keepOnly(whole.files);
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    if (page !== null) await database.setAside();
    setNotice(`What this browser kept of an earlier page cannot be used (${why}); the page begins anew.`);
  }
}

/** Copies what has come; removes what neither the page nor its undo knows any more. */
async function keepRecords(
  records: RecordFolder | null,
  held: Held | null,
  before: Held | null,
): Promise<void> {
  if (records === null || held?.files === before?.files) return;
  if (held === null) await records.keepOnly([]);
  else await records.keep(held.files);
}

function refusal(error: unknown): string {
  const full = error instanceof DOMException && error.name === "QuotaExceededError";
  return full
    ? "This browser's store is full: the page is not kept beyond a reload. Save a workspace file now, or make room."
    : `This browser refuses to keep the page (${error instanceof Error ? error.message : String(error)}). Save a workspace file before you leave.`;
}
