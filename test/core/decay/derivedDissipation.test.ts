import { describe, expect, it } from "vitest";
import { deriveStations } from "../../../src/core/decay/deriveStations.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { lawVariance } from "../../../src/core/decay/lawBand.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate, missing, type Quantity } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom } from "../../support/lawStations.ts";

const law = { A: 0.06, x0: 1, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.1, m: 0.375 };
const xs = spacedFrom(law.x0, 4, 40, 9);
const exact = lawStations(law, xs, 0.01);
const plain: DecaySettings = { ...plainSettings, window: [xs[1], xs[7]], kinematicViscosity: law.nu };
function derived(stations: StationResult[], choice: Partial<DecaySettings> = {}) {
  const all = { ...plain, ...choice };
  const decay = fitDecay(stations, all);
  return { decay, stations: deriveStations(stations, decay, all) };
}
const refitted = { relative: 1e-6, because: "an exact law, refitted" };
const standard = (quantity: Quantity) => (isEstimate(quantity) ? quantity.error?.standard : undefined);
const whyOf = (quantity: Quantity) => (isEstimate(quantity) ? "" : quantity.why);

describe("the dissipation of the decay at a station", () => {
  it("is n U k/(x - x0) inside the window, its ends included, and missing outside", () => {
    derived(exact).stations.forEach(({ x, epsilon_decay, k, balance }, i) => {
      if (i === 0 || i === 8) {
        expect(whyOf(epsilon_decay)).toMatch(/outside the fit window/);
        expect(balance.value).toBeNull();
        return;
      }
      expectClose(epsilon_decay.value, (1.25 * 6 * (k.value ?? 0)) / (x - 1), refitted);
      expectClose(balance.value, 1, refitted);
    });
  });
  it("is as uncertain as the law's slope there, and as U where that has an error", () => {
    const { decay, stations } = derived(exact);
    const uncertain = derived(
      exact.map((one) => ({ ...one, U: known(6, 0.004) })),
      { coordinate: "x" },
    );
    if (decay.law === null) throw new Error("no law");
    const own = Math.sqrt(lawVariance(decay.law, xs[4], 1));
    expectClose(standard(stations[4].epsilon_decay), own, refitted);
    expectClose(standard(uncertain.stations[4].epsilon_decay), Math.hypot(own, 0.004), refitted);
    expectClose(uncertain.stations[4].epsilon_decay.value, stations[4].epsilon_decay.value ?? 0, refitted);
    // the balance adds the error of the gradients
    expectClose(standard(stations[4].balance), Math.hypot(own, 0.01), refitted);
  });
  it("counts uu three halves of an energy, and 1 for U along time", () => {
    const ofU = derived(exact, { quantity: "uu" }).stations[4];
    expectClose(ofU.epsilon_decay.value, exact[4].epsilon.value ?? 0, refitted);
    const time = derived(exact, { along: "t" }).stations[4];
    expectClose(time.epsilon_decay.value, (exact[4].epsilon.value ?? 0) / 6, refitted);
  });
  it("is not to be had of a q that may be no energy, without a law, or without U", () => {
    const q = exact.map((one) => ({ ...one, q: one.k }));
    expect(whyOf(derived(q, { quantity: "q" }).stations[4].epsilon_decay)).toMatch(
      /not known to be an energy/,
    );
    const none = derived(exact, { window: [xs[0], xs[1]] });
    expect(whyOf(none.stations[0].epsilon_decay)).toBe(whyOf(none.decay.n));
    const gap = exact.map((one, i) => (i === 4 ? { ...one, U: missing("none") } : one));
    expect(whyOf(derived(gap, { coordinate: "x" }).stations[4].epsilon_decay)).toMatch(/no mean velocity/);
    expect(derived(gap, { along: "t" }).stations[4].epsilon_decay.value).not.toBeNull();
  });
});

describe("scales that rest on the decay", () => {
  const scaled = (change: Partial<StationResult>, choice: Partial<DecaySettings> = {}) =>
    derived(
      exact.map((one) => ({ ...one, ...change })),
      { dissipation: "decay", ...choice },
    ).stations[4];
  it("replace those of a record, but a profile keeps the lambda it brought", () => {
    const record = scaled({ lambda: known(9, 0.1), epsilon: known(9, 0.1) });
    expectClose(record.lambda.value, exact[4].lambda.value ?? 0, refitted);
    expectClose(record.epsilon.value, exact[4].epsilon.value ?? 0, refitted);
    const profile = scaled({ duration: null, epsilon: missing("none"), lambda: known(9, 0.1) });
    expect(profile.lambda.value).toBe(9);
    expectClose(profile.eta.value, exact[4].eta.value ?? 0, refitted);
    const bare = scaled({ duration: null, epsilon: missing("none"), lambda: missing("none") });
    expectClose(bare.lambda.value, exact[4].lambda.value ?? 0, refitted);
  });
  it("take the variance along the line that lengths are taken on: v on lines across in y, w in z", () => {
    const facts = exact[4].facts;
    const lines = (along: "x" | "y" | "z") => {
      const of = { ...(facts.lines ?? {}), along } as NonNullable<StationResult["facts"]["lines"]>;
      return scaled({
        facts: { ...facts, lines: of },
        vv: known(4e-3, 0.01),
        ww: known(9e-3, 0.01),
      });
    };
    const expected = (variance: number, epsilon: Quantity) =>
      Math.sqrt((15 * law.nu * variance) / (epsilon.value ?? 1));
    const [alongY, alongZ, alongX] = [lines("y"), lines("z"), lines("x")];
    expectClose(alongY.lambda.value, expected(4e-3, alongY.epsilon), refitted);
    expectClose(alongZ.lambda.value, expected(9e-3, alongZ.epsilon), refitted);
    expectClose(alongX.lambda.value, expected(exact[4].uu.value ?? 0, alongX.epsilon), refitted);
  });
});
