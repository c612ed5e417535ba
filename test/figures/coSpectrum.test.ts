import { describe, expect, it } from "vitest";
import { estimate } from "../../src/core/quantity.ts";
import { coSpectrumCurves } from "../../src/figures/coSpectrum.ts";
import { defaultFigureOptions, type FigureOptions } from "../../src/figures/figureSpec.ts";
import { localSpectrumFigure } from "../../src/figures/localSpectrumFigure.ts";
import { spectrumFigure } from "../../src/figures/spectrumFigure.ts";
import { lightTokens } from "../../src/figures/tokens.ts";
import { expectClose } from "../support/expectClose.ts";
import { madePair } from "./powerLawCase.ts";

const options: FigureOptions = { ...defaultFigureOptions, tokens: lightTokens, widthMm: 178 };
const [of] = madePair;
const station = of.stations[5];
if (station.curves === null) throw new Error("the made station has no curves");
const { curves } = station;

/** Ten bins a band, u and v with the coherence of their correlation coefficient at every scale. */
const rho = -0.4;
const k1 = Float64Array.from({ length: 4000 }, (_, i) => 1 + i);
const flat = k1.map(() => 1e-4);
const uu = 1e-4 * 4000;
const made = {
  of,
  letter: "a",
  station: {
    ...station,
    uu: estimate(uu, uu, uu),
    vv: estimate(uu, uu, uu),
    curves: { ...curves, k1, E11: flat, E22: flat, E12: flat.map((E) => rho * E), freedom: 40 },
  },
};
const { freedoms: _, ...plain } = made.station.curves;
const picked = [{ ...made, station: { ...made.station, curves: plain } }];

describe("the co-spectrum of u and v", () => {
  const [curve] = coSpectrumCurves(picked);

  it("has the correlation coefficient for its area over ln k1", () => {
    let area = 0;
    for (let i = 1; i < curve.x.length; i++)
      area += ((curve.y[i] + curve.y[i - 1]) / 2) * Math.log(curve.x[i] / curve.x[i - 1]);
    expectClose(area, rho, {
      relative: 0.1,
      because: "half a band is lost at each end, a tenth of the area",
    });
  });
  it("has the error of a co-spectrum of such coherence", () => {
    // one bin a band at the lowest wavenumber: 40 degrees of freedom
    const error = Math.sqrt((1 + rho ** 2) / 40);
    expectClose((curve.high[0] - curve.y[0]) / (curve.y[0] / rho), 1.96 * error, {
      relative: 1e-9,
      because: "se² = (E11 E22 + E12²)/ν, evaluated",
    });
  });
  it("is drawn on an axis that shows its sign", () => {
    const { layout } = spectrumFigure(picked, options, "compensated", "E12");
    expect(layout.yaxis2?.type).toBe("linear");
    expect(layout.yaxis2?.range?.[0]).toBeLessThan(0);
  });
});

describe("the correlation of a replayed record", () => {
  const lag = Float64Array.from({ length: 41 }, (_, i) => 0.4 + 0.01 * i);
  const revival = {
    period: 0.6,
    peak: 0.9,
    lag,
    rho: lag.map((tau) => 0.9 * Math.exp(-(((tau - 0.6) / 0.05) ** 2))),
  };
  const revived = [{ ...made, station: { ...made.station, curves: { ...plain, revival } } }];
  it("is shown around its revival, in a panel of its own", () => {
    const panels = (spec: ReturnType<typeof spectrumFigure>) =>
      Object.keys(spec.layout).filter((key) => /^xaxis\d/.test(key)).length;
    expect(panels(spectrumFigure(picked, options))).toBe(2);
    const figure = spectrumFigure(revived, options);
    expect(panels(figure)).toBe(3);
    const T = station.T_int.value ?? 1;
    const [from, to] = figure.layout.xaxis4?.range ?? [];
    expect(from).toBeLessThan(0.6 / T);
    expect(to).toBeGreaterThan(0.6 / T);
  });
});

describe("isotropy scale by scale", () => {
  const local = {
    ...{
      k1: Float64Array.of(10, 20, 40),
      E11: Float64Array.of(3, 2, 1),
      slope: Float64Array.of(-1, -1.4, -2),
    },
    ...{ E22_isotropic: Float64Array.of(3, 2.4, 1.5), E22: Float64Array.of(3, 2.4, 1.5) },
  };
  const of = (E33: Float64Array | null) => [
    { ...made, station: { ...made.station, curves: { ...plain, local: { ...local, E33 } } } },
  ];
  it("has a panel for w where w was measured", () => {
    const names = (E33: Float64Array | null) =>
      new Set(localSpectrumFigure(of(E33), options).table.rows.map((row) => row[3]));
    expect(names(null)).toEqual(new Set(["local_slope", "E22_over_isotropic"]));
    expect(names(Float64Array.of(1, 1, 1))).toContain("E33_over_isotropic");
  });
});
