import { describe, expect, it } from "vitest";
import { startRecord } from "../../../src/core/station/startRecord.ts";
import type { StationPart } from "../../../src/core/station/stationPart.ts";
import { expectClose } from "../../support/expectClose.ts";
import { about, close, count, plan, rowsOf, step, total, u, v } from "./plannedRecord.ts";
import { blockOf, exponential, origin, partOf, type Signal, settings, smooth } from "./records.ts";

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
