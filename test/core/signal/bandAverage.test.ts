import { describe, expect, it } from "vitest";
import { bandAverage } from "../../../src/core/signal/bandAverage.ts";
import { hannWindow } from "../../../src/core/signal/hannWindow.ts";
import { expectClose } from "../../support/expectClose.ts";

const rounding = { relative: 1e-12, because: "closed form" };

describe("a spectrum averaged over bands", () => {
  // k = 0 … 9: with one band a decade 1 … 9 are one, k = 0 none
  const k1 = Float64Array.from({ length: 12 }, (_, i) => i);
  const E = k1.map((k) => 100 - k);

  it("has the mean of k1 and of E over the bins of a band; k1 = 0 is in none", () => {
    const found = bandAverage(k1, E, 1);
    expect(found.k1).toEqual([5, 10.5]);
    expect(found.E).toEqual([95, 89.5]);
  });
  it("keeps a bin that is alone in its band as it is", () => {
    const found = bandAverage(Float64Array.of(1, 10, 100), Float64Array.of(7, 5, 3), 2, 9);
    expect(found).toEqual({ k1: [1, 10, 100], E: [7, 5, 3], freedom: [9, 9, 9] });
  });
  it("splits a decade into as many bands as are asked for, at equal ratios", () => {
    // borders 1, 3.16, 10
    expect(bandAverage(k1.subarray(1, 10), E.subarray(1, 10), 2).k1).toEqual([2, 6.5]);
  });
  it("of nothing is nothing", () => {
    const nothing = { k1: [], E: [], freedom: [] };
    expect(bandAverage(new Float64Array(0), new Float64Array(0), 5)).toEqual(nothing);
    expect(bandAverage(Float64Array.of(0), Float64Array.of(4), 5)).toEqual(nothing);
  });

  it.each([1, 2, 3, 6, 9])("of %d Hann bins has the degrees of freedom their overlap leaves", (m) => {
    // white noise through a window: the powers of bins i and j correlate by |Σ w² e^(2πi(i-j)n/N)|²/(Σ w²)²
    const size = 64;
    const window = hannWindow(size);
    const correlation = (apart: number) => {
      let [re, im, whole] = [0, 0, 0];
      window.forEach((w, n) => {
        re += w * w * Math.cos((2 * Math.PI * apart * n) / size);
        im += w * w * Math.sin((2 * Math.PI * apart * n) / size);
        whole += w * w;
      });
      return (re * re + im * im) / whole ** 2;
    };
    let sum = 0;
    for (let i = 0; i < m; i++) for (let j = 0; j < m; j++) sum += correlation(i - j);
    const bins = Float64Array.from({ length: m }, (_, i) => 1 + i);
    const [freedom] = bandAverage(bins, bins, 1, 2).freedom;
    expectClose(freedom, (2 * m * m) / sum, rounding);
  });
  it("adds the degrees of freedom of bins that have their own", () => {
    const bins = Float64Array.of(1, 2, 3);
    const [even] = bandAverage(bins, bins, 1, 4).freedom;
    const [own] = bandAverage(bins, bins, 1, Float64Array.of(2, 4, 6)).freedom;
    expectClose(own, even, rounding);
  });
});
