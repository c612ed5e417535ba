import { describe, expect, it } from "vitest";
import { argueDecay } from "../../../src/core/decay/argueDecay.ts";
import { deriveStations } from "../../../src/core/decay/deriveStations.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { flightCourse, placeAlong, placeBack, rateAlong } from "../../../src/core/decay/flightCourse.ts";
import { lawAt, lawVariance } from "../../../src/core/decay/lawBand.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const M = 0.025;
const nu = 1.5e-5;
const settings: DecaySettings = { ...plainSettings, referenceLength: M, kinematicViscosity: nu };
const digits = { relative: 1e-9, because: "closed forms on both sides; the fit ends far below its errors" };
const ends = (quantity: Quantity | undefined) =>
  quantity && isEstimate(quantity) ? [quantity.value, quantity.low, quantity.high] : [];

/**
 * Turbulence that decays in its own time, k = k0 ((t - t0)/(M/Us))^(-n), carried by a stream of straight U(x): the time
 * from the first station is ln(U/U1)/U', and epsilon = -dk/dt = n k/(t - t0) whatever U does.
 */
function carriedStations(U1: number, slope: number, n: number, x0: number, error: number) {
  const xs = spacedFrom(x0, 0.2, 2, 15);
  const U = (x: number) => U1 + slope * (x - 0.2);
  const Us = xs.reduce((sum, x) => sum + U(x) / xs.length, 0);
  // upstream of the first station U stays what it is there
  const age = (x: number) => Math.log(U(x) / U1) / slope + (0.2 - x0) / U1;
  const stations = xs.map((x) => {
    const k = 0.06 * Us ** 2 * ((Us * age(x)) / M) ** -n;
    const epsilon = (n * k) / age(x);
    const uu = (2 / 3) * k;
    return stationAt(x, {
      duration: 1,
      U: known(U(x), 1e-4),
      uu: known(uu, error),
      vv: known(uu, error),
      ww: known(uu, error),
      k: known(k, error),
      Tu: known(Math.sqrt(uu) / U(x), error / 2),
      L11: known(0.005 * ((Us * age(x)) / M) ** (1 - n / 2), error),
      epsilon_gradient: known(epsilon, error),
    });
  });
  return { stations, Us, U };
}

describe.each([
  ["speeds up by a half", 4, 1.1],
  ["slows down by a third", 6, -1.1],
])("a law in time, carried by a stream that %s", (_, U1, slope) => {
  const [n, x0] = [1.25, 3 * M];
  const { stations, Us } = carriedStations(U1, slope, n, x0, 0.005);
  const decay = fitDecay(stations, settings);
  const derived = deriveStations(stations, decay, settings);
  const argument = argueDecay(derived, decay, settings);

  it("gives back n, x0 and A along the time of flight, which is taken by itself", () => {
    expect(decay.coordinate).toBe("flight");
    expectClose(decay.n.value, n, digits);
    expectClose(decay.x0.value, x0, digits);
    expectClose(decay.A.value, 0.06, digits);
    expect(decay.flags.find(({ code }) => code === "u-varies")?.text).toContain("time of flight");
  });
  it("is not told along x, whose n leaves the interval", () => {
    const alongX = fitDecay(stations, { ...settings, coordinate: "x", window: [0, 9] });
    expect(alongX.coordinate).toBe("x");
    expect(Math.abs((alongX.n.value ?? 0) - n)).toBeGreaterThan(0.05);
  });
  it("has the dissipation of -dk/dt at every station, and a balance of one", () => {
    for (const { epsilon_decay, epsilon_gradient, balance } of derived) {
      expectClose(epsilon_decay.value, epsilon_gradient.value ?? 0, digits);
      expectClose(balance.value, 1, digits);
    }
  });
  it("tells the same by every route that sees the course", () => {
    for (const key of ["joint", "straight-line", "lambda", "epsilon", "origin-scan"])
      expectClose(argument.routes.find((route) => route.key === key)?.x0.value, x0, {
        relative: 1e-6,
        because: "the scale of Lambda² is that of U at the mean speed",
      });
    expectClose(argument.growths[0].exponent.value, 1 - n / 2, digits);
    const { x0: tried = [], rms = [] } = argument.originScan ?? {};
    expect(Math.abs(tried[rms.indexOf(Math.min(...rms))] - x0)).toBeLessThan(0.05);
  });
  it("is level once compensated, and has its exponent at every station", () => {
    for (const exponent of argument.local?.exponent ?? [])
      if (isEstimate(exponent)) expectClose(exponent.value, n, digits);
    for (const level of argument.local?.compensated ?? []) expectClose(level.value, 0.06, digits);
  });
  it("meets its own stations with the curve that is drawn", () => {
    if (decay.law === null) throw new Error("no law");
    for (const point of decay.points) expectClose(lawAt(decay.law, point.x) ?? 0, point.q, digits);
  });
  it("draws a contour whose extremes hold the interval of x0", () => {
    const [, low, high] = ends(decay.given_window.x0);
    const contour = argument.region?.contours[1];
    expect(Math.min(...(contour?.x0 ?? []))).toBeLessThan(low ?? 0);
    expect(Math.max(...(contour?.x0 ?? []))).toBeGreaterThan(high ?? 0);
  });
  it("moves q at a place by the covariance of A, x0 and n as the moved law itself does", () => {
    const { law } = decay;
    if (law === null) throw new Error("no law");
    // the variance by x0 alone, against the law drawn from an origin that is moved a little
    const only = { ...law, covariance: law.covariance.map((value, i) => (i === 4 ? value : 0)) };
    const step = 1e-6;
    const moved = Math.log((lawAt({ ...law, x0: law.x0 + step }, 1) ?? 0) / (lawAt(law, 1) ?? 1)) / step;
    expectClose(lawVariance(only, 1, 0), moved ** 2 * law.covariance[4], {
      relative: 1e-4,
      because: "a difference quotient",
    });
  });
  it("counts A in the mean speed of the window, so that a law in lengths keeps its meaning", () =>
    expectClose(decay.flight?.speed, Us, digits));
});

describe("a stream of one speed", () => {
  const law = { A: 0.06, x0: 3 * M, n: 1.25, ell: M, U: 6, nu, B: 0.005, m: 0.375 };
  const scatter = [3, -2, 1, -3, 2, 2, -1, -2, 1, 1, -2, 3, -1, 0];
  const stations = lawStations(law, spacedFrom(law.x0, 0.2, 2, 14), 0.01, (i) => 1 + scatter[i] / 400);

  it("has the same numbers along the time of flight as along x", () => {
    const [x, flight] = (["x", "flight"] as const).map((coordinate) => {
      const all = { ...settings, coordinate };
      const decay = fitDecay(stations, all);
      return { decay, argument: argueDecay(deriveStations(stations, decay, all), decay, all) };
    });
    expect(flight.decay.coordinate).toBe("flight");
    const same = { relative: 1e-12, because: "s is x but for the rounding of its sums" };
    for (const key of ["n", "x0", "A"] as const)
      ends(flight.decay[key]).forEach((value, i) => {
        expectClose(value, ends(x.decay[key])[i] ?? 0, same);
      });
    expectClose(flight.decay.chi2_reduced, x.decay.chi2_reduced ?? 0, same);
    expectClose(flight.argument.bootstrap?.n.value, x.argument.bootstrap?.n.value ?? 0, same);
  });
  it("is left to x by itself", () => {
    const decay = fitDecay(stations, settings);
    expect([decay.coordinate, decay.flight]).toEqual(["x", null]);
  });
});

describe("a U whose spread is that of its sampling errors", () => {
  it("does not ask for the time of flight, and one beyond them does", () => {
    const law = { A: 0.06, x0: 3 * M, n: 1.25, ell: M, U: 6, nu, B: 0.005, m: 0.375 };
    const spread = (error: number) =>
      lawStations(law, spacedFrom(law.x0, 0.2, 2, 10), 0.01).map((station, i) => ({
        ...station,
        U: known(6 * (1 + (i % 2 === 0 ? 0.012 : -0.012)), error),
      }));
    expect(fitDecay(spread(0.01), settings).coordinate).toBe("x");
    expect(fitDecay(spread(0.001), settings).coordinate).toBe("flight");
  });
});

describe("the time of flight", () => {
  const { stations } = carriedStations(4, 1.1, 1.25, 3 * M, 0.005);
  const course = flightCourse(stations, 5);
  if (course === null) throw new Error("no course");

  it("comes back to x from any place, upstream and beyond the last station too", () => {
    for (const x of [-3, 0.2, 0.2001, 0.7, 1.9999, 2, 5])
      expectClose(placeBack(course, placeAlong(course, x)), x, digits);
  });
  it("runs at Us/U, which is the slope of the course", () => {
    for (const x of [-1, 0.25, 1.1, 1.97, 4]) {
      const slope = (placeAlong(course, x + 1e-6) - placeAlong(course, x - 1e-6)) / 2e-6;
      expectClose(rateAlong(course, x), slope, { relative: 1e-7, because: "a central difference" });
    }
  });
  it("is asked for in vain where no station carries a U: the law runs along x, and a flag says so", () => {
    const bare = stations.map((station) => ({ ...station, U: { value: null, why: "not given" } as const }));
    const decay = fitDecay(bare, { ...settings, coordinate: "flight" });
    expect(decay.coordinate).toBe("x");
    expect(decay.flags.map(({ code }) => code)).toContain("flight-unknown");
  });
  it("is no matter in a decay along time", () => {
    const decay = fitDecay(stations, { ...settings, along: "t", coordinate: "flight" });
    expect([decay.coordinate, decay.flags.some(({ code }) => code === "flight-unknown")]).toEqual([
      "t",
      false,
    ]);
  });
});
