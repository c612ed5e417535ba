import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { requiredDuration } from "../../../src/core/station/requiredDuration.ts";
import { expectClose } from "../../support/expectClose.ts";
import { exponential, smooth, smoothRecord, stationOf } from "./records.ts";

function halfWidth(q: Quantity): number {
  if (!isEstimate(q) || q.low === null || q.high === null) throw new Error("no interval");
  return Math.sqrt(q.high / q.low) - 1;
}

describe("the record length that a wanted interval needs", () => {
  const station = stationOf(smoothRecord(60_000, 21));
  const now = (station.facts.integralTimes ?? 0) * (station.T_int.value ?? 0);

  it("is the present one where the interval is as wide as wanted", () => {
    for (const name of ["Tu", "L11", "lambda"] as const) {
      const needed = requiredDuration(station, halfWidth(station[name]))[name];
      expectClose(needed.value, now, { relative: 0.02, because: "quantiles at 40 to 50 groups" });
    }
  });
  it("is four times as long for half the width", () => {
    const [wide, narrow] = [0.02, 0.01].map((width) => requiredDuration(station, width));
    for (const name of ["Tu", "L11", "lambda"] as const) {
      const ratio = (narrow[name].value ?? 0) / (wide[name].value ?? 1);
      expectClose(ratio, (Math.log(1.02) / Math.log(1.01)) ** 2, {
        relative: 0.06,
        because: "Student's t at the groups of either length",
      });
    }
  });
  it("gives that interval, when so much is recorded", () => {
    const needed = requiredDuration(station, 0.01).Tu.value ?? 0;
    const count = Math.round(needed / 1e-3);
    const u = smooth(count, 77).map((value) => 10 + value);
    const long = stationOf({ u, v: smooth(count, 78), w: smooth(count, 79) });
    expectClose(halfWidth(long.Tu), 0.01, {
      relative: 0.35,
      because: "either error is known to a seventh, by 50 groups, and with it the square root of the length",
    });
  });
  it("is no shorter than what is given an interval at all", () => {
    expectClose(requiredDuration(station, 5).lambda.value, 100 * (station.T_int.value ?? 0), {
      relative: 1e-12,
      because: "a hundred integral times",
    });
  });
  it("is not told where there is no interval to begin from, and why", () => {
    const short = stationOf({ u: exponential(2000, 40, 2).map((u) => u + 10) });
    const needed = requiredDuration(short, 0.05);
    expect(isEstimate(needed.Tu)).toBe(false);
    expect(!isEstimate(needed.Tu) && needed.Tu.why).toMatch(/no interval yet/);
    // the integral length has an error by its own law
    expect(isEstimate(needed.L11)).toBe(true);
    expect(isEstimate(requiredDuration(station, 0).Tu)).toBe(false);
  });
});
