import type { PageStore } from "../session/pageStore.ts";
import { openPageDatabase } from "./pageDatabase.ts";
import { openRecordFolder } from "./recordFolder.ts";
import { startKeeping } from "./startKeeping.ts";

const name = "waneline";

/**
 * Keeps the page in this browser, unless another tab does: two that wrote to one place would undo each other's work.
 * @returns when what was kept is on the page, or when it is clear that nothing is
 */
export async function keepPage(store: PageStore): Promise<void> {
  const { setNotice } = store.getState();
  if (!(await ownsPage())) {
    setNotice(
      "The page is open in another tab, which keeps it. What is done in this tab is gone when it closes, unless you save a workspace file.",
    );
    return;
  }
  try {
    const [database, records] = await Promise.all([
      openPageDatabase(name),
      openRecordFolder(`${name}-records`),
    ]);
    await startKeeping(store, { database, records });
  } catch {
    setNotice("This browser keeps nothing for this page: save a workspace file before you leave it.");
  }
}

/** A reload may come before the page that is left has let go. */
const tries = 4;
const pauseMs = 150;

/** True, for as long as this tab lives, in one tab alone. */
async function ownsPage(): Promise<boolean> {
  if (!("locks" in navigator)) return true;
  for (let i = 0; i < tries; i++) {
    if (await tryLock()) return true;
    await new Promise((resolve) => setTimeout(resolve, pauseMs));
  }
  return false;
}

function tryLock(): Promise<boolean> {
  return new Promise((tell) => {
    void navigator.locks.request(name, { ifAvailable: true }, (lock) => {
      tell(lock !== null);
      // a promise without end holds the lock until the tab is gone
      return lock === null ? undefined : new Promise(() => {});
    });
  });
}
