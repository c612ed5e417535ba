import { describe, expect, it } from "vitest";
import { commonBlocks } from "../../../src/core/decay/commonBlocks.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { startRecord } from "../../../src/core/station/startRecord.ts";
import type { ReduceSettings } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { plainSettings, spacedFrom } from "../../support/lawStations.ts";

const settings: ReduceSettings = {
  kinematicViscosity: 1.5e-5,
  referenceSpeed: null,
  kind: null,
  simultaneous: "auto",
  periodic: "auto",
  sensorLength: null,
  integralScale: "zero-crossing",
  correlation: "biased",
  detrend: "mean",
  segment: null,
  taylorCorrection: true,
  dissipation: "auto",
};
const law = { A: 0.02, x0: 0.1, n: 1.3, U: 6 };
const xs = spacedFrom(law.x0, 0.4, 2, 6);
const step = 1e-3;
const samples = 40_000;
/** Samples kept upstream, from which later stations draw their earlier eddies. */
const lead = 400;

/** The same pattern carried past every station at U, fading as it goes: an exponential correlation of 10 samples. */
function pattern(seed: number): Float64Array {
  const random = seededRandom(seed);
  const rho = Math.exp(-1 / 10);
  const signal = new Float64Array(lead + samples);
  for (let i = 1; i < signal.length; i++)
    signal[i] = rho * signal[i - 1] + Math.sqrt(1 - rho * rho) * random.gaussian();
  return signal;
}

function station(x: number, eddies: Float64Array) {
  const late = Math.round((x - xs[0]) / law.U / step);
  const rms = law.U * Math.sqrt(law.A * (x - law.x0) ** -law.n);
  const u = Float64Array.from({ length: samples }, (_, i) => law.U + rms * eddies[lead + i - late]);
  const origin = { file: "made", x, y: null, z: null, position: "hand", step } as const;
  const reducer = startRecord(origin, settings);
  reducer.add({ count: samples, t: null, u, v: null, w: null });
  const end = reducer.finish();
  if (!("part" in end)) throw new Error("a short record was to be read twice");
  return reduceStation([end.part], settings);
}

describe("records of probes that sample one stream at the same times", () => {
  const eddies = pattern(1);
  const together = xs.map((x) => station(x, eddies));
  const what = { quantity: "uu", assumption: "none" } as const;
  const wanted = { ...plainSettings, window: [0, 9] as const, quantity: "uu" as const };

  it("show one pattern in all blocks once it is followed along the stream", () => {
    const blocks = commonBlocks(together, what, wanted);
    expectClose(blocks?.correlation, 1, { absolute: 0.1, because: "flights of up to a quarter of a block" });
  });
  it("know n better than stations each for itself: what moves all alike does not bend the law", () => {
    const width = (simultaneous: boolean | "auto") => {
      const { n } = fitDecay(together, { ...wanted, simultaneous });
      return n.value === null || n.low === null || n.high === null ? 0 : n.high - n.low;
    };
    expect(width("auto")).toBeGreaterThan(0);
    expect(width("auto")).toBeLessThan(width(false) / 2);
  });
  it("are told from records of other times", () => {
    const apart = xs.map((x, i) => station(x, pattern(10 + i)));
    expect(commonBlocks(apart, what, wanted)).toBeNull();
    expect(fitDecay(apart, wanted).together).toBeNull();
  });
});
