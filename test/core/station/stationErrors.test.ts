import { describe, expect, it } from "vitest";
import { isEstimate } from "../../../src/core/quantity.ts";
import { joinParts } from "../../../src/core/station/joinParts.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { requiredDuration } from "../../../src/core/station/requiredDuration.ts";
import { sampling } from "../../../src/core/station/sampling.ts";
import { joinedError, withError } from "../../../src/core/station/stationErrors.ts";
import { expectClose } from "../../support/expectClose.ts";
import { close, station, u, whole, whyOf } from "./quickStation.ts";
import { partOf, settings } from "./records.ts";

describe("errors put together", () => {
  it("of a product add in the square, with the freedom of Welch and Satterthwaite", () => {
    const a = { standard: 0.3, freedom: 9, scale: "log" as const };
    const b = { standard: 0.4, freedom: 4, scale: "log" as const };
    const both = joinedError(a, b);
    expectClose(both.standard, 0.5, close);
    expectClose(both.freedom, 0.25 ** 2 / (0.09 ** 2 / 9 + 0.16 ** 2 / 4), close);
    expectClose(joinedError(a, { ...b, freedom: null }).freedom, (0.25 ** 2 * 9) / 0.09 ** 2, close);
    expectClose(joinedError({ ...a, freedom: null }, b).freedom, (0.25 ** 2 * 4) / 0.16 ** 2, close);
    expect(joinedError({ ...a, freedom: null }, { ...b, freedom: null }).freedom).toBeNull();
  });
  it("give ends by Student's t, in the logarithm where the value is positive", () => {
    // t(0.975, 9) = 2.262157, t(0.975, ∞) = 1.959964: tables
    const linear = withError(5, { standard: 0.3, freedom: 9, scale: "linear" });
    const log = withError(5, { standard: 0.3, freedom: null, scale: "log" });
    if (!isEstimate(linear) || !isEstimate(log)) throw new Error("missing");
    expectClose(linear.low, 5 - 0.3 * 2.262157, { relative: 1e-6, because: "seven digits of a table" });
    expectClose(linear.high, 5 + 0.3 * 2.262157, { relative: 1e-6, because: "seven digits of a table" });
    expectClose(log.low, 5 * Math.exp(-0.3 * 1.959964), {
      relative: 1e-6,
      because: "seven digits of a table",
    });
    expectClose(log.high, 5 * Math.exp(0.3 * 1.959964), {
      relative: 1e-6,
      because: "seven digits of a table",
    });
  });
  it("of a length by its own law, and of a product with it by both", () => {
    const { T_int, Re_L, facts } = station;
    const standard = Math.sqrt((4 * (facts.tauStar ?? 0)) / 3);
    expectClose(isEstimate(T_int) ? T_int.error?.standard : 0, standard, close);
    const own = isEstimate(Re_L) ? (Re_L.error?.standard ?? 0) : 0;
    expect(own).toBeGreaterThan(standard);
    expectClose(Re_L.value, (Math.sqrt(station.uu.value ?? 0) * (station.L11.value ?? 0)) / 1.5e-5, close);
  });
  it("are none below a hundred integral times, nor of a replayed record with too few groups in a period", () => {
    const record = joinParts([whole], settings);
    const of = (scale: number, repeats = 1) =>
      sampling(
        { ...record, repeats, span: record.span / repeats },
        { routes: {} as never, tauStar: 2 * scale, scale },
      );
    expect(of(0.0301).groups).toBeNull();
    expect(of(0.0299).groups?.count).toBe(10);
    expectClose(of(0.0299).scaleError?.standard, Math.sqrt((8 * 0.0299) / 3), close);
    expect(of(0.0299).integralTimes).toBeCloseTo(3 / 0.0299, 9);
    // 47 blocks: five in each of nine periods, and not in each of ten
    expect(of(0.001, 9).groups?.count).toBe(46);
    expect(of(0.001, 10).why).toMatch(/too long against one period/);
    expect(of(0.01, 9).why).toMatch(/one period of the replayed record is 33 integral times/);
    const unknown = sampling(record, { routes: {} as never, tauStar: null, scale: null });
    expect([unknown.integralTimes, unknown.groups]).toEqual([null, null]);
  });
});

describe("how long to sample", () => {
  it("L11: the law of its error solved for the length", () => {
    const { L11 } = requiredDuration(station, 0.02);
    expectClose(L11.value, 4 * (station.facts.tauStar ?? 0) * (1.959963985 / Math.log(1.02)) ** 2, {
      relative: 1e-8,
      because: "ten digits of the quantile",
    });
  });
  it("no less than a hundred integral times, and nothing where there is nothing to begin from", () => {
    const { Tu, L11 } = requiredDuration(station, 5);
    const least = 100 * (station.T_int.value ?? 0);
    expectClose(Tu.value, least, close);
    expectClose(L11.value, least, close);
    expect(whyOf(requiredDuration(station, 0).Tu)).toMatch(/not above zero/);
    const short = reduceStation([partOf({ u: u.slice(0, 300) })], settings);
    expect(whyOf(requiredDuration(short, 0.1).Tu)).toMatch(/no interval yet/);
  });
});
