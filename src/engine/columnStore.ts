import type { VelocityBlock } from "../core/records.ts";

/**
 * Columns kept by key, so that a file need not be parsed twice. A place for them can be lost at any time:
 * whoever reads must be ready to go back to the file.
 */
export interface ColumnStore {
  /** Begins the columns of a key anew. */
  write(key: string): ColumnWriter;
  /** The blocks in the order of their writing; null unless all of them are here. */
  read(key: string): AsyncIterable<StoredBlock> | null;
  drop(key: string): void;
}

export interface ColumnWriter {
  /** Copies the block: a reader may fill the same arrays again. */
  add(record: number, block: VelocityBlock): void;
  /** Nothing is missing: from now on the key can be read. */
  close(): void;
}

/** A block and which record of its file it belongs to. */
export interface StoredBlock {
  readonly record: number;
  readonly block: VelocityBlock;
}

interface Entry {
  readonly blocks: StoredBlock[];
  bytes: number;
  complete: boolean;
}

/**
 * Columns in memory. What would not fit is not kept at all: half a file is of no use.
 * @param budget bytes at most; the key that was written longest ago makes room
 */
export function memoryColumnStore(budget: number): ColumnStore {
  const entries = new Map<string, Entry>();
  const held = () => [...entries.values()].reduce((sum, entry) => sum + entry.bytes, 0);

  function makeRoom(key: string, entry: Entry): boolean {
    for (const [oldest] of entries) {
      if (held() <= budget) return true;
      if (oldest !== key) entries.delete(oldest);
    }
    if (held() <= budget) return true;
    entry.blocks.length = 0;
    entries.delete(key);
    return false;
  }

  return {
    write(key) {
      const entry: Entry = { blocks: [], bytes: 0, complete: false };
      entries.delete(key); // a key set again moves to the end of the order
      entries.set(key, entry);
      const here = () => entries.get(key) === entry;
      return {
        add(record, block) {
          if (!here()) return;
          entry.bytes += bytesOf(block);
          if (makeRoom(key, entry)) entry.blocks.push({ record, block: copyOf(block) });
        },
        close() {
          if (here()) entry.complete = true;
        },
      };
    },
    read(key) {
      const entry = entries.get(key);
      return entry?.complete ? walk(entry.blocks) : null;
    },
    drop: (key) => void entries.delete(key),
  };
}

async function* walk(blocks: readonly StoredBlock[]): AsyncGenerator<StoredBlock> {
  yield* blocks;
}

const columns = ["t", "u", "v", "w"] as const;

function bytesOf(block: VelocityBlock): number {
  return columns.filter((name) => block[name] !== null).length * block.count * 8;
}

function copyOf(block: VelocityBlock): VelocityBlock {
  const copy = (column: Float64Array) => column.slice(0, block.count);
  const { count, t, u, v, w } = block;
  return { count, t: t && copy(t), u: copy(u), v: v && copy(v), w: w && copy(w) };
}
