import { describe, expect, it } from "vitest";
import { commonBlocks } from "../../../src/core/decay/commonBlocks.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { type SeededRandom, seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";
import { plainSettings, spacedFrom } from "../../support/lawStations.ts";
import { sharedRecords } from "../../support/sharedRecords.ts";

const law = { A: 0.06, x0: 4, n: 1.25, U: 1 };
const xs = spacedFrom(law.x0, 20, 80, 12);
const settings: DecaySettings = { ...plainSettings, window: [0, 100], quantity: "uu" };
const records = (random: SeededRandom, rho: number) => sharedRecords(law, xs, rho, random);

const holds = (quantity: Quantity, truth: number) =>
  isEstimate(quantity) && (quantity.low ?? -Infinity) <= truth && truth <= (quantity.high ?? Infinity);
const what = { quantity: "uu", assumption: "none" } as const;

function coverage(rho: number, simultaneous: boolean | "auto", trials: number) {
  const random = seededRandom(11);
  let [n, x0] = [0, 0];
  for (let trial = 0; trial < trials; trial++) {
    const decay = fitDecay(records(random, rho), { ...settings, simultaneous });
    if (holds(decay.n, law.n)) n++;
    if (holds(decay.x0, law.x0)) x0++;
  }
  return { n: n / trials, x0: x0 / trials };
}

describe("stations sampled together", () => {
  it("show the same eddies in the same blocks once these are shifted by the time of flight", () => {
    const blocks = commonBlocks(records(seededRandom(1), 0.95), what, settings);
    expectClose(blocks?.correlation, 0.95, { absolute: 0.04, because: "50 groups of four blocks" });
    expect(blocks?.groups).toBe(50);
  });
  it("are told from records taken one after the other with the same clock", () => {
    let together = 0;
    for (let seed = 1; seed <= 100; seed++)
      if (commonBlocks(records(seededRandom(seed), 0), what, settings) !== null) together++;
    // 1 % of a hundred; more than five has a probability of 6e-4
    expect(together).toBeLessThanOrEqual(5);
  });
  it("hold the truth 95 times in 100 with neighbours correlated 0.95, given or found", () => {
    for (const simultaneous of [true, "auto"] as const) {
      const { n, x0 } = coverage(0.95, simultaneous, 200);
      // 200 trials: one standard deviation is 1.5 %
      expect(n).toBeGreaterThan(0.91);
      expect(n).toBeLessThanOrEqual(0.99);
      expect(x0).toBeGreaterThan(0.91);
    }
  });
  it("hold it as often where they are independent and taken as together all the same", () => {
    const { n, x0 } = coverage(0, true, 200);
    expect(Math.min(n, x0)).toBeGreaterThan(0.91);
  });
  it("would be far too sure of themselves, or too unsure, as stations each for itself", () => {
    const { n } = coverage(0.95, false, 200);
    expect(Math.abs(n - 0.95)).toBeGreaterThan(0.03);
  });
  it("need records of 100 integral times, cut alike", () => {
    const stations = records(seededRandom(1), 0.95);
    const shorter = stations.map((s) => ({ ...s, facts: { ...s.facts, integralTimes: 90 } }));
    expect(commonBlocks(shorter, what, settings)).toBeNull();
    const late = stations.map((s, i) =>
      i === 3 && s.blocks ? { ...s, blocks: { ...s.blocks, start: 7 } } : s,
    );
    expect(commonBlocks(late, what, settings)).toBeNull();
    expect(commonBlocks(stations, what, { ...settings, simultaneous: false })).toBeNull();
  });
  it("say so in the decay: how many groups, how closely correlated", () => {
    const { together, law: fitted, n } = fitDecay(records(seededRandom(1), 0.95), settings);
    expect(together?.groups).toBe(50);
    expect(fitted?.freedom).toBe(49);
    expect(isEstimate(n) ? n.error?.freedom : null).toBe(49);
  });
});
