import { describe, expect, it } from "vitest";
import { decayPoints, decaySpeed } from "../../../src/core/decay/decayPoints.ts";
import { decayQuantity, decayValue } from "../../../src/core/decay/decayQuantity.ts";
import { bare, estimate } from "../../../src/core/quantity.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, plainSettings, stationAt } from "../../support/lawStations.ts";

const rounding = { relative: 1e-12, because: "closed form" };
const [uu, vv, ww, q] = [known(3, 0.02), known(2, 0.03), known(1, 0.04), known(7, 0.05)];
const whole = stationAt(1, { uu, vv, ww });
const lateral = stationAt(2, { uu, vv });
const otherLateral = stationAt(2, { uu, ww });
const alone = stationAt(3, { uu });
const profile = stationAt(4, { q });

describe("what decays in a case", () => {
  it.each([
    ["three components everywhere", [whole, whole], "auto", "k", "none"],
    ["one lateral component everywhere", [lateral, otherLateral], "auto", "k", "axisymmetric"],
    ["a lateral component, both at some stations", [whole, lateral], "auto", "k", "axisymmetric"],
    ["u alone", [alone, alone], "auto", "uu", "isotropic"],
    ["u alone at one station", [whole, alone], "auto", "uu", "isotropic"],
    ["u alone, k wanted", [alone, whole], "k", "k", "isotropic"],
    ["uu wanted", [whole, whole], "uu", "uu", "none"],
    ["a profile of q", [profile, profile], "auto", "q", "none"],
    ["q beside u", [profile, alone], "auto", "uu", "isotropic"],
    ["q wanted beside u", [profile, alone], "q", "q", "none"],
    ["nothing at all", [stationAt(1, {})], "auto", "uu", "isotropic"],
    ["stations without u among whole ones", [whole, stationAt(2, { vv, ww })], "auto", "k", "none"],
  ] as const)("with %s (%j, wanted %s): %s, assumed %s", (_, stations, wanted, quantity, assumption) => {
    expect(decayQuantity([...stations], wanted)).toEqual({ quantity, assumption });
  });
});

describe("the energy of a station", () => {
  const of = (station: typeof whole, assumption: "none" | "axisymmetric" | "isotropic") =>
    decayValue(station, { quantity: "k", assumption });

  it("is half the trace, its error that of independent components", () => {
    const k = of(whole, "none");
    expectClose(k?.value, 3, rounding);
    expectClose(k?.error, Math.hypot(3 * 0.02, 2 * 0.03, 1 * 0.04) / 2 / 3, rounding);
  });
  it("counts a lateral component twice, whichever it is; u three times", () => {
    expectClose(of(lateral, "axisymmetric")?.value, (3 + 2 * 2) / 2, rounding);
    expectClose(of(otherLateral, "axisymmetric")?.value, (3 + 2 * 1) / 2, rounding);
    // of both, v: the same at all stations
    expectClose(of(whole, "axisymmetric")?.value, (3 + 2 * 2) / 2, rounding);
    expectClose(of(lateral, "axisymmetric")?.error, Math.hypot(1.5 * 0.02, 2 * 0.03) / 3.5, rounding);
    expectClose(of(alone, "isotropic")?.value, 4.5, rounding);
    expectClose(of(alone, "isotropic")?.error, 0.02, rounding);
  });
  it("is the station's own k where that rests on the same assumption, and not where it does not", () => {
    const k = known(2.9, 0.01);
    expectClose(of(stationAt(1, { uu, vv, ww, k }), "none")?.value, 2.9, rounding);
    expectClose(of(stationAt(1, { uu, vv, k }), "axisymmetric")?.value, 2.9, rounding);
    expectClose(of(stationAt(1, { uu, vv, ww, k }), "axisymmetric")?.value, 3.5, rounding);
  });
  it("is none where a component is missing or not above zero, or carries no error where one has none", () => {
    expect(of(alone, "none")).toBeNull();
    expect(of(stationAt(1, { uu, vv: known(0, 0), ww }), "none")).toBeNull();
    expect(decayValue(profile, { quantity: "uu", assumption: "none" })).toBeNull();
    const without = of(stationAt(1, { uu, vv: bare(2, "short"), ww }), "none");
    expectClose(without?.value, 3, rounding);
    expect(without?.error).toBeNull();
  });
  it("has the degrees of freedom of its least known part", () => {
    const blocks = (freedom: number | null) =>
      estimate(1, 0.9, 1.1, { standard: 0.05, freedom, scale: "log" });
    const freedom = (...parts: (number | null)[]) => {
      const [a, b, c] = parts.map(blocks);
      return of(stationAt(1, { uu: a, vv: b, ww: c }), "none")?.freedom;
    };
    expect(freedom(20, 9, 15)).toBe(9);
    expect(freedom(20, null, 15)).toBe(15);
    expect(freedom(null, null, null)).toBeNull();
    expect(
      decayValue(stationAt(1, { uu: blocks(12) }), { quantity: "uu", assumption: "none" })?.freedom,
    ).toBe(12);
  });
});

describe("the points of a law", () => {
  const stations = [3, 1, 2].map((x) => stationAt(x, { q: known(1 / x, 0.1), duration: 1 }));

  it("stand in order of x, and leave out stations without the quantity", () => {
    const { points, weights } = decayPoints([...stations, stationAt(0.5, {})], plainSettings);
    expect(points.map(({ x }) => x)).toEqual([1, 2, 3]);
    expect(points.map(({ q: value }) => value)).toEqual([1, 1 / 2, 1 / 3]);
    expect(weights).toBe("sampling");
    for (const { error, smoothedError } of points) {
      expectClose(error, 0.1, rounding);
      expectClose(smoothedError, 0.1, rounding);
    }
  });
  it("weigh alike where that is asked for, or where there are no errors", () => {
    const equal = decayPoints(stations, { ...plainSettings, weights: "equal" });
    expect([equal.weights, equal.points[0].smoothedError]).toEqual(["equal", null]);
    const bareStations = [1, 2, 3].map((x) => stationAt(x, { q: bare(1 / x, "none") }));
    expect(decayPoints(bareStations, plainSettings).weights).toBe("equal");
  });
});

describe("the speed that makes k a number", () => {
  const moving = [4, 6, 0, -3].map((U, x) => stationAt(x, { U: bare(U, "") }));
  it("is the mean U of the stations, of those where the stream runs forward", () => {
    expect(decaySpeed(moving, "k", plainSettings)).toBe(5);
    expect(decaySpeed([stationAt(0, {})], "k", plainSettings)).toBeNull();
  });
  it("is the reference speed where one is given, 1 along time, and none for a profile of q", () => {
    expect(decaySpeed(moving, "uu", { ...plainSettings, referenceSpeed: 9 })).toBe(9);
    expect(decaySpeed(moving, "uu", { ...plainSettings, along: "t" })).toBe(1);
    expect(decaySpeed(moving, "q", { ...plainSettings, referenceSpeed: 9 })).toBeNull();
  });
});
