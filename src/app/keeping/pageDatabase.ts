import { type IDBPDatabase, openDB } from "idb";
import type { Reduced } from "../session/session.ts";
import { type KeptPage, nothingKept } from "./keptPage.ts";

/** Where a page is kept in this browser. */
export interface PageDatabase {
  /** What was kept last; null: nothing. */
  read(): Promise<KeptPage | null>;
  /** Writes what has changed since the last time, all of it or nothing. */
  write(page: KeptPage): Promise<void>;
  /** What is there cannot be used: the next writing leaves it be, for whoever mends it. */
  setAside(): Promise<void>;
}

const store = "parts";
/** All but the results, which are many times larger and change far less often. */
const rest = "page";
const ofCase = "case ";

/** The browser's own database. */
export async function openPageDatabase(name: string): Promise<PageDatabase> {
  const database = await openDB(name, 1, { upgrade: (fresh) => void fresh.createObjectStore(store) });
  let written: Readonly<Record<string, Reduced>> = {};
  return {
    async read() {
      const page = await readPage(database);
      written = page?.reductions ?? {};
      return page;
    },
    async write(page) {
      await writePage(database, page, written);
      written = page.reductions;
    },
    async setAside() {
      const held: unknown = await database.get(store, rest);
      if (held !== undefined) await database.put(store, held, `${rest} set aside`);
    },
  };
}

async function readPage(database: IDBPDatabase): Promise<KeptPage | null> {
  const held: unknown = await database.get(store, rest);
  if (held === undefined) return null;
  const { reductions: _none, ...page } = held as KeptPage; // written below
  const keys = (await database.getAllKeys(store)).map(String).filter((key) => key.startsWith(ofCase));
  const values = await Promise.all(keys.map((key) => database.get(store, key)));
  const reductions = Object.fromEntries(
    keys.map((key, i) => [key.slice(ofCase.length), values[i] as Reduced]),
  );
  return { ...nothingKept, ...page, reductions };
}

async function writePage(
  database: IDBPDatabase,
  { reductions, ...page }: KeptPage,
  written: Readonly<Record<string, Reduced>>,
): Promise<void> {
  const change = database.transaction(store, "readwrite");
  const writes: Promise<unknown>[] = [change.store.put(page, rest)];
  for (const [id, reduced] of Object.entries(reductions))
    if (written[id] !== reduced) writes.push(change.store.put(reduced, ofCase + id));
  for (const id of Object.keys(written))
    if (!Object.hasOwn(reductions, id)) writes.push(change.store.delete(ofCase + id));
  await Promise.all([...writes, change.done]);
}
