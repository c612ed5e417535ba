import { describe, expect, it } from "vitest";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { missing } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom } from "../../support/lawStations.ts";

const law = { A: 0.06, x0: 1, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.1, m: 0.375 };
const xs = spacedFrom(law.x0, 4, 40, 9);
const given: DecaySettings = { ...plainSettings, window: [0, 99] };
const exact = lawStations(law, xs, 0.01);

const flagsOf = (stations: StationResult[], choice: Partial<DecaySettings> = {}) =>
  fitDecay(stations, { ...given, ...choice }).flags;
const codes = (stations: StationResult[], choice: Partial<DecaySettings> = {}) =>
  flagsOf(stations, choice).map(({ code }) => code);
const flag = (code: string, stations: StationResult[], choice: Partial<DecaySettings> = {}) =>
  flagsOf(stations, choice).find((one) => one.code === code);
const without = (stations: StationResult[], lacking: Partial<StationResult>) =>
  stations.map((one) => ({ ...one, k: missing("none"), ...lacking }));
const none = missing("none");

describe("doubts about a decay", () => {
  it("are none on an exact law of three components over a wide window", () => {
    expect(codes(exact)).toEqual([]);
    expect(codes(exact, { window: "auto" })).toEqual([]);
  });
  it("name what was assumed of components that were not measured", () => {
    expect(codes(without(exact, { vv: none, ww: none }))).toEqual(["isotropy-assumed"]);
    expect(codes(without(exact, { ww: none }))).toEqual(["axisymmetry-assumed"]);
    expect(codes(without(exact, { vv: none }))).toEqual(["axisymmetry-assumed"]);
    expect(codes(exact, { quantity: "uu" })).toEqual([]);
  });
  it("tell of equal weights where they were not asked for, or leave an automatic window untested", () => {
    const bare = lawStations(law, xs, 0);
    expect(codes(bare)).toEqual(["equal-weights"]);
    expect(codes(bare, { weights: "equal" })).toEqual([]);
    expect(codes(exact, { weights: "equal", window: "auto" })).toEqual(["equal-weights"]);
    expect(flag("equal-weights", bare)?.text).toMatch(/sampling error/);
    expect(flag("equal-weights", exact, { weights: "equal", window: "auto" })?.text).toMatch(
      /automatic window/,
    );
  });
  it("tell of a U that varies by more than 1 % of its mean beyond its errors, by how much, and what the law runs along", () => {
    const moving = (share: number, error = 1e-5) =>
      exact.map((one, i) => ({ ...one, U: known(6 * (1 + (share * i) / 8), error) }));
    const found = flag("u-varies", moving(0.05), { coordinate: "x" });
    expectClose(found?.value, 0.05 / 1.025, { relative: 1e-9, because: "range over mean" });
    expect(found?.text).toMatch(/x and time of flight differ/);
    expect(flag("u-varies", moving(0.05))?.text).toMatch(/runs along the time of flight/);
    expect(codes(moving(0.009))).not.toContain("u-varies");
    expect(codes(moving(0.03, 0.02))).not.toContain("u-varies");
    expect(codes(moving(0.05), { along: "t" })).not.toContain("u-varies");
  });
  it("tell where the time of flight was asked for and no U is known", () => {
    const still = exact.map((one) => ({ ...one, U: none }));
    expect(codes(still, { coordinate: "flight" })).toContain("flight-unknown");
    expect(codes(still, { coordinate: "flight", along: "t" })).not.toContain("flight-unknown");
    expect(codes(exact, { coordinate: "flight" })).not.toContain("flight-unknown");
    expect(codes(still)).not.toContain("flight-unknown");
  });
  it("count stations below five, and a last distance from the origin below four times the first", () => {
    expect(flag("few-stations", exact, { window: [xs[5], 99] })?.value).toBe(4);
    expect(codes(exact, { window: [xs[4], 99] })).not.toContain("few-stations");
    // steps of 13^(1/8): five of them are 4.97, four 3.61
    expect(codes(exact, { window: [xs[3], 99] })).toEqual([]);
    const short = flag("short-span", exact, { window: [xs[4], 99] });
    expectClose(short?.value, 13 ** 0.5, { relative: 1e-6, because: "an exact law, refitted" });
  });
  it("say how n moves with the origin at a short span, but where n is held or x0 says it already", () => {
    const text = (choice: Partial<DecaySettings>) =>
      flag("short-span", exact, { window: [xs[4], 99], ...choice })?.text;
    // dn/dx0 = -n over the geometric mean of the distances
    const slope = -1.25 / Math.sqrt((xs[4] - 1) * (xs[8] - 1));
    expect(text({})).toContain(`n would change by ${slope.toPrecision(2)}`);
    expect(text({})).toMatch(/x - x0 is 3\.6 times/);
    expect(text({ n: 1.25 })).not.toMatch(/would change/);
  });
  it("speak of time where the decay runs along it", () => {
    const text = flag("short-span", exact, { window: [xs[4], 99], along: "t" })?.text;
    expect(text).toMatch(/t - t0 is 3\.6 times/);
    expect(text).toMatch(/unit of t later/);
    expect(flag("held-origin", exact, { x0: 1, along: "t" })?.text).toMatch(/later by one unit of t/);
  });
  it("give the price of a held origin", () => {
    const held = flag("held-origin", exact, { x0: 1 });
    expectClose(held?.value, -1.25 / Math.sqrt((xs[0] - 1) * (xs[8] - 1)), {
      relative: 1e-6,
      because: "closed form",
    });
    expect(held?.text).toMatch(/farther downstream by one unit of x/);
    expect(codes(exact)).not.toContain("held-origin");
  });
  it("tell of a scatter beyond the errors, with the p of the test", () => {
    const wild = lawStations(law, xs, 0.01, (i) => (i % 2 ? 1.05 : 1 / 1.05)).map((one) => ({
      ...one,
      duration: null,
    }));
    const { p, chi2_reduced } = fitDecay(wild, given);
    const found = flag("chi-square-fails", wild);
    expect(found?.value).toBe(p);
    expect(found?.text).toContain(`chi-square ${chi2_reduced?.toFixed(1)}`);
    expect(codes(wild, { window: "auto" })).toContain("window-without-plateau");
    expect(codes(wild)).not.toContain("window-without-plateau");
  });
  it("tell of an open side, but not of a number that was held", () => {
    const short = lawStations(law, spacedFrom(law.x0, 9, 16, 6), 0.05);
    expect(codes(short)).toContain("half-open");
    expect(codes(short, { x0: 1 })).not.toContain("half-open");
  });
  it("tell why there is no law, and then nothing about one", () => {
    expect(codes(exact.slice(0, 3))).toEqual(["law-refused"]);
    const growing = exact.map((one, i) => ({ ...one, k: known(1 + i / 5, 0.01) }));
    expect(codes(growing, { x0: 1 })).toEqual(["law-refused"]);
    expect(flag("law-refused", growing, { x0: 1 })?.text).toMatch(/not fall/);
  });
  it("count the stations a test left out before an automatic window, and how far the last of them lies off", () => {
    const factor = (i: number) => [1.8, 1.5, 1.2][i] ?? 1;
    const near = lawStations(law, spacedFrom(law.x0, 4, 40, 12), 0.01, factor);
    const found = flag("near-field", near, { window: "auto" });
    expect(found?.value).toBe(3);
    expect(found?.text).toMatch(/^3 stations before the window leave the law, the last of them by 20 %/);
    const one = lawStations(law, spacedFrom(law.x0, 4, 40, 12), 0.01, (i) => (i === 0 ? 1.5 : 1));
    expect(flag("near-field", one, { window: "auto" })?.text).toMatch(
      /^One station before the window leaves the law/,
    );
    expect(codes(near)).toContain("chi-square-fails");
  });
});

describe("a window set by hand", () => {
  const window = (from: number, to: number) => fitDecay(exact, { ...given, window: [from, to] });
  it("holds the stations at its ends, whatever their last digit", () => {
    expect(window(xs[2], xs[7]).window).toEqual([xs[2], xs[7]]);
    expect(window(xs[2] * (1 + 1e-12), xs[7] * (1 - 1e-12)).stations).toBe(6);
    expect(window(xs[2] * (1 + 1e-6), xs[7]).stations).toBe(5);
    expect(window(xs[2], xs[7] * (1 - 1e-6)).stations).toBe(5);
    expect(window(xs[2], xs[7]).windowReason).toBe("set by hand");
    expect(window(xs[2], xs[7]).windowChosen).toBe("given");
  });
  it("marks the stations it uses", () => {
    expect(window(xs[2], xs[7]).points.map(({ used }) => used)).toEqual(
      [2, 2, 1, 1, 1, 1, 1, 1, 2].map((mark) => mark === 1),
    );
  });
});

describe("what a law runs along", () => {
  const moving = exact.map((one, i) => ({ ...one, U: known(6 + i / 2, 1e-5) }));
  const coordinate = (stations: StationResult[], choice: Partial<DecaySettings> = {}) =>
    fitDecay(stations, { ...given, ...choice }).coordinate;
  it("is x in a steady stream, the time of flight in one that speeds up, or what is asked for", () => {
    expect(coordinate(exact)).toBe("x");
    expect(coordinate(moving)).toBe("flight");
    expect(coordinate(moving, { coordinate: "x" })).toBe("x");
    expect(coordinate(exact, { coordinate: "flight" })).toBe("flight");
    expect(coordinate(moving, { along: "t" })).toBe("t");
    expect(coordinate(moving, { along: "t", coordinate: "flight" })).toBe("t");
    expect(
      coordinate(
        exact.map((one) => ({ ...one, U: none })),
        { coordinate: "flight" },
      ),
    ).toBe("x");
  });
  it("counts s in the mean U of the stations of the window, by hand or found", () => {
    const found = fitDecay(moving, { ...given, window: [xs[2], xs[6]] });
    expectClose(found.flight?.speed, 6 + 4 / 2, { relative: 1e-12, because: "the mean of stations 2 to 6" });
    expectClose(found.speed, 8, { relative: 1e-12, because: "the same" });
    const all = fitDecay(moving, { ...given, window: "auto" });
    expect(all.flight?.speed).toBeGreaterThan(6);
    const gap = moving.map((one, i) => (i === 3 ? { ...one, U: none } : one));
    expectClose(fitDecay(gap, { ...given, coordinate: "flight" }).flight?.speed, 6 + (36 - 3) / 8 / 2, {
      relative: 1e-12,
      because: "the mean of the eight that carry a U",
    });
  });
});
