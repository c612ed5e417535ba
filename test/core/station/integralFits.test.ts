import { describe, expect, it } from "vitest";
import { logBins } from "../../../src/core/signal/logBins.ts";
import { integralTimes } from "../../../src/core/station/integralTimes.ts";
import { modelScale } from "../../../src/core/station/modelScale.ts";
import { areaUpTo, zeroCrossing } from "../../../src/core/station/zeroCrossing.ts";
import { expectClose } from "../../support/expectClose.ts";

const exact = { relative: 1e-10, because: "a closed form" };

describe("von Karman's form fitted to a spectrum", () => {
  const [size, step, segments] = [4096, 1e-3, 12];
  const edges = logBins(1, size / 2 + 1, 20);
  /** Bands lie on the form, each as far below it as the mean of the logarithm of its chi-square. */
  function karman(T: number, of = (E: number, _f: number) => E): Float64Array {
    const E = new Float64Array(size / 2 + 1);
    for (let b = 0; b + 1 < edges.length; b++) {
      const weight = edges[b + 1] - edges[b];
      const f = (edges[b] + edges[b + 1] - 1) / 2 / (size * step);
      const form = 5 / (1 + (2 * Math.PI * 1.33896 * f * T) ** 2) ** (5 / 6);
      E.fill(of(form, f) * Math.exp(-19 / (36 * segments * weight)), edges[b], edges[b + 1]);
    }
    return E;
  }
  const fitted = (E: Float64Array, guess: number) =>
    modelScale({ size, step, segments, density: [E], cross: null }, guess);
  const searched = { relative: 1e-8, because: "a zero found by halving" };

  it.each([0.5, 1, 3, 7])("gives back its integral time from a guess %d times as long", (factor) => {
    expectClose(Number(fitted(karman(0.05), 0.05 * factor)), 0.05, searched);
  });
  it("sees nothing beyond f T = 1/2: the inertial and the dissipation range may be anything", () => {
    expectClose(
      Number(
        fitted(
          karman(0.05, (E, f) => (f * 0.05 < 0.5 ? E : 0.01 * E)),
          0.05,
        ),
      ),
      0.05,
      searched,
    );
  });
  it("is the least weighted squares of the logarithm where the spectrum is another's", () => {
    const E = karman(0.05, (value, f) => value * (1 + 0.1 * Math.sin(2 * f)));
    const found = Number(fitted(E, 0.05));
    const misfit = (T: number) => {
      const rest: [number, number][] = [];
      for (let b = 0; b + 1 < edges.length; b++) {
        const weight = edges[b + 1] - edges[b];
        const f = (edges[b] + edges[b + 1] - 1) / 2 / (size * step);
        if (f * found >= 0.5) continue;
        const log = Math.log(E[edges[b]]) + 19 / (36 * segments * weight);
        rest.push([weight, log + (5 / 6) * Math.log(1 + (2 * Math.PI * 1.33896 * f * T) ** 2)]);
      }
      const total = rest.reduce((sum, [w]) => sum + w, 0);
      const mean = rest.reduce((sum, [w, y]) => sum + w * y, 0) / total;
      return rest.reduce((sum, [w, y]) => sum + w * (y - mean) ** 2, 0) / total;
    };
    for (const away of [1e-4, 1e-3, 0.05]) {
      expect(misfit(found * (1 + away))).toBeGreaterThan(misfit(found));
      expect(misfit(found * (1 - away))).toBeGreaterThan(misfit(found));
    }
  });
  it("gives a reason where it has too few bands, lies out of reach, or is shorter than a step", () => {
    expect(fitted(karman(0.05), 1)).toMatch(/fewer than four bands/);
    expect(fitted(karman(0.05).fill(1), 0.05)).toMatch(/factor of ten|uncorrelated/);
    expect(fitted(karman(0.0008), 0.0008)).toMatch(/uncorrelated samples/);
    expectClose(Number(fitted(karman(0.0012), 0.0012)), 0.0012, {
      relative: 1e-7,
      because: "a nearly flat form",
    });
  });
  it("passes over bands that hold nothing", () => {
    const E = karman(0.05);
    E.fill(0, edges[7], edges[8]);
    expectClose(Number(fitted(E, 0.05)), 0.05, searched);
  });
});

describe("a zero crossing", () => {
  it("lies on the straight line between two lags, and the area before it is that of trapezoids", () => {
    const found = zeroCrossing(Float64Array.of(4, 2, 1, -3, 5));
    expectClose(found.at, 2.25, exact);
    expectClose(found.area, 3 + 1.5 + 0.125, exact);
    expect(zeroCrossing(Float64Array.of(4, 0, 1))).toEqual({ at: 1, area: 2 });
  });
  it("that is not there leaves the whole area", () => {
    expect(zeroCrossing(Float64Array.of(4, 2, 1))).toEqual({ at: null, area: 4.5 });
  });
  it("area: up to any lag, and no further than the last", () => {
    const rho = Float64Array.of(4, 2, 1);
    expect([0, 0.5, 1, 1.5, 2, 2.5, 9].map((end) => areaUpTo(rho, end))).toEqual([
      0, 1.75, 3, 3.875, 4.5, 4.5, 4.5,
    ]);
  });
});

describe("the integral time by every route", () => {
  const [step, scale, lags] = [1e-3, 20, 200];
  const falling = Float64Array.from({ length: lags }, (_, l) => (l < 120 ? 3 * Math.exp(-l / scale) : -0.1));
  const correlation = { step, stride: 1, covariance: [falling] };
  const [size, segments] = [8192, 9];
  // ln E linear in f², as far below as the mean of the logarithm of a chi-square
  const level = 4 * 3 * 0.021;
  const density = Float64Array.from(
    { length: size / 2 + 1 },
    (_, f) => level * Math.exp(-0.002 * f * f - 19 / (36 * segments)),
  );
  const spectra = { size, step, segments, density: [density], cross: null };
  const found = integralTimes(correlation, spectra, "zero-crossing");

  it("of an exponential is its own: exactly where the form is fitted, to the trapezoid's error elsewhere", () => {
    const { routes, tauStar, scale: adopted } = found;
    expectClose(Number(routes.exponential), 0.02, exact);
    // on the straight line between lags 19 and 20, e^-0.95 and e^-1
    expectClose(Number(routes["one-over-e"]), 0.02, { relative: 1e-12, because: "1/e lies on a lag" });
    const [before, last] = [3 * Math.exp(-119 / scale), -0.1];
    const star = 119 + before / (before - last);
    expectClose(tauStar, star * step, exact);
    const ratio = Math.exp(-1 / scale);
    const trapezoid = (3 * (1 - ratio ** 119) * (1 + ratio)) / (1 - ratio) / 2;
    const area = (trapezoid + (before * (star - 119)) / 2) / 3;
    expectClose(Number(routes["zero-crossing"]), area * step, exact);
    expect(adopted).toBe(routes["zero-crossing"]);
  });
  it("at frequency 0 is E(0)/(4 uu), from ln E linear in f²", () => {
    expectClose(Number(found.routes["low-frequency"]), 0.021, exact);
  });
  it("at frequency 0 uses bins below 0.12/T alone", () => {
    const T = Number(found.routes["zero-crossing"]);
    const last = Math.ceil((0.12 / T) * size * step) - 1;
    const bent = density.map((value, f) => (f > last ? 50 : value));
    const bentToo = density.map((value, f) => (f >= last ? 50 : value));
    const of = (E: Float64Array) =>
      Number(
        integralTimes(correlation, { ...spectra, density: [E] }, "zero-crossing").routes["low-frequency"],
      );
    expectClose(of(bent), 0.021, exact);
    expect(Math.abs(of(bentToo) / 0.021 - 1)).toBeGreaterThan(0.01);
    const holed = density.map((value, f) => (f === 5 ? 0 : value));
    expectClose(of(holed), 0.021, exact);
  });
  it("needs three bins there, and says so", () => {
    const few = (bins: number) => {
      const short = Math.ceil(bins / 0.12 / (1 / Number(found.routes["zero-crossing"])) / step) + 2;
      const own = { ...spectra, size: short, density: [density] };
      return integralTimes(correlation, own, "zero-crossing").routes["low-frequency"];
    };
    expect(few(2)).toMatch(/fewer than three bins/);
    expect(typeof few(3)).toBe("number");
  });
  it("that a correlation or a spectrum does not give has its reason, and the adopted one its best guess", () => {
    const slow = { step, stride: 1, covariance: [Float64Array.from({ length: 50 }, (_, l) => 1 - l / 200)] };
    const lacking = integralTimes(slow, null, "exponential");
    expect(lacking.routes["zero-crossing"]).toMatch(
      /does not fall to zero within 0\.0500 of lag.* 0\.0430 or more/,
    );
    expect(lacking.routes["one-over-e"]).toMatch(/1\/e/);
    expect(lacking.routes["low-frequency"]).toMatch(/shorter than a segment/);
    expect(lacking.routes.model).toMatch(/shorter than a segment/);
    expect(lacking.tauStar).toBeNull();
    expect(lacking.scale).toBe(lacking.routes.exponential);
    expect(integralTimes(slow, null, "zero-crossing").scale).toBeNull();
    const low = integralTimes(correlation, null, "low-frequency");
    expect(low.scale).toBe(low.routes["zero-crossing"]);
    const none = integralTimes(null, spectra, "zero-crossing");
    expect(Object.values(none.routes).every((why) => /no correlation/.test(String(why)))).toBe(true);
    expect(Object.keys(none.routes).sort()).toEqual(Object.keys(found.routes).sort());
    expect([none.scale, none.tauStar]).toEqual([null, null]);
  });
  it("of uncorrelated samples has no exponential", () => {
    const white = { step, stride: 1, covariance: [Float64Array.of(1, 0.1, -0.1)] };
    expect(integralTimes(white, null, "exponential").routes.exponential).toMatch(/fewer than two lags/);
    expectClose(
      Number(integralTimes(white, null, "one-over-e").routes["one-over-e"]),
      ((1 - 1 / Math.E) / 0.9) * step,
      exact,
    );
  });
});
