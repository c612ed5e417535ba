import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { startEdges } from "../../../src/core/signal/edgeSums.ts";
import { startLagProducts } from "../../../src/core/signal/lagProducts.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";

const random = seededRandom(6);
const rounding = { relative: 1e-12, absolute: 1e-12, because: "order of summing" };

/** The edges of the samples between the first and the last border, handed in piece by piece. */
function edgesOf(x: Float64Array, borders: readonly number[], limit: number, stride: number) {
  const edges = startEdges(limit, stride);
  for (let i = 0; i + 1 < borders.length; i++) edges.add(x, borders[i], borders[i + 1]);
  return edges;
}

const sum = (x: Float64Array) => x.reduce((total, value) => total + value, 0);

const records = fc.record({
  values: fc.array(fc.integer({ min: -9, max: 9 }), { minLength: 1, maxLength: 60 }),
  cuts: fc.array(fc.nat(60), { maxLength: 6 }),
  skip: fc.nat(5),
  stride: fc.constantFrom(1, 2, 4),
  lags: fc.integer({ min: 1, max: 8 }),
});

describe("the edges of a record", () => {
  it("are the sums of its first and of its last l samples, in whatever pieces it arrives", () => {
    fc.assert(
      fc.property(records, ({ values, cuts, skip, stride, lags }) => {
        const x = Float64Array.from([...new Array(skip).fill(99), ...values]);
        const inside = cuts.filter((cut) => cut > 0 && cut < values.length).sort((a, b) => a - b);
        const borders = [0, ...inside, values.length].map((border) => border + skip);
        const edges = edgesOf(x, borders, lags * stride, stride);
        const record = x.subarray(skip);
        expect([edges.heads().length, edges.tails().length, edges.pairs().length]).toEqual([
          lags,
          lags,
          lags,
        ]);
        const at = (l: number) => Math.min(l, record.length);
        for (let i = 0; i < lags; i++) {
          const l = i * stride;
          expect(edges.heads()[i]).toBe(sum(record.subarray(0, at(l))));
          expect(edges.tails()[i]).toBe(sum(record.subarray(record.length - at(l))));
          expect(edges.pairs()[i]).toBe(record.length - at(l));
        }
      }),
      { seed: 20261201, numRuns: 200 },
    );
  });

  it("let the mean be taken out of lag products afterwards, as if it had been taken out before", () => {
    const x = Float64Array.from({ length: 300 }, () => random.gaussian() + 4);
    const [limit, stride, mean] = [32, 4, sum(x) / 300];
    const lagged = (of: Float64Array) => {
      const lags = startLagProducts(limit, limit, stride);
      lags.add(of, 0, of.length);
      const row = new Float64Array(limit / stride);
      lags.flush(row);
      return row;
    };
    const edges = edgesOf(x, [0, 32, 64, 300], limit, stride);
    const [heads, tails, pairs] = [edges.heads(), edges.tails(), edges.pairs()];
    const before = lagged(x.map((value) => value - mean));
    lagged(x).forEach((product, i) => {
      const after = product - mean * (2 * sum(x) - heads[i] - tails[i]) + pairs[i] * mean * mean;
      expectClose(after, before[i], { absolute: 1e-9, because: "rounding of sums of some thousands" });
    });
  });

  it("of two records parted by a restart are those of each, added", () => {
    const x = Float64Array.from({ length: 90 }, () => random.gaussian());
    const both = startEdges(12, 3);
    both.add(x, 0, 40);
    both.restart();
    // shorter than the longest lag: it forms no pairs there, and its edges are all of it
    both.add(x, 40, 47);
    both.restart();
    both.add(x, 47, 90);
    const parts = [edgesOf(x, [0, 40], 12, 3), edgesOf(x, [40, 47], 12, 3), edgesOf(x, [47, 90], 12, 3)];
    for (const of of ["heads", "tails", "pairs"] as const) {
      const each = parts.map((part) => part[of]());
      both[of]().forEach((value, i) => {
        expectClose(value, each[0][i] + each[1][i] + each[2][i], rounding);
      });
    }
    // 40 - l, 7 - l and 43 - l pairs, none below zero
    expect(Array.from(both.pairs())).toEqual([90, 81, 72, 65]);
  });
});
