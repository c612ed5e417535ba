import { isDeepStrictEqual } from "node:util";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { ReductionFailure } from "../../../src/core/failure.ts";
import { recordCorrelation, wholeMoments } from "../../../src/core/station/recordCorrelation.ts";
import { startRecord } from "../../../src/core/station/startRecord.ts";
import { transferables } from "../../../src/core/station/stationPart.ts";
import { expectClose } from "../../support/expectClose.ts";
import {
  blockOf,
  exponential,
  origin,
  partOf,
  type Signal,
  settings,
  smoothRecord,
  whiteNoise,
} from "./records.ts";

const seed = 20261201;
/** A pilot of some thousand samples, so that records outgrow it quickly. */
const pilot = 1 << 14;

function failureOf(signal: Signal, step: number | null = 1e-3): ReductionFailure {
  try {
    partOf(signal, { origin: { step } });
  } catch (error) {
    if (error instanceof ReductionFailure) return error;
    throw error;
  }
  throw new Error("nothing failed");
}

describe("a record handed over in pieces", () => {
  const signal = smoothRecord(9000, 3);
  const whole = partOf(signal);
  it("gives the same bits however it is cut", () => {
    fc.assert(
      fc.property(fc.uniqueArray(fc.integer({ min: 1, max: 8999 }), { maxLength: 12 }), (cuts) => {
        const cut = partOf(signal, { cuts: cuts.sort((a, b) => a - b) });
        expect(isDeepStrictEqual(cut, whole)).toBe(true);
      }),
      { seed, numRuns: 15 },
    );
  });
  it("past its pilot too, where blocks are paired and samples no longer held", () => {
    const long = { u: exponential(pilot + 11_000, 20, 1).map((value) => 5 + value) };
    const cuts = [1, pilot - 1, pilot + 1, pilot + 3333];
    const part = partOf(long, { cuts, record: { pilot } });
    expect(isDeepStrictEqual(partOf(long, { record: { pilot } }), part)).toBe(true);
    expect(part.samples).toBe(pilot + 11_000);
    expect(part.blocks.blockSamples).toBe(256);
    expect(part.blocks.rows).toBe(Math.ceil(part.samples / 256));
  });
  it("keeps no reference to the arrays it was given", () => {
    const reducer = startRecord(origin, settings);
    const block = blockOf(signal);
    reducer.add(block);
    for (const column of [block.u, block.v, block.w]) column?.fill(Number.NaN);
    const end = reducer.finish();
    expect(isDeepStrictEqual(end, { part: whole })).toBe(true);
  });
  it("crosses to another thread without a copy, every buffer once", () => {
    const buffers = transferables(whole);
    expect(new Set(buffers).size).toBe(buffers.length);
    expect(buffers).toContain(whole.blocks.data.buffer);
    expect(buffers).toContain(whole.lags?.products[0].buffer);
  });
});

describe("sums of a record", () => {
  const x = exponential(5000, 15, 8).map((value) => 3 + value);
  const part = partOf({ u: x });
  const mean = x.reduce((sum, value) => sum + value, 0) / x.length;
  it("hold its moments", () => {
    const whole = wholeMoments(part);
    expectClose(part.plan.reference[0] + whole[1], mean, { relative: 1e-13, because: "rounding" });
    const variance = x.reduce((sum, value) => sum + (value - mean) ** 2, 0);
    expectClose(whole[2], variance, { relative: 1e-12, because: "rounding" });
  });
  it("hold its correlation about its own mean, though they were formed about another", () => {
    const offset = partOf(
      { u: x },
      { record: { plan: { ...part.plan, reference: [part.plan.reference[0] + 0.7] } } },
    );
    const found = recordCorrelation(offset, 0);
    for (const lag of [0, 1, 10, 100, 255]) {
      let direct = 0;
      for (let i = lag; i < x.length; i++) direct += (x[i] - mean) * (x[i - lag] - mean);
      expectClose(found?.[lag], direct, { absolute: 1e-9, because: "rounding of sums of some thousand" });
    }
  });
  it("hold its derivative's moments at the pilot's step", () => {
    const at = (name: string) => {
      let sum = 0;
      const width = part.blocks.fields.length;
      for (let row = 0; row < part.blocks.rows; row++) {
        sum += part.blocks.data[row * width + part.blocks.fields.indexOf(name)];
      }
      return sum;
    };
    const m = part.plan.derivativeStep;
    let [square, cube, second] = [0, 0, 0];
    for (let i = 2 * m; i < x.length; i++) {
      const d = (x[i] - x[i - 2 * m]) / (2 * m * part.step);
      square += d ** 2;
      cube += d ** 3;
    }
    for (let i = 4; i < x.length; i++) second += ((x[i - 1] - x[i - 3]) / 2) ** 2;
    expect(at("derivatives")).toBe(x.length - 2 * m);
    expectClose(at("derivative_squared"), square, { relative: 1e-11, because: "rounding" });
    expectClose(at("derivative_cubed"), cube, {
      absolute: 1e-8 * square ** 1.5,
      because: "the cubes cancel",
    });
    expectClose(at("difference2"), second, { relative: 1e-11, because: "rounding" });
  });
});

describe("time stamps", () => {
  const u = exponential(2000, 10, 4).map((value) => 2 + value);
  const stamps = (step: number, digits?: number) =>
    Float64Array.from(u, (_, i) => (digits === undefined ? i * step : Number((i * step).toFixed(digits))));

  it("rounded to few digits still give the step to all of them", () => {
    const part = partOf({ u, t: stamps(1 / 3000, 5) });
    expect(part.plan.weighted).toBe(false);
    expect(part.flags.map(({ code }) => code)).toEqual(["rounded-times"]);
    expectClose(part.step, 1 / 3000, { relative: 1e-5, because: "half a digit over two thousand steps" });
  });
  it("that run backward over all of the record are refused, and the first is named", () => {
    const failure = failureOf({ u, t: stamps(-1e-3) });
    expect(failure.code).toBe("backward-time");
    expect(failure.message).toContain("first at sample 2");
  });
  it("that are absent need a step", () => {
    expect(failureOf({ u }, null).code).toBe("no-time");
  });
  it("of the start-up are left out", () => {
    const part = partOf({ u, t: stamps(1e-3) }, { record: { startup: 0.5 } });
    expect(part.samples).toBe(1500);
    expectClose(part.start, 0.5, { relative: 1e-12, because: "rounding of the stamps" });
    expect(part.flags.map(({ code }) => code)).toEqual(["start-up"]);
    const alone = partOf({ u: u.slice(500), t: stamps(1e-3).slice(500) });
    expect(isDeepStrictEqual(part.blocks, alone.blocks)).toBe(true);
  });
  it("weight moments by the trapezoid rule: a ramp sampled unevenly has the mean of its ends", () => {
    const t = Float64Array.from({ length: 300 }, (_, i) => (i / 299) ** 2);
    const part = partOf({ u: t.map((time) => 4 + 6 * time), t });
    expectClose(part.plan.reference[0] + wholeMoments(part)[1], 7, {
      relative: 1e-12,
      because: "the trapezoid rule is exact for a straight line",
    });
  });
});

describe("what is no record", () => {
  it.each([0, 1, 2, 63])("%i samples are too few", (count) => {
    expect(failureOf({ u: whiteNoise(count, 1) }).code).toBe("too-few-samples");
  });
  it("a constant has nothing to reduce", () => {
    expect(failureOf({ u: new Float64Array(500).fill(6.1) }).code).toBe("constant-signal");
  });
  it("a value that is no number is refused, in the pilot and past it", () => {
    const u = whiteNoise(500, 1);
    u[300] = Number.NaN;
    expect(failureOf({ u }).code).toBe("not-a-number");
    const long = exponential(pilot + 5000, 10, 2);
    long[pilot + 2000] = Number.POSITIVE_INFINITY;
    expect(() => partOf({ u: long }, { record: { pilot } })).toThrow("not a finite number");
  });
});

describe("a linear trend of a record longer than its pilot", () => {
  it("is found in the whole of it, by a second reading", () => {
    const u = exponential(5 * pilot, 10, 21).map((value, i) => 8 + value + (i / pilot) ** 2 / 5);
    const linear = { ...settings, detrend: "linear" } as const;
    const first = startRecord(origin, linear, { pilot });
    first.add(blockOf({ u }));
    const end = first.finish();
    if (!("again" in end)) throw new Error("no second reading was asked for");
    // least squares of s²/5 over 0 … 5 has slope 1 a pilot
    expectClose(end.again.slope[0], 1 / (pilot * 1e-3), {
      relative: 0.03,
      because: "the noise has a slope too",
    });
  });
});

describe("a record whose beginning does not stand for the whole", () => {
  const quick = exponential(pilot, 10, 5);
  const slow = exponential(3 * pilot, 60, 6);
  const signal = { u: new Float64Array(4 * pilot) };
  signal.u.set(quick.map((value) => 8 + value));
  signal.u.set(
    slow.map((value) => 8 + value),
    pilot,
  );

  it("is read once more with the plan it asks for, and says so", () => {
    const first = startRecord(origin, settings, { pilot });
    first.add(blockOf(signal));
    const end = first.finish();
    if (!("again" in end)) throw new Error("no second reading was asked for");
    const part = partOf(signal, { record: { plan: end.again } });
    expect(part.flags.map(({ code }) => code)).toContain("record-unsteady-scale");
    expect(part.samples).toBe(4 * pilot);
    expectClose(part.plan.integralTime, 0.0475, {
      relative: 0.25,
      because: "a quarter of it 10 samples, the rest 60; a thousand integral times",
    });
  });
});
