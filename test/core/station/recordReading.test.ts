import { describe, expect, it } from "vitest";
import { hannWindow } from "../../../src/core/signal/hannWindow.ts";
import { bandBorders } from "../../../src/core/station/bandBorders.ts";
import { planRecord } from "../../../src/core/station/planRecord.ts";
import type { RecordPlan } from "../../../src/core/station/recordPlan.ts";
import { startRecord } from "../../../src/core/station/startRecord.ts";
import type { StationPart } from "../../../src/core/station/stationPart.ts";
import { zeroCrossing } from "../../../src/core/station/zeroCrossing.ts";
import { expectClose } from "../../support/expectClose.ts";
import { blockOf, exponential, origin, partOf, type Signal, settings, smooth } from "./records.ts";

const close = { relative: 1e-9, absolute: 1e-10, because: "the definition, summed in another order" };
const step = 1e-3;

/** A plan by hand: every length small, so that all of them are met within a few hundred samples. */
const plan: RecordPlan = {
  ...{ step, weighted: false, quantum: 0, reference: [10, 0.5], slope: [0, 0], centre: 0 },
  ...{ integralTime: 8e-3, lagLimit: 16, lagStride: 1, segment: 32, bandSegment: 16, blockSamples: 64 },
  derivativeStep: 3,
  last: true,
};
const count = 300;
const u = smooth(count, 4).map((value) => 10 + value);
const v = smooth(count, 5);
const part = partOf({ u, v }, { record: { plan } });
const about = [u.map((value) => value - 10), v.map((value) => value - 0.5)];

function rowsOf(of: StationPart, name: string): number[] {
  const { fields, rows, data } = of.blocks;
  return Array.from({ length: rows }, (_, row) => data[row * fields.length + fields.indexOf(name)]);
}
const total = (values: ArrayLike<number>) => Array.from(values).reduce((sum, value) => sum + value, 0);

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

describe("unequal steps, read with a plan", () => {
  // steps of 0.7 and 1.3 in turn: the middle of each trapezoid is known
  const weightedPlan = { ...plan, weighted: true, bandSegment: 32 };
  const t = Float64Array.from({ length: count }, (_, i) => (i + (i % 2 === 0 ? 0 : -0.3)) * step);
  const uneven = partOf({ u, v, t }, { record: { plan: weightedPlan } });
  const weights = Float64Array.from(t, (_, i) => {
    const before = i === 0 ? 0 : t[i] - t[i - 1];
    const after = i === count - 1 ? 0 : t[i + 1] - t[i];
    return (before + after) / 2 / step;
  });

  it("have moments by the trapezoid rule, each sample in the block of its time", () => {
    const place = (i: number) => Math.floor(Math.floor(t[i] / step + 1e-6) / 64);
    [0, 1, 4].forEach((block) => {
      const own = Array.from({ length: count }, (_, i) => i).filter((i) => place(i) === block);
      const weight = total(own.map((i) => weights[i]));
      const mean = total(own.map((i) => weights[i] * about[0][i])) / weight;
      expectClose(rowsOf(uneven, "weight")[block], weight, close);
      expectClose(rowsOf(uneven, "u")[block], mean, close);
      expectClose(
        rowsOf(uneven, "uu")[block],
        total(own.map((i) => weights[i] * (about[0][i] - mean) ** 2)),
        close,
      );
    });
    expectClose(uneven.duration, t[count - 1] - t[0], close);
    expect(uneven.samples).toBe(count);
  });
  it("are made equal by a natural cubic spline, exact for a straight line", () => {
    const line = t.map((time) => 10 + 40 * (time - 0.1));
    const straight = partOf({ u: line, v, t }, { record: { plan: weightedPlan } });
    // 299 grid points of a ramp of 0.04 a step: the lag product at lag 0 and 5 in closed form
    const ramp = Array.from({ length: 299 }, (_, i) => 40 * (i * step - 0.1));
    for (const l of [0, 5]) {
      const sum = total(ramp.slice(l).map((value, i) => value * ramp[i]));
      expectClose(total([0, 1, 2, 3, 4].map((b) => straight.lags?.products[0][b * 16 + l] ?? 0)), sum, {
        relative: 1e-9,
        because: "rounding of the stamps",
      });
    }
    expect(straight.lags?.pairs?.[5]).toBe(294);
    expectClose(straight.lags?.totals?.[0], total(ramp), close);
    expectClose(straight.lags?.heads[0][4], total(ramp.slice(0, 4)), close);
  });
  it("are counted, and tell what the splines take at most", () => {
    const flag = uneven.flags.find(({ code }) => code === "unequal-steps");
    expect(flag?.text).toMatch(/^299 time steps differ/);
    expect(flag?.value).toBeGreaterThan(0);
    expect(flag?.value).toBeLessThan(0.05);
    const even = partOf({ u, v, t: u.map((_, i) => i * step) }, { record: { plan: weightedPlan } });
    expectClose(even.flags.find(({ code }) => code === "unequal-steps")?.value, 0, {
      absolute: 1e-9,
      because: "a spline goes through its points",
    });
  });
  it("are steadied over windows of some six hundred samples, which cannot be told from one spline", () => {
    const long = smooth(1500, 9).map((value) => 10 + value);
    const at = Float64Array.from({ length: 1500 }, (_, i) => (i + (i % 2 === 0 ? 0 : -0.3)) * step);
    const whole = partOf({ u: long, t: at }, { record: { plan: weightedPlan } });
    // the second half by itself: what lies before is forgotten but for its first points
    const later = partOf({ u: long.slice(700), t: at.slice(700) }, { record: { plan: weightedPlan } });
    const middle = (of: StationPart, from: number) => of.lags?.products[0][from * 16] ?? 0;
    expect(whole.lags?.pairs?.[0]).toBe(1499);
    expect(later.lags?.pairs?.[0]).toBe(799);
    // block 12 of the whole begins at 768, 68 grid points after the half does
    const own = Array.from({ length: 64 }, (_, i) => i + 768);
    const later64 = partOf({ u: long.slice(704), t: at.slice(704) }, { record: { plan: weightedPlan } });
    expectClose(middle(later64, 1), middle(whole, 12), {
      relative: 1e-9,
      because: "a spline forgets by half a point",
    });
    expect(own.length).toBe(64);
  });
  it("begin anew after a gap: nothing is made in between", () => {
    const apart = t.map((time, i) => (i < 100 ? time : time + 0.05));
    const broken = partOf({ u, v, t: apart }, { record: { plan: weightedPlan } });
    // 99 and 200 points, each piece from its first to its last sample
    expect(broken.lags?.pairs?.[0]).toBe(
      Math.floor((t[99] - t[0]) / step + 1e-6) + 1 + Math.floor((t[299] - t[100]) / step + 1e-6) + 1,
    );
    expectClose(total(rowsOf(broken, "weight")), (t[99] - t[0] + t[299] - t[100]) / step, close);
    expectClose(broken.duration, t[99] - t[0] + t[299] - t[100], close);
  });
});

describe("the plan that a record is given", () => {
  const planOf = (column: Float64Array, more: Partial<typeof settings> = {}, t: Float64Array | null = null) =>
    planRecord({ count: column.length, t, columns: [column] }, origin, { ...settings, ...more });
  const correlationOf = (column: Float64Array, lags: number) => {
    const mean = total(column) / column.length;
    return Float64Array.from({ length: lags }, (_, l) => {
      let sum = 0;
      for (let i = l; i < column.length; i++) sum += (column[i] - mean) * (column[i - l] - mean);
      return sum;
    });
  };

  it.each([
    [4000, 12],
    [4000, 40],
    [30_000, 12],
  ])(
    "of %i samples with an integral time of some %i: lags, segments and blocks in powers of two",
    (samples, scale) => {
      const column = exponential(samples, scale, 3).map((value) => value + 6);
      const found = planOf(column, { kinematicViscosity: null });
      const rho = correlationOf(column, 512);
      const { at, area } = zeroCrossing(rho);
      const steps = area / rho[0];
      expectClose(found.integralTime, steps * step, close);
      const wanted = Math.max(256, 2 ** Math.ceil(Math.log2(((at ?? 0) + 2) * 2.5)));
      expect([found.lagLimit, found.lagStride]).toEqual([wanted, 1]);
      const segment = Math.min(
        2 ** Math.ceil(Math.log2(50 * steps)),
        2 ** Math.floor(Math.log2(samples / 4)),
      );
      expect(found.segment).toBe(segment);
      const short = Math.min(segment, Math.max(64, 2 ** Math.ceil(Math.log2(2 * steps))));
      expect(found.bandSegment).toBe(samples >= 200 * segment ? segment : short);
      expect(found.blockSamples).toBe(64 * 2 ** Math.max(0, Math.ceil(Math.log2(samples / 127 / 64))));
      expectClose(found.reference[0], total(column) / samples, close);
      expect([found.slope[0], found.derivativeStep, found.weighted]).toEqual([0, 1, false]);
    },
  );
  it("has the user's segment, to a power of two that the record holds", () => {
    const column = exponential(1000, 5, 3);
    expect([500, 512, 513, 4000].map((segment) => planOf(column, { segment }).segment)).toEqual([
      512, 512, 512, 512,
    ]);
    expect(planOf(column, { segment: 100 }).segment).toBe(128);
  });
  it("has the least-squares slope of a record whose trend is to go, about its middle", () => {
    const column = exponential(400, 5, 3).map((value, i) => value + i / 50);
    const found = planOf(column, { detrend: "linear" });
    let [product, square] = [0, 0];
    column.forEach((value, i) => {
      product += (i - 199.5) * step * value;
      square += ((i - 199.5) * step) ** 2;
    });
    expectClose(found.slope[0], product / square, close);
    expectClose(found.centre, 199.5 * step, close);
    const timed = planOf(
      column,
      { detrend: "linear" },
      column.map((_, i) => 3 + i * step),
    );
    expectClose(timed.slope[0], product / square, { relative: 1e-8, because: "times are differenced" });
    expectClose(timed.centre, 3 + 199.5 * step, close);
    // its correlation is that of what is left
    const left = column.map((value, i) => value - (product / square) * (i - 199.5) * step);
    const { area } = zeroCrossing(correlationOf(left, 200));
    expectClose(found.integralTime, (area / correlationOf(left, 1)[0]) * step, close);
  });
  it("has differences over a base nearest eta: (ν³/epsilon)^(1/4)/(U dt), by u alone", () => {
    const column = smooth(4000, 6).map((value) => 10 + value);
    const at = (viscosity: number) => planOf(column, { kinematicViscosity: viscosity }).derivativeStep;
    // eta goes with the root of the viscosity at a given gradient: twice as far at four times of it
    const bases = [0.0625, 0.25, 1].map(at);
    expect(bases[0]).toBeGreaterThan(2);
    expect(bases[2]).toBeLessThan(32);
    expect(Math.abs(bases[1] - 2 * bases[0])).toBeLessThanOrEqual(1);
    expect(Math.abs(bases[2] - 2 * bases[1])).toBeLessThanOrEqual(1);
    expect(at(1e-5)).toBe(1);
    expect(at(1e9)).toBe(32);
    expect(
      planOf(
        column.map((value) => value - 20),
        { kinematicViscosity: 100 },
      ).derivativeStep,
    ).toBe(1);
  });
});

describe("a record longer than its pilot", () => {
  const read = (signal: Signal, pilot: number, more: Partial<typeof settings> = {}) => {
    const reducer = startRecord(origin, { ...settings, ...more }, { pilot });
    reducer.add(blockOf(signal));
    return reducer.finish();
  };
  const even = exponential(1200, 4, 8).map((value) => 5 + value);

  it("whose beginning stands for the whole is read once", () => {
    expect("part" in read({ u: even }, 900)).toBe(true);
  });
  it("whose integral time is another by more than a quarter is read again, with lags and segments for that", () => {
    const slow = exponential(2400, 24, 9);
    const u2 = Float64Array.of(...exponential(400, 3, 8), ...slow).map((value) => 5 + value);
    const end = read({ u: u2 }, 400);
    if (!("again" in end)) throw new Error("no second reading");
    const first = planRecord({ count: 400, t: null, columns: [u2.slice(0, 400)] }, origin, settings);
    expectClose(end.again.pilotTime, first.integralTime ?? 0, close);
    expect(end.again.last).toBe(true);
    // the lag products of the pilot's lags, about the mean of the whole
    const mean = total(u2) / u2.length;
    const rho = Float64Array.from({ length: first.lagLimit }, (_, l) => {
      let sum = 0;
      for (let i = l; i < u2.length; i++) sum += (u2[i] - mean) * (u2[i - l] - mean);
      return sum;
    });
    const { at, area } = zeroCrossing(rho);
    if (at === null) throw new Error("no crossing");
    const steps = area / rho[0];
    expectClose(end.again.integralTime, steps * step, close);
    expect(end.again.lagLimit).toBe(Math.min(2 ** Math.ceil(Math.log2(8 * steps)), 1024));
    expect(end.again.segment).toBe(Math.min(Math.max(2 ** Math.ceil(Math.log2(50 * steps)), 256), 512));
    const again = startRecord(origin, settings, { plan: end.again });
    again.add(blockOf({ u: u2 }));
    const done = again.finish();
    if (!("part" in done)) throw new Error("a third reading");
    const flag = done.part.flags.find(({ code }) => code === "record-unsteady-scale");
    expectClose(flag?.value, (end.again.integralTime ?? 0) / (first.integralTime ?? 1), close);
  });
  it("whose steps grow unequal past it is read again by splines", () => {
    const t = even.map((_, i) => (i < 1000 || i % 2 === 0 ? i : i + 0.3) * step);
    const end = read({ u: even, t }, 600);
    expect("again" in end && end.again.weighted && end.again.last).toBe(true);
  });
  it("whose trend is another is read again where that moves its ends by a hundredth of u'", () => {
    const bent = even.map((value, i) => value + (i < 600 ? 0 : (i - 600) / 300));
    const end = read({ u: bent }, 600, { detrend: "linear" });
    if (!("again" in end)) throw new Error("no second reading");
    let [product, square] = [0, 0];
    const first = planRecord({ count: 600, t: null, columns: [bent.slice(0, 600)] }, origin, {
      ...settings,
      detrend: "linear",
    });
    bent.forEach((value, i) => {
      product += (i - 599.5) * step * value;
      square += ((i - 599.5) * step) ** 2;
    });
    expectClose(end.again.slope[0], product / square, {
      relative: 0.02,
      because: "from the means of blocks of 64",
    });
    expect(Math.abs(first.slope[0] - end.again.slope[0])).toBeGreaterThan(0.1);
  });
  it("whose time runs back past it is read again with its cuts", () => {
    const order = Array.from({ length: 1300 }, (_, i) => (i < 1000 ? i : i - 100));
    const signal = {
      u: Float64Array.from(order, (i) => even[i]),
      t: Float64Array.from(order, (i) => i * step),
    };
    const end = read(signal, 600);
    if (!("again" in end)) throw new Error("no second reading");
    expect(end.again.cuts).toMatchObject([{ sample: 1000, time: 0.9 }]);
    const again = startRecord(origin, settings, { pilot: 600, plan: end.again });
    again.add(blockOf(signal, 0, 950));
    again.add(blockOf(signal, 950, 1300));
    const done = again.finish();
    if (!("part" in done)) throw new Error("a third reading");
    const clean = read({ u: even, t: even.map((_, i) => i * step) }, 600);
    expect(done.part.blocks).toEqual("part" in clean && clean.part.blocks);
    expect(done.part.flags.find(({ code }) => code === "backward-time")?.text).toContain("100 ");
  });
});

describe("the pilot of a record", () => {
  const clean = smooth(400, 7).map((value) => 4 + value);
  const at = (order: readonly number[]): Signal => ({
    u: Float64Array.from(order, (i) => clean[i]),
    t: Float64Array.from(order, (i) => i * step),
  });
  const run = (from: number, to: number) => Array.from({ length: to - from }, (_, i) => from + i);
  const whole = partOf(at(run(0, 400)));

  it("drops what a restart overtakes, wherever a block ends", () => {
    const order = [...run(0, 200), ...run(150, 300), ...run(280, 400)];
    for (const cuts of [[], [200], [150, 201, 349, 350]]) {
      const found = partOf(at(order), { cuts });
      expect(found.blocks).toEqual(whole.blocks);
      expect(found.lags).toEqual(whole.lags);
      const flag = found.flags.find(({ code }) => code === "backward-time");
      expect(flag?.value).toBe(2);
    }
  });
  it("keeps the newer of two samples under one time", () => {
    const order = [...run(0, 101), 100, ...run(101, 400)];
    const signal = at(order);
    signal.u[100] = 77;
    for (const cuts of [[], [101], [50, 102]]) {
      const found = partOf(signal, { cuts });
      expect(found.blocks).toEqual(whole.blocks);
      expect(found.samples).toBe(400);
    }
  });
  it("leaves the start-up out by time or by count, and says how many samples", () => {
    const late = partOf(at(run(0, 400)), { record: { startup: 0.1 } });
    expect([late.samples, late.start]).toEqual([300, 0.1]);
    const counted = partOf({ u: clean }, { record: { startup: 0.1 }, cuts: [40, 200] });
    expectClose(counted.start, 0.1, close);
    expect(counted.samples).toBe(300);
    expect(counted.flags.find(({ code }) => code === "start-up")?.value).toBe(100);
    expect(rowsOf(counted, "uu")).toEqual(rowsOf(late, "uu"));
  });
  it("grows with the record", () => {
    const long = exponential(20_000, 3, 2);
    const found = partOf({ u: long }, { cuts: [100, 17_000] });
    expect(found.samples).toBe(20_000);
    expectClose(found.plan.reference[0], total(long) / 20_000, close);
  });
  it("refuses blocks that lose a column", () => {
    const reducer = startRecord(origin, settings);
    reducer.add(blockOf({ u: clean, v: clean }));
    expect(() => reducer.add(blockOf({ u: clean }))).toThrow(/same columns/);
  });
});
