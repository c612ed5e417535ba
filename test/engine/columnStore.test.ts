import { describe, expect, it } from "vitest";
import type { VelocityBlock } from "../../src/core/records.ts";
import type { ColumnStore } from "../../src/engine/columnStore.ts";
import { memoryColumnStore } from "../../src/engine/columnStore.ts";

const block = (...u: number[]): VelocityBlock => ({
  count: u.length,
  t: null,
  u: Float64Array.from(u),
  v: null,
  w: null,
});

async function held(store: ColumnStore, key: string) {
  const found: [number, number[]][] = [];
  const blocks = store.read(key);
  if (!blocks) return null;
  for await (const stored of blocks) found.push([stored.record, [...stored.block.u]]);
  return found;
}

describe("columns in memory", () => {
  it("come back in the order of their writing, with the record they belong to", async () => {
    const store = memoryColumnStore(1000);
    const writer = store.write("a");
    writer.add(0, block(1, 2));
    writer.add(1, block(7));
    writer.add(0, block(3));
    writer.close();
    expect(await held(store, "a")).toEqual([
      [0, [1, 2]],
      [1, [7]],
      [0, [3]],
    ]);
    expect(await held(store, "a")).toHaveLength(3); // as often as asked
  });

  it("are copies: the reader fills its arrays again", async () => {
    const store = memoryColumnStore(1000);
    const writer = store.write("a");
    const reused = { ...block(1, 2, 3), count: 2 };
    writer.add(0, reused);
    reused.u.fill(0);
    writer.close();
    expect(await held(store, "a")).toEqual([[0, [1, 2]]]);
  });

  it("are not to be had before all are there", async () => {
    const store = memoryColumnStore(1000);
    const writer = store.write("a");
    writer.add(0, block(1));
    expect(store.read("a")).toBeNull();
    writer.close();
    expect(store.read("a")).not.toBeNull();
    store.drop("a");
    expect(store.read("a")).toBeNull();
  });

  it("are not kept at all where they do not fit: half a record is of no use", () => {
    const store = memoryColumnStore(16);
    const writer = store.write("a");
    writer.add(0, block(1, 2));
    writer.add(0, block(3));
    writer.add(0, block(4));
    writer.close();
    expect(store.read("a")).toBeNull();
  });

  it("make room for later ones, the oldest first", () => {
    const store = memoryColumnStore(16);
    for (const key of ["a", "b", "c"]) {
      const writer = store.write(key);
      writer.add(0, block(1));
      writer.close();
    }
    expect(["a", "b", "c"].map((key) => store.read(key) !== null)).toEqual([false, true, true]);
  });

  it("of a key that is written anew leave no trace of the old ones", async () => {
    const store = memoryColumnStore(1000);
    const old = store.write("a");
    old.add(0, block(1));
    const writer = store.write("a");
    old.add(0, block(2));
    old.close();
    expect(store.read("a")).toBeNull();
    writer.add(0, block(3));
    writer.close();
    expect(await held(store, "a")).toEqual([[0, [3]]]);
  });
});
