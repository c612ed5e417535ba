import { describe, expect, it } from "vitest";
import { decayRoutes, meet, routeDisagreements } from "../../../src/core/decay/decayRoutes.ts";
import { adoptsDecay } from "../../../src/core/decay/deriveStations.ts";
import { epsilonRoute } from "../../../src/core/decay/epsilonRoute.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { fitPowerLaw } from "../../../src/core/decay/fitPowerLaw.ts";
import { fitWindow } from "../../../src/core/decay/fitWindow.ts";
import { hypotheses, namedExponents } from "../../../src/core/decay/hypotheses.ts";
import { lambdaRoute } from "../../../src/core/decay/lambdaRoute.ts";
import { scalesFromDissipation } from "../../../src/core/decay/scalesFromDissipation.ts";
import { straightLine } from "../../../src/core/decay/straightLine.ts";
import type { DecayRoute } from "../../../src/core/decayArgument.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { bare, estimate, isEstimate, missing, type Quantity } from "../../../src/core/quantity.ts";
import { chiSquareTail } from "../../../src/core/signal/distributions/chiSquareTail.ts";
import { fTail } from "../../../src/core/signal/distributions/fTail.ts";
import { studentQuantile } from "../../../src/core/signal/distributions/studentQuantile.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const law = { A: 0.06, x0: 1, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.1, m: 0.375 };
const xs = spacedFrom(law.x0, 4, 40, 9);
const settings: DecaySettings = { ...plainSettings, window: [0, 99], kinematicViscosity: law.nu };
const scatter = [0.01, -0.02, 0.015, 0, -0.01, 0.02, -0.005, 0.01, -0.02];
const exact = lawStations(law, xs, 0.01);
const moved = lawStations(law, xs, 0.02, (i) => Math.exp(scatter[i]));
const refitted = { relative: 1e-6, because: "an exact law, refitted" };
const z = 1.959963984540054;

function routesOf(stations: StationResult[], choice: Partial<DecaySettings> = {}) {
  const all = { ...settings, ...choice };
  const decay = fitDecay(stations, all);
  const routes = decayRoutes(decay, all, null);
  return { decay, routes, of: (key: string) => routes.find((route) => route.key === key) };
}
const whyOf = (quantity: Quantity | undefined) => (!quantity || isEstimate(quantity) ? "" : quantity.why);
const endsOf = (quantity: Quantity | undefined) =>
  quantity && isEstimate(quantity) ? [quantity.low, quantity.high] : [];

describe("the routes to n and x0", () => {
  it("are the joint fit, the scan, the straight line, Lambda², epsilon, and x0 held at zero", () => {
    expect(routesOf(exact).routes.map(({ key }) => key)).toEqual([
      "joint",
      "origin-scan",
      "straight-line",
      "lambda",
      "epsilon",
      "origin-zero",
    ]);
  });
  it("have more with an origin that is held, or asked for elsewhere; zero is not held twice", () => {
    const keys = (choice: Partial<DecaySettings>) =>
      routesOf(exact, choice)
        .routes.slice(5)
        .map(({ key }) => key);
    expect(keys({ x0: 0.5 })).toEqual(["origin-zero", "origin-held"]);
    expect(keys({ x0: 0 })).toEqual(["origin-zero"]);
    expect(keys({ otherX0: 2 })).toEqual(["origin-zero", "origin-other"]);
    expect(keys({ otherX0: 0 })).toEqual(["origin-zero", "origin-other"]);
  });
  it("with an origin held give the n of a straight line of ln q over ln(x - x0)", () => {
    const by = (x0: number) => {
      const line = straightLine(
        xs.map((x) => Math.log(x - x0)),
        moved.map(({ k }) => Math.log(k.value ?? 1)),
        xs.map(() => 0.02),
      );
      if (line === null) throw new Error("no line");
      // where chi-square fails the scatter tells the errors, with Student's t
      const fails = chiSquareTail(line.sum, line.freedom) < 0.05;
      const widened = fails ? Math.sqrt(line.sum / line.freedom) * studentQuantile(0.975, line.freedom) : z;
      return { n: -line.slope, reach: widened * Math.sqrt(line.varianceOfSlope) };
    };
    const { of } = routesOf(moved, { otherX0: 2, x0: 0.5 });
    for (const [key, x0] of [
      ["origin-zero", 0],
      ["origin-held", 0.5],
      ["origin-other", 2],
    ] as const) {
      const { n, reach } = by(x0);
      expectClose(of(key)?.n.value, n, { relative: 1e-8, because: "the same line" });
      expectClose(endsOf(of(key)?.n)[1], n + reach, {
        relative: 1e-5,
        because: "a profile that is a parabola",
      });
      expect(of(key)?.x0).toMatchObject({ value: x0, low: null, high: null });
    }
  });
  it("cannot hold an origin at or beyond the first station", () => {
    const { of } = routesOf(exact, { otherX0: xs[0] });
    expect(whyOf(of("origin-other")?.n)).toMatch(/first station/);
    expect(of("origin-zero")?.n.value).not.toBeNull();
    const upstream = exact.map((one) => ({ ...one, x: one.x - 10 }));
    expect(whyOf(routesOf(upstream, { window: [-99, 99] }).of("origin-zero")?.x0)).toMatch(/first station/);
  });
  it("scan the origin with all stations alike, whatever their errors", () => {
    const uneven = moved.map((one, i) => ({
      ...one,
      k: known(one.k.value ?? 1, i < 4 ? 0.02 : 0.2),
      duration: null,
    }));
    const free = fitPowerLaw({ x: xs, q: uneven.map(({ k }) => k.value ?? 1), error: null });
    const { of } = routesOf(uneven);
    expectClose(of("origin-scan")?.n.value, free.n, { relative: 1e-6, because: "the same fit" });
    expectClose(of("origin-scan")?.x0.value, free.x0, { relative: 1e-6, because: "the same fit" });
    expect(Math.abs((of("joint")?.n.value ?? 0) - free.n)).toBeGreaterThan(0.01);
  });
  it("leave what was held free in the joint fit", () => {
    const held = routesOf(moved, { n: 1.1 }).of("joint");
    const free = routesOf(moved).of("joint");
    expectClose(held?.n.value, free?.n.value ?? 0, { relative: 1e-6, because: "the same fit" });
    expect(endsOf(held?.n)[0]).not.toBeNull();
  });
  it("draw a straight line of q^(-1/n) whose zero is x0, by Fieller's interval", () => {
    const { of } = routesOf(exact, { n: 1.25 });
    const route = of("straight-line");
    expectClose(route?.x0.value, 1, refitted);
    expect(route?.n).toMatchObject({ value: 1.25, low: null });
    const [low, high] = endsOf(route?.x0);
    // relative errors 0.01/n of a line through 1: at the ends the line is 1.96 errors from zero
    const y = xs.map((x) => (x - 1) / 3);
    const line = straightLine(
      xs,
      y,
      y.map((value) => (value * 0.01) / 1.25),
    );
    if (line === null) throw new Error("no line");
    for (const end of [low, high]) {
      const x = end ?? 0;
      const variance = line.varianceOfIntercept + 2 * x * line.covariance + x * x * line.varianceOfSlope;
      expectClose(((x - 1) / 3) ** 2, z * z * variance, {
        relative: 1e-4,
        because: "scaled to the first station",
      });
    }
    expect(route?.note).toMatch(/as given/);
    expect(routesOf(exact).of("straight-line")?.note).toMatch(/as fitted/);
  });
  it("have no straight line without an exponent or three stations, or where it does not grow", () => {
    expect(whyOf(routesOf(exact.slice(0, 2)).of("straight-line")?.x0)).toMatch(/no exponent/);
    expect(whyOf(routesOf(exact.slice(0, 2), { n: 1.2 }).of("straight-line")?.x0)).toMatch(
      /fewer than three/,
    );
    const growing = exact.map((one, i) => ({ ...one, k: known(1 + i, 0.01) }));
    expect(whyOf(routesOf(growing, { n: 1.2 }).of("straight-line")?.x0)).toMatch(/not grow/);
  });
  it("widen the straight line's interval to the scatter where that exceeds the errors", () => {
    const width = (error: number) => {
      const stations = lawStations(law, xs, error, (i) => Math.exp(scatter[i])).map((one) => ({
        ...one,
        duration: null,
      }));
      const [low, high] = endsOf(routesOf(stations, { n: 1.25 }).of("straight-line")?.x0);
      return (high ?? 0) - (low ?? 0);
    };
    expectClose(width(0.001), width(0.002), { relative: 1e-3, because: "the scatter alone counts" });
    expectClose(width(0.04) / width(0.02), 2, {
      relative: 0.02,
      because: "errors that cover the scatter count",
    });
  });
});

describe("two intervals", () => {
  it("meet where they have a value in common, an open side reaching without end", () => {
    const [a, b] = [estimate(1, 0, 2), estimate(4, 3, 5)];
    expect([meet(a, b), meet(b, a), meet(a, estimate(3, 2, 4)), meet(estimate(3, 2, 4), a)]).toEqual([
      false,
      false,
      true,
      true,
    ]);
    expect(meet(estimate(1, 0, Infinity), b)).toBe(true);
    expect(meet(a, estimate(4, -Infinity, 5))).toBe(true);
    expect(meet(a, estimate(4, 3, Infinity))).toBe(false);
  });
  it("cannot be compared where one has none", () => {
    expect(meet(estimate(1, 0, 2), bare(5, "held"))).toBeNull();
    expect(meet(missing("none"), estimate(1, 0, 2))).toBeNull();
  });
  it("that do not meet are told for n and for x0 apart", () => {
    const route = (key: DecayRoute["key"], n: Quantity, x0: Quantity): DecayRoute => ({
      key,
      name: key,
      n,
      x0,
      note: "",
    });
    const [low, high] = [estimate(1, 0, 2), estimate(4, 3, 5)];
    const found = routeDisagreements([
      route("joint", low, low),
      route("lambda", high, low),
      route("epsilon", bare(9, ""), high),
    ]);
    expect(found).toEqual([
      { routes: ["joint", "lambda"], of: "n" },
      { routes: ["joint", "epsilon"], of: "x0" },
      { routes: ["lambda", "epsilon"], of: "x0" },
    ]);
  });
});

describe("Lambda² = 10 nu k/epsilon along the stream", () => {
  it("grows from x0 at 10 nu/(n U): n and x0 by a straight line, n's ends from those of the slope", () => {
    const { n, x0 } = lambdaRoute(exact, settings);
    expectClose(n.value, 1.25, { relative: 1e-9, because: "closed form" });
    expectClose(x0.value, 1, { relative: 1e-9, because: "closed form" });
    const y = xs.map((x) => (10 * law.nu * (x - 1)) / (law.n * law.U));
    // k and epsilon known to 1 % each
    const line = straightLine(
      xs,
      y,
      y.map((value) => value * 0.01 * Math.SQRT2),
    );
    const reach = z * Math.sqrt(line?.varianceOfSlope ?? 0);
    const [slope, numerator] = [line?.slope ?? 0, (10 * law.nu) / law.U];
    expectClose(endsOf(n)[0], numerator / (slope + reach), { relative: 1e-8, because: "closed form" });
    expectClose(endsOf(n)[1], numerator / (slope - reach), { relative: 1e-8, because: "closed form" });
  });
  it("takes 1 for U in a decay along time, and the mean U of the stations along x", () => {
    const time = { ...settings, along: "t" as const };
    expectClose(lambdaRoute(exact, time).n.value, 1.25 * 6, { relative: 1e-9, because: "n U = 10 nu/slope" });
    const still = exact.map((one) => ({ ...one, U: missing("none") }));
    expect(whyOf(lambdaRoute(still, settings).n)).toMatch(/no mean velocity/);
    const twice = exact.map((one, i) => ({ ...one, U: known(i % 2 ? 8 : 4, 0) }));
    expectClose(lambdaRoute(twice.slice(0, 8), settings).n.value, 1.25, {
      relative: 1e-9,
      because: "the mean is 6",
    });
  });
  it("is told by its scatter where errors are lacking or too small: Student's t for N - 2", () => {
    const scattered = (error: number) =>
      exact.map((one, i) => ({
        ...one,
        epsilon_gradient: known((one.epsilon.value ?? 1) * Math.exp(5 * scatter[i]), error),
      }));
    const [none, tiny] = [lambdaRoute(scattered(0), settings), lambdaRoute(scattered(1e-4), settings)];
    expect(endsOf(none.n)[1]).toBeGreaterThan(none.n.value ?? 9);
    expect((endsOf(tiny.n)[1] ?? 0) - (endsOf(tiny.n)[0] ?? 0)).toBeGreaterThan(0.02);
  });
  it("is open above where a slope of zero is not excluded", () => {
    const flat = exact.map((one, i) => ({
      ...one,
      epsilon_gradient: known((one.k.value ?? 1) * Math.exp(i % 2 ? 0.4 : -0.41), 0),
    }));
    const { n, x0 } = lambdaRoute(flat, settings);
    if (isEstimate(n)) expect(n).toMatchObject({ high: null, why_high: expect.stringMatching(/not grow/) });
    else expect(n.why).toMatch(/not grow/);
    expect(endsOf(x0).every((end) => end === null)).toBe(true);
  });
  it("is not drawn without viscosity, of an LES, of fewer than three stations, or where it falls", () => {
    expect(whyOf(lambdaRoute(exact, { ...settings, kinematicViscosity: null }).n)).toMatch(/viscosity/);
    expect(whyOf(lambdaRoute(exact, { ...settings, kind: "les" }).n)).toMatch(/large-eddy/);
    expect(whyOf(lambdaRoute(exact.slice(0, 2), settings).x0)).toMatch(/fewer than three/);
    expect(lambdaRoute(exact.slice(0, 3), settings).n.value).not.toBeNull();
    const falling = exact.map((one) => ({ ...one, epsilon_gradient: known(1, 0.01) }));
    expect(whyOf(lambdaRoute(falling, settings).n)).toMatch(/not grow/);
    const zero = exact.map((one) => ({ ...one, epsilon_gradient: bare(0, "") }));
    expect(whyOf(lambdaRoute(zero, settings).n)).toMatch(/fewer than three/);
  });
});

describe("the fall of the measured dissipation", () => {
  it("has the exponent n + 1 of the same origin, its interval that of the profile less one", () => {
    const { n, x0 } = epsilonRoute(exact, settings);
    expectClose(n.value, 1.25, refitted);
    expectClose(x0.value, 1, refitted);
    const direct = fitWindow(
      exact.map((one) => ({ x: one.x, q: one.epsilon.value ?? 1, smoothedError: 0.01 })),
      settings,
    );
    if ("refused" in direct) throw new Error(direct.refused);
    const own = routesOf(exact.map((one) => stationAt(one.x, { q: one.epsilon }))).decay.given_window.n;
    expectClose(endsOf(n)[0], (endsOf(own)[0] ?? 0) - 1, refitted);
    expectClose(endsOf(n)[1], (endsOf(own)[1] ?? 0) - 1, refitted);
  });
  it("is free of what the law holds, and taken in logarithms", () => {
    const held = epsilonRoute(exact, { ...settings, x0: 0, n: 2, residuals: "linear" });
    expectClose(held.n.value, 1.25, refitted);
    expect(endsOf(held.x0)[0]).not.toBeNull();
  });
  it("is not to be had of an LES, without gradients, or of too few of them", () => {
    expect(whyOf(epsilonRoute(exact, { ...settings, kind: "les" }).n)).toMatch(/large-eddy/);
    const without = exact.map((one) => ({ ...one, epsilon_gradient: missing("none") }));
    expect(whyOf(epsilonRoute(without, settings).n)).toMatch(/no station/);
    expect(whyOf(epsilonRoute(exact.slice(0, 3), settings).n)).toMatch(/three stations/);
  });
});

describe("the exponents of theory", () => {
  const q = moved.map(({ k }) => k.value ?? 1);
  it("are 1, 6/5, 10/7, 3/2, 2 and 5/2", () => {
    expect(namedExponents.map(({ n }) => n)).toEqual([1, 1.2, 10 / 7, 1.5, 2, 2.5]);
  });
  it.each([
    ["known errors, by chi-square", 0.02, "chi-square"],
    ["the scatter, by F", 0, "F"],
  ] as const)("have the p of a fit with n held there against one with n free: %s", (_, error, test) => {
    const points = xs.map((x, i) => ({ x, q: q[i], smoothedError: error || null }));
    const window = fitWindow(points, settings);
    if ("refused" in window) throw new Error(window.refused);
    const data = { x: xs, q, error: error ? xs.map(() => error) : null };
    const free = fitPowerLaw(data);
    for (const found of hypotheses([window], settings)) {
      const rise = fitPowerLaw(data, { n: found.n }).residualSum - free.residualSum;
      const p = error ? chiSquareTail(rise, 1) : fTail(rise / (free.residualSum / 6), 1, 6);
      expectClose(found.p, p, {
        relative: 1e-4,
        absolute: 1e-12,
        because: "the profile ends at 1e-4 of an error",
      });
      expect(found.test).toBe(test);
    }
  });
  it("take the largest p over the windows that count, and none where n is held or there is no law", () => {
    const window = (of: readonly number[]) => {
      const fitted = fitWindow(
        xs.map((x, i) => ({ x, q: of[i], smoothedError: 0.02 })),
        settings,
      );
      return fitted;
    };
    const [own, other] = [window(q), window(exact.map(({ k }) => k.value ?? 1))];
    const p = (windows: Parameters<typeof hypotheses>[0], choice = settings) =>
      hypotheses(windows, choice).map((one) => one.p);
    const both = p([own, { refused: "none" }, other]);
    const [first, second] = [p([own]), p([other])];
    both.forEach((value, i) => {
      expect(value).toBe(Math.max(first[i] ?? 0, second[i] ?? 0));
    });
    expect(p([{ refused: "none" }])).toEqual(new Array(6).fill(null));
    expect(p([own], { ...settings, n: 1.2 })).toEqual(new Array(6).fill(null));
  });
});

describe("the dissipation of the decay", () => {
  const record = stationAt(1, { duration: 1, epsilon: known(1, 0.1) });
  const profile = stationAt(1, { duration: null, epsilon: known(1, 0.1) });
  const emptyProfile = stationAt(1, { duration: null });
  it.each([
    ["a record", record, "auto", null, false],
    ["a record of an LES", record, "auto", "les", true],
    ["a record, chosen", record, "decay", null, true],
    ["an LES, gradients chosen", record, "gradient", "les", false],
    ["a profile with its own", profile, "decay", "les", false],
    ["a profile without", emptyProfile, "auto", null, true],
    ["a profile without, gradients chosen", emptyProfile, "gradient", null, false],
  ] as const)("of %s is adopted or not", (_, station, dissipation, kind, adopted) => {
    expect(adoptsDecay(station, { ...settings, dissipation, kind } as DecaySettings)).toBe(adopted);
  });
  it("fixes the scales by their definitions", () => {
    const scales = scalesFromDissipation(known(4, 0.02), known(30, 0.1), known(0.05, 0.03), 1.5e-5);
    const close = { relative: 1e-12, because: "closed form" };
    const standard = (quantity: Quantity) => (isEstimate(quantity) ? quantity.error?.standard : 0);
    expectClose(scales.lambda.value, Math.sqrt((15 * 1.5e-5 * 4) / 30), close);
    expectClose(standard(scales.lambda), Math.hypot(0.01, 0.05), close);
    expectClose(scales.eta.value, (1.5e-5 ** 3 / 30) ** 0.25, close);
    expectClose(standard(scales.eta), 0.025, close);
    expectClose(scales.Re_lambda.value, (2 * Math.sqrt((15 * 1.5e-5 * 4) / 30)) / 1.5e-5, close);
    expectClose(standard(scales.Re_lambda), Math.hypot(0.02, 0.05), close);
    expectClose(scales.C_epsilon.value, (30 * 0.05) / 8, close);
    expectClose(standard(scales.C_epsilon), Math.hypot(0.1, 0.03, 0.03), close);
    const without = scalesFromDissipation(known(4, 0.02), known(30, 0.1), known(0.05, 0.03), null);
    expect([without.lambda.value, without.eta.value, without.Re_lambda.value]).toEqual([null, null, null]);
    expectClose(without.C_epsilon.value, 1.5 / 8, close);
  });
});
