import { describe, expect, it } from "vitest";
import { planRecord } from "../../../src/core/station/planRecord.ts";
import { startRecord } from "../../../src/core/station/startRecord.ts";
import { zeroCrossing } from "../../../src/core/station/zeroCrossing.ts";
import { expectClose } from "../../support/expectClose.ts";
import { close, step, total } from "./plannedRecord.ts";
import { blockOf, exponential, origin, type Signal, settings, smooth } from "./records.ts";

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
