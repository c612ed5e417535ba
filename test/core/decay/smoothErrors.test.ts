import { describe, expect, it } from "vitest";
import { settledFrom } from "../../../src/core/decay/settledFrom.ts";
import { smoothErrors } from "../../../src/core/decay/smoothErrors.ts";
import { bare, estimate, missing, type Quantity } from "../../../src/core/quantity.ts";
import { expectClose } from "../../support/expectClose.ts";

const rounding = { relative: 1e-12, because: "closed form" };

function stations(errors: readonly (number | null)[], xs: readonly number[], duration: number | null = 4) {
  return errors.map((error, i) => ({ x: xs[i], error, freedom: null as number | null, duration }));
}

describe("sampling errors along a stream", () => {
  const xs = [1, 2, 4, 8, 16];
  const power = xs.map((x) => 0.02 * x ** 0.4);

  it("on a power law of x stay as they are", () => {
    smoothErrors(stations(power, xs))?.forEach((error, i) => {
      expectClose(error, power[i], rounding);
    });
  });
  it("fall with the root of the time recorded: a record four times as long has half the error", () => {
    const four = stations(power, xs).map((station, i) =>
      i === 2 ? { ...station, error: power[2] / 2, duration: 16 } : station,
    );
    smoothErrors(four)?.forEach((error, i) => {
      expectClose(error, i === 2 ? power[2] / 2 : power[i], rounding);
    });
  });
  it("that scatter are replaced by their line, a missing one by what the line has there", () => {
    const scattered = power.map((error, i) => error * Math.exp(i === 1 ? 0.3 : i === 3 ? -0.3 : 0));
    const smoothed = smoothErrors(stations(scattered, xs)) ?? [];
    // +0.3 and -0.3 at ln x one step below and above the centre: slope -0.06 a step, level unmoved
    smoothed.forEach((error, i) => {
      expectClose(error, power[i] * Math.exp(-0.06 * (i - 2)), rounding);
    });
    const gap = smoothErrors(stations([power[0], power[1], null, power[3], power[4]], xs)) ?? [];
    expectClose(gap[2], power[2], rounding);
  });
  it("run along x itself where a place is not above zero", () => {
    const from = [-1, 0, 1, 2, 3];
    const exponential = from.map((x) => 0.05 * Math.exp(0.2 * x));
    smoothErrors(stations(exponential, from))?.forEach((error, i) => {
      expectClose(error, exponential[i], rounding);
    });
  });
  it("told by few blocks are lifted by what their logarithm lies low, 1/(2(B - 1))", () => {
    const few = stations(power, xs).map((station) => ({ ...station, freedom: 10 }));
    smoothErrors(few)?.forEach((error, i) => {
      expectClose(error, power[i] * Math.exp(1 / 20), rounding);
    });
  });
  it("of a profile are kept as given, or given up where one is lacking", () => {
    const uneven = [0.1, 0.3, 0.05, 0.2, 0.1];
    expect(smoothErrors(stations(uneven, xs, null))).toEqual(uneven);
    expect(smoothErrors(stations([0.1, null, 0.1], [1, 2, 3], null))).toBeNull();
  });
  it("need three stations, or all there are", () => {
    expect(smoothErrors(stations([0.1, 0.1, null, null, null], xs))).toBeNull();
    expect(smoothErrors(stations([0.1, 0.1, 0.1, null, null], xs))).not.toBeNull();
    expect(smoothErrors(stations([0.1, 0.2], [1, 2]))).not.toBeNull();
    expect(smoothErrors(stations([0.1, null], [1, 2]))).toBeNull();
    expect(smoothErrors(stations([null, null], [1, 2]))).toBeNull();
    expect(smoothErrors([])).toBeNull();
  });
  it("at one place are their geometric mean", () => {
    const [one] = smoothErrors(stations([0.1, 0.4], [3, 3])) ?? [];
    expectClose(one, 0.2, rounding);
  });
});

describe("a quantity has settled", () => {
  const exact = (values: readonly number[]): Quantity[] => values.map((value) => bare(value, ""));

  it("after the last station whose value leaves the mean of the last three by more than the tolerance", () => {
    expect(settledFrom(exact([2, 1.3, 1, 1.05, 0.95]), 0.25)).toBe(2);
    expect(settledFrom(exact([2, 1.2, 1, 1.05, 0.95]), 0.25)).toBe(1);
    // below it just as well
    expect(settledFrom(exact([0, 0.7, 1, 1.05, 0.95]), 0.25)).toBe(2);
    // by exactly the tolerance is within
    expect(settledFrom(exact([1.25, 1, 1, 1]), 0.25)).toBe(0);
  });
  it("not yet, where only an earlier station agrees", () => {
    expect(settledFrom(exact([1, 5, 1, 1, 1]), 0.25)).toBe(2);
  });
  it("where no interval contradicts it: ends count, not the value", () => {
    const wide = [estimate(2, 1.2, 2.8), ...exact([1, 1, 1])];
    expect(settledFrom(wide, 0.25)).toBe(0);
    expect(settledFrom([estimate(2, 1.3, 2.8), ...exact([1, 1, 1])], 0.25)).toBe(1);
    expect(settledFrom([estimate(0.5, 0.2, 0.8), ...exact([1, 1, 1])], 0.25)).toBe(0);
    expect(settledFrom([estimate(0.5, 0.2, 0.7), ...exact([1, 1, 1])], 0.25)).toBe(1);
  });
  it("counts stations that lack it, but does not ask them", () => {
    const gap = [bare(2, ""), missing("none"), ...exact([1, 1, 1])];
    expect(settledFrom(gap, 0.25)).toBe(1);
    expect(settledFrom([missing("none"), ...exact([2, 1, 1, 1])], 0.25)).toBe(2);
  });
  it("cannot be told of three stations", () => {
    expect(settledFrom(exact([1, 1, 1]), 0.25)).toBeNull();
    expect(settledFrom([...exact([1, 1, 1]), missing("none")], 0.25)).toBeNull();
  });
});
