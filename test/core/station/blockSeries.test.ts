import { describe, expect, it } from "vitest";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
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
