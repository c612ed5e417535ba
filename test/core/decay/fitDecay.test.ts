import { describe, expect, it } from "vitest";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const M = 0.025;
const law = { A: 0.06, x0: 3 * M, n: 1.25, ell: M, U: 6, nu: 1.5e-5, B: 0.005, m: 0.375 };
const xs = spacedFrom(law.x0, 0.2, 2, 16);
const settings = { ...plainSettings, referenceLength: M, kinematicViscosity: law.nu };
const scattered = (error: number, seed = 7, places = xs) => {
  const random = seededRandom(seed);
  return lawStations(law, places, error, () => Math.exp(error * random.gaussian()));
};
const holds = (quantity: Quantity, truth: number) =>
  isEstimate(quantity) && (quantity.low ?? -Infinity) <= truth && truth <= (quantity.high ?? Infinity);
const codes = (stations: StationResult[], choice: Partial<DecaySettings> = {}) =>
  fitDecay(stations, { ...settings, ...choice }).flags.map(({ code }) => code);

describe("the decay of a case", () => {
  const decay = fitDecay(scattered(0.01), settings);

  it("holds the law its stations were drawn from", () => {
    expect(decay.quantity).toBe("k");
    expect(holds(decay.n, law.n)).toBe(true);
    expect(holds(decay.x0, law.x0)).toBe(true);
    expect(holds(decay.A, law.A)).toBe(true);
  });
  it("correlates n with x0 as closely as is known: about -0.98 over x/M = 20 to 80", () => {
    const places = spacedFrom(4, 20, 80, 12);
    const stations = lawStations({ ...law, x0: 4, ell: 1 }, places, 0.02);
    expectClose(fitDecay(stations, plainSettings).correlation_n_x0, -0.98, {
      absolute: 0.01,
      because: "a rule of thumb for a grid with its origin at 4 M",
    });
  });
  it("keeps the Lambda² line and the epsilon law beside it, each with the same answer", () => {
    for (const route of [decay.lambda_route, decay.epsilon_route]) {
      expect(holds(route.n, law.n)).toBe(true);
      expect(holds(route.x0, law.x0)).toBe(true);
    }
  });
  it("sees L11 grow with the exponent put in", () => expect(holds(decay.growth.m, law.m)).toBe(true));
  it("does not exclude the exponent it was made with, and excludes the final period", () => {
    const p = (n: number) => decay.hypotheses.find((one) => Math.abs(one.n - n) < 1e-9)?.p ?? Number.NaN;
    expect(p(1.2)).toBeGreaterThan(p(1.5));
    expect(p(2.5)).toBeLessThan(1e-6);
  });
  it("is the same whatever the order of its stations", () => {
    expect(fitDecay([...scattered(0.01)].reverse(), settings)).toEqual(decay);
  });
  it("carries the union of later windows around the interval given the window", () => {
    for (const key of ["n", "x0"] as const) {
      const [whole, given] = [decay[key], decay.given_window[key]];
      if (!isEstimate(whole) || !isEstimate(given)) throw new Error("missing");
      expect(whole.low ?? -Infinity).toBeLessThanOrEqual(given.low ?? -Infinity);
      expect(whole.high ?? Infinity).toBeGreaterThanOrEqual(given.high ?? Infinity);
    }
  });
  it("has no unit in A: twice the speed leaves it", () => {
    const fast = lawStations({ ...law, U: 12 }, xs, 0.01);
    const slow = lawStations(law, xs, 0.01);
    const [a, b] = [fast, slow].map((stations) => fitDecay(stations, settings).A.value);
    expectClose(a, b ?? 0, { relative: 1e-9, because: "k/U² is the same" });
  });
});

describe("a window set by hand", () => {
  it("fits the stations within it, ends included, and says so", () => {
    const decay = fitDecay(scattered(0.01), { ...settings, window: [xs[3], xs[12]] });
    expect(decay.stations).toBe(10);
    expect(decay.window).toEqual([xs[3], xs[12]]);
    expect(decay.windowChosen).toBe("given");
    expect(decay.points.filter((point) => point.used)).toHaveLength(10);
    expect(decay.n).toEqual(decay.given_window.n);
  });
  it.each([
    [1, {}, "one station lies in the window, and a law with a free virtual origin needs four"],
    [3, {}, "three stations lie in the window, and a law with a free virtual origin needs four"],
    [2, { x0: 0.05 }, "two stations lie in the window, and a law with its virtual origin held needs three"],
    [2, { n: 1.25 }, "two stations lie in the window, and a law with its exponent held needs three"],
  ])("of %d stations is refused with the reason", (count, held, why) => {
    const decay = fitDecay(scattered(0.01), { ...settings, ...held, window: [xs[0], xs[count - 1]] });
    expect(decay.law).toBeNull();
    for (const quantity of [decay.n, decay.x0, decay.A, decay.given_window.n])
      expect(quantity).toEqual({ value: null, why });
  });
  it("of no station at all is refused and stays where it was set", () => {
    const decay = fitDecay(scattered(0.01), { ...settings, window: [50, 60] });
    expect(decay.window).toEqual([50, 60]);
    expect(decay.stations).toBe(0);
    expect(JSON.stringify(decay)).not.toMatch(/NaN|Infinity/);
  });
  it("of three stations is enough where x0 or n is held", () => {
    for (const held of [{ x0: law.x0 }, { n: law.n }]) {
      const decay = fitDecay(scattered(0.001), { ...settings, ...held, window: [xs[0], xs[2]] });
      expectClose(decay.n.value, law.n, { relative: 0.05, because: "0.1 % scatter over a short span" });
    }
  });
});

describe("doubts about a decay", () => {
  it("says at a short span how n moves with the origin, as refits with the origin held do", () => {
    const places = spacedFrom(law.x0, 0.2, 0.4, 8);
    const stations = lawStations(law, places, 0.01);
    const window = [0, 1] as const;
    const { flags } = fitDecay(stations, { ...settings, window });
    const text = flags.find(({ code }) => code === "short-span")?.text ?? "";
    const told = Number(/n would change by (-?\d+\.?\d*)/.exec(text)?.[1]);
    const nAt = (x0: number) => fitDecay(stations, { ...settings, window, x0 }).n.value ?? 0;
    const step = 0.001;
    expectClose(told, (nAt(law.x0 + step) - nAt(law.x0 - step)) / (2 * step), {
      relative: 0.1,
      because: "the rule takes the geometric centre for all stations; two digits are printed",
    });
  });
  it("flags a law on four stations, and a short span", () => {
    expect(codes(scattered(0.01), { window: [xs[0], xs[3]] })).toEqual(
      expect.arrayContaining(["few-stations", "short-span"]),
    );
  });
  it("flags a held origin with dn/dx0 = -n/(x_c - x0)", () => {
    const { flags, n, x0 } = fitDecay(scattered(0.01), {
      ...settings,
      x0: 0,
      window: [xs[0], xs[15]],
    });
    const centre = Math.sqrt(xs[0] * xs[15]);
    const flag = flags.find(({ code }) => code === "held-origin");
    expectClose(flag?.value, -(n.value ?? 0) / centre, { relative: 1e-12, because: "the rule itself" });
    expect(x0).toMatchObject({ value: 0, low: null, high: null });
  });
  it("puts the change of n with the held origin where refitting puts it", () => {
    // the rule holds for stations spread evenly in ln(x - x0), to first order
    const n = (x0: number) => fitDecay(lawStations(law, xs, 0.01), { ...settings, x0 }).n.value ?? 0;
    const measured = (n(law.x0 + 0.002) - n(law.x0 - 0.002)) / 0.004;
    const flag = fitDecay(lawStations(law, xs, 0.01), { ...settings, x0: law.x0 }).flags.find(
      ({ code }) => code === "held-origin",
    );
    expectClose(measured, flag?.value ?? 0, {
      relative: 0.35,
      because: "a rule of thumb: one centre for all stations",
    });
  });
  it("falls back to equal weights without errors, and says so", () => {
    const bare = lawStations(law, xs, 0);
    const decay = fitDecay(bare, settings);
    expect(decay.weights).toBe("equal");
    expect(decay.chi2_reduced).toBeNull();
    expect(decay.flags.map(({ code }) => code)).toContain("equal-weights");
    expect(decay.stations).toBe(16);
  });
  it("widens intervals to the scatter where chi-square fails, and says so", () => {
    const understated = scattered(0.03).map((station) => ({
      ...station,
      k: known(station.k.value ?? 1, 0.003),
    }));
    const decay = fitDecay(understated, { ...settings, window: [xs[0], xs[15]] });
    const equal = fitDecay(understated, { ...settings, weights: "equal", window: [xs[0], xs[15]] });
    expect(decay.flags.map(({ code }) => code)).toContain("chi-square-fails");
    if (!isEstimate(decay.n) || !isEstimate(equal.n)) throw new Error("missing");
    // all errors alike: the same fit, and F takes the place of chi-square
    expectClose(decay.n.low, equal.n.low ?? 0, { relative: 1e-5, because: "both ends come from F(1, 13)" });
  });
  it("says what was assumed where a component is missing", () => {
    const alone = lawStations(law, xs, 0.01).map(({ x, U, uu }) => stationAt(x, { U, uu }));
    const pair = lawStations(law, xs, 0.01).map(({ x, U, uu, vv }) => stationAt(x, { U, uu, vv }));
    expect(fitDecay(alone, settings)).toMatchObject({ quantity: "uu", assumption: "isotropic" });
    expect(fitDecay(pair, settings)).toMatchObject({ quantity: "k", assumption: "axisymmetric" });
    expect(codes(alone)).toContain("isotropy-assumed");
    expect(codes(pair)).toContain("axisymmetry-assumed");
    const k = fitDecay(lawStations(law, xs, 0.01), settings).A.value ?? 0;
    expectClose(fitDecay(pair, settings).A.value, k, { relative: 1e-9, because: "the law is isotropic" });
    expectClose(fitDecay(alone, settings).A.value, (2 / 3) * k, { relative: 1e-9, because: "uu is 2k/3" });
  });
  it("flags a mean velocity that varies by more than 1 %", () => {
    const slowing = lawStations(law, xs, 0.01).map((one, i) => ({ ...one, U: known(6 - 0.01 * i, 0.001) }));
    expect(codes(slowing)).toContain("u-varies");
    expect(codes(lawStations(law, xs, 0.01))).not.toContain("u-varies");
  });
  it("refuses a quantity that grows, and one that falls like an exponential", () => {
    const grows = xs.map((x) => stationAt(x, { q: known(1 + x, 0.01) }));
    const exponential = xs.map((x) => stationAt(x, { q: known(Math.exp(-3 * x), 0.01) }));
    for (const stations of [grows, exponential]) {
      const decay = fitDecay(stations, { ...settings, window: [xs[0], xs[15]] });
      expect(decay.law).toBeNull();
      expect(decay.flags.map(({ code }) => code)).toContain("law-refused");
      expect(JSON.stringify(decay)).not.toMatch(/NaN|Infinity/);
    }
  });
});

describe("the Lambda² line", () => {
  it("gives n and x0 exactly where the turbulence is isotropic and exact", () => {
    const { lambda_route } = fitDecay(lawStations(law, xs, 0), settings);
    expectClose(lambda_route.n.value, law.n, { relative: 1e-9, because: "Lambda² is exactly straight" });
    expectClose(lambda_route.x0.value, law.x0, { relative: 1e-9, because: "Lambda² is exactly straight" });
  });
  it("is refused for a large-eddy simulation, and so is the epsilon law: its gradients are filtered", () => {
    const decay = fitDecay(lawStations(law, xs, 0.01), { ...settings, kind: "les" });
    for (const route of [decay.lambda_route, decay.epsilon_route])
      for (const quantity of [route.n, route.x0])
        expect(quantity).toMatchObject({ value: null, why: expect.stringContaining("large-eddy") });
  });
  it("is refused without viscosity and without a dissipation of its own", () => {
    const stations = lawStations(law, xs, 0.01);
    const { lambda_route } = fitDecay(stations, { ...settings, kinematicViscosity: null });
    expect(lambda_route.n).toMatchObject({ value: null, why: expect.stringContaining("viscosity") });
    const without = stations.map(({ epsilon_gradient: _, ...one }) => stationAt(one.x, one));
    expect(fitDecay(without, settings).lambda_route.x0).toMatchObject({
      value: null,
      why: expect.stringContaining("circle"),
    });
  });
  it("holds the truth 95 times in 100", () => {
    const random = seededRandom(11);
    let [n, x0] = [0, 0];
    for (let trial = 0; trial < 300; trial++) {
      const stations = lawStations(law, xs, 0.02).map((station) => ({
        ...station,
        k: known((station.k.value ?? 1) * Math.exp(0.02 * random.gaussian()), 0.02),
        epsilon_gradient: known(
          (station.epsilon_gradient.value ?? 1) * Math.exp(0.02 * random.gaussian()),
          0.02,
        ),
      }));
      const { lambda_route } = fitDecay(stations, { ...settings, window: [xs[0], xs[15]] });
      n += holds(lambda_route.n, law.n) ? 1 : 0;
      x0 += holds(lambda_route.x0, law.x0) ? 1 : 0;
    }
    // 300 at 95 %: 285 with a standard deviation of 3.8
    for (const held of [n, x0]) expect(held).toBeGreaterThanOrEqual(270);
    for (const held of [n, x0]) expect(held).toBeLessThanOrEqual(298);
  });
});
