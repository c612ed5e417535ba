import { describe, expect, it } from "vitest";
import { commonBlocks } from "../../../src/core/decay/commonBlocks.ts";
import { drawTogether } from "../../../src/core/decay/drawTogether.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { plainSettings, spacedFrom } from "../../support/lawStations.ts";
import { sharedRecords } from "../../support/sharedRecords.ts";

const law = { A: 0.06, x0: 4, n: 1.25, U: 1 };
const settings: DecaySettings = { ...plainSettings, window: [0, 100], quantity: "uu" };
const what = { quantity: "uu", assumption: "none" } as const;
const once = (seed: number) => sharedRecords(law, spacedFrom(law.x0, 20, 80, 12), 0.95, seededRandom(seed));

/** The same record of every station so many times over, as an inflow that is replayed gives it. */
function replayed(stations: readonly StationResult[], times: number): StationResult[] {
  return stations.map((station) => {
    if (station.blocks === null) throw new Error("no blocks");
    const { rows, data } = station.blocks;
    const longer = new Float64Array(times * data.length);
    for (let i = 0; i < times; i++) longer.set(data, i * data.length);
    const facts = { ...station.facts, repeats: times };
    return { ...station, blocks: { ...station.blocks, rows: times * rows, data: longer }, facts };
  });
}
const standard = (quantity: Quantity) => (isEstimate(quantity) ? (quantity.error?.standard ?? 0) : 0);

describe("stations sampled together behind an inflow that is replayed", () => {
  it("know n and x0 as well as one period does, and no better for its copies", () => {
    for (const key of ["n", "x0"] as const) {
      const ratios = Array.from({ length: 12 }, (_, i) => {
        const stations = once(i + 1);
        const [single, many] = [stations, replayed(stations, 6)].map((all) => fitDecay(all, settings));
        expect(many[key].value).toBe(single[key].value);
        return Math.log(standard(many[key]) / standard(single[key]));
      });
      const mean = ratios.reduce((sum, value) => sum + value, 0) / ratios.length;
      // without that knowledge the ratio is 1/√6
      expectClose(Math.exp(mean), 1, {
        relative: 0.12,
        because: "twelve pairs, each error known to a tenth",
      });
    }
  });
  it("have the degrees of freedom of one period", () => {
    const decay = fitDecay(replayed(once(1), 6), settings);
    expect(decay.law?.freedom).toBe((decay.together?.groups ?? 0) / 6 - 1);
  });
  it("count as replayed where a single station shows it", () => {
    const many = replayed(once(2), 6);
    const shown = many.map((one, i) => {
      const { repeats: _, ...facts } = one.facts;
      return i === 4 ? one : { ...one, facts };
    });
    expect(commonBlocks(shown, what, settings)?.repeats).toBe(6);
  });
  it("are drawn together with the spread of one period", () => {
    const [single, many] = [once(3), replayed(once(3), 6)].map((all) => {
      const blocks = commonBlocks(all, what, settings);
      if (blocks === null) throw new Error("not together");
      const random = seededRandom(5);
      const out = new Float64Array(12);
      let square = 0;
      for (let draw = 0; draw < 4000; draw++) {
        drawTogether(blocks, random, out);
        square += out[6] ** 2 / 4000;
      }
      return Math.sqrt(square);
    });
    expectClose(many / single, 1, { relative: 0.15, because: "two jackknife errors of the same blocks" });
  });
  it("tell nothing by blocks that are long against the period", () => {
    const stations = once(1).map((one) => ({ ...one, facts: { ...one.facts, repeats: 60 } }));
    expect(commonBlocks(stations, what, settings)).toBeNull();
  });
});
