import { describe, expect, it } from "vitest";
import { atBody } from "../../../src/core/decay/atBody.ts";
import { deriveStations } from "../../../src/core/decay/deriveStations.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import type { BodySettings, DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const M = 0.025;
const law = { A: 0.06, x0: 3 * M, n: 1.25, ell: M, U: 6, nu: 1.5e-5, B: 0.005, m: 0.375 };
const xs = spacedFrom(law.x0, 0.2, 2, 14);
const settings: DecaySettings = {
  ...plainSettings,
  referenceLength: M,
  kinematicViscosity: law.nu,
  window: [0, 9],
};
const body: BodySettings = { x: 0.9, chord: 0.1, Tu: null, L11: null };
const at = (stations: StationResult[], wanted: Partial<BodySettings> = {}) => {
  const decay = fitDecay(stations, settings);
  return atBody(deriveStations(stations, decay, settings), decay, settings, { ...body, ...wanted });
};
const Tu = (x: number) => Math.sqrt((2 / 3) * law.A * ((x - law.x0) / M) ** -law.n);
const L11 = (x: number) => law.B * ((x - law.x0) / M) ** law.m;
const exact = lawStations(law, xs, 0.01);
const because = "an exact law; every length a straight line in ln(x - x0)";
const holds = (quantity: Quantity | null | undefined, truth: number) =>
  !!quantity &&
  isEstimate(quantity) &&
  (quantity.low ?? Infinity) <= truth &&
  truth <= (quantity.high ?? -Infinity);

describe("what a body meets", () => {
  const found = at(exact);

  it("is the intensity of the law and the lengths between the stations", () => {
    expectClose(found.at.Tu.value, Tu(0.9), { relative: 1e-6, because });
    expectClose(found.at.L11.value, L11(0.9), { relative: 1e-6, because });
    expectClose(found.L11_chord.value, L11(0.9) / 0.1, { relative: 1e-6, because });
    expectClose(found.at.lambda.value, Math.sqrt((10 * law.nu * (0.9 - law.x0)) / (law.n * law.U)), {
      relative: 1e-6,
      because: "lambda² = 10 nu (x - x0)/(n U) in isotropy",
    });
    expectClose(found.at.isotropy_uv.value, 1, { relative: 1e-9, because });
  });
  it("changes over the chord as the law does", () => {
    expectClose(found.change.Tu.value, Tu(1) / Tu(0.9), { relative: 1e-6, because });
    expectClose(found.change.L11.value, L11(1) / L11(0.9), { relative: 1e-6, because });
  });
  it("is missing beyond the last station, with the reason", () => {
    const beyond = at(exact, { x: 3 });
    expect(beyond.at.L11).toMatchObject({ value: null, why: expect.stringMatching(/beyond the last/) });
    expect(beyond.at.Tu.value).toBeNull();
    expect(at(exact, { x: 0.1 }).at.Tu).toMatchObject({ why: expect.stringMatching(/before the first/) });
  });
  it("holds the truth 95 times in 100: intensity, length, and the places that meet their targets", () => {
    const random = seededRandom(5);
    const held = { Tu: 0, L11: 0, placeTu: 0, placeL11: 0 };
    const trials = 150;
    for (let trial = 0; trial < trials; trial++) {
      const stations = lawStations(law, xs, 0.02, () => Math.exp(0.02 * random.gaussian())).map((one) => ({
        ...one,
        L11: known((one.L11.value ?? 1) * Math.exp(0.02 * random.gaussian()), 0.02),
      }));
      const one = at(stations, { Tu: Tu(0.7), L11: L11(0.7) / 0.1 });
      if (holds(one.at.Tu, Tu(0.9))) held.Tu++;
      if (holds(one.at.L11, L11(0.9))) held.L11++;
      if (holds(one.targets.Tu?.x, 0.7)) held.placeTu++;
      if (holds(one.targets.L11_chord?.x, 0.7)) held.placeL11++;
    }
    // 150 trials: one standard deviation is 1.8 %
    for (const [key, count] of Object.entries(held)) {
      expect(count / trials, key).toBeGreaterThan(0.89);
      expect(count / trials, key).toBeLessThanOrEqual(1);
    }
  });
});

describe("targets at the body", () => {
  it("are met where the law and the growing length reach them", () => {
    const { targets, both } = at(exact, { Tu: Tu(0.7), L11: L11(1.1) / 0.1 });
    expectClose(targets.Tu?.x.value, 0.7, { relative: 1e-6, because });
    expectClose(targets.L11_chord?.x.value, 1.1, { relative: 1e-6, because });
    // one falls as the other grows: the smallest miss lies between, both off by the same factor
    expect(both?.x.value).toBeGreaterThan(0.7);
    expect(both?.x.value).toBeLessThan(1.1);
    expectClose((both?.Tu ?? 0) / (both?.L11_chord ?? 1), 1, {
      relative: 5e-3,
      because: "2000 places: both fall short alike",
    });
  });
  it("are missing with what is lacking where no place meets them", () => {
    const { targets } = at(exact, { Tu: Tu(2) / 2, L11: L11(0.2) / 0.4 });
    expect(targets.Tu?.x).toMatchObject({
      value: null,
      why: "the intensity is 2.00 times the target at the last station still",
    });
    expect(targets.L11_chord?.x).toMatchObject({ value: null, why: expect.stringMatching(/already/) });
  });
  it("need nothing that could be told of the inflow where the decaying quantity may be no energy", () => {
    const given = xs.map((x) => stationAt(x, { q: known((x - law.x0) ** -1.2, 0.01) }));
    expect(at(given, { Tu: 0.02 }).inflow?.Tu).toMatchObject({
      value: null,
      why: expect.stringMatching(/not known to be an energy/),
    });
  });
  it("need at the inflow what the law makes of them on the way, marked as extrapolated", () => {
    const { inflow } = at(exact, { Tu: 0.02 });
    expectClose(inflow?.Tu.value, (0.02 * Tu(0.2)) / Tu(0.9), { relative: 1e-6, because });
    expect(inflow?.x).toBe(xs[0]);
    expect(inflow?.extrapolated).toBe(true);
  });
});
