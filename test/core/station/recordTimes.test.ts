import { isDeepStrictEqual } from "node:util";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { isotropicRecord } from "../../../sample-data/maker/synthesise.mjs";
import type { Flag } from "../../../src/core/flag.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { startRecord } from "../../../src/core/station/startRecord.ts";
import type { StationPart } from "../../../src/core/station/stationPart.ts";
import { expectClose } from "../../support/expectClose.ts";
import { blockOf, exponential, origin, partOf, type Signal, settings, smooth } from "./records.ts";

const seed = 20261201;
const step = 1e-3;
type Timed = Signal & { readonly t: Float64Array };

function timed(u: Float64Array, of = (i: number) => i * step): Timed {
  return { u, t: u.map((_, i) => of(i)) };
}

/** The samples of the given indices, in their order. */
function picked(signal: Timed, indices: readonly number[]): Timed {
  return {
    t: Float64Array.from(indices, (i) => signal.t[i]),
    u: Float64Array.from(indices, (i) => signal.u[i]),
  };
}

const range = (from: number, to: number) => Array.from({ length: to - from }, (_, i) => from + i);
const flagOf = (part: StationPart, code: Flag["code"]) => part.flags.find((flag) => flag.code === code);
/** All that a part is made of but its plan, its flags and where it was cut. */
const numbersOf = ({ plan: _plan, flags: _flags, cuts: _cuts, ...numbers }: StationPart) => numbers;

/** A record read as a file would be: once more with a new plan where that is asked for. */
function readAll(signal: Signal, pilot: number, cuts: readonly number[] = []): StationPart {
  const hand = (reducer: ReturnType<typeof startRecord>) => {
    const borders = [0, ...cuts, signal.u.length];
    for (let i = 0; i + 1 < borders.length; i++) reducer.add(blockOf(signal, borders[i], borders[i + 1]));
    return reducer.finish();
  };
  let end = hand(startRecord(origin, settings, { pilot }));
  for (let reading = 2; "again" in end && reading <= 3; reading++) {
    end = hand(startRecord(origin, settings, { pilot, plan: end.again }));
  }
  if ("again" in end) throw new Error("a fourth reading was asked for");
  return end.part;
}

describe("a record whose restarts wrote some of it twice", () => {
  const clean = timed(smooth(3000, 5).map((u) => 4 + u));
  const whole = numbersOf(partOf(clean));
  /** Runs that each go on from anywhere in what is there: what is kept at last is the clean record. */
  const restarts = fc.array(fc.tuple(fc.integer({ min: 80, max: 2999 }), fc.integer({ min: 1, max: 79 })), {
    minLength: 1,
    maxLength: 4,
  });

  it("is the clean record, bit for bit, whichever stretches were sent again", () => {
    fc.assert(
      fc.property(restarts, fc.array(fc.integer({ min: 1, max: 2999 }), { maxLength: 3 }), (runs, cuts) => {
        const order: number[] = [];
        let next = 0;
        for (const [end, back] of [...runs].sort((a, b) => a[0] - b[0])) {
          order.push(...range(next, end));
          next = Math.max(0, end - back);
        }
        order.push(...range(next, 3000));
        const part = partOf(picked(clean, order), { cuts: cuts.sort((a, b) => a - b) });
        expect(isDeepStrictEqual(numbersOf(part), whole)).toBe(true);
        expect(part.flags.map(({ code }) => code)).toEqual(["backward-time"]);
      }),
      { seed, numRuns: 40 },
    );
  });
  it("is the clean record too where it goes back past the pilot, by a second reading, however it is cut", () => {
    const pilot = 1 << 12;
    const long = timed(exponential(20_000, 20, 3).map((u) => 5 + u));
    const plain = numbersOf(readAll(long, pilot));
    fc.assert(
      fc.property(
        fc.integer({ min: 4200, max: 19_000 }),
        fc.integer({ min: 1, max: 4000 }),
        fc.array(fc.integer({ min: 1, max: 19_999 }), { maxLength: 3 }),
        (end, back, cuts) => {
          const order = [...range(0, end), ...range(end - back, 20_000)];
          const part = readAll(
            picked(long, order),
            pilot,
            cuts.sort((a, b) => a - b),
          );
          expect(isDeepStrictEqual(numbersOf(part), plain)).toBe(true);
          expect(part.flags.find(({ code }) => code === "backward-time")).toBeDefined();
        },
      ),
      { seed, numRuns: 10 },
    );
  });
  it("keeps the newer branch where the two differ, and lists each cut", () => {
    const older = { ...clean, u: clean.u.map((u, i) => (i >= 900 ? 99 : u)) };
    const signal = {
      t: Float64Array.of(...clean.t.slice(0, 1000), ...clean.t.slice(900)),
      u: Float64Array.of(...older.u.slice(0, 1000), ...clean.u.slice(900)),
    };
    const part = partOf(signal);
    expect(isDeepStrictEqual(numbersOf(part), whole)).toBe(true);
    const flag = flagOf(part, "backward-time");
    expect(flag?.value).toBe(1);
    expect(flag?.text).toContain("at sample 1001 back to 0.9 (100 older samples left out)");
  });
  it("cuts an older sample that lies within half a step of the restart", () => {
    // the new run begins 0.4 of a step late: the older sample there goes, the one before stays
    const t = Float64Array.of(
      ...clean.t.slice(0, 500),
      ...clean.t.slice(400, 2900).map((x) => x + 0.4 * step),
    );
    const u = Float64Array.of(...clean.u.slice(0, 500), ...clean.u.slice(400, 2900));
    expect(flagOf(partOf({ t, u }), "backward-time")?.text).toContain("(100 older");
  });
  it("takes a stamp that comes twice for one sample, the newer one", () => {
    const order = [...range(0, 700), 699, ...range(700, 2500), 2499, ...range(2500, 3000)];
    const part = partOf(picked(clean, order));
    expect(isDeepStrictEqual(numbersOf(part), whole)).toBe(true);
    expect(flagOf(part, "backward-time")?.text).toContain("2 samples were sent once more");
  });
});

describe("gaps", () => {
  const u = exponential(6000, 10, 9).map((value) => 3 + value);
  const broken = timed(u, (i) => (i < 2500 ? i : i + 400) * step);

  it("cut a record: steps and moments are those of the pieces, and nothing is put in between", () => {
    const part = partOf(broken);
    const unbroken = partOf(timed(u));
    expect(part.flags.map(({ code }) => code)).toEqual(["gap"]);
    expect(flagOf(part, "gap")?.value).toBe(1);
    expectClose(part.step, step, { relative: 1e-12, because: "rounding" });
    expectClose(part.duration, 6, { relative: 1e-9, because: "six thousand steps were recorded" });
    const width = part.blocks.fields.length;
    for (let row = 0; row < part.blocks.rows; row++) {
      expectClose(part.blocks.data[row * width + 2], unbroken.blocks.data[row * width + 2], {
        relative: 1e-9,
        because: "variances of the same samples",
      });
    }
  });
  it("let no lag product, no segment and no difference reach across", () => {
    const part = partOf(broken);
    const mean = part.plan.reference[0];
    const at = (name: string) => part.blocks.fields.indexOf(name);
    const sum = (data: Float64Array, width: number, column: number) => {
      let total = 0;
      for (let row = 0; row < part.blocks.rows; row++) total += data[row * width + column];
      return total;
    };
    const { lags, spectrum } = part;
    if (lags === null || spectrum === null) throw new Error("no lag products");
    for (const lag of [0, 1, 7, 63, 200]) {
      let direct = 0;
      for (let i = lag; i < 6000; i++) {
        if (i >= 2500 && i - lag < 2500) continue;
        direct += (u[i] - mean) * (u[i - lag] - mean);
      }
      expectClose(sum(lags.products[0], lags.count, lag), direct, {
        absolute: 1e-8,
        because: "rounding of sums of some thousand",
      });
      expect(lags.pairs?.[lag]).toBe(6000 - 2 * lag);
    }
    const halves = [2500, 3500].map((count) => Math.floor((2 * count) / spectrum.size) - 1);
    expect(spectrum.segments).toBe(halves[0] + halves[1]);
    expect(sum(part.blocks.data, part.blocks.fields.length, at("differences"))).toBe(6000 - 8);
  });
  it("leave the integral time as it is: a record in twenty pieces has that of the whole", () => {
    const pieces = timed(exponential(40_000, 10, 4), (i) => (i + 50 * Math.floor(i / 2000)) * step);
    const times = [pieces, timed(pieces.u)].map((signal) => {
      const { T_int } = reduceStation([partOf(signal)], settings);
      return T_int.value;
    });
    expect(flagOf(partOf(pieces), "gap")?.value).toBe(19);
    expectClose(times[0], times[1] ?? 0, {
      relative: 0.03,
      because: "one pair in forty is lost at the seams",
    });
  });
  it("limit segments to the pieces, also in the plan of another reading", () => {
    const quick = exponential(8192, 6, 5);
    const slow = exponential(40_000, 60, 6);
    const both = Float64Array.of(...quick, ...slow).map((value) => 8 + value);
    const part = readAll(
      timed(both, (i) => (i + 100 * Math.floor(i / 3000)) * step),
      8192,
    );
    expect(flagOf(part, "record-unsteady-scale")).toBeDefined();
    expect(flagOf(part, "gap")?.value).toBe(16);
    expect(part.spectrum?.segments).toBeGreaterThan(100);
  });
  it("give the same bits however the record is handed over", () => {
    const whole = partOf(broken);
    for (const cuts of [[2500], [2499, 2501], [1, 2000, 4000]]) {
      expect(isDeepStrictEqual(partOf(broken, { cuts }), whole)).toBe(true);
    }
  });
});

describe("time stamps with too few digits", () => {
  const u = exponential(4000, 12, 2).map((value) => 2 + value);
  const plain = partOf({ u }, { origin: { step: 1 / 300 } });
  const printed = (digits: number, of = 1 / 300) => timed(u, (i) => Number((i * of).toFixed(digits)));

  it.each([
    [3, "0.003, 0.007, 0.010"],
    [2, "0.00, 0.00, 0.01, 0.01"],
  ])("%i digits (%s) are rebuilt", (digits) => {
    const part = partOf(printed(digits));
    expect(part.flags.map(({ code }) => code)).toEqual(["rounded-times"]);
    expectClose(part.step, 1 / 300, {
      relative: 1e-5,
      because: "a digit over four thousand to the power 3/2",
    });
    expect(part.samples).toBe(4000);
    expect(isDeepStrictEqual(part.lags?.products, plain.lags?.products)).toBe(true);
  });
  it("are not taken for rounded where a sample is missing", () => {
    const missing = timed(u, (i) => Number(((i < 900 ? i : i + 1) * step).toFixed(3)));
    expect(flagOf(partOf(missing), "rounded-times")).toBeUndefined();
    expect(flagOf(partOf(missing), "unequal-steps")).toBeDefined();
  });
  it("are not taken for rounded where every third sample, at random, is missing", () => {
    const random = seededRandom(3);
    let index = 0;
    const holes = timed(u, () => {
      index += random.uniform() < 1 / 3 ? 2 : 1;
      return Number((index * step).toFixed(3));
    });
    expect(flagOf(partOf(holes), "rounded-times")).toBeUndefined();
  });
});

// Pope (2000) eqs. (6.246)-(6.248), sampled sixteen times finer than the record is, so that a sample can be had
// at any sixteenth of a step
const flow = { k: 0.24, epsilon: 10, viscosity: 1.5e-5, U: 10 };
const eta = (flow.viscosity ** 3 / flow.epsilon) ** 0.25;
const fine = (eta * 2) / flow.U / 16;
const made = isotropicRecord({ ...flow, step: fine, samples: 1 << 18, seed: 7 });
const count = 1 << 14;

function sampledAt(sixteenths: (i: number) => number | null): Timed {
  const kept = range(0, count - 1)
    .map(sixteenths)
    .filter((at): at is number => at !== null && at < made.u.length);
  return { t: Float64Array.from(kept, (at) => at * fine), u: Float64Array.from(kept, (at) => made.u[at]) };
}

describe("unequal steps of a record of Pope's model spectrum, every 2 eta", () => {
  const even = reduceStation([partOf(sampledAt((i) => 16 * i))], settings);
  const random = seededRandom(11);
  const ways: [string, (i: number) => number | null][] = [
    ["samples dropped, one in fifty", (i) => (random.uniform() < 0.02 ? null : 16 * i)],
    ["samples dropped, one in five", (i) => (random.uniform() < 0.2 ? null : 16 * i)],
    ["a clock that jitters by a tenth of a step", (i) => 16 * i + Math.round(3.2 * random.uniform())],
    ["a clock that jitters by a quarter of a step", (i) => 16 * i + Math.round(8 * random.uniform())],
    ["steps that swell and shrink by a third", (i) => 16 * i + Math.round(300 * Math.sin(i / 60) ** 2)],
  ];

  it.each(ways)("%s: lambda is that of the even record within the loss it tells", (_, way) => {
    const part = partOf(sampledAt(way));
    const station = reduceStation([part], settings);
    const loss = flagOf(part, "unequal-steps")?.value ?? Number.NaN;
    const ratio = (station.gradient.value ?? 0) / (even.gradient.value ?? 1);
    // the time stamps decide which of the turbulence is seen: a third of a per cent to either side
    expect(1 - ratio).toBeLessThan(loss + 0.003);
    expect(1 - ratio).toBeGreaterThan(0.3 * loss - 0.003);
    expect(loss).toBeLessThan(0.03);
    expectClose(station.uu.value, even.uu.value ?? 0, { relative: 0.01, because: "the same flow" });
    expectClose(station.T_int.value, even.T_int.value ?? 0, { relative: 0.03, because: "the same flow" });
  });
  it("give the same bits however the record is handed over", () => {
    const jittered = sampledAt((i) => (i % 7 === 3 ? null : 16 * i + (i % 3)));
    const whole = partOf(jittered);
    for (const cuts of [
      [1, 700],
      [5000, 5001, 9000],
    ]) {
      expect(isDeepStrictEqual(partOf(jittered, { cuts }), whole)).toBe(true);
    }
  });
  it("that begin past the pilot are found and the record is read once more", () => {
    const late = sampledAt((i) => (i > 9000 && i % 11 === 0 ? null : 16 * i));
    const part = readAll(late, 1 << 12);
    expect(part.plan.weighted).toBe(true);
    expectClose(flagOf(part, "unequal-steps")?.value, 0, {
      absolute: 0.02,
      because: "one interval in twenty",
    });
  });
  it("make no value where nothing was measured: lag products count the pairs there are", () => {
    const part = partOf(sampledAt((i) => (i % 50 === 7 ? null : 16 * i)));
    expect(part.lags?.pairs?.[0]).toBe(count - 1);
  });
});

describe("a record in pieces that are all too short for a segment", () => {
  it("has moments, and says what a spectrum would have needed", () => {
    const u = exponential(3000, 10, 6).map((value) => 4 + value);
    const shreds = timed(u, (i) => (i + 40 * Math.floor(i / 30)) * step);
    const part = partOf(shreds);
    const station = reduceStation(
      [{ ...part, spectrum: part.spectrum && { ...part.spectrum, segments: 0 } }],
      settings,
    );
    expectClose(station.uu.value, 1, { relative: 0.3, because: "150 integral times" });
    expect(station.lambda.value).toBeNull();
    expect("why" in station.lambda && station.lambda.why).toContain("whole segment");
  });
});
