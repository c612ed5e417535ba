import { describe, expect, it } from "vitest";
import { CoarseSignal } from "../../../src/core/station/coarseSignal.ts";
import { borrowColumn, returnColumn } from "../../../src/core/station/columnStore.ts";
import { addDifferences } from "../../../src/core/station/differenceSums.ts";
import { groupBlocks, groupsFor } from "../../../src/core/station/groupBlocks.ts";
import { expectClose } from "../../support/expectClose.ts";
import { whiteNoise } from "./records.ts";

const exact = { relative: 1e-10, because: "a closed form" };

describe("a coarse signal", () => {
  it("has the means of equal stretches, handed in as they may be, and no last one that is not full", () => {
    const x = whiteNoise(5000, 4);
    const coarse = new CoarseSignal(7);
    for (const [from, to] of [
      [0, 3],
      [3, 3],
      [3, 4000],
      [4000, 5000],
    ])
      coarse.add(x, from, to);
    const { points, length } = coarse.finish();
    expect([points.length, length]).toEqual([714, 7]);
    points.forEach((value, i) => {
      let mean = 0;
      for (let k = 0; k < 7; k++) mean += x[7 * i + k] / 7;
      expectClose(value, mean, { absolute: 1e-14, because: "rounding" });
    });
  });
  it("grows past its first thousand points", () => {
    const coarse = new CoarseSignal(1);
    coarse.add(
      Float64Array.from({ length: 3000 }, (_, i) => i),
      0,
      3000,
    );
    const { points } = coarse.finish();
    expect(points.length).toBe(3000);
    expect(points.every((value, i) => value === i)).toBe(true);
  });
  it("of more than 2^18 points is averaged by pairs", () => {
    const coarse = new CoarseSignal(1);
    const count = (1 << 18) + 4;
    coarse.add(
      new Float64Array(count).map((_, i) => i),
      0,
      count,
    );
    const { points, length } = coarse.finish();
    expect([points.length, length]).toEqual([(1 << 17) + 2, 2]);
    expect([points[0], points[1], points[1 << 17], points[points.length - 1]]).toEqual([
      0.5,
      2.5,
      2 ** 18 + 0.5,
      2 ** 18 + 2.5,
    ]);
  });
});

describe("groups of blocks", () => {
  it("are as many as hold twenty integral times, from ten to fifty", () => {
    expect([0, 199, 210, 230, 410, 990, 5000].map(groupsFor)).toEqual([10, 10, 11, 12, 21, 50, 50]);
  });
  it("are of neighbours, of nearly equal weight, and hold two blocks or more where there are enough", () => {
    const { count, of, repeats } = groupBlocks(new Float64Array(100).fill(64), 5000);
    expect([count, repeats]).toEqual([50, 1]);
    expect([...of]).toEqual(Array.from({ length: 100 }, (_, block) => Math.floor(block / 2)));
    expect(groupBlocks(new Float64Array(64).fill(64), 5000).count).toBe(32);
    expect(groupBlocks(new Float64Array(12).fill(64), 5000).count).toBe(10);
    expect(groupBlocks(new Float64Array(7).fill(64), 5000).count).toBe(7);
  });
  it("are cut by weight, not by number, and a short last block stays with its neighbours", () => {
    const weights = Float64Array.of(...new Array<number>(39).fill(10), 2);
    const { count, of } = groupBlocks(weights, 200);
    expect(count).toBe(10);
    // the middle of block b is at 10 b + 5 of 392, a group is 39.2 long
    expect([...of]).toEqual(
      [...weights].map((weight, b) => Math.min(9, Math.floor((10 * (10 * b + weight / 2)) / 392))),
    );
  });
  it("of a record that repeats itself are as many as there are whole blocks, each short against the period", () => {
    const weights = new Float64Array(90).fill(64);
    expect(groupBlocks(weights, 300, 10)).toMatchObject({ count: 90, repeats: 10 });
    expect(groupBlocks(weights, 100, 5)).toMatchObject({ count: 25, repeats: 5 });
    expect(groupBlocks(Float64Array.of(...new Array<number>(89).fill(64), 8), 300, 10).count).toBe(89);
  });
});

describe("differences along a record", () => {
  /** x⁴, whose fourth-order central difference is 4 x³ exactly, and whose second-order one 4 x³ + 4 x. */
  const history = 8;
  const u = Float64Array.from({ length: history + 20 }, (_, i) => (i - history) ** 4);
  const sums = (known: number, m = 3, step = 0.5) => {
    const row = new Float64Array(6);
    addDifferences(row, u, history, history + 20, known, m, step);
    return row;
  };
  const at = (i: number) => i - 2;

  it("of the second and of the fourth order end within the chunk, the history before it included", () => {
    const [count, second, fourth] = sums(8);
    expect(count).toBe(20);
    let [two, four] = [0, 0];
    for (let i = 0; i < 20; i++) {
      // the difference that ends at sample i stands about i - 2; the second-order one reaches one to either side
      two += (4 * at(i) ** 3 + 4 * at(i)) ** 2;
      four += (4 * at(i) ** 3) ** 2;
    }
    expectClose(second, two, exact);
    expectClose(fourth, four, exact);
  });
  it("reach no further back than the record is known", () => {
    const [count, second] = sums(1);
    expect(count).toBe(17);
    let two = 0;
    for (let i = 3; i < 20; i++) two += (4 * at(i) ** 3 + 4 * at(i)) ** 2;
    expectClose(second, two, exact);
    expect(sums(0)[0]).toBe(16);
    expect(sums(4)[0]).toBe(20);
  });
  it("over a longer base are (u_(i+m) - u_(i-m))/(2 m dt), squared and cubed", () => {
    const [, , , count, square, cube] = sums(2);
    expect(count).toBe(16);
    let [squares, cubes] = [0, 0];
    for (let i = 4; i < 20; i++) {
      const d = (i ** 4 - (i - 6) ** 4) / (6 * 0.5);
      squares += d ** 2;
      cubes += d ** 3;
    }
    expectClose(square, squares, exact);
    expectClose(cube, cubes, exact);
  });
  it("add to what the block has already, and of a chunk too short there are none", () => {
    const row = new Float64Array(6).fill(2);
    addDifferences(row, u, history, history + 2, 0, 3, 0.5);
    expect([...row]).toEqual([2, 2, 2, 2, 2, 2]);
    addDifferences(row, u, history, history + 20, 8, 3, 0.5);
    const plain = sums(8);
    row.forEach((value, i) => {
      expectClose(value, plain[i] + 2, exact);
    });
  });
});

describe("large arrays that are lent", () => {
  it("come back, the smallest that is long enough first, and no more than eight are kept", () => {
    const lengths = [300, 100, 200, 700, 400, 900, 800, 600, 500];
    const columns = lengths.map((length) => new Float64Array(length * 1000));
    for (const column of columns) returnColumn(column);
    // the ninth drove out the least
    expect(borrowColumn(50_000)).toBe(columns[2]);
    expect(borrowColumn(550_000)).toBe(columns[7]);
    expect(borrowColumn(600_000)).toBe(columns[3]);
    const fresh = borrowColumn(1_000_000);
    expect(columns.some((column) => column === fresh)).toBe(false);
    expect(fresh.length).toBe(1_000_000);
    for (const at of [0, 4, 8, 6, 5]) expect(borrowColumn(300_000)).toBe(columns[at]);
    const small = borrowColumn(1000);
    expect(columns.some((column) => column === small)).toBe(false);
  });
});
