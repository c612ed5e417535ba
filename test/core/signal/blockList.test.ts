import { describe, expect, it } from "vitest";
import {
  additiveSeries,
  blockRow,
  mostBlocks,
  startBlocks,
  trimmed,
} from "../../../src/core/signal/blockList.ts";

/** Counts of samples and sums of their indices, a block; samples arrive one by one. */
function blocksOf(samples: number, first: number) {
  const [counts, sums] = [additiveSeries(1), additiveSeries(2)];
  const blocks = startBlocks(first, [counts, sums]);
  for (let i = 0; i < samples; i++) {
    blocks.begin(1);
    blockRow(counts, blocks.current)[0] += 1;
    const row = blockRow(sums, blocks.current);
    row[0] += i;
    row[1] -= i;
  }
  return { blocks, counts: trimmed(counts, blocks.rows), sums: trimmed(sums, blocks.rows) };
}

describe("blocks of a record", () => {
  it("are none before the first sample", () => {
    const blocks = startBlocks(4, []);
    expect([blocks.rows, blocks.current, blocks.size]).toEqual([0, 0, 4]);
  });
  it("number as many as fill, the last one begun", () => {
    expect(Array.from(blocksOf(10, 4).counts)).toEqual([4, 4, 2]);
    expect(Array.from(blocksOf(8, 4).counts)).toEqual([4, 4]);
  });
  it("are 127 when full, and 64 of twice the size once one sample more has come", () => {
    const full = blocksOf(2 * mostBlocks, 2);
    expect([full.blocks.rows, full.blocks.size]).toEqual([127, 2]);
    const paired = blocksOf(2 * mostBlocks + 1, 2);
    expect([paired.blocks.rows, paired.blocks.size]).toEqual([64, 4]);
    // the 127th had no partner: its second half is filled now
    expect(Array.from(paired.counts)).toEqual([...new Array(63).fill(4), 3]);
  });
  it.each([300, 511, 1017, 1500])("hold consecutive samples after pairing, %d of them", (samples) => {
    const { blocks, sums, counts } = blocksOf(samples, 1);
    counts.forEach((count, block) => {
      const start = block * blocks.size;
      const sum = count * start + (count * (count - 1)) / 2;
      expect([sums[2 * block], sums[2 * block + 1]]).toEqual([sum, -sum]);
    });
  });
  it("merge by the rule of each kind of sum", () => {
    const data = new Float64Array(mostBlocks).map((_, i) => i);
    const largest = {
      width: 1,
      data,
      merge: (into: Float64Array, from: Float64Array) => {
        into[0] = Math.max(into[0], from[0]);
      },
    };
    const blocks = startBlocks(1, [largest]);
    for (let i = 0; i <= mostBlocks; i++) blocks.begin(1);
    expect(Array.from(data.subarray(0, 64))).toEqual(
      Array.from({ length: 64 }, (_, i) => Math.min(2 * i + 1, 126)),
    );
    expect(data.subarray(64).every((value) => value === 0)).toBe(true);
  });
});
