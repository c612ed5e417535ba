import { describe, expect, it } from "vitest";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { fitWindow, windowQuantity } from "../../../src/core/decay/fitWindow.ts";
import { flightCourse, placeAlong } from "../../../src/core/decay/flightCourse.ts";
import { flightFit } from "../../../src/core/decay/flightFit.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate, missing, type Quantity } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const law = { A: 0.06, x0: 1, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.1, m: 0.375 };
const xs = spacedFrom(law.x0, 4, 40, 9);
const alongX: DecaySettings = { ...plainSettings, window: [xs[1], xs[7]], coordinate: "x" };
const moving = (share: number) =>
  lawStations(law, xs, 0.01).map((one, i) => ({ ...one, U: known(6 * (1 + (share * i) / 8), 1e-5) }));
const fitOf = (stations: StationResult[], choice: Partial<DecaySettings> = {}) => {
  const all = { ...alongX, ...choice };
  return flightFit(stations, fitDecay(stations, all), all);
};

function expectSame(found: Quantity | undefined, expected: Quantity): void {
  const numbers = (of: Quantity | undefined) =>
    of && isEstimate(of) ? [of.value, of.low ?? 0, of.high ?? 0] : [];
  const wanted = numbers(expected);
  expect(numbers(found)).toHaveLength(3);
  numbers(found).forEach((value, i) => {
    expectClose(value, wanted[i], {
      relative: 1e-6,
      because: "the same fit, its speed summed in another order",
    });
  });
}

describe("the law along the time of flight beside that along x", () => {
  const stations = moving(0.4);
  const found = fitOf(stations);
  // seven stations of the window, whose U is 6 (1 + 0.05 i)
  const speed = 6 * (1 + 0.05 * 4);
  const course = flightCourse(stations, speed);

  it("is fitted to the stations of the window at their places along the course, Us their mean U", () => {
    expectClose(found?.speed, speed, { relative: 1e-9, because: "the mean of stations 1 to 7" });
    expectClose(found?.variation, (0.05 * 6) / 1.2, { relative: 1e-9, because: "range over mean" });
    expect(found?.x).toEqual(xs.slice(1, 8));
    found?.distance.forEach((s, i) => {
      expectClose(s, placeAlong(course, xs[i + 1]), {
        relative: 1e-12,
        because: "the course of all stations",
      });
    });
    const decay = fitDecay(stations, alongX);
    const direct = fitWindow(
      decay.points.filter(({ used }) => used),
      alongX,
      course,
    );
    if ("refused" in direct) throw new Error(direct.refused);
    expectSame(found?.n, windowQuantity(direct, "n"));
    expectSame(found?.x0, windowQuantity(direct, "x0"));
  });
  it("is the adopted one where the law runs along it already", () => {
    const all = { ...alongX, coordinate: "auto" as const };
    const decay = fitDecay(stations, all);
    const own = flightFit(stations, decay, all);
    expectSame(own?.n, decay.given_window.n);
    expectSame(own?.x0, decay.given_window.x0);
    expect(own?.speed).toBe(decay.flight?.speed);
    // asked for in a steady stream it is still the law
    expect(fitOf(moving(0.001), { coordinate: "flight" })?.n.value).not.toBeNull();
  });
  it("is not asked for where U varies by 1 % or less, along time, or where a station of the window has no U", () => {
    expect(fitOf(moving(0.01))).toBeNull();
    expect(fitOf(moving(0.015))).not.toBeNull();
    expect(fitOf(stations, { along: "t" })).toBeNull();
    const gap = (at: number) => stations.map((one, i) => (i === at ? { ...one, U: missing("none") } : one));
    expect(fitOf(gap(3))).toBeNull();
    expect(fitOf(gap(0))).not.toBeNull();
  });
  it("passes over stations that carry no energy: they are not of the decay", () => {
    const [first, ...rest] = stations;
    const between = stationAt((xs[0] + xs[1]) / 2, { U: known(60, 1e-5) });
    const with_ = fitOf([first, between, ...rest]);
    expectClose(with_?.n.value, found?.n.value ?? 0, { relative: 1e-9, because: "the same stations" });
  });
  it("says why there is none", () => {
    const few = fitOf(stations, { window: [xs[1], xs[3]] });
    expect(few?.n).toMatchObject({ value: null, why: expect.stringMatching(/three stations/) });
    expect(few?.x).toHaveLength(3);
  });
});
