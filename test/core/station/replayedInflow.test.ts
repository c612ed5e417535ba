import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { replayPeriod } from "../../../src/core/station/replayPeriod.ts";
import { expectClose } from "../../support/expectClose.ts";
import { exponential, smooth, stationOf } from "./records.ts";

const boxLength = 24_000;
/** A box of turbulence closed on itself: its end runs into its beginning. */
function box(seed: number): Float64Array {
  const long = smooth(boxLength + 2000, seed);
  return long.slice(0, boxLength).map((value, i) => {
    if (i >= 2000) return value;
    const share = (Math.PI * i) / 4000;
    return value * Math.sin(share) + long[boxLength + i] * Math.cos(share);
  });
}

function replayed(one: Float64Array, times: number, noise = 0): Float64Array {
  const random = seededRandom(99);
  const whole = Math.round(one.length * times);
  return Float64Array.from({ length: whole }, (_, i) => {
    const extra = noise > 0 ? noise * random.gaussian() : 0;
    return 10 + one[i % one.length] + extra;
  });
}

const width = (q: Quantity) => {
  if (!isEstimate(q) || q.error === undefined) throw new Error(`no interval: ${JSON.stringify(q)}`);
  return q.error.standard;
};

describe("a box of inflow that is replayed", () => {
  const one = box(5);
  const once = stationOf({ u: replayed(one, 1) });
  const ten = stationOf({ u: replayed(one, 10) });

  it("is found with its period, and counts as one", () => {
    const flag = ten.flags.find(({ code }) => code === "replayed-inflow");
    expectClose(flag?.value, boxLength * 1e-3, { relative: 2e-3, because: "a point of the coarse signal" });
    expectClose(ten.facts.integralTimes, once.facts.integralTimes ?? 0, {
      relative: 0.05,
      because: "the integral time of ten copies is that of one but for its ends",
    });
  });
  it("shows its correlation lost before the period, and whole again at it", () => {
    const revival = ten.curves?.revival;
    if (revival === undefined) throw new Error("no revival");
    const top = revival.rho.indexOf(Math.max(...revival.rho));
    expectClose(revival.lag[top], revival.period, {
      relative: 5e-3,
      because: "a point of the coarse signal",
    });
    expectClose(revival.rho[top], 1, { relative: 0.05, because: "the box comes back without noise" });
    expect(Math.abs(revival.rho[0])).toBeLessThan(0.3);
    expect(once.curves?.revival).toBeUndefined();
  });
  // over many boxes, so that the error of an error is small
  const pairs = Array.from({ length: 10 }, (_, i) => {
    const copy = box(100 + i);
    return [1, 10].map((times) => stationOf({ u: replayed(copy, times) }));
  });
  it.each(["U", "uu", "lambda", "Tu"] as const)(
    "ten times gives the interval of %s of one period",
    (name) => {
      const ratios = pairs.map(([single, many]) => Math.log(width(many[name]) / width(single[name])));
      const mean = ratios.reduce((sum, value) => sum + value, 0) / ratios.length;
      expectClose(Math.exp(mean), 1, {
        relative: 0.2,
        because: "ten pairs, each error known to a fifth on either side",
      });
    },
  );
  it("is found at two and a half periods, and through changes downstream", () => {
    const part = stationOf({ u: replayed(one, 2.5, 0.4) });
    expect(part.flags.map(({ code }) => code)).toContain("replayed-inflow");
  });
  it("is not seen in records that do not repeat", () => {
    for (let seed = 1; seed <= 40; seed++) {
      const x = seed % 2 === 0 ? exponential(6000, 3, seed) : exponential(3000, 3, seed);
      expect(replayPeriod(x)).toBeNull();
    }
  });
  it("is not what a tone is", () => {
    const random = seededRandom(4);
    const tone = Float64Array.from({ length: 20_000 }, (_, i) => Math.sin(i / 9) + 0.3 * random.gaussian());
    expect(replayPeriod(tone)).toBeNull();
  });
  it("of which the blocks hold too much gives no interval, and says why", () => {
    const short = stationOf({ u: replayed(box(8), 40) });
    expect(isEstimate(short.U) && short.U.why_low).toMatch(/too long against one period|integral times long/);
  });
});
