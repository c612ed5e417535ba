import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { additiveSeries, blockRow, mostBlocks, startBlocks } from "../../../src/core/signal/blockList.ts";
import { coarsenDensity } from "../../../src/core/signal/coarsenDensity.ts";
import { hannWindow } from "../../../src/core/signal/hannWindow.ts";
import { jackknife } from "../../../src/core/signal/jackknife.ts";
import { fillJoint, jointLayout } from "../../../src/core/signal/jointMoments.ts";
import { startLagProducts } from "../../../src/core/signal/lagProducts.ts";
import { logBins } from "../../../src/core/signal/logBins.ts";
import { mergeJoint } from "../../../src/core/signal/mergeJoint.ts";
import { realFourier } from "../../../src/core/signal/realFourier.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { shiftJoint } from "../../../src/core/signal/shiftJoint.ts";
import { startWelch } from "../../../src/core/signal/welch.ts";
import { welchDensity } from "../../../src/core/signal/welchDensity.ts";
import { expectClose } from "../../support/expectClose.ts";

const seed = 20261201;
const rounding = { relative: 1e-12, because: "rounding" };

function gaussian(count: number, of = seed): Float64Array {
  const random = seededRandom(of);
  return Float64Array.from({ length: count }, () => random.gaussian());
}

describe("Fourier transform of real sequences", () => {
  it.each([2, 4, 8, 64, 1024])("of %i points: Parseval, and back again", (size) => {
    const x = gaussian(size);
    const spectrum = realFourier(size)
      .forward(x)
      .slice(0, size + 2);
    let power = 0;
    for (let f = 0; f <= size / 2; f++) {
      const weight = f === 0 || f === size / 2 ? 1 : 2;
      power += weight * (spectrum[2 * f] ** 2 + spectrum[2 * f + 1] ** 2);
    }
    expectClose(
      power / size,
      x.reduce((sum, value) => sum + value * value, 0),
      rounding,
    );
    const back = new Float64Array(size);
    realFourier(size).inverse(spectrum, back);
    x.forEach((value, i) => {
      expectClose(back[i], value, { absolute: 1e-14 * size, because: "rounding" });
    });
  });
});

describe("a transform of a length that is a power of two", () => {
  it("is refused for any other", () => {
    for (const size of [0, 1, 0.5, 3, 12]) expect(() => realFourier(size)).toThrow(/power of two/);
  });
  it("is planned once", () => expect(realFourier(64)).toBe(realFourier(64)));
  it("goes back into as much as is wanted, and no farther than the sequence is long", () => {
    const x = gaussian(8);
    const spectrum = realFourier(8).forward(x).slice(0, 10);
    for (const length of [1, 3, 5, 6, 8, 11]) {
      const out = new Float64Array(length).fill(99);
      realFourier(8).inverse(spectrum, out);
      out.forEach((value, n) => {
        expectClose(value, n < 8 ? x[n] : 99, { absolute: 1e-13, because: "rounding" });
      });
    }
  });
});

describe("Hann window, periodic", () => {
  const window = hannWindow(4096);
  const mean = window.reduce((sum, w) => sum + w, 0) / 4096;
  const square = window.reduce((sum, w) => sum + w * w, 0) / 4096;
  // Harris (1978), table 1; the values are exact for the periodic window
  it("has gain 1/2, mean square 3/8 and a noise bandwidth of 1.5 bins", () => {
    expectClose(mean, 0.5, rounding);
    expectClose(square, 0.375, rounding);
    expectClose(square / mean ** 2, 1.5, rounding);
  });
  it("keeps a correlation of 1/6 at half overlap", () => {
    let sum = 0;
    for (let n = 0; n < 2048; n++) sum += window[n] * window[n + 2048];
    expectClose(sum / (4096 * square), 1 / 6, rounding);
  });
});

describe("moments merged from blocks", () => {
  it("are those of all samples at once, wherever the borders lie", () => {
    const layout = jointLayout(3);
    const columns = [gaussian(300, 1), gaussian(300, 2), gaussian(300, 3)].map((x, c) =>
      x.map((v) => v ** 3 + 50 * c),
    );
    const whole = new Float64Array(layout.length);
    fillJoint(whole, layout, columns, 0, 300, null);
    fc.assert(
      fc.property(fc.uniqueArray(fc.integer({ min: 1, max: 299 }), { maxLength: 9 }), (cuts) => {
        const borders = [0, ...cuts.sort((a, b) => a - b), 300];
        const merged = new Float64Array(layout.length);
        const row = new Float64Array(layout.length);
        for (let b = 0; b + 1 < borders.length; b++) {
          fillJoint(row, layout, columns, borders[b], borders[b + 1], null);
          mergeJoint(merged, row, layout);
        }
        whole.forEach((value, i) => {
          expectClose(merged[i], value, { relative: 1e-10, absolute: 1e-9, because: "rounding" });
        });
      }),
      { seed, numRuns: 50 },
    );
  });
  it("about another point add up plainly", () => {
    const layout = jointLayout(1);
    const x = gaussian(200).map((value) => value ** 2 + 7);
    const [row, shifted, sum] = [0, 1, 2].map(() => new Float64Array(layout.length));
    for (const from of [0, 90]) {
      fillJoint(row, layout, [x], from, from === 0 ? 90 : 200, null);
      shiftJoint(row, layout, [7.5], shifted);
      for (let i = 0; i < sum.length; i++) sum[i] += shifted[i];
    }
    [1, 2, 3, 4].forEach((power, i) => {
      const direct = x.reduce((total, value) => total + (value - 7.5) ** power, 0);
      expectClose(sum[1 + i], direct, { relative: 1e-12, because: "rounding" });
    });
  });
  it("weigh samples: a weight of two is the sample twice", () => {
    const layout = jointLayout(1);
    const [once, twice] = [0, 1].map(() => new Float64Array(layout.length));
    fillJoint(once, layout, [Float64Array.of(1, 4, 6)], 0, 3, Float64Array.of(1, 2, 1));
    fillJoint(twice, layout, [Float64Array.of(1, 4, 4, 6)], 0, 4, null);
    expect(Array.from(once)).toEqual(Array.from(twice));
  });
});

describe("blocks of a record", () => {
  it("never number more than 127, hold every sample once and are alike but for the last", () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 3000 }), (chunks) => {
        const counts = additiveSeries(1);
        const blocks = startBlocks(64, [counts]);
        for (let i = 0; i < chunks; i++) {
          blocks.begin(64);
          blockRow(counts, blocks.current)[0] += 64;
        }
        const rows = Array.from(counts.data.subarray(0, blocks.rows));
        expect(blocks.rows).toBeLessThanOrEqual(mostBlocks);
        expect(rows.reduce((sum, count) => sum + count, 0)).toBe(64 * chunks);
        expect(rows.slice(0, -1).every((count) => count === blocks.size)).toBe(true);
        expect(rows[rows.length - 1]).toBeGreaterThan(0);
      }),
      { seed, numRuns: 60 },
    );
  });
});

describe("lag products", () => {
  const x = gaussian(1000);
  const direct = (l: number, from: number, to: number) => {
    let sum = 0;
    for (let i = Math.max(l, from); i < to; i++) sum += x[i] * x[i - l];
    return sum;
  };
  it.each([
    [64, 64, 1],
    [256, 32, 1],
    [256, 32, 4],
    [256, 32, 64],
    [16, 128, 2],
  ])(
    "of %i lags in chunks of %i, every %i-th kept, belong to the block of their later sample",
    (limit, chunk, stride) => {
      const lags = startLagProducts(limit, chunk, stride);
      for (const [from, to] of [
        [0, 256],
        [256, 768],
        [768, 1000],
      ]) {
        const row = new Float64Array(limit / stride);
        lags.add(x, from, to);
        lags.flush(row);
        row.forEach((value, i) => {
          expectClose(value, direct(i * stride, from, to), {
            absolute: 1e-10,
            because: "rounding of some hundred terms",
          });
        });
      }
    },
  );
  it("of two records parted by a restart are those of each, added", () => {
    const lags = startLagProducts(64, 16, 1);
    const row = new Float64Array(64);
    lags.add(x, 0, 208);
    lags.restart();
    lags.add(x, 208, 512);
    lags.flush(row);
    row.forEach((value, l) => {
      let sum = 0;
      for (let i = l; i < 512; i++) if (i < 208 || i - l >= 208) sum += x[i] * x[i - l];
      expectClose(value, sum, { absolute: 1e-10, because: "rounding of some hundred terms" });
    });
  });
  it("taken in at its place in a chunk are the same: a record that begins within one", () => {
    const lags = startLagProducts(32, 16, 1);
    const row = new Float64Array(32);
    // at 21: the sixth of a chunk of 16
    lags.add(x, 0, 43, 21);
    lags.add(x, 43, 200);
    lags.flush(row);
    row.forEach((value, l) => {
      expectClose(value, direct(l, 0, 200), { absolute: 1e-10, because: "rounding of some hundred terms" });
    });
  });
});

describe("Welch spectrum", () => {
  it("integrates to the variance of white noise, on average", () => {
    const x = gaussian(1 << 16);
    const welch = startWelch(512);
    welch.add(x, 0, x.length);
    const density = welchDensity({ ...welch, size: 512, segments: welch.segments }, 0.01, 0);
    const area = density.reduce((sum, value) => sum + value, 0) / (512 * 0.01);
    expectClose(area, 1, {
      relative: 0.02,
      because: "three standard errors of the variance of 65536 samples",
    });
  });
  it("keeps its integral when it is brought onto wider bins", () => {
    const fine = gaussian(513).map((value) => value * value);
    const coarse = coarsenDensity(fine, 1024, 256);
    const sum = (density: Float64Array) => density.reduce((total, value) => total + value, 0);
    expectClose(4 * sum(coarse), sum(fine), rounding);
  });
});

describe("jackknife", () => {
  const x = gaussian(240);
  const mean = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0) / values.length;
  const without = (from: number, to: number) => Float64Array.of(...x.subarray(0, from), ...x.subarray(to));
  it("of a mean over equal groups is the standard error of the group means", () => {
    const groups = Array.from({ length: 12 }, (_, j) => x.subarray(20 * j, 20 * j + 20));
    const means = groups.map(mean);
    const centre = mean(x);
    const spread = means.reduce((sum, value) => sum + (value - centre) ** 2, 0) / (12 * 11);
    const replicates = groups.map((_, j) => mean(without(20 * j, 20 * j + 20)));
    const error = jackknife(centre, replicates, new Array(12).fill(20));
    expectClose(error?.standard, Math.sqrt(spread), rounding);
    expect(error?.freedom).toBe(11);
  });
  it("of unequal groups stays near that of equal ones", () => {
    const borders = [0, 10, 35, 60, 70, 100, 120, 150, 160, 190, 215, 240];
    const replicates = borders.slice(1).map((to, j) => mean(without(borders[j], to)));
    const weights = borders.slice(1).map((to, j) => to - borders[j]);
    const error = jackknife(mean(x), replicates, weights);
    expectClose(error?.standard, 1 / Math.sqrt(240), {
      relative: 0.5,
      because: "eleven groups tell an error to a fifth",
    });
  });
  it("says nothing of one group or of a value that is no number", () => {
    expect(jackknife(1, [1], [1])).toBeNull();
    expect(jackknife(Number.NaN, [1, 2], [1, 1])).toBeNull();
  });
});

describe("logarithmic bins", () => {
  it("leave no point out, take none twice and begin with single points", () => {
    const borders = logBins(1, 2049, 20);
    expect(borders[0]).toBe(1);
    expect(borders[borders.length - 1]).toBe(2049);
    expect(borders.every((border, i) => i === 0 || border > borders[i - 1])).toBe(true);
    expect(borders.slice(0, 5)).toEqual([1, 2, 3, 4, 5]);
  });
});

describe("seeded random numbers", () => {
  it("are the same for a seed, and others for another", () => {
    expect(gaussian(5, 7)).toEqual(gaussian(5, 7));
    expect(gaussian(5, 7)).not.toEqual(gaussian(5, 8));
  });
  it("are standard normal: mean 0, variance 1, flatness 3", () => {
    const x = gaussian(100_000);
    const power = (p: number) => x.reduce((sum, value) => sum + value ** p, 0) / x.length;
    expectClose(power(1), 0, { absolute: 0.01, because: "three standard errors" });
    expectClose(power(2), 1, { absolute: 0.014, because: "three standard errors" });
    expectClose(power(4), 3, { absolute: 0.1, because: "three standard errors" });
  });
});
