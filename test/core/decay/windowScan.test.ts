import { describe, expect, it } from "vitest";
import { criterion } from "../../../src/core/decay/criterion.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { windowScan } from "../../../src/core/decay/windowScan.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate } from "../../../src/core/quantity.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const xs = spacedFrom(0, 6, 100, 16);
const nearField = (x: number) => (x - 3) ** -1.25 * (1 + Math.exp(-(x - 6) / 6));
const random = seededRandom(4);
const stations = xs.map((x) =>
  stationAt(x, { q: known(nearField(x) * Math.exp(0.005 * random.gaussian()), 0.005) }),
);
const scanOf = (settings: DecaySettings = plainSettings) =>
  windowScan(stations, fitDecay(stations, settings), settings);

describe("n and x0 against the first and the last station used", () => {
  const decay = fitDecay(stations, plainSettings);
  const { first, last } = scanOf();

  it("give at the adopted window what the fit gives", () => {
    for (const side of [first, last]) {
      const adopted = side.filter((window) => window.adopted);
      expect(adopted).toHaveLength(1);
      expect(adopted[0].n).toEqual(decay.given_window.n);
      expect(adopted[0].x0).toEqual(decay.given_window.x0);
      expect(adopted[0].stations).toBe(decay.stations);
    }
  });
  it("drift with the first station while the near field is inside, and p shows it", () => {
    const [whole] = first;
    expect(whole.x).toBe(xs[0]);
    expect(whole.p).toBeLessThan(1e-6);
    if (!isEstimate(whole.n)) throw new Error("no law over all stations");
    // the interval of all stations lies wholly beside the exponent they fall with in the end
    expect(whole.n.low ?? 0).toBeGreaterThan(1.25);
  });
  it("say why there is no law where three stations are left", () => {
    const three = first.find((window) => window.stations === 3);
    expect(three?.n).toMatchObject({ value: null, why: expect.stringMatching(/three stations/) });
    expect(three?.p).toBeNull();
  });
  it("mark the starts whose intervals the adopted one unites", () => {
    const united = first.flatMap(({ inUnion, n }) => (inUnion && isEstimate(n) ? [n] : []));
    expect(united.length).toBeGreaterThan(1);
    if (!isEstimate(decay.n)) throw new Error("no law");
    expect(decay.n.low).toBe(Math.min(...united.map(({ low }) => low ?? Number.NEGATIVE_INFINITY)));
    expect(decay.n.high).toBe(Math.max(...united.map(({ high }) => high ?? Number.POSITIVE_INFINITY)));
    expect(last.filter(({ inUnion }) => inUnion)).toHaveLength(1);
    const given = scanOf({ ...plainSettings, window: decay.window });
    expect(given.first.some(({ inUnion }) => inUnion)).toBe(false);
  });
  it("are in order of x, one window a station", () => {
    expect(last.map(({ x }) => x)).toEqual(xs.filter((x) => x >= decay.window[0]));
  });
});

describe("a condition on the stations", () => {
  const places = [1, 2, 3, 4, 5, 6];
  const values = [1.4, 1.14, 1.05, 1.09, 1.02, 1.0].map((value) => known(value, 0.02));
  const condition = { key: "r", words: "r within 10 % of 1", values, low: 1 / 1.1, high: 1.1 };

  it("holds from where no interval contradicts it, and from where every one lies inside", () => {
    // 1.14 less 4 % reaches 1.1; 1.09 plus 4 % leaves it again
    const { notContradicted, inside } = criterion(places, condition);
    expect(notContradicted.value).toBe(2);
    expect(inside.value).toBe(5);
  });
  it("has an interval that holds its own value and repeats", () => {
    const found = criterion(places, condition);
    for (const at of [found.notContradicted, found.inside]) {
      if (!isEstimate(at)) throw new Error("missing");
      expect(at.low ?? 9).toBeLessThanOrEqual(at.value);
      expect(at.high ?? 9).toBeGreaterThanOrEqual(at.value);
    }
    expect(criterion(places, condition)).toEqual(found);
  });
  it("read towards the end, holds up to the last station before the first that breaks it", () => {
    const growing = [0.1, 0.15, 0.2, 0.24, 0.3, 0.4].map((value) => known(value, 0.05));
    const { notContradicted, inside } = criterion(
      places,
      { key: "L", words: "", values: growing, low: 0, high: 0.25 },
      "end",
    );
    expect(notContradicted.value).toBe(4);
    expect(inside.value).toBe(3); // 0.24 plus 10 % passes 0.25
  });
  it("is missing, with the reason, where the last station does not hold it", () => {
    const never = criterion(places, { ...condition, high: 0.95 });
    expect(never.inside).toMatchObject({ value: null, why: expect.stringMatching(/last station/) });
  });
});

describe("what physics says of the ends of a window", () => {
  const law = { A: 0.06, x0: 0, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.1, m: 0.4 };
  const developing = lawStations(law, xs, 0.02).map((station, i) => ({
    ...station,
    U: known(i < 3 ? 6.3 : 6, 0.001),
    S_dudx: known(1, 0.01),
    ...(i < 5 ? { S_dudx: { value: -0.1, low: -0.15, high: -0.05 } } : {}),
    ...(i >= 5 ? { S_dudx: { value: -0.45, low: -0.47, high: -0.43 } } : {}),
    uv: { value: 0, low: -1e-5, high: 1e-5 },
  }));
  const settings = { ...plainSettings, extent: 1.2 };
  const { start, end } = windowScan(developing, fitDecay(developing, settings), settings);
  const at = (key: string) => start.find((one) => one.key === key)?.inside.value;

  it("names the station from which U stays, and from which the cascade has developed", () => {
    expect(at("U")).toBe(xs[3]);
    expect(at("S_dudx")).toBe(xs[5]);
    expect(at("uv")).toBe(xs[0]);
    expect(start.find((one) => one.key === "skewness_u")?.inside.value).toBeNull();
  });
  it("ends where L11 reaches a quarter of the lateral extent", () => {
    // 0.1 x^0.4 = 0.3 at x = 3^2.5 = 15.6
    const bound = 3 ** 2.5;
    const place = end[0].notContradicted.value ?? 0;
    expect(place).toBeGreaterThanOrEqual(Math.max(...xs.filter((x) => x <= bound)));
    expectClose(place, bound, { relative: 0.25, because: "stations stand 21 % apart, L11 known to 4 %" });
    expect(windowScan(developing, fitDecay(developing, plainSettings), plainSettings).end).toEqual([]);
  });
  it("ends, too, where noise of a known level reaches 2 % of the variance", () => {
    // white noise of variance s² has E11 = s²/k1max one-sided
    const step = 1e-4;
    const most = Math.PI / (law.U * step);
    const variance = 2e-4;
    const noisy = developing.map((station) => ({
      ...station,
      U: known(law.U, 0),
      facts: { ...station.facts, step, noiseFloor: variance / most },
    }));
    const found = windowScan(noisy, fitDecay(noisy, plainSettings), plainSettings).end;
    const clean = noisy.filter(({ uu }) => (uu.value ?? 0) > variance / 0.02).map(({ x }) => x);
    expect(clean.length).toBeGreaterThan(3);
    expect(clean.length).toBeLessThan(xs.length);
    expect(found.map(({ key, inside }) => [key, inside.value])).toEqual([["background", Math.max(...clean)]]);
  });
});
