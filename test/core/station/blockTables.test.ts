import { describe, expect, it } from "vitest";
import type { BlockTable } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { exponential, stationOf } from "./records.ts";

/** Rows of a table added up so that each holds `blockSamples`. */
function coarsened({ fields, rows, data, blockSamples }: BlockTable, wanted: number): Float64Array[] {
  const width = fields.length;
  const merged = Math.ceil((rows * blockSamples) / wanted);
  const out = Array.from({ length: merged }, () => new Float64Array(width));
  for (let row = 0; row < rows; row++) {
    const into = out[Math.floor((row * blockSamples) / wanted)];
    for (let i = 0; i < width; i++) into[i] += data[row * width + i];
  }
  return out;
}

describe("blocks of two stations whose records differ in length", () => {
  const count = 200_000;
  const common = exponential(count, 20, 4);
  const long = { u: common.map((value) => 8 + value), v: exponential(count, 20, 5) };
  const short = { u: common.slice(0, 30_000).map((value) => 7 + value), v: long.v.slice(0, 30_000) };
  const tables = [long, short].map((signal) => {
    const { blocks } = stationOf(signal);
    if (blocks === null) throw new Error("no blocks");
    return blocks;
  });
  const wanted = Math.max(...tables.map(({ blockSamples }) => blockSamples));

  it("have the same fields, and sizes of which one divides the other", () => {
    const [a, b] = tables;
    expect(a.fields).toEqual(b.fields);
    expect([a.start, a.step]).toEqual([b.start, b.step]);
    expect(a.blockSamples).toBeGreaterThan(b.blockSamples);
    expect(Number.isInteger(Math.log2(a.blockSamples / b.blockSamples))).toBe(true);
  });
  it("are the same stretches of time once the finer are added up to the coarser", () => {
    const [a, b] = tables.map((table) => coarsened(table, wanted));
    const [weight, u, uu, uv] = ["weight", "u", "uu", "uv"].map((name) => tables[0].fields.indexOf(name));
    const whole = Math.floor(30_000 / wanted);
    expect(whole).toBeGreaterThanOrEqual(7);
    for (let row = 0; row < whole; row++) {
      expect([a[row][weight], b[row][weight]]).toEqual([wanted, wanted]);
      // the samples are the same but for a constant: so are the central moments of a stretch
      const central = (sums: Float64Array, of: number, other: number) =>
        sums[of] / wanted - (sums[u] / wanted) * (sums[other] / wanted);
      const close = { relative: 1e-9, because: "rounding" };
      expectClose(central(b[row], uu, u), central(a[row], uu, u), close);
      const v = tables[0].fields.indexOf("v");
      expectClose(central(b[row], uv, v), central(a[row], uv, v), { ...close, absolute: 1e-9 });
    }
  });
  it("are counted in time where steps are unequal: a row holds the samples of its stretch", () => {
    // every other step a half longer than the rest: 1.25 steps on the average, the shorter being the median
    const t = long.u.slice(0, 30_000).map((_, i) => (i + Math.floor(i / 3) * 0.5) * 1e-3);
    const { blocks } = stationOf({ u: short.u, t });
    if (blocks === null) throw new Error("no blocks");
    const at = blocks.fields.indexOf("weight");
    for (let row = 0; row + 1 < blocks.rows; row++) {
      expectClose(blocks.data[row * blocks.fields.length + at], blocks.blockSamples, {
        absolute: 2,
        because: "a sample at either border may lie in the next stretch",
      });
    }
  });
});
