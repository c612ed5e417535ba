import { describe, expect, it } from "vitest";
import type { BodyCurve } from "../../../src/core/decay/bodyCurves.ts";
import { growthCurve } from "../../../src/core/decay/growthCurve.ts";
import { growthExponent } from "../../../src/core/decay/growthExponent.ts";
import { localDecay } from "../../../src/core/decay/localDecay.ts";
import { logPlace, logSeries, sharesVariance } from "../../../src/core/decay/logSeries.ts";
import { targetPlace } from "../../../src/core/decay/targetPlace.ts";
import type { PowerLaw } from "../../../src/core/decayResult.ts";
import { bare, estimate, isEstimate, missing, type Quantity } from "../../../src/core/quantity.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, stationAt } from "../../support/lawStations.ts";

const rounding = { relative: 1e-9, absolute: 1e-12, because: "closed form" };
const z = 1.959963984540054;
const law: PowerLaw = {
  A: 0.1,
  x0: 1,
  n: 1.2,
  length: 1,
  covariance: [0, 0, 0, 0, 0.04, 0, 0, 0, 0],
  quantile: z,
  freedom: null,
  flight: null,
};

describe("ln of a quantity between stations", () => {
  const along = Math.log;
  const series = logSeries(
    [1, 2, 4, 8],
    [known(3, 0.1), known(6, 0.2), known(12, 0.1), known(24, 0.1)],
    along,
  );

  it("lies on the straight line in the coordinate, each station with its share", () => {
    const at = logPlace(series, 2 ** 1.25, along(2 ** 1.25));
    expectClose(at?.logarithm, Math.log(6) + 0.25 * Math.LN2, rounding);
    expect(at?.shares.map((share) => share.at)).toEqual([1, 2]);
    expectClose(at?.shares[0].share, 0.75, rounding);
    expectClose(at?.shares[1].share, 0.25, rounding);
    expectClose(sharesVariance(series, at?.shares ?? []), (0.75 * 0.2) ** 2 + (0.25 * 0.1) ** 2, rounding);
  });
  it("is the station's own at a station, the first and the last included, and nothing beyond them", () => {
    [1, 2, 4, 8].forEach((x) => {
      expectClose(logPlace(series, x, along(x))?.logarithm, Math.log(3 * x), rounding);
    });
    expect(logPlace(series, 0.99, along(0.99))).toBeNull();
    expect(logPlace(series, 8.01, along(8.01))).toBeNull();
  });
  it("adds what two places owe to one station before squaring", () => {
    const shares = [
      { at: 0, share: 0.5 },
      { at: 0, share: -0.5 },
      { at: 1, share: 2 },
    ];
    expectClose(sharesVariance(series, shares), (2 * 0.2) ** 2, rounding);
  });
  it("passes over what is missing, not above zero, or nowhere on the coordinate", () => {
    const values = [known(1, 0.1), missing("none"), bare(-2, ""), bare(0, ""), known(5, 0.1)];
    const gaps = logSeries([0, 1, 2, 3, 4], values, along);
    expect(gaps.x).toEqual([4]);
    expect(gaps.s).toEqual([Math.log(4)]);
    expect(logPlace(gaps, 4, along(4))).toEqual({ logarithm: Math.log(5), shares: [{ at: 0, share: 1 }] });
    expect(logPlace(logSeries([], [], along), 1, 0)).toBeNull();
  });
  it("carries errors where all stations do", () => {
    const lacking = logSeries([1, 2], [known(3, 0.1), bare(2, "none")], along);
    expect(lacking.error).toBeNull();
    expect(sharesVariance(lacking, [{ at: 0, share: 1 }])).toBeNull();
  });
});

describe("the place where the intensity falls to a target", () => {
  const stations = [2, 3, 5, 9].map((x) => stationAt(x, {}));
  /** Tu = 1/x with a relative error. */
  const curve = (error: number | null): BodyCurve => ({
    logarithm: (x) => (x < 2 || x > 9 ? null : -Math.log(x)),
    at: (x) => (error === null ? bare(1 / x, "") : known(1 / x, error)),
    change: () => missing(""),
  });
  const place = (target: number, error: number | null = 0.01) =>
    targetPlace(curve(error), stations, Math.log(target));

  it("is found on the curve itself, between the stations that bracket it", () => {
    expectClose(place(1 / 7.3).value, 7.3, rounding);
    expectClose(place(1 / 2.2).value, 2.2, rounding);
    expectClose(place(1 / 9).value, 9, rounding);
    expectClose(place(1 / 2).value, 2, rounding);
  });
  it("is off by 1.96 errors of ln Tu over the slope of ln Tu between its stations", () => {
    for (const [target, from, to] of [
      [1 / 7.3, 5, 9],
      [1 / 2, 2, 3],
    ]) {
      const found = place(target);
      if (!isEstimate(found)) throw new Error("no place");
      const reach = (z * 0.01 * (to - from)) / Math.log(to / from);
      const close = { relative: 1e-6, because: "closed form; the quantile to nine digits" };
      expectClose((found.high ?? 0) - found.value, reach, close);
      expectClose(found.value - (found.low ?? 0), reach, close);
    }
    expect(place(1 / 7.3, null)).toMatchObject({ low: null, high: null });
  });
  it("takes Student's t where the intensity has degrees of freedom", () => {
    const few: BodyCurve = {
      ...curve(0),
      at: (x) => estimate(1 / x, 0.9 / x, 1.1 / x, { standard: 0.01, freedom: 9, scale: "log" }),
    };
    const found = targetPlace(few, stations, Math.log(1 / 7.3));
    if (!isEstimate(found)) throw new Error("no place");
    // 2.262 at nine degrees of freedom (table; from memory)
    expectClose((found.high ?? 0) - found.value, (2.262 * 0.01 * 4) / Math.log(9 / 5), {
      relative: 3e-4,
      because: "four printed digits",
    });
  });
  it("is missing where the target is passed before the first station or not reached at the last", () => {
    const why = (quantity: Quantity) => (isEstimate(quantity) ? "" : quantity.why);
    expect(why(place(0.75))).toMatch(/^the intensity is 0\.667 times the target at the first station/);
    expect(why(place(1 / 18))).toMatch(/^the intensity is 2\.00 times the target at the last station/);
    const nothing: BodyCurve = { ...curve(null), logarithm: () => null };
    expect(why(targetPlace(nothing, stations, 0))).toMatch(/no station/);
  });
});

describe("a length that grows as a power of the distance", () => {
  const xs = [2, 3, 5, 9, 17];
  const lengths = (error: number) => xs.map((x) => known(0.2 * (x - 1) ** 0.4, error));
  const stations = (error: number) => xs.map((x, i) => stationAt(x, { L11: lengths(error)[i] }));

  it("is a straight line in logarithms between its ends", () => {
    const curve = growthCurve(stations(0.05), law);
    expectClose(curve?.slope, 0.4, rounding);
    expect(curve?.ends).toEqual([2, 17]);
    for (const x of [2, 4.5, 17]) expectClose(curve?.logarithm(x), Math.log(0.2 * (x - 1) ** 0.4), rounding);
  });
  it("is best known in the middle: error²/N, and more beyond by the spread of ln(x - x0)", () => {
    const curve = growthCurve(stations(0.05), law);
    const s = xs.map((x) => Math.log2(x - 1)); // 0 1 2 3 4
    expect(s).toEqual([0, 1, 2, 3, 4]);
    expectClose(curve?.error(5), 0.05 / Math.sqrt(5), rounding);
    expectClose(curve?.error(17), 0.05 * Math.sqrt(1 / 5 + 4 / 10), rounding);
  });
  it("is as uncertain as its scatter, where that exceeds the errors or there are none", () => {
    const bent = xs.map((x, i) =>
      stationAt(x, { L11: known(0.2 * (x - 1) ** 0.4 * Math.exp([0, 0.1, 0, -0.1, 0][i]), 0.01) }),
    );
    const curve = growthCurve(bent, law);
    // line through 0, .1, 0, -.1, 0 at -2 .. 2: slope -0.02, so that 0.02 - 0.0004·10 is left over three degrees
    expectClose(curve?.error(5), Math.sqrt((0.02 - 0.004) / 3 / 5), rounding);
    const unknown = xs.map((x, i) => stationAt(x, { L11: known(bent[i].L11.value ?? 1, 0) }));
    expectClose(growthCurve(unknown, law)?.error(5), Math.sqrt((0.02 - 0.004) / 3 / 5), rounding);
  });
  it("is none with fewer than three stations beyond the origin", () => {
    expect(growthCurve(stations(0.05).slice(0, 2), law)).toBeNull();
    const upstream = [stationAt(0.5, { L11: known(1, 0.1) }), ...stations(0.05).slice(0, 2)];
    expect(growthCurve(upstream, law)).toBeNull();
  });

  const exponent = (values: readonly Quantity[], with_: Partial<PowerLaw> = {}) => {
    const found = growthExponent(xs, values, { ...law, covariance: new Array(9).fill(0), ...with_ });
    if (!isEstimate(found)) throw new Error("no exponent");
    return found;
  };
  it("has an exponent whose error is that of the slope", () => {
    const found = exponent(lengths(0.05));
    expectClose(found.value, 0.4, rounding);
    // steps of ln 2: the spread is 10 (ln 2)²
    expectClose(found.error?.standard, 0.05 / (Math.sqrt(10) * Math.LN2), rounding);
    expect(found.error?.freedom).toBeNull();
    expectClose(found.high, 0.4 + z * (found.error?.standard ?? 0), {
      relative: 1e-8,
      because: "the quantile",
    });
  });
  it("moves with the origin: an uncertain x0 adds (dm/dx0)² of its variance", () => {
    const at = (x0: number) => exponent(lengths(0.05), { x0 }).value;
    const slope = (at(1 + 1e-4) - at(1 - 1e-4)) / 2e-4;
    const found = exponent(lengths(0.05), { covariance: law.covariance });
    const own = 0.05 / (Math.sqrt(10) * Math.LN2);
    expectClose(found.error?.standard, Math.hypot(own, slope * 0.2), {
      relative: 1e-4,
      because: "a one-sided difference over 1e-4 of the first distance",
    });
  });
  it("is told by the scatter where chi-square fails or a length has no error: Student with N - 2", () => {
    const bent = [0, 0.1, 0, -0.1, 0];
    const values = (error: number) => xs.map((x, i) => known((x - 1) ** 0.4 * Math.exp(bent[i]), error));
    const expected = Math.sqrt((0.02 - 0.004) / 3 / 10) / Math.LN2;
    for (const error of [0.01, 0]) {
      const found = exponent(values(error));
      expectClose(found.value, 0.4 - 0.02 / Math.LN2, rounding);
      expectClose(found.error?.standard, expected, rounding);
      expect(found.error?.freedom).toBe(3);
    }
  });
  it("leaves out what is missing or upstream of the origin, and needs three", () => {
    const gappy = [missing("none"), bare(-1, ""), ...lengths(0.05).slice(2)];
    expectClose(exponent(gappy).value, 0.4, rounding);
    const two = growthExponent(
      xs,
      [missing("none"), missing("none"), missing("none"), ...lengths(0.05).slice(3)],
      law,
    );
    expect(two.value).toBeNull();
    expectClose(
      exponent(lengths(0.05), { x0: 2.5 }).value,
      exponent([missing(""), ...lengths(0.05).slice(1)], { x0: 2.5 }).value,
      rounding,
    );
  });
});

describe("a law seen station by station", () => {
  const point = (x: number, q: number, error: number | null) => ({
    x,
    q,
    error,
    smoothedError: error,
    used: true,
  });
  const xs = [2, 3, 5, 9];
  const points = xs.map((x) => point(x, 0.1 * (x - 1) ** -1.2, 0.02));

  it("has its exponent over each station and its neighbours, none at the ends", () => {
    const { exponent, x } = localDecay(points, law);
    expect(x).toEqual(xs);
    expect([exponent[0].value, exponent[3].value]).toEqual([null, null]);
    for (const value of [exponent[1], exponent[2]]) {
      if (!isEstimate(value)) throw new Error("missing");
      expectClose(value.value, 1.2, rounding);
      // three places ln 2 apart: the spread is 2 (ln 2)²
      const standard = 0.02 / (Math.SQRT2 * Math.LN2);
      expectClose(value.error?.standard, standard, rounding);
      expectClose(value.low, 1.2 - z * standard, rounding);
      expectClose(value.high, 1.2 + z * standard, rounding);
    }
  });
  it("has a level compensated energy with each station's own error", () => {
    for (const value of localDecay(points, law).compensated) {
      if (!isEstimate(value)) throw new Error("missing");
      expectClose(value.value, 0.1, rounding);
      expectClose(value.high, 0.1 * Math.exp(z * 0.02), { relative: 1e-8, because: "the quantile" });
    }
    const raw = localDecay([{ ...points[0], smoothedError: null }], law).compensated[0];
    expectClose(isEstimate(raw) ? raw.error?.standard : null, 0.02, rounding);
  });
  it("leaves out stations at and before the origin, and gives no interval without errors", () => {
    expect(localDecay([point(1, 5, 0.1), point(0.5, 5, 0.1), ...points], law).x).toEqual(xs);
    const bareLaw = localDecay(
      points.map(({ x, q }) => point(x, q, null)),
      law,
    );
    expect(bareLaw.exponent[1]).toMatchObject({ low: null, high: null });
    expect(bareLaw.compensated[1]).toMatchObject({ low: null, high: null });
    expectClose(bareLaw.exponent[1].value, 1.2, rounding);
    const together = localDecay([points[0], points[0], points[0]], law);
    expect(together.exponent[1]).toMatchObject({ value: null, why: expect.stringMatching(/same x/) });
  });
});
