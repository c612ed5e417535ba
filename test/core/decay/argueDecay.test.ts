import { describe, expect, it } from "vitest";
import { argueDecay } from "../../../src/core/decay/argueDecay.ts";
import { deriveStations } from "../../../src/core/decay/deriveStations.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import type { DecayArgument, RouteKey } from "../../../src/core/decayArgument.ts";
import type { DecayResult, DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";
import { sharedRecords } from "../../support/sharedRecords.ts";

const M = 0.025;
const law = { A: 0.06, x0: 3 * M, n: 1.25, ell: M, U: 6, nu: 1.5e-5, B: 0.005, m: 0.375 };
const xs = spacedFrom(law.x0, 0.2, 2, 14);
const settings: DecaySettings = {
  ...plainSettings,
  referenceLength: M,
  kinematicViscosity: law.nu,
  window: [0, 9],
};

function argued(stations: StationResult[], choice: Partial<DecaySettings> = {}) {
  const all = { ...settings, ...choice };
  const decay = fitDecay(stations, all);
  return { decay, argument: argueDecay(deriveStations(stations, decay, all), decay, all) };
}
const holds = (quantity: Quantity | undefined, truth: number) =>
  quantity !== undefined &&
  isEstimate(quantity) &&
  (quantity.low ?? -Infinity) <= truth &&
  truth <= (quantity.high ?? Infinity);
const random = seededRandom(3);
/** Stations whose energy, length and scales scatter by what they say. */
const scattered = lawStations(law, xs, 0.01, () => Math.exp(0.01 * random.gaussian()));
const { decay, argument } = argued(scattered);
const exact = argued(lawStations(law, xs, 0.01));

describe("routes to n and x0 side by side", () => {
  const route = (of: DecayArgument, key: RouteKey) => of.routes.find((one) => one.key === key);

  it("all hold the law they were drawn from, but the one that holds x0 at 0", () => {
    for (const key of ["joint", "origin-scan", "lambda", "epsilon"] as const) {
      expect(holds(route(argument, key)?.n, law.n), key).toBe(true);
      expect(holds(route(argument, key)?.x0, law.x0), key).toBe(true);
    }
    expect(holds(route(exact.argument, "straight-line")?.x0, law.x0)).toBe(true);
    expect(holds(route(argument, "origin-zero")?.n, law.n)).toBe(false);
  });
  it("return n = 1.40 with the origin held at 0 on a law of 1.25 from 4 M, and say that it disagrees", () => {
    // a rule of thumb for x/M = 20 to 80
    const far = lawStations({ ...law, x0: 4, ell: 1 }, spacedFrom(4, 20, 80, 12), 0.002);
    const found = argued(far, { window: [0, 100], referenceLength: 1 }).argument;
    expectClose(route(found, "origin-zero")?.n.value, 1.4, { absolute: 0.02, because: "told as 1.40" });
    expect(found.disagreements).toContainEqual({ routes: ["joint", "origin-zero"], of: "n" });
  });
  it("do not disagree on an exact law but with the origin held at 0", () => {
    for (const { routes } of exact.argument.disagreements) expect(routes).toContain("origin-zero");
  });
  it("scan the origin to the same minimum as the joint fit with equal weights", () => {
    const scan = argument.originScan;
    if (scan === null) throw new Error("no scan");
    const best = scan.x0[scan.rms.indexOf(Math.min(...scan.rms))];
    expectClose(best, route(argument, "origin-scan")?.x0.value ?? 0, {
      absolute: 0.01,
      because: "the places tried lie 5 mm apart there",
    });
  });
  it("draw the straight line to the exact origin with the exact n held", () => {
    const held = argued(lawStations(law, xs, 0.01), { n: law.n }).argument;
    expectClose(route(held, "straight-line")?.x0.value, law.x0, { relative: 1e-9, because: "closed form" });
  });
  it("see the exponent at every station, and a level compensated energy", () => {
    const { local } = exact.argument;
    const because = "an exact law, refitted";
    for (const value of local?.exponent.slice(1, -1) ?? [])
      expectClose(value.value, law.n, { relative: 1e-6, because });
    for (const value of local?.compensated ?? [])
      expectClose(value.value, exact.decay.A.value ?? 0, { relative: 1e-6, because });
    expect(local?.exponent[0].value).toBeNull();
  });
});

describe("the joint region of n and x0", () => {
  const { region, bootstrap } = argument;
  const [inner, outer] = region?.contours ?? [];

  it("is the contour of the profile: its extremes are the ends of an interval with the joint drop", () => {
    // chi-square of two numbers at 68 %: 2.279, so that the extremes lie beyond one standard error by its root
    const { n } = decay.given_window;
    if (!isEstimate(n) || n.low === null || n.high === null) throw new Error("no interval");
    const reach = Math.max(...outer.n) - Math.min(...outer.n);
    // 95 %: 5.991 against 3.841 for one number
    expectClose(reach / (n.high - n.low), Math.sqrt(5.991 / 3.841), {
      relative: 0.03,
      because: "the region is nearly an ellipse, drawn with 96 points",
    });
    expect([inner.closed, outer.closed]).toEqual([true, true]);
    expect(Math.max(...inner.n)).toBeLessThan(Math.max(...outer.n));
  });
  it("has at each of its points the rise of two numbers at 95 %, by hand", () => {
    const sumAt = (n: number, x0: number) => {
      const level = scattered.map(({ x, k }) => Math.log(k.value ?? 1) + n * Math.log(x - x0));
      const mean = level.reduce((sum, value) => sum + value / level.length, 0);
      return level.reduce((sum, value) => sum + ((value - mean) / 0.01) ** 2, 0);
    };
    const least = sumAt(decay.law?.n ?? 0, decay.law?.x0 ?? 0);
    // chi-square with two degrees of freedom: -2 ln 0.05
    for (let i = 0; i < outer.n.length; i += 8)
      expectClose(sumAt(outer.n[i], outer.x0[i]) - least, -2 * Math.log(0.05), {
        relative: 1e-3,
        because: "errors smoothed over equal ones are equal; the crossing is found to a millionth",
      });
  });
  it("lies near its ellipse where the law is well known, and leaves it where it is not", () => {
    const misfit = (stations: StationResult[]) => {
      const contour = argued(stations).argument.region?.contours[1];
      if (contour === undefined) throw new Error("no region");
      const width = Math.max(...contour.ellipse.n) - Math.min(...contour.ellipse.n);
      return Math.abs(Math.max(...contour.n) - Math.max(...contour.ellipse.n)) / width;
    };
    expect(misfit(lawStations(law, xs, 0.0005))).toBeLessThan(0.01);
    const short = spacedFrom(law.x0, 0.2, 0.6, 8);
    expect(misfit(lawStations(law, short, 0.02))).toBeGreaterThan(0.05);
  });
  it("is open where the origin runs upstream without end", () => {
    const short = lawStations(law, spacedFrom(law.x0, 0.3, 0.5, 6), 0.03);
    const contour = argued(short).argument.region?.contours[1];
    expect(contour?.closed).toBe(false);
    expect(contour?.x0.every(Number.isFinite)).toBe(true);
  });
  it("and the scan, and the bootstrap, are of the common blocks where stations were sampled together", () => {
    const shared = { A: 0.06, x0: 4, n: 1.25, U: 1 };
    const stations = sharedRecords(shared, spacedFrom(4, 20, 80, 12), 0.95, seededRandom(2));
    const found = argued(stations, { window: [0, 100], quantity: "uu", referenceLength: 1 });
    const { n } = found.decay.given_window;
    const { n: drawn } = found.argument.bootstrap ?? { n };
    const adopted = found.argument.scan.first.find((window) => window.adopted);
    expect(adopted?.n).toEqual(n);
    if (!isEstimate(n) || !isEstimate(drawn)) throw new Error("missing");
    const [told, seen] = [n, drawn].map(({ low, high }) => (high ?? 0) - (low ?? 0));
    // Student's t of 49 is 2.5 % beyond the normal's
    expectClose(seen / told, 1, { absolute: 0.12, because: "percentiles of 1000 draws" });
  });
  it("is not drawn where x0 is held", () => expect(argued(scattered, { x0: 0 }).argument.region).toBeNull());
  it("stands beside a bootstrap whose percentiles are those of the profile within their own scatter", () => {
    const { n, x0 } = decay.given_window;
    for (const [one, other] of [
      [bootstrap?.n, n],
      [bootstrap?.x0, x0],
    ])
      for (const end of ["low", "high"] as const) {
        if (!one || !other || !isEstimate(one) || !isEstimate(other)) throw new Error("missing");
        const width = (other.high ?? 0) - (other.low ?? 0);
        expectClose(((one[end] ?? 0) - (other[end] ?? 0)) / width, 0, {
          absolute: 0.08,
          because: "percentiles of 1000 draws, and a slight bend",
        });
      }
    expect(bootstrap?.refits).toBe(1000);
    expect(argued(scattered).argument.bootstrap).toEqual(bootstrap);
  });
});

describe("growth of the scales", () => {
  it("follows the exponents put in, L11 with 1 - n/2, lambda with 1/2, Re_lambda with (1 - n)/2", () => {
    const growth = (key: string) => exact.argument.growths.find((one) => one.key === key);
    const because = "an exact law";
    expectClose(growth("L11")?.exponent.value, law.m, { relative: 1e-6, because });
    expectClose(growth("lambda")?.exponent.value, 0.5, { relative: 1e-6, because });
    expectClose(growth("Re_lambda")?.exponent.value, (1 - law.n) / 2, { relative: 1e-5, because });
    expectClose(growth("L11")?.implied.value, 1 - law.n / 2, { relative: 1e-6, because });
    for (const { agrees } of exact.argument.growths) expect(agrees).toBe(true);
  });
  it("sees C_epsilon stay as it is where m is 1 - n/2: L11 epsilon/u'³ does not change then", () => {
    // epsilon ~ xi^-(n + 1), u'³ ~ xi^(-3n/2), L11 ~ xi^(1 - n/2)
    const withConstant = (drift: number) =>
      scattered.map((station, i) => ({
        ...station,
        C_epsilon: known(0.6 * ((xs[i] - law.x0) / (xs[0] - law.x0)) ** drift, 0.02),
      }));
    const level = argued(withConstant(0)).argument.dissipationConstant;
    expectClose(level.mean.value, 0.6, { relative: 1e-12, because: "all stations have it" });
    expect(level.constant).toBe(true);
    expect(level.p).toBeGreaterThan(0.99);
    const drifting = argued(withConstant(0.2)).argument.dissipationConstant;
    expect(holds(drifting.exponent, 0.2)).toBe(true);
    expect(drifting.constant).toBe(false);
    expect(drifting.p).toBeLessThan(0.001);
  });
  it("has no C_epsilon where no station carries one, with the reason", () => {
    const { mean, p, constant, exponent } = exact.argument.dissipationConstant;
    expect([mean.value, p, constant, exponent.value]).toEqual([null, null, null, null]);
  });
  it("says where a length grows otherwise", () => {
    const slow = argued(lawStations({ ...law, m: 0.2 }, xs, 0.01)).argument.growths;
    expect(slow.find((one) => one.key === "L11")?.agrees).toBe(false);
  });
});

describe("development length", () => {
  const developing = lawStations(law, xs, 0.01).map((station, i) => ({
    ...station,
    isotropy_uv: known(i < 4 ? 1.3 : 1.05, 0.01),
    isotropy_uw: known(i < 6 ? 1.3 : 1.15, 0.01),
    epsilon_gradient: known((station.epsilon_gradient.value ?? 1) * (i < 5 ? 0.5 : 1), 0.01),
  }));
  const { development } = argued(developing).argument;
  const at = (key: string) => development.criteria.find((one) => one.key === key);

  it("is that of each criterion by itself", () => {
    expect(at("isotropy_uv")?.inside.value).toBe(xs[4]);
    expect(at("isotropy_uw")?.inside.value).toBeNull();
    expect(at("isotropy_uw_settled")?.inside.value).toBe(xs[6]);
    expect(at("balance")?.inside.value).toBe(xs[5]);
    expect(at("window")?.inside.value).toBe(xs[0]);
    expect(at("S_dudx")?.inside).toMatchObject({ value: null });
  });
  it("moves with its tolerance", () => {
    const derived = deriveStations(developing, fitDecay(developing, settings), settings);
    const wide = argueDecay(derived, fitDecay(developing, settings), {
      ...settings,
      developmentTolerance: 0.25,
    });
    expect(wide.development.criteria.find((one) => one.key === "isotropy_uw")?.inside.value).toBe(xs[6]);
    expect(wide.development.tolerance).toBe(0.25);
  });
  it("can be counted in reference lengths and in L11 at the inflow", () => {
    expect(development.length).toBe(M);
    expect(development.inflowL11.value).toBe(developing[0].L11.value);
  });
});

describe("U that varies along the stream", () => {
  const flowing = spacedFrom(law.x0, 0.2, 2, 40);
  /** q on a law in x1 + integral of (Um/U) dx, with U growing linearly. */
  const speedAt = (x: number) => 6 * (1 + 0.1 * (x - 0.2));
  const Um = flowing.reduce((sum, x) => sum + speedAt(x) / flowing.length, 0);
  const flown = (x: number) => 0.2 + (Um / 0.6) * Math.log(speedAt(x) / speedAt(0.2));
  const stations = flowing.map((x) =>
    stationAt(x, {
      U: known(speedAt(x), 0.001),
      uu: known(((flown(x) - law.x0) / M) ** -law.n, 0.005),
    }),
  );
  const alongX = argued(stations, { quantity: "uu", coordinate: "x" }).argument;
  const inFlight = argued(stations, { quantity: "uu" }).argument;
  const keys = ({ routes }: DecayArgument) => routes.map(({ key }) => key);

  it("is put right by the time of flight: n comes back, which it does not along x", () => {
    const { flight, routes } = alongX;
    expectClose(flight?.n.value, law.n, { relative: 1e-9, because: "U is straight between stations" });
    expectClose(flight?.x0.value, 0.2 - ((0.2 - law.x0) * speedAt(0.2)) / Um, {
      relative: 1e-9,
      because: "the same, carried back to x with the U of the first station",
    });
    expect(Math.abs((routes[0].n.value ?? 0) - law.n)).toBeGreaterThan(0.01);
  });
  it("shows the coordinate that was not adopted among the routes", () => {
    expect(keys(alongX)).toContain("flight");
    expect(keys(alongX)).not.toContain("along-x");
    expect(keys(inFlight)).toContain("along-x");
    expect(keys(inFlight)).not.toContain("flight");
    expectClose(
      inFlight.routes.find(({ key }) => key === "along-x")?.n.value,
      alongX.routes[0].n.value ?? 0,
      {
        relative: 1e-9,
        because: "the same fit of the same stations",
      },
    );
  });
  it("is left alone below 1 %", () => expect(argument.flight).toBeNull());
});

describe("what would narrow the intervals", () => {
  const { narrowing } = argument;
  const widthOf = (stations: StationResult[], of: DecayResult = decay) => {
    const { n } = argued(stations, { window: of.window }).decay.given_window;
    return isEstimate(n) ? (n.error?.standard ?? 0) : 0;
  };
  it("never widens them, and lists the greatest gain first", () => {
    for (const { n, x0 } of narrowing) {
      expect(n).toBeLessThanOrEqual(1 + 1e-9);
      expect(x0).toBeLessThanOrEqual(1 + 1e-9);
    }
    const gains = narrowing.map(({ n, x0 }) => n * x0);
    expect(gains).toEqual([...gains].sort((a, b) => a - b));
  });
  it("foretells what a record twice as long at the first station does", () => {
    const plan = narrowing.find(({ kind, x }) => kind === "record" && x === xs[0]);
    const longer = scattered.map((station, i) =>
      i === 0 ? { ...station, duration: null, k: known(station.k.value ?? 1, 0.01 / Math.SQRT2) } : station,
    );
    const plain = scattered.map((station) => ({ ...station, duration: null }));
    expectClose(plan?.n, widthOf(longer) / widthOf(plain), {
      relative: 0.02,
      because: "the law itself moves a little with the weights",
    });
  });
  it("foretells what one more station beyond the last does", () => {
    const plan = narrowing.find(({ kind, x }) => kind === "station" && x > xs[13]);
    if (!plan) throw new Error("no plan beyond the last station");
    const more = [...scattered, ...lawStations(law, [plan.x], 0.01)];
    const after = argued(more).decay.given_window.n;
    const before = decay.given_window.n;
    if (!isEstimate(after) || !isEstimate(before)) throw new Error("missing");
    expectClose(plan.n, (after.error?.standard ?? 0) / (before.error?.standard ?? 1), {
      relative: 0.03,
      because: "the law moves a little",
    });
  });
});
