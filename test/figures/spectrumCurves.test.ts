import { describe, it } from "vitest";
import { bandAverage } from "../../src/core/signal/bandAverage.ts";
import { spectrumCurves } from "../../src/figures/spectrumCurves.ts";
import { expectClose } from "../support/expectClose.ts";
import { madePair } from "./powerLawCase.ts";

describe("intervals of a spectrum", () => {
  it("are those of chi-square with the bin's degrees of freedom", () => {
    const [of] = madePair;
    const [station] = of.stations;
    if (station.curves === null) throw new Error("the made station has no curves");
    const curves = { ...station.curves, k1: Float64Array.of(10), E11: Float64Array.of(2), freedom: 20 };
    const { freedoms: _, ...plain } = curves;
    const [curve] = spectrumCurves(
      [{ of, station: { ...station, curves: plain }, letter: "a" }],
      "dimensional",
    );
    // percentage points of chi-square with 20 degrees of freedom, as tabulated: 9.591 and 34.170
    const why = { relative: 1e-4, because: "the tables give four digits" };
    expectClose(curve.low[0], (2 * 20) / 34.17, why);
    expectClose(curve.high[0], (2 * 20) / 9.591, why);
  });

  it("narrow in a band of several bins, by less than independent bins would", () => {
    const k1 = Float64Array.from({ length: 40 }, (_, i) => 100 + 0.01 * i);
    const { freedom } = bandAverage(
      k1,
      k1.map(() => 1),
      10,
      10,
    );
    // 40 bins of a Hann window are worth 1/(1 + 8/9 + 1/18) = 18/35 of 40 independent ones, but for their ends
    expectClose(freedom[0], (400 * 18) / 35, { relative: 0.03, because: "the ends of the band count more" });
  });
});
