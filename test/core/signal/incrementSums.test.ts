import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { incrementLags, startIncrements } from "../../../src/core/signal/incrementSums.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";

const lags = [1, 3, 8, 20, 50];
const random = seededRandom(4);
const x = Float64Array.from({ length: 2000 }, () => random.gaussian());

function sums(borders: readonly number[]): Float64Array {
  const row = new Float64Array(3 * lags.length);
  const increments = startIncrements(lags);
  for (let i = 0; i + 1 < borders.length; i++) increments.add(row, x, borders[i], borders[i + 1]);
  return row;
}

describe("increments of a sequence", () => {
  const whole = sums([0, x.length]);
  it("are those of the definition: every one up to a lag of 3, every l/2-th beyond", () => {
    lags.forEach((lag, at) => {
      let [count, squares, cubes] = [0, 0, 0];
      for (let i = lag; i < x.length; i++) {
        if (i % Math.max(1, Math.floor(lag / 2)) !== 0) continue;
        count++;
        squares += (x[i] - x[i - lag]) ** 2;
        cubes += (x[i] - x[i - lag]) ** 3;
      }
      expect(whole[3 * at]).toBe(count);
      expectClose(whole[3 * at + 1], squares, { relative: 1e-12, because: "rounding" });
      expectClose(whole[3 * at + 2], cubes, { relative: 1e-9, absolute: 1e-9, because: "rounding" });
    });
  });
  it("are the same in whatever pieces the sequence arrives", () => {
    fc.assert(
      fc.property(fc.uniqueArray(fc.integer({ min: 1, max: x.length - 1 }), { maxLength: 60 }), (cuts) => {
        const found = sums([0, ...cuts.sort((a, b) => a - b), x.length]);
        found.forEach((value, i) => {
          expectClose(value, whole[i], { relative: 1e-10, absolute: 1e-10, because: "order of summing" });
        });
      }),
      { seed: 20261201, numRuns: 50 },
    );
  });
  it("do not reach across a restart", () => {
    const increments = startIncrements([10]);
    const row = new Float64Array(3);
    increments.add(row, x, 0, 100);
    increments.restart();
    increments.add(row, x, 100, 200);
    expect(row[0]).toBe(36);
  });
  it("are taken at lags of one series, ten a decade", () => {
    expect(incrementLags(1, 30)).toEqual([1, 2, 3, 4, 5, 6, 8, 10, 13, 16, 20, 25]);
    expect(incrementLags(7, 30)).toEqual([8, 10, 13, 16, 20, 25]);
    expect(incrementLags(1, 0.5)).toEqual([]);
  });
});
