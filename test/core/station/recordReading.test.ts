import { describe, expect, it } from "vitest";
import { hannWindow } from "../../../src/core/signal/hannWindow.ts";
import { bandBorders } from "../../../src/core/station/bandBorders.ts";
import { expectClose } from "../../support/expectClose.ts";
import { about, close, count, part, plan, rowsOf, step, total, u, v } from "./plannedRecord.ts";
import { partOf } from "./records.ts";

describe("a record read with a plan", () => {
  it("has moments by blocks of whole chunks, the last one shorter", () => {
    expect(rowsOf(part, "weight")).toEqual([64, 64, 64, 64, 44]);
    const [x, y] = about.map((column) => column.slice(64, 128));
    const [mx, my] = [x, y].map((column) => total(column) / 64);
    expectClose(rowsOf(part, "u")[1], mx, close);
    expectClose(rowsOf(part, "v")[1], my, close);
    expectClose(rowsOf(part, "uv")[1], total(x.map((value, i) => (value - mx) * (y[i] - my))), close);
    expectClose(rowsOf(part, "vvv")[1], total(y.map((value) => (value - my) ** 3)), close);
    expectClose(rowsOf(part, "uuuu")[1], total(x.map((value) => (value - mx) ** 4)), close);
    expect([part.samples, part.duration, part.start, part.step]).toEqual([count, 0.3, 0, step]);
    expect(part.lowestSpeed).toBe(Math.min(...u));
    expect(part.components).toEqual(["u", "v"]);
  });
  it("has lag products by the block of the later sample, and the sums at its edges", () => {
    const { lags } = part;
    if (lags === null) throw new Error("no lags");
    expect([lags.count, lags.stride]).toEqual([16, 1]);
    for (const c of [0, 1])
      for (const [block, l] of [
        [0, 0],
        [0, 5],
        [2, 15],
        [4, 3],
      ]) {
        let sum = 0;
        for (let i = 64 * block; i < Math.min(count, 64 * (block + 1)); i++)
          if (i >= l) sum += about[c][i] * about[c][i - l];
        expectClose(lags.products[c][block * 16 + l], sum, close);
      }
    expectClose(lags.heads[1][7], total(about[1].slice(0, 7)), close);
    expectClose(lags.tails[1][7], total(about[1].slice(count - 7)), close);
    expect([lags.pairs, lags.totals]).toEqual([undefined, undefined]);
  });
  it("has Welch sums of half-overlapping segments, and the cross power of u and v", () => {
    const { spectrum } = part;
    if (!spectrum?.cross) throw new Error("no spectrum");
    expect([spectrum.size, spectrum.segments]).toEqual([32, 17]);
    const window = hannWindow(32);
    let [power, cross, first] = [0, 0, 0];
    const f = 3;
    for (let s = 0; s < 17; s++) {
      const [a, b] = about.map((column) => {
        let [re, im] = [0, 0];
        for (let i = 0; i < 32; i++) {
          re += window[i] * column[16 * s + i] * Math.cos((2 * Math.PI * f * i) / 32);
          im -= window[i] * column[16 * s + i] * Math.sin((2 * Math.PI * f * i) / 32);
        }
        return [re, im];
      });
      power += a[0] ** 2 + a[1] ** 2;
      cross += a[0] * b[0] + a[1] * b[1];
      for (let i = 0; i < 32; i++)
        first += window[i] * about[1][16 * s + i] * Math.cos((2 * Math.PI * i) / 32);
    }
    expectClose(spectrum.power[0][f], power, close);
    expectClose(spectrum.cross[f], cross, close);
    expectClose(spectrum.edges[1][1], first, close);
  });
  it("has the gradient's sums f² |X_f|² of short segments in the block of their middle, by bands", () => {
    const { bands } = part;
    if (bands === null) throw new Error("no bands");
    const borders = bandBorders(16);
    expect([bands.size, bands.count]).toEqual([16, borders.length]);
    const window = hannWindow(16);
    const middles = Array.from({ length: 36 }, (_, s) => 8 * s + 8);
    expect([...bands.segments]).toEqual(
      [0, 1, 2, 3, 4].map((b) => middles.filter((m) => Math.floor(m / 64) === b).length),
    );
    const band = 0;
    let sum = 0;
    for (const middle of middles.filter((m) => Math.floor(m / 64) === 2))
      for (let f = borders[band]; f <= 8; f++) {
        let [re, im] = [0, 0];
        for (let i = 0; i < 16; i++) {
          const value = window[i] * about[1][middle - 8 + i];
          re += value * Math.cos((2 * Math.PI * f * i) / 16);
          im += value * Math.sin((2 * Math.PI * f * i) / 16);
        }
        sum += f * f * (re * re + im * im);
      }
    expectClose(bands.sums[1][2 * borders.length + band], sum, close);
  });
  it("has increments of u at lags from a fortieth of the integral time up to it", () => {
    const { increments } = part;
    expect(increments?.lags).toEqual([1, 2, 3, 4, 5, 6, 8]);
    // over eight samples: every fourth, counted from the start
    let [n, square] = [0, 0];
    for (let i = 8; i < count; i += 4) {
      n++;
      square += (u[i] - u[i - 8]) ** 2;
    }
    const sums = increments?.sums ?? new Float64Array(0);
    const at = (entry: number) => total([0, 1, 2, 3, 4].map((block) => sums[(block * 7 + 6) * 3 + entry]));
    expect(at(0)).toBe(n);
    expectClose(at(1), square, close);
  });
  it("has differences that begin where the record does", () => {
    expect(total(rowsOf(part, "differences"))).toBe(count - 4);
    expect(total(rowsOf(part, "derivatives"))).toBe(count - 6);
    let square = 0;
    for (let i = 6; i < count; i++) square += ((u[i] - u[i - 6]) / (6 * step)) ** 2;
    expectClose(total(rowsOf(part, "derivative_squared")), square, close);
  });
  it("is transformed once where long and short segments are alike", () => {
    const alike = partOf({ u, v }, { record: { plan: { ...plan, bandSegment: 32 } } });
    expect(alike.spectrum).toEqual(part.spectrum);
    expect(alike.bands?.size).toBe(32);
    expect(total(alike.bands?.segments ?? [])).toBe(17);
  });
  it("keeps every other lag where it is told to", () => {
    const thin = partOf({ u, v }, { record: { plan: { ...plan, lagStride: 4 } } });
    expect([thin.lags?.count, thin.lags?.stride]).toEqual([4, 4]);
    expectClose(thin.lags?.products[0][1], part.lags?.products[0][4] ?? 0, close);
    expectClose(thin.lags?.tails[0][2], part.lags?.tails[0][8] ?? 0, close);
  });
  it("has a trend taken out, about its centre, by time or by count", () => {
    const tilted = u.map((value, i) => value + 2 * (i * step - 0.1));
    const leaning = { ...plan, slope: [2, 0], centre: 0.1 };
    const counted = partOf({ u: tilted, v }, { record: { plan: leaning } });
    expectClose(rowsOf(counted, "uu")[2], rowsOf(part, "uu")[2], close);
    expectClose(rowsOf(counted, "u")[4], rowsOf(part, "u")[4], close);
    const t = u.map((_, i) => 7 + i * step);
    const timed = partOf({ u: tilted, v, t }, { record: { plan: { ...leaning, centre: 7.1 } } });
    expectClose(rowsOf(timed, "uu")[2], rowsOf(part, "uu")[2], close);
    expectClose(rowsOf(timed, "uv")[0], rowsOf(part, "uv")[0], close);
  });
  it("comes out the same in whatever pieces it is handed over", () => {
    for (const cuts of [[1], [63, 64, 65], [100, 200]])
      expect(partOf({ u, v }, { cuts, record: { plan } })).toEqual(part);
  });
});

describe("a record in pieces, read with a plan", () => {
  const t = u.map((_, i) => (i < 100 ? i : i + 50) * step);
  const broken = partOf({ u, v, t }, { record: { plan } });
  const flag = broken.flags.find(({ code }) => code === "gap");

  it("has its gap counted, and the time of it left out", () => {
    expect(flag?.value).toBe(1);
    expect(flag?.text).toContain("0.0510 of time");
    expectClose(broken.duration, 0.3, close);
  });
  it("has no pair, no segment and no difference across it", () => {
    const { lags } = broken;
    for (const l of [0, 5, 15]) {
      let sum = 0;
      for (let i = l; i < count; i++) if (i < 100 || i - l >= 100) sum += about[0][i] * about[0][i - l];
      expectClose(total([0, 1, 2, 3, 4].map((b) => lags?.products[0][b * 16 + l] ?? 0)), sum, close);
      expect(lags?.pairs?.[l]).toBe(count - 2 * l);
    }
    expectClose(lags?.heads[0][3], total(about[0].slice(0, 3)) + total(about[0].slice(100, 103)), close);
    // (100 - 32)/16 + 1 and (200 - 32)/16 + 1
    expect(broken.spectrum?.segments).toBe(5 + 11);
    expect(total(rowsOf(broken, "differences"))).toBe(count - 8);
    expect(total(rowsOf(broken, "derivatives"))).toBe(count - 12);
  });
  it("has the moments of all of it", () => {
    for (const name of ["weight", "u", "uu", "uv", "vvvv"])
      rowsOf(broken, name).forEach((value, row) => {
        expectClose(value, rowsOf(part, name)[row], close);
      });
  });
  it("has a sample sent twice but once, the newer", () => {
    const doubled = (column: Float64Array, last: number) =>
      Float64Array.of(...column.slice(0, 64), last, ...column.slice(64));
    // the older one of the two is wrong
    const wrong = u.slice();
    wrong[63] = 99;
    const even = u.map((_, i) => i * step);
    const twice = {
      u: Float64Array.of(...wrong.slice(0, 64), u[63], ...u.slice(64)),
      v: doubled(v, v[63]),
      t: doubled(even, even[63]),
    };
    const once = partOf(twice, { record: { plan } });
    expect(once.blocks).toEqual(partOf({ u, v, t: even }, { record: { plan } }).blocks);
    expect(once.samples).toBe(count);
    expect(once.flags.find(({ code }) => code === "backward-time")?.text).toContain("1 sample was");
  });
});
