import { describe, expect, it } from "vitest";
import { argueCases } from "../../../src/core/compare/argueCases.ts";
import { compareCases } from "../../../src/core/compare/compareCases.ts";
import { comparedCase } from "../../../src/core/compare/comparedCase.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate } from "../../../src/core/quantity.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { plainSettings, spacedFrom } from "../../support/lawStations.ts";
import { sharedRecords } from "../../support/sharedRecords.ts";

const law = { A: 0.06, x0: 4, n: 1.25, U: 1 };
const farther = { ...law, x0: 10 };
const settings: DecaySettings = { ...plainSettings, window: [0, 200], quantity: "uu" };
const along = ({ x0 }: typeof law) => spacedFrom(x0, x0 + 16, x0 + 76, 12);

describe("two cases, each with stations sampled together", () => {
  it("lie apart by the distance they were made with 95 times in 100", () => {
    const random = seededRandom(21);
    const trials = 60;
    let held = 0;
    for (let trial = 0; trial < trials; trial++) {
      const cases = [law, farther].map((one, i) => {
        const stations = sharedRecords(one, along(one), 0.95, random);
        const decay = fitDecay(stations, settings);
        return { name: `case ${i}`, stations, decay, decaySettings: settings };
      });
      const [{ extra_distance }] = compareCases(cases, { align: "x0", tolerance: 0.1 });
      if (!isEstimate(extra_distance)) throw new Error(extra_distance.why);
      if ((extra_distance.low ?? 9) <= 6 && 6 <= (extra_distance.high ?? -9)) held++;
    }
    // 60 trials: one standard deviation is 2.8 %
    expect(held / trials).toBeGreaterThan(0.86);
  });
  it("are moved by the blocks they have in common", () => {
    const stations = sharedRecords(law, along(law), 0.95, seededRandom(1));
    const { cases } = argueCases([{ name: "a", stations, settings }], { align: "x0", tolerance: 0.1 });
    expect(comparedCase(cases[0], "x0").law?.blocks?.groups).toBe(50);
  });
});

describe("the exponents cases are aligned with", () => {
  const cases = [law, farther].map((one, i) => ({
    name: `case ${i}`,
    stations: sharedRecords(one, along(one), 0, seededRandom(i + 1)),
    settings,
  }));
  it.each([
    ["common", "common n"],
    ["own", "own n"],
    ["auto", "common n"],
  ] as const)("can be chosen: %s", (exponent, found) => {
    const compare = { align: "x0", tolerance: 0.1, exponent } as const;
    expect(argueCases(cases, compare).comparisons[0].aligned_with).toBe(found);
  });
  it("are tested over all cases at once where there are more than two", () => {
    const third = { ...cases[1], name: "case 2" };
    const { comparisons } = argueCases([...cases, third], { align: "x0", tolerance: 0.1 });
    expect(comparisons).toHaveLength(2);
    for (const { common_n_of_all } of comparisons)
      expect(common_n_of_all?.cases).toEqual(["case 0", "case 1", "case 2"]);
  });
});
