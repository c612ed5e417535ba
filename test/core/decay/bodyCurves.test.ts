import { describe, expect, it } from "vitest";
import { atBody } from "../../../src/core/decay/atBody.ts";
import { bodyCurves } from "../../../src/core/decay/bodyCurves.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { lawChangeVariance, lawVariance } from "../../../src/core/decay/lawBand.ts";
import { powerProduct } from "../../../src/core/decay/powerProduct.ts";
import type { BodySettings, DecaySettings } from "../../../src/core/decayResult.ts";
import { bare, isEstimate, missing, type Quantity } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const law = { A: 0.06, x0: 1, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.1, m: 0.375 };
const xs = spacedFrom(law.x0, 4, 40, 9);
const settings: DecaySettings = { ...plainSettings, window: [0, 99] };
const rounding = { relative: 1e-8, because: "closed form; quantiles to nine digits" };
const z = 1.959963984540054;

function curvesOf(stations: StationResult[], choice: Partial<DecaySettings> = {}) {
  const all = { ...settings, ...choice };
  const decay = fitDecay(stations, all);
  return { decay, curves: bodyCurves(stations, decay, all) };
}
const endsOf = (quantity: Quantity) => (isEstimate(quantity) ? [quantity.low, quantity.high] : []);
const whyOf = (quantity: Quantity) => (isEstimate(quantity) ? "" : quantity.why);

describe("a quantity between stations", () => {
  const values = (xs: readonly number[], of: (x: number) => number) =>
    xs.map((x) => stationAt(x, { L11: known(of(x), 0.1) }));

  it("without a law lies on straight lines of logarithms over ln x: a power law is met exactly", () => {
    const { curves } = curvesOf(values([1, 2, 8], (x) => 3 * x ** 0.4));
    for (const x of [1, 1.3, 5, 8]) expectClose(curves.L11.at(x).value, 3 * x ** 0.4, rounding);
  });
  it("goes over x itself where a station stands at zero or before it", () => {
    const { curves } = curvesOf(values([0, 1, 3], (x) => 3 * Math.exp(0.4 * x)));
    for (const x of [0, 0.5, 2.2]) expectClose(curves.L11.at(x).value, 3 * Math.exp(0.4 * x), rounding);
    const negative = curvesOf(values([-2, 1, 3], (x) => 3 * Math.exp(0.4 * x))).curves;
    expectClose(negative.L11.at(-1).value, 3 * Math.exp(-0.4), rounding);
  });
  it("goes over ln x where the origin of the law lies among the stations", () => {
    const among = [
      ...values([0.5], (x) => 0.2 * x),
      ...lawStations(law, xs, 0.01).map((one) => ({ ...one, L11: known(0.2 * one.x, 0.1) })),
    ];
    const { decay, curves } = curvesOf(among, { x0: 1 });
    expect(decay.law?.x0).toBe(1);
    expectClose(curves.L11.at(2).value, 0.4, rounding);
  });
  it("is known as well as its two stations make it: halfway, by the root of a half", () => {
    const { curves } = curvesOf(values([1, 4], (x) => x));
    const middle = curves.L11.at(2);
    expectClose(isEstimate(middle) ? middle.error?.standard : 0, 0.1 * Math.SQRT1_2, rounding);
    expectClose(endsOf(middle)[1], 2 * Math.exp(z * 0.1 * Math.SQRT1_2), rounding);
  });
  it("changes between two places as the values do, what they owe to one station taken once", () => {
    const { curves } = curvesOf(values([1, 4], (x) => x));
    const change = curves.L11.change(2, 4);
    expectClose(change.value, 2, rounding);
    // ln L(4) - (ln L(1) + ln L(4))/2
    expectClose(isEstimate(change) ? change.error?.standard : 0, 0.1 * Math.SQRT1_2, rounding);
    const none = curves.L11.change(3, 3);
    expect([none.value, ...endsOf(none)]).toEqual([1, 1, 1]);
  });
  it("carries no interval where a station carries none", () => {
    const { curves } = curvesOf([
      stationAt(1, { L11: bare(1, "short") }),
      stationAt(4, { L11: known(4, 0.1) }),
    ]);
    expect(curves.L11.at(2)).toMatchObject({ low: null, high: null });
    expect(curves.L11.change(1, 4)).toMatchObject({ low: null, high: null });
  });
  it("is missing where nothing carries it, and beyond what does: on the side that lacks it", () => {
    const { curves } = curvesOf(values([2, 4], (x) => x));
    expect(whyOf(curves.lambda.at(3))).toBe("not part of this test");
    expect(whyOf(curves.L11.at(1))).toMatch(/first station/);
    expect(whyOf(curves.L11.at(5))).toMatch(/last station/);
    expect(whyOf(curves.L11.change(1, 3))).toMatch(/first station/);
    expect(whyOf(curves.L11.change(3, 5))).toMatch(/last station/);
    expect(curves.L11.logarithm(5)).toBeNull();
    expect(whyOf(curvesOf([]).curves.L11.at(1))).toBe("no station carries it");
  });
});

describe("the intensity", () => {
  const stations = lawStations(law, xs, 0.01);
  const { decay, curves } = curvesOf(stations);
  if (decay.law === null) throw new Error("no law");
  const fitted = decay.law;
  const intensity = (x: number) => Math.sqrt((2 / 3) * law.A * (x - law.x0) ** -law.n);

  it("inside the window is that of the law, with half the error of ln k", () => {
    for (const x of [xs[0], 7, xs[8]]) {
      const found = curves.Tu.at(x);
      expectClose(found.value, intensity(x), { relative: 1e-6, because: "an exact law, refitted" });
      expectClose(
        isEstimate(found) ? found.error?.standard : 0,
        Math.sqrt(lawVariance(fitted, x, 0)) / 2,
        rounding,
      );
    }
    const change = curves.Tu.change(5, 20);
    expectClose(change.value, intensity(20) / intensity(5), {
      relative: 1e-6,
      because: "an exact law, refitted",
    });
    const half = Math.sqrt(lawChangeVariance(fitted, 5, 20)) / 2;
    expectClose(isEstimate(change) ? change.error?.standard : 0, half, rounding);
  });
  it("outside the window is that between the stations, as is a change that leaves it", () => {
    const short = curvesOf(
      stations.map((one) => ({ ...one, Tu: known(0.07, 0.02) })),
      { window: [xs[2], xs[6]] },
    ).curves;
    expectClose(short.Tu.at(xs[1]).value, 0.07, rounding);
    expectClose(short.Tu.at(xs[7]).value, 0.07, rounding);
    expectClose(short.Tu.at(xs[4]).value, intensity(xs[4]), { relative: 1e-6, because: "the law" });
    expectClose(short.Tu.change(xs[4], xs[7]).value, 1, rounding);
    expectClose(short.Tu.change(xs[1], xs[4]).value, 1, rounding);
  });
  it("is sqrt(uu)/U where uu was fitted", () => {
    const { curves: ofU } = curvesOf(stations, { quantity: "uu" });
    expectClose(ofU.Tu.at(7).value, intensity(7), { relative: 1e-6, because: "isotropic: uu = 2k/3" });
  });
  it("is over the reference speed where one is given, over the U of the place where none is", () => {
    const { curves: referred } = curvesOf(stations, { referenceSpeed: 3 });
    expectClose(referred.Tu.at(7).value, intensity(7) * 2, {
      relative: 1e-6,
      because: "half the speed, k/U² the same law",
    });
    // U off by a slope too small to take the time of flight for it
    const uneven = stations.map((one) => ({ ...one, U: known(6 * one.x ** 0.001, 0.01) }));
    const found = curvesOf(uneven, { coordinate: "x" });
    const of = (x: number) => (intensity(x) * 6) / (6 * x ** 0.001);
    expectClose(found.curves.Tu.at(7).value, of(7), { relative: 1e-6, because: "k does not change with U" });
  });
  it("of a decay in time, where no station has a U and no speed is given, is missing with the reason", () => {
    const none = missing("neither U nor a reference speed is given");
    const inTime = stations.map(({ x, uu, vv, ww, k }) => stationAt(x, { uu, vv, ww, k, Tu: none }));
    const { decay: ofTime, curves: unscaled } = curvesOf(inTime, { along: "t" });
    expect(ofTime.law).not.toBeNull();
    expect(whyOf(unscaled.Tu.at(7))).toBe(none.why);
    expect(unscaled.Tu.logarithm(7)).toBeNull();
    const { curves: scaled } = curvesOf(inTime, { along: "t", referenceSpeed: law.U });
    expectClose(scaled.Tu.at(7).value, intensity(7), { relative: 1e-6, because: "an exact law, refitted" });
  });
  it("of a profile of q, which may be no energy, is that between the stations", () => {
    const profile = stations.map(({ x, k }) => stationAt(x, { q: k, Tu: known(0.05, 0.1) }));
    expectClose(curvesOf(profile).curves.Tu.at(7).value, 0.05, rounding);
  });
});

describe("a body", () => {
  const wanted: BodySettings = { x: 7, chord: 2, Tu: null, L11: null };
  const stations = lawStations(law, xs, 0.01);
  const meets = (of: StationResult[], body: Partial<BodySettings>, choice: Partial<DecaySettings> = {}) => {
    const all = { ...settings, ...choice };
    return atBody(of, fitDecay(of, all), all, { ...wanted, ...body });
  };
  const lengthAt = (x: number) => law.B * (x - law.x0) ** law.m;

  it("without a chord has no change over it and no length in chords, and says so", () => {
    const found = meets(stations, { chord: null, L11: 0.1 });
    expect(whyOf(found.L11_chord)).toMatch(/chord/);
    expect(whyOf(found.change.Tu)).toMatch(/chord/);
    expect(whyOf(found.targets.L11_chord?.x ?? missing(""))).toMatch(/chord/);
    expect(found.both).toBeNull();
  });
  it("without targets has none", () => {
    const found = meets(stations, {});
    expect([found.targets.Tu, found.targets.L11_chord, found.both, found.inflow]).toEqual([
      null,
      null,
      null,
      null,
    ]);
  });
  it("meets a length where the growing L11 reaches it, off by its error over its growth", () => {
    const found = meets(stations, { L11: lengthAt(10) / 2 }).targets.L11_chord?.x;
    if (!found || !isEstimate(found)) throw new Error("no place");
    expectClose(found.value, 10, { relative: 1e-6, because: "an exact law, refitted" });
    // nine stations at equal steps of ln(x - x0): the error of the line at 10, over m/(x - x0)
    const s = xs.map((x) => Math.log(x - law.x0));
    const centre = s.reduce((sum, value) => sum + value / 9, 0);
    const spread = s.reduce((sum, value) => sum + (value - centre) ** 2, 0);
    const error = 0.01 * Math.sqrt(1 / 9 + (Math.log(9) - centre) ** 2 / spread);
    const reach = (z * error * 9) / law.m;
    expectClose((found.high ?? 0) - found.value, reach, {
      relative: 1e-5,
      because: "an exact law, refitted",
    });
    expectClose(found.value - (found.low ?? 0), reach, { relative: 1e-5, because: "an exact law, refitted" });
  });
  it("does not meet a length that no station of the window has, and says by how much it is missed", () => {
    const why = (length: number) =>
      whyOf(meets(stations, { L11: length / 2 }).targets.L11_chord?.x ?? missing(""));
    expect(why(lengthAt(xs[0]) / 2)).toMatch(/^L11 is 2\.00 times the target at the first/);
    expect(why(lengthAt(xs[8]) * 2)).toMatch(/^L11 is 0\.500 times the target at the last/);
    const shrinking = stations.map((one) => ({ ...one, L11: known(1 / one.x, 0.01) }));
    expect(whyOf(meets(shrinking, { L11: 1 }).targets.L11_chord?.x ?? missing(""))).toMatch(/not grow/);
    const none = stations.map((one) => ({ ...one, L11: missing("none") }));
    expect(whyOf(meets(none, { L11: 1 }).targets.L11_chord?.x ?? missing(""))).toMatch(/fewer than three/);
    expect(meets(none, { L11: 1, Tu: 0.02 }).both).toBeNull();
  });
  it("asks at the inflow for what the law loses on the way, with the error of that change alone", () => {
    const { inflow } = meets(stations, { Tu: 0.02 });
    const decay = fitDecay(stations, settings);
    if (!inflow || !isEstimate(inflow.Tu) || decay.law === null) throw new Error("no inflow");
    expectClose(inflow.Tu.error?.standard, Math.sqrt(lawChangeVariance(decay.law, xs[0], 7)) / 2, rounding);
    // from k/U²: (x - x0) to the power -n/2
    expectClose(inflow.Tu.value, 0.02 * ((xs[0] - 1) / 6) ** (-1.25 / 2), {
      relative: 1e-6,
      because: "refitted",
    });
  });
  it("has no inflow to ask for without a law or stations, or upstream of the origin", () => {
    const without = meets(stations.slice(0, 2), { Tu: 0.02 });
    expect(whyOf(without.inflow?.Tu ?? bare(1, ""))).toMatch(/no law/);
    expect(without.inflow?.x).toBe(xs[0]);
    expect(meets([], { Tu: 0.02 }).inflow).toBeNull();
    expect(whyOf(meets(stations, { Tu: 0.02, x: 0.5 }).inflow?.Tu ?? bare(1, ""))).toMatch(/origin/);
  });
  it("misses two targets least where both are off by the same factor", () => {
    const { both } = meets(stations, { Tu: 0.03, L11: 0.2 });
    const ofTu = (x: number) => Math.log(Math.sqrt((2 / 3) * law.A * (x - 1) ** -1.25) / 0.03);
    const ofL11 = (x: number) => Math.log(lengthAt(x) / 0.4);
    if (both === null || both.x.value === null) throw new Error("no place");
    const miss = (x: number) => Math.max(Math.abs(ofTu(x)), Math.abs(ofL11(x)));
    const step = (xs[8] - xs[0]) / 2000;
    expect(miss(both.x.value)).toBeLessThanOrEqual(
      Math.min(miss(both.x.value - step), miss(both.x.value + step)) + 1e-9,
    );
    expectClose(both.Tu, Math.exp(ofTu(both.x.value)), { relative: 1e-6, because: "refitted" });
    expectClose(both.L11_chord, Math.exp(ofL11(both.x.value)), { relative: 1e-6, because: "refitted" });
  });
});

it("a product of no powers is its factor, known exactly", () => {
  expect(powerProduct(3, [])).toMatchObject({ value: 3, low: 3, high: 3 });
});
