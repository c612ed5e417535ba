import { describe, expect, it } from "vitest";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { CoarseSignal } from "../../../src/core/station/coarseSignal.ts";
import { borrowColumn, returnColumn } from "../../../src/core/station/columnStore.ts";
import { addDifferences } from "../../../src/core/station/differenceSums.ts";
import { groupBlocks, groupsFor } from "../../../src/core/station/groupBlocks.ts";
import { replayPeriod } from "../../../src/core/station/replayPeriod.ts";
import { startUpTransient } from "../../../src/core/station/startUpTransient.ts";
import { expectClose } from "../../support/expectClose.ts";
import { whiteNoise } from "./records.ts";

const exact = { relative: 1e-10, because: "a closed form" };
const sumOf = (x: readonly number[]) => x.reduce((sum, value) => sum + value, 0);

describe("the blocks of a record", () => {
  /** Blocks that alternate, so that they have no memory, with a beginning of another mean. */
  const means = (count: number, first: number, shift: number) =>
    Array.from({ length: count }, (_, i) => (i < first ? shift : 0) + (i % 2 === 0 ? 1 : -1));
  const ones = (count: number) => Array.from({ length: count }, (_, i) => (i % 2 === 0 ? 1.1 : 1 / 1.1));

  it("fewer than sixteen, or one without variance, tell nothing", () => {
    expect(startUpTransient(means(15, 2, 50), ones(15))).toBeNull();
    expect(startUpTransient(means(16, 2, 50), ones(16))).not.toBeNull();
    expect(startUpTransient(means(16, 2, 50), [...ones(15), 0])).toBeNull();
  });
  it("of which the first differs have its departure in standard errors of the rest, and its length", () => {
    const x = means(41, 1, 9);
    const found = startUpTransient(x, ones(41));
    // the rest: forty blocks of ±1, mean 0, variance 40/39, no memory
    const error = Math.sqrt((40 / 39) * (1 + 1 / 40));
    expectClose(found?.departure, 10 / error, exact);
    expect(found).toMatchObject({ kind: "start-up", what: "mean", blocks: 1 });
  });
  it("are cut where the beginning ends", () => {
    for (const first of [2, 5, 12]) {
      expect(startUpTransient(means(40, first, 9), ones(40))).toMatchObject({
        kind: "start-up",
        blocks: first,
      });
    }
  });
  it("are cut by the mean of the rest that is known best: White (1997)", () => {
    const random = seededRandom(2);
    const x = Array.from({ length: 60 }, (_, i) => 8 * Math.exp(-i / 4) + random.gaussian());
    const scores = Array.from({ length: 31 }, (_, d) => {
      const rest = x.slice(d);
      const mean = sumOf(rest) / rest.length;
      return sumOf(rest.map((value) => (value - mean) ** 2)) / rest.length ** 2;
    });
    expect(startUpTransient(x, ones(60))?.blocks).toBe(scores.indexOf(Math.min(...scores)));
  });
  it("are tested at the half of them too, where the first half stands against the second", () => {
    const found = startUpTransient(means(40, 20, 3), ones(40));
    // means 3 and 0 of twenty blocks of ±1 each, memory none
    expectClose(found?.departure, 3 / Math.sqrt((20 / 19) * (2 / 20)), exact);
    expect(found).toMatchObject({ kind: "trend", blocks: 20 });
  });
  it("that change later than two fifths on are a trend, half of them long", () => {
    expect(startUpTransient(means(40, 16, 9), ones(40))).toMatchObject({ kind: "start-up", blocks: 16 });
    expect(startUpTransient(means(40, 17, 9), ones(40))).toMatchObject({ kind: "trend", blocks: 20 });
    expect(startUpTransient(means(41, 18, 9), ones(41))).toMatchObject({ kind: "trend", blocks: 20 });
  });
  it("whose variance alone changes are told by it, in the logarithm", () => {
    const variances = ones(40).map((value, i) => (i < 4 ? 30 * value : value));
    const found = startUpTransient(means(40, 0, 0), variances);
    expect(found).toMatchObject({ kind: "start-up", what: "variance", blocks: 4 });
    // ln 30 against four and 36 blocks of ±ln 1.1
    const error = Math.log(1.1) * Math.sqrt((36 / 35) * (1 / 4 + 1 / 36));
    expectClose(found?.departure, Math.log(30) / error, exact);
  });
  it("of which mean and variance change are told by what takes longer", () => {
    const variances = ones(40).map((value, i) => (i < 7 ? 30 * value : value));
    expect(startUpTransient(means(40, 3, 9), variances)).toMatchObject({ what: "variance", blocks: 7 });
    expect(startUpTransient(means(40, 9, 9), variances)).toMatchObject({ what: "mean", blocks: 9 });
  });
  it("that remember each other have fewer of their own: (1 + r)/(1 - r) times the variance", () => {
    // runs of two alike: the correlation between neighbours of a long such series is a half
    const slow = Array.from({ length: 81 }, (_, i) =>
      i < 1 ? 12 : Math.floor((i - 1) / 2) % 2 === 0 ? 1 : -1,
    );
    const rest = slow.slice(1);
    const products = sumOf(rest.slice(1).map((value, i) => value * rest[i]));
    const r = Math.max(0, products / 80);
    const error = Math.sqrt((80 / 79) * ((1 + r) / (1 - r)) * (1 + 1 / 80));
    expectClose(startUpTransient(slow, ones(81))?.departure, 12 / error, exact);
  });
  it("that are steady are left alone, also where one cut reaches 4.4 standard errors", () => {
    expect(startUpTransient(means(40, 0, 0), ones(40))).toBeNull();
    const of = (errors: number) => {
      const error = Math.sqrt((40 / 39) * (1 + 1 / 40));
      return startUpTransient(means(41, 1, errors * error - 1), ones(41));
    };
    expect(of(4.4)).toBeNull();
    expect(of(4.6)).not.toBeNull();
  });
});

describe("a signal that comes back", () => {
  const box = whiteNoise(200, 3);
  const repeated = (points: number, noise = 0, seed = 9) => {
    const extra = whiteNoise(points, seed);
    return Float64Array.from({ length: points }, (_, i) => 5 + box[i % 200] + noise * extra[i]);
  };
  const rhoAt = (x: Float64Array, lag: number) => {
    const mean = x.reduce((sum, value) => sum + value, 0) / x.length;
    let [product, square] = [0, 0];
    for (let i = 0; i < x.length; i++) {
      square += (x[i] - mean) ** 2 / x.length;
      if (i >= lag) product += ((x[i] - mean) * (x[i - lag] - mean)) / (x.length - lag);
    }
    return product / square;
  };

  it("has the period of its box, and the correlation there", () => {
    const x = repeated(1000);
    const found = replayPeriod(x);
    expectClose(found?.peak, rhoAt(x, 200), exact);
    // the top of the parabola through the peak and its neighbours
    const [a, b, c] = [199, 200, 201].map((lag) => rhoAt(x, lag));
    expectClose(found?.period, 200 + (a - c) / (2 * (a - 2 * b + c)), exact);
  });
  it("is seen down to a correlation of one half", () => {
    // with noise of variance s² the correlation is 1/(1 + s²)
    const peaks = [0.6, 0.8, 1.3].map((noise) => replayPeriod(repeated(2000, noise)));
    expectClose(peaks[0]?.peak, 1 / 1.36, { relative: 0.1, because: "two thousand points" });
    expectClose(peaks[1]?.peak, 1 / 1.64, { relative: 0.1, because: "two thousand points" });
    expect(peaks[2]).toBeNull();
  });
  it("is not seen past half the record, for there is too little to hold it against", () => {
    expect(replayPeriod(repeated(398))).toBeNull();
    expect(replayPeriod(repeated(404))?.peak).toBeGreaterThan(0.9);
  });
  it("must stand out of what chance makes of a short record", () => {
    // 48 points: se(ρ) = √(1/24..48), six of them are more than 0.86
    const x = Float64Array.from({ length: 48 }, (_, i) => box[i % 20] + 0.5 * box[100 + i]);
    const peak = rhoAt(x, 20);
    expect(peak).toBeGreaterThan(0.6);
    expect(peak).toBeLessThan(6 * Math.sqrt(1 / 28));
    expect(replayPeriod(x)).toBeNull();
  });
  it("is told by the first of several returns, unless a later one is much higher", () => {
    expectClose(replayPeriod(repeated(2000))?.period, 200, { absolute: 0.5, because: "half a point" });
    // 0, 1, 0, 2: halves of a box that resemble each other by 0.6 only
    const other = whiteNoise(200, 77);
    const like = Float64Array.from({ length: 2000 }, (_, i) => {
      const [place, second] = [i % 200, i % 400 >= 200];
      return second ? 0.6 * box[place] + 0.8 * other[place] : box[place];
    });
    expectClose(replayPeriod(like)?.period, 400, { absolute: 0.5, because: "half a point" });
  });
  it("of fewer than sixteen points, without variance, or shorter than forty integral times is not looked at", () => {
    expect(replayPeriod(new Float64Array(15))).toBeNull();
    expect(replayPeriod(new Float64Array(100).fill(3))).toBeNull();
    // a box of 18 runs of ten: its correlation falls to zero within ten, an integral time of some five
    const runs = (times: number) =>
      Float64Array.from({ length: 180 * times }, (_, i) => box[Math.floor((i % 180) / 10)]);
    expect(replayPeriod(runs(1))).toBeNull();
    expectClose(replayPeriod(runs(6))?.period, 180, { absolute: 0.5, because: "half a point" });
  });
  it("that never loses its correlation does not come back: a tone", () => {
    expect(replayPeriod(Float64Array.from({ length: 2000 }, (_, i) => Math.sin(i / 5)))).toBeNull();
  });
});

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
