import { describe, expect, it } from "vitest";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { fitPowerLaw } from "../../../src/core/decay/fitPowerLaw.ts";
import {
  type FitPoint,
  fitWindow,
  inflation,
  type WindowFit,
  windowQuantity,
} from "../../../src/core/decay/fitWindow.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { chiSquareTail } from "../../../src/core/signal/distributions/chiSquareTail.ts";
import { studentQuantile } from "../../../src/core/signal/distributions/studentQuantile.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom } from "../../support/lawStations.ts";
import { sharedRecords } from "../../support/sharedRecords.ts";

const xs = spacedFrom(1, 4, 40, 8);
const scatter = [0.01, -0.02, 0.015, 0, -0.01, 0.02, -0.005, 0.01];
const settings: DecaySettings = { ...plainSettings, window: [0, 99] };
const pointsOf = (error: number | null, q = (x: number) => (x - 1) ** -1.25): FitPoint[] =>
  xs.map((x, i) => ({ x, q: q(x) * Math.exp(scatter[i]), smoothedError: error }));
const dataOf = (points: readonly FitPoint[]) => {
  return {
    x: points.map(({ x }) => x),
    q: points.map(({ q }) => q),
    error: points[0].smoothedError === null ? null : points.map(({ smoothedError }) => smoothedError ?? 1),
  };
};
function sound(points: readonly FitPoint[], choice: Partial<DecaySettings> = {}): WindowFit {
  const window = fitWindow(points, { ...settings, ...choice });
  if ("refused" in window) throw new Error(window.refused);
  return window;
}
const refusal = (points: readonly FitPoint[], choice: Partial<DecaySettings> = {}) => {
  const window = fitWindow(points, { ...settings, ...choice });
  return "refused" in window ? window.refused : "";
};
const endsOf = (quantity: Quantity) => (isEstimate(quantity) ? [quantity.low, quantity.high] : []);
const z2 = 1.959963984540054 ** 2;
const found = { relative: 1e-4, because: "an end is found to a millionth of its distance" };

describe("a law of one window", () => {
  it("with errors that cover the scatter has their chi-square, and a drop of 3.84", () => {
    const window = sound(pointsOf(0.02));
    const { residualSum } = fitPowerLaw(dataOf(pointsOf(0.02)));
    expectClose(window.p, chiSquareTail(residualSum, 5), { relative: 1e-6, because: "the same fit" });
    expect([window.scattered, window.variance]).toEqual([false, 1]);
    expectClose(window.drop, z2, { relative: 1e-9, because: "chi-square of one number at 95 %" });
  });
  it.each([
    ["errors too small for the scatter", 0.004],
    ["equal weights", null],
  ])("with %s has the variance of the scatter, and Student's drop", (_, error) => {
    const window = sound(pointsOf(error));
    const { residualSum } = fitPowerLaw(dataOf(pointsOf(error)));
    expect(window.scattered).toBe(true);
    if (error === null) expect(window.p).toBeNull();
    else expect(window.p).toBeLessThan(0.05);
    expectClose(window.variance, residualSum / 5, { relative: 1e-6, because: "the same fit" });
    expectClose(window.drop, (residualSum / 5) * studentQuantile(0.975, 5) ** 2, {
      relative: 1e-6,
      because: "t² = F",
    });
  });
  it.each(["n", "x0"] as const)(
    "has ends of %s at which the best of the others raises the sum by the drop",
    (key) => {
      for (const error of [0.02, 0.004, null]) {
        const points = pointsOf(error);
        const window = sound(points);
        for (const end of endsOf(windowQuantity(window, key))) {
          const held = fitPowerLaw(dataOf(points), { [key]: end ?? 0 });
          expectClose(held.residualSum - window.fit.residualSum, window.drop, found);
        }
      }
    },
  );
  it("has errors of n and x0 on the linear scale, of A on that of logarithms", () => {
    const window = sound(pointsOf(0.02));
    const { standardError } = window.fit;
    for (const [key, scale] of [
      ["n", "linear"],
      ["x0", "linear"],
      ["A", "log"],
    ] as const) {
      const quantity = windowQuantity(window, key);
      const error = isEstimate(quantity) ? quantity.error : undefined;
      expect([error?.scale, error?.freedom]).toEqual([scale, null]);
      const standard = (standardError?.[key] ?? 0) / (key === "A" ? window.fit.A : 1);
      expectClose(error?.standard, standard, { relative: 1e-9, because: "the same covariance" });
    }
    const scattered = windowQuantity(sound(pointsOf(null)), "n");
    expect(isEstimate(scattered) ? scattered.error?.freedom : 0).toBe(5);
  });
  it("gives no interval to what was held", () => {
    const window = sound(pointsOf(0.02), { x0: 1 });
    expect(windowQuantity(window, "x0")).toMatchObject({ value: 1, low: null, why_low: "held, not fitted" });
    expect(endsOf(windowQuantity(window, "n"))[0]).not.toBeNull();
    const other = sound(pointsOf(0.02), { n: 1.2 });
    expect(windowQuantity(other, "n")).toMatchObject({ value: 1.2, low: null });
    expect(endsOf(windowQuantity(other, "A"))[0]).not.toBeNull();
  });
  it("counts A in the reference length", () => {
    const metres = sound(pointsOf(0.02));
    const meshes = sound(pointsOf(0.02), { referenceLength: 0.5 });
    expectClose(meshes.fit.A, metres.fit.A * 0.5 ** -metres.fit.n, { relative: 1e-6, because: "(x/ell)^-n" });
  });
});

describe("there is no law", () => {
  it.each([
    [0, {}, "no station lie in the window, and a law with a free virtual origin needs four"],
    [1, {}, "one station lies in the window, and a law with a free virtual origin needs four"],
    [3, {}, "three stations lie in the window, and a law with a free virtual origin needs four"],
    [2, { n: 1.2 }, "two stations lie in the window, and a law with its exponent held needs three"],
    [2, { x0: 1 }, "two stations lie in the window, and a law with its virtual origin held needs three"],
    [
      1,
      { x0: 1, n: 1.2 },
      "one station lies in the window, and a law with origin and exponent held needs two",
    ],
  ])("for %d stations with %j", (count, choice, words) => {
    expect(refusal(pointsOf(0.02).slice(0, count), choice)).toBe(words);
    expect(refusal(pointsOf(0.02).slice(0, count + 1), choice)).not.toBe(words);
  });
  it("for stations at fewer places than it needs", () => {
    const twice = [...pointsOf(0.02).slice(0, 3), ...pointsOf(0.02).slice(0, 3)];
    expect(refusal(twice)).toMatch(/^three stations lie/);
  });
  it("for what falls like an exponential, grows, or does not tell its numbers apart", () => {
    const clean = (q: (x: number) => number) => refusal(xs.map((x) => ({ x, q: q(x), smoothedError: 0.02 })));
    expect(clean((x) => Math.exp(-x / 10))).toMatch(/exponential/);
    expect(clean((x) => Math.exp(-((x / 20) ** 2)))).toMatch(/exponential/);
    // its scatter puts the best origin some 18 000 lengths upstream, with an A beyond all numbers
    expect(refusal(pointsOf(0.02, (x) => Math.exp(-x / 10)))).toMatch(/do not tell/);
    expect(
      refusal(
        pointsOf(0.02, (x) => x),
        { x0: 1 },
      ),
    ).toMatch(/not fall/);
    expect(refusal(pointsOf(0.02).slice(0, 4), {})).toBe("");
  });
});

describe("common blocks that tell another error than the fit", () => {
  const window = sound(pointsOf(0.02));
  const own = (window.fit.unitCovariance ?? []).slice();
  const together = (factor: number) => {
    return { ...window, together: { covariance: own.map((value) => value * factor), freedom: 30 } };
  };
  it("scale the variance of each number, with their own freedom, up or down", () => {
    for (const factor of [4, 0.25]) {
      const { ratio, freedom } = inflation(together(factor), "n");
      expectClose(ratio, factor, { relative: 1e-12, because: "the ratio of both variances" });
      expect(freedom).toBe(30);
      const quantity = windowQuantity(together(factor), "n");
      const plain = windowQuantity(window, "n");
      if (!isEstimate(quantity) || !isEstimate(plain)) throw new Error("missing");
      expectClose(quantity.error?.standard, (plain.error?.standard ?? 0) * Math.sqrt(factor), {
        relative: 1e-12,
        because: "the root of the ratio",
      });
      const drop = studentQuantile(0.975, 30) ** 2 * factor;
      for (const end of endsOf(quantity)) {
        const held = fitPowerLaw(dataOf(pointsOf(0.02)), { n: end ?? 0 });
        expectClose(held.residualSum - window.fit.residualSum, drop, found);
      }
    }
  });
  it("count only where they are larger if the scatter exceeds the errors", () => {
    const wild = sound(pointsOf(0.004));
    const scaled = (factor: number) => {
      const covariance = (wild.fit.unitCovariance ?? []).map((value) => value * wild.variance * factor);
      return inflation({ ...wild, together: { covariance, freedom: 30 } }, "x0");
    };
    expect(scaled(0.5)).toEqual({ ratio: 1, freedom: 5 });
    expectClose(scaled(2).ratio, 2, { relative: 1e-12, because: "the ratio of both variances" });
    expect(scaled(2).freedom).toBe(30);
  });
  it("say nothing of a number that was held", () => {
    const held = sound(pointsOf(0.02), { x0: 1 });
    const zero = { ...held, together: { covariance: new Array(9).fill(0), freedom: 30 } };
    expect(inflation(zero, "x0")).toEqual({ ratio: 1, freedom: null });
  });
});

describe("the covariance a decay carries", () => {
  const law = { A: 0.06, x0: 1, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.1, m: 0.375 };
  const stations = lawStations(law, xs, 0.02, (i) => Math.exp(scatter[i]));
  const moving = stations.map((one, i) => ({ ...one, U: known(6 + i / 2, 1e-5) }));
  const shared = sharedRecords(
    { A: 0.06, x0: 4, n: 1.25, U: 1 },
    spacedFrom(4, 20, 80, 12),
    0.95,
    seededRandom(1),
  );

  it.each([
    ["along x", stations, {}],
    ["along the time of flight", moving, {}],
    ["with equal weights", stations, { weights: "equal" }],
    ["of common blocks", shared, { quantity: "uu", window: [0, 100] }],
  ] as const)("agrees with the errors of n and x0, and their correlation: %s", (_, of, choice) => {
    const decay = fitDecay([...of], { ...settings, ...choice } as DecaySettings);
    const { covariance } = decay.law ?? { covariance: [] };
    const error = (quantity: Quantity) => (isEstimate(quantity) ? (quantity.error?.standard ?? 0) : 0);
    const digits = { relative: 1e-6, because: "the same numbers, carried to x" };
    expectClose(Math.sqrt(covariance[8]), error(decay.given_window.n), digits);
    expectClose(Math.sqrt(covariance[4]), error(decay.given_window.x0), digits);
    expectClose(covariance[5], covariance[7], { relative: 1e-12, because: "it is symmetric" });
    if (decay.together === null)
      expectClose(
        covariance[5] / Math.sqrt(covariance[4] * covariance[8]),
        decay.correlation_n_x0 ?? 0,
        digits,
      );
    expectClose(decay.law?.x0, decay.x0.value ?? 0, digits);
    expect(decay.law?.n).toBe(decay.n.value);
    expectClose(decay.law?.A, decay.A.value ?? 0, digits);
  });
  it("has Student's t of its freedom, and a reduced chi-square where errors are known", () => {
    const sampled = fitDecay(stations, settings);
    expect([sampled.law?.freedom, sampled.chi2_reduced !== null]).toEqual([null, true]);
    expectClose(chiSquareTail((sampled.chi2_reduced ?? 0) * 5, 5), sampled.p ?? 0, {
      relative: 1e-9,
      because: "N - 3 = 5",
    });
    const equal = fitDecay(stations, { ...settings, weights: "equal" });
    expect([equal.law?.freedom, equal.chi2_reduced, equal.p]).toEqual([5, null, null]);
    expectClose(equal.law?.quantile, studentQuantile(0.975, 5), {
      relative: 1e-6,
      because: "the same quantile",
    });
  });
  it("is missing with all else where there is no law, and says why", () => {
    const none = fitDecay(stations.slice(0, 3), settings);
    const why = expect.stringMatching(/three stations/);
    for (const quantity of [none.n, none.x0, none.A, none.given_window.n, none.given_window.x0])
      expect(quantity).toMatchObject({ value: null, why });
    expect([
      none.law,
      none.p,
      none.chi2_reduced,
      none.correlation_n_x0,
      none.converged,
      none.near_field,
    ]).toEqual([null, null, null, null, false, null]);
    expect(none.growth.m.value).toBeNull();
    expect(fitDecay([], { ...settings, window: "auto" }).window).toEqual([0, 0]);
    expect(fitDecay([], settings).window).toEqual([0, 99]);
  });
  it("leaves stations at or before a held origin out, and unites later starts where the window is automatic", () => {
    const held = fitDecay(stations, { ...settings, x0: xs[1] });
    expect(held.points.map(({ used }) => used)).toEqual([false, false, true, true, true, true, true, true]);
    const auto = fitDecay(stations, { ...settings, window: "auto" });
    expect(auto.windowChosen).toBe("auto");
    const width = (quantity: Quantity) => (endsOf(quantity)[1] ?? 0) - (endsOf(quantity)[0] ?? 0);
    expect(width(auto.n)).toBeGreaterThan(width(auto.given_window.n));
    const given = fitDecay(stations, settings);
    expect(given.n).toEqual(given.given_window.n);
    expect(given.x0).toEqual(given.given_window.x0);
  });
});
