import { describe, expect, it } from "vitest";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { fitPowerLaw } from "../../../src/core/decay/fitPowerLaw.ts";
import { settledFrom } from "../../../src/core/decay/settledFrom.ts";
import { missing } from "../../../src/core/quantity.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const xs = spacedFrom(0, 6, 100, 16);
/** A near field of twice the far field's law at x = 6 that dies out over six mesh widths. */
const nearField = (x: number) => (x - 3) ** -1.25 * (1 + Math.exp(-(x - 6) / 6));
const stations = (q: (x: number) => number, error: number, seed: number) => {
  const random = seededRandom(seed);
  return xs.map((x) => stationAt(x, { q: known(q(x) * Math.exp(error * random.gaussian()), error) }));
};

describe("the automatic window", () => {
  it("is tempted: the first ten stations alone give n = 1.50", () => {
    const ten = xs.slice(0, 10);
    const { n } = fitPowerLaw({ x: ten, q: ten.map(nearField), error: null });
    expectClose(n, 1.5, { absolute: 0.01, because: "the near field as it was designed" });
    // R² of the straight line in ln(x - x0), which tells nothing
    const { residualSum } = fitPowerLaw({ x: ten, q: ten.map(nearField), error: null });
    const logs = ten.map((x) => Math.log(nearField(x)));
    const mean = logs.reduce((sum, value) => sum + value / 10, 0);
    const spread = logs.reduce((sum, value) => sum + (value - mean) ** 2, 0);
    expectClose(1 - residualSum / spread, 0.9995, { absolute: 0.0003, because: "no misfit to be seen" });
  });
  it.each([1, 2, 3, 4, 5, 6])("leaves a near field of 100 % (seed %d)", (seed) => {
    const decay = fitDecay(stations(nearField, 0.005, seed), plainSettings);
    expect(decay.window[0]).toBeGreaterThan(10);
    expect(decay.window[1]).toBe(100);
    expect(decay.n.value).toBeLessThan(1.35);
    expect(decay.windowReason).toMatch(/p = /);
  });
  it("is never those ten, nor begins among the first three of them, in 200 draws", () => {
    let beyond = 0;
    for (let seed = 1; seed <= 200; seed++) {
      const { window } = fitDecay(stations(nearField, 0.005, seed), plainSettings);
      expect(window[0]).toBeGreaterThan(xs[2]);
      if (window[1] > xs[9]) beyond++;
    }
    // a run of six within the ten passes the test once in a thousand
    expect(beyond).toBeGreaterThanOrEqual(198);
  });
  it("keeps all stations of a pure law 95 times in 100", () => {
    let all = 0;
    for (let seed = 1; seed <= 200; seed++)
      if (
        fitDecay(
          stations((x) => (x - 3) ** -1.25, 0.01, seed),
          plainSettings,
        ).stations === 16
      )
        all++;
    // 200 chi-square tests at 5 %: 190 with a standard deviation of 3.1
    expect(all).toBeGreaterThanOrEqual(178);
    expect(all).toBeLessThan(200);
  });
  it("holds the truth at least 95 times in 100 with the union of later windows", () => {
    let held = 0;
    for (let seed = 1; seed <= 200; seed++) {
      const { n } = fitDecay(
        stations((x) => (x - 3) ** -1.25, 0.01, seed),
        plainSettings,
      );
      if (n.value !== null && (n.low ?? -Infinity) < 1.25 && 1.25 < (n.high ?? Infinity)) held++;
    }
    expect(held).toBeGreaterThanOrEqual(190);
  });
  it("begins where derivative skewness has settled, and says so", () => {
    const law = { A: 0.06, x0: 0, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.1, m: 0.4 };
    const developing = lawStations(law, xs, 0.02).map((station, i) => ({
      ...station,
      S_dudx: known(1, 0.01),
      ...(i < 4 ? { S_dudx: { value: -0.1 * i, low: -0.1 * i - 0.02, high: -0.1 * i + 0.02 } } : {}),
      ...(i >= 4 ? { S_dudx: { value: -0.45, low: -0.47, high: -0.43 } } : {}),
    }));
    const decay = fitDecay(developing, plainSettings);
    expect(decay.window[0]).toBe(xs[4]);
    expect(decay.windowReason).toMatch(/skewness/);
  });
  it("with equal weights takes every station, flagged", () => {
    const bare = xs.map((x) => stationAt(x, { q: known(nearField(x), 0) }));
    const decay = fitDecay(bare, plainSettings);
    expect(decay.stations).toBe(16);
    expect(decay.flags.map(({ code }) => code)).toContain("equal-weights");
  });
  it("says so where no run of five stations agrees with one law", () => {
    const random = seededRandom(9);
    const wild = xs.map((x) =>
      stationAt(x, { q: known(x ** -1.2 * Math.exp(0.2 * random.gaussian()), 0.002) }),
    );
    const codes = fitDecay(wild, plainSettings).flags.map(({ code }) => code);
    expect(codes).toEqual(expect.arrayContaining(["window-without-plateau", "chi-square-fails"]));
  });
});

describe("a quantity has settled", () => {
  it("from the first station after which no interval leaves its last value", () => {
    const values = [1.4, 1.3, 1.12, 1.01, 1.0, 0.99, 1.0].map((value) => known(value, 0.02));
    expect(settledFrom(values, 0.1)).toBe(2); // 1.12 less 4 % reaches 1.1
    expect(settledFrom(values, 0.02)).toBe(3);
  });
  it("at once where it never leaves it, and unknown with three stations", () => {
    expect(
      settledFrom(
        [1, 1, 1, 1].map((value) => known(value, 0.01)),
        0.1,
      ),
    ).toBe(0);
    expect(
      settledFrom(
        [1, 1, 1].map((value) => known(value, 0.01)),
        0.1,
      ),
    ).toBeNull();
    expect(
      settledFrom(
        [1, 1, 1, 1].map(() => missing("not measured")),
        0.1,
      ),
    ).toBeNull();
  });
});
