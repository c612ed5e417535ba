import { describe, expect, it } from "vitest";
import { developmentLength } from "../../../src/core/decay/developmentLength.ts";
import { dissipationConstant } from "../../../src/core/decay/dissipationConstant.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { type FitPoint, fitWindow, type WindowFit } from "../../../src/core/decay/fitWindow.ts";
import { growths } from "../../../src/core/decay/growths.ts";
import { jointRegion } from "../../../src/core/decay/jointRegion.ts";
import { narrowing } from "../../../src/core/decay/narrowing.ts";
import { originScan } from "../../../src/core/decay/originScan.ts";
import { inverseOfSymmetric } from "../../../src/core/decay/solveSymmetric.ts";
import { windowScan } from "../../../src/core/decay/windowScan.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { bare, isEstimate, missing, type Quantity } from "../../../src/core/quantity.ts";
import { chiSquareTail } from "../../../src/core/signal/distributions/chiSquareTail.ts";
import { fQuantile } from "../../../src/core/signal/distributions/fQuantile.ts";
import { studentQuantile } from "../../../src/core/signal/distributions/studentQuantile.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const law = { A: 0.06, x0: 1, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.1, m: 0.375 };
const xs = spacedFrom(law.x0, 4, 40, 8);
const settings: DecaySettings = { ...plainSettings, window: [0, 99], kinematicViscosity: law.nu };
const scatter = [0.01, -0.02, 0.015, 0, -0.01, 0.02, -0.005, 0.01];
const pointsOf = (error: number | null): FitPoint[] =>
  xs.map((x, i) => ({ x, q: (x - 1) ** -1.25 * Math.exp(scatter[i]), smoothedError: error }));
function windowOf(error: number | null, choice: Partial<DecaySettings> = {}): WindowFit {
  const window = fitWindow(pointsOf(error), { ...settings, ...choice });
  if ("refused" in window) throw new Error(window.refused);
  return window;
}
/** Least sum of squares of ln q over A, at given n and x0. */
function sumAt(n: number, x0: number, error: number): number {
  const level = pointsOf(error).map(({ x, q }) => Math.log(q) + n * Math.log(x - x0));
  const mean = level.reduce((sum, value) => sum + value / level.length, 0);
  return level.reduce((sum, value) => sum + ((value - mean) / error) ** 2, 0);
}

describe("the joint region of n and x0", () => {
  it.each([
    ["known errors: chi-square of two numbers", 0.02, (level: number) => -2 * Math.log(1 - level)],
    ["equal weights: F of two numbers", null, (level: number) => 2 * fQuantile(level, 2, 5)],
  ] as const)("is where the sum of squares has risen by the drop, by hand; %s", (_, error, drop) => {
    const window = windowOf(error);
    const one = error ?? Math.sqrt(window.variance);
    const least = sumAt(window.fit.n, window.fit.x0, one);
    for (const { level, n, x0, closed } of jointRegion(window)?.contours ?? []) {
      expect(closed).toBe(true);
      expect(n).toHaveLength(96);
      for (let i = 0; i < 96; i += 7)
        expectClose(sumAt(n[i], x0[i], one) - least, drop(level), {
          relative: 1e-4,
          because: "the crossing is found to a millionth",
        });
    }
  });
  it("goes round the best pair once: its rays cover all directions", () => {
    const window = windowOf(0.02);
    const [, outer] = jointRegion(window)?.contours ?? [];
    for (const key of ["n", "x0"] as const) {
      expect(Math.min(...outer[key])).toBeLessThan(window.fit[key]);
      expect(Math.max(...outer[key])).toBeGreaterThan(window.fit[key]);
    }
  });
  it("has an ellipse beside it: every point at the drop in the metric of the covariance", () => {
    for (const error of [0.02, null]) {
      const window = windowOf(error);
      const { fit, variance } = window;
      const [, , , , xx, xn, , , nn] = (fit.unitCovariance ?? []).map((value) => value * variance);
      const [, outer] = jointRegion(window)?.contours ?? [];
      const drop = error === null ? 2 * fQuantile(0.95, 2, 5) : -2 * Math.log(0.05);
      outer.ellipse.n.forEach((n, i) => {
        const [dn, dx] = [n - fit.n, outer.ellipse.x0[i] - fit.x0];
        const square = (dx * dx * nn - 2 * dx * dn * xn + dn * dn * xx) / (xx * nn - xn * xn);
        expectClose(square, drop, { relative: 1e-6, because: "closed form; the covariance nearly singular" });
      });
      // the angle of each point goes all the way round
      expect(Math.min(...outer.ellipse.n)).toBeLessThan(fit.n);
      expect(Math.min(...outer.ellipse.x0)).toBeLessThan(fit.x0);
      expect(Math.max(...outer.ellipse.x0)).toBeGreaterThan(fit.x0);
    }
  });
  it("is cut off, and says so, where the origin runs upstream without end", () => {
    const short = spacedFrom(4, 30, 60, 6).map((x) => ({ x, q: (x - 4) ** -1.25, smoothedError: 0.05 }));
    const window = fitWindow(short, settings);
    if ("refused" in window) throw new Error(window.refused);
    const [, outer] = jointRegion(window)?.contours ?? [];
    expect(outer.closed).toBe(false);
    const { centre, span } = window.fit.problem;
    // fifty spans of the stations upstream of their centre
    expect(Math.min(...outer.x0)).toBeGreaterThan(centre - 50.01 * span);
    expect(Math.max(...outer.x0)).toBeLessThan(30);
    expect(Math.min(...outer.n)).toBeGreaterThan(0);
  });
  it("of what was held there is none", () => {
    expect(jointRegion(windowOf(0.02, { x0: 1 }))).toBeNull();
    expect(jointRegion(windowOf(0.02, { n: 1.25 }))).toBeNull();
  });
});

describe("what would narrow the intervals", () => {
  /** Variances of n and x0 on the found law, from the design of ln q alone. */
  function variances(
    window: WindowFit,
    places: readonly number[],
    errors: readonly number[],
    held: "x0" | "n" | null,
  ) {
    const { n, x0 } = window.fit;
    const rows = places.map((x) => [
      1,
      held === "x0" ? 0 : n / (x - x0),
      held === "n" ? 0 : -Math.log(x - x0),
    ]);
    const normal = [0, 1, 2].flatMap((a) =>
      [0, 1, 2].map((b) => {
        const sum = rows.reduce((total, row, i) => total + (row[a] * row[b]) / errors[i] ** 2, 0);
        return sum === 0 && a === b ? 1 : sum;
      }),
    );
    const inverse = inverseOfSymmetric(normal) ?? [];
    return { n: inverse[8], x0: inverse[4] };
  }
  const digits = { relative: 1e-6, because: "closed form, in other variables" };

  it.each([
    ["both free", {}, null],
    ["x0 held", { x0: 1 }, "x0"],
    ["n held", { n: 1.25 }, "n"],
  ] as const)("is foretold by the design of the stations, %s", (_, choice, held) => {
    const errors = xs.map((_, i) => 0.02 + 0.005 * i);
    const points = pointsOf(0.02).map((point, i) => ({ ...point, smoothedError: errors[i] }));
    const window = fitWindow(points, { ...settings, ...choice });
    if ("refused" in window) throw new Error(window.refused);
    const { x0 } = window.fit;
    const before = variances(window, xs, errors, held);
    const plans = narrowing(points, window);
    expect(plans).toHaveLength(16);
    for (const { kind, x, n, x0: ofX0 } of plans) {
      let [places, wanted] = [[...xs], [...errors]];
      if (kind === "record") wanted = errors.map((error, i) => (xs[i] === x ? error / Math.SQRT2 : error));
      else {
        const right = xs.findIndex((place) => place > x);
        // beyond the last by the step before it; half way between two in ln(x - x0), errors likewise
        const expected =
          right < 0
            ? { x: x0 + (xs[7] - x0) ** 2 / (xs[6] - x0), error: errors[7] }
            : {
                x: x0 + Math.sqrt((xs[right - 1] - x0) * (xs[right] - x0)),
                error: Math.sqrt(errors[right - 1] * errors[right]),
              };
        expectClose(x, expected.x, digits);
        [places, wanted] = [
          [...xs, expected.x],
          [...errors, expected.error],
        ];
      }
      const after = variances(window, places, wanted, held);
      expectClose(n, held === "n" ? 1 : Math.sqrt(after.n / before.n), digits);
      expectClose(ofX0, held === "x0" ? 1 : Math.sqrt(after.x0 / before.x0), digits);
    }
    const gains = plans.map(({ n, x0: ofX0 }) => n * ofX0);
    expect([...gains].sort((a, b) => a - b)).toEqual(gains);
  });
  it("counts the station that also tells the scatter better, where the scatter tells the errors", () => {
    const window = windowOf(null);
    const before = variances(
      window,
      xs,
      xs.map(() => 1),
      null,
    );
    for (const { kind, x, n } of narrowing(pointsOf(null), window)) {
      const [places, errors] =
        kind === "station"
          ? [[...xs, x], new Array(9).fill(1)]
          : [xs, xs.map((place) => (place === x ? Math.SQRT1_2 : 1))];
      const reach = kind === "station" ? studentQuantile(0.975, 6) / studentQuantile(0.975, 5) : 1;
      expectClose(n, reach * Math.sqrt(variances(window, places, errors, null).n / before.n), digits);
    }
  });
  it("with equal weights of q itself takes the same error of q everywhere", () => {
    const points = pointsOf(null);
    const window = windowOf(null, { residuals: "linear" });
    // residuals of q: an error of one in q is 1/q in ln q
    const errors = points.map(({ q }) => 1 / q);
    const linear = (places: readonly number[], of: readonly number[]) =>
      variances(
        window,
        places,
        places.map((_, i) => of[i]),
        null,
      );
    const before = linear(xs, errors);
    const records = narrowing(points, window).filter(({ kind }) => kind === "record");
    for (const { x, n: width } of records) {
      const after = linear(
        xs,
        errors.map((error, i) => (xs[i] === x ? error / Math.SQRT2 : error)),
      );
      expectClose(width, Math.sqrt(after.n / before.n), {
        relative: 1e-6,
        because: "an error of q measured, taken as a share of q on the law",
      });
    }
  });
  it("is nothing where both are held", () => {
    expect(narrowing(pointsOf(0.02), windowOf(0.02, { n: 1.25, x0: 1 }))).toEqual([]);
  });
});

describe("the classical scan of the origin", () => {
  it("finds no scatter at the origin of an exact law, and that of any other by hand", () => {
    const q = xs.map((x) => (x - 1) ** -1.25);
    const scan = originScan(xs, q);
    if (scan === null) throw new Error("no scan");
    expect(scan.x0).toHaveLength(200);
    const span = xs[7] - xs[0];
    expectClose(scan.x0[0], xs[0] - 2 * span, { relative: 1e-12, because: "two spans upstream" });
    expect(scan.x0.every((x0, i) => i === 0 || x0 > scan.x0[i - 1])).toBe(true);
    expect(scan.x0[199]).toBeLessThan(xs[0]);
    expect(xs[0] - scan.x0[199]).toBeLessThan(1e-4 * span);
    // the scatter about the best line in ln(x - x0), its root mean square over all stations
    for (const i of [0, 80, 150]) {
      const s = xs.map((x) => Math.log(x - scan.x0[i]));
      const y = q.map(Math.log);
      const [ms, my] = [s, y].map((of) => of.reduce((sum, value) => sum + value / 8, 0));
      const slope =
        s.reduce((sum, value, k) => sum + (value - ms) * (y[k] - my), 0) /
        s.reduce((sum, value) => sum + (value - ms) ** 2, 0);
      const square = s.reduce((sum, value, k) => sum + (y[k] - my - slope * (value - ms)) ** 2, 0);
      expectClose(scan.rms[i], Math.sqrt(square / 8), { relative: 1e-8, because: "the same line" });
    }
    const best = scan.x0[scan.rms.indexOf(Math.min(...scan.rms))];
    expectClose(best, 1, { absolute: 0.2, because: "origins tried there lie 0.2 apart" });
  });
  it("is none at one place", () => expect(originScan([3, 3, 3, 3], [1, 1, 1, 1])).toBeNull());
});

describe("lengths that grow, and C_epsilon that does not", () => {
  const exact = lawStations(law, xs, 0.01);
  const decay = fitDecay(exact, settings);
  const endsOf = (quantity: Quantity) => (isEstimate(quantity) ? [quantity.low, quantity.high] : []);

  it("have the exponents n implies: 1 - n/2, 1/2 and (1 - n)/2, ends changing places", () => {
    const [L11, lambda, Re] = growths(exact, decay);
    const [low, high] = endsOf(decay.n);
    const close = { relative: 1e-9, because: "linear in n" };
    expect([L11.key, lambda.key, Re.key]).toEqual(["L11", "lambda", "Re_lambda"]);
    expectClose(L11.implied.value, 1 - (decay.n.value ?? 0) / 2, close);
    expectClose(endsOf(L11.implied)[0], 1 - (high ?? 0) / 2, close);
    expectClose(endsOf(L11.implied)[1], 1 - (low ?? 0) / 2, close);
    expect(lambda.implied).toMatchObject({ value: 0.5, low: null, high: null });
    expectClose(Re.implied.value, (1 - (decay.n.value ?? 0)) / 2, close);
    expectClose(endsOf(Re.implied)[1], (1 - (low ?? 0)) / 2, close);
    expect([L11.agrees, lambda.agrees, Re.agrees]).toEqual([true, true, true]);
  });
  it("disagree where they grow otherwise, and cannot be judged without an exponent", () => {
    const slow = exact.map((one) => ({
      ...one,
      L11: known(0.1, 0.001),
      lambda: known(0.01, 0.001),
      Re_lambda: missing("none"),
    }));
    expect(growths(slow, decay).map(({ agrees }) => agrees)).toEqual([false, false, null]);
    const none = growths(exact, { ...decay, law: null, n: missing("refused") });
    expect(none.map(({ agrees, implied }) => [agrees, implied.value])).toEqual(
      [
        [null, null],
        [null, 0.5],
        [null, null],
      ].map(([agrees]) => [agrees, null]),
    );
  });
  it("carry an open side of n to the other side of the exponent, with its reason", () => {
    const open = { ...decay, n: { value: 1.2, low: 1, high: null, why_high: "open" } };
    const [L11] = growths(exact, open);
    expect(L11.implied).toEqual({ value: 1 - 0.6, low: null, high: 0.5, why_low: "open" });
  });
  it("have a mean C_epsilon weighted by errors, and a test that it is one", () => {
    const errors = [0.1, 0.1, 0.2, 0.2];
    const logs = [0.05, -0.05, 0.3, -0.1];
    const stations = logs.map((value, i) =>
      stationAt(xs[i], { C_epsilon: known(Math.exp(value), errors[i]) }),
    );
    const weights = errors.map((error) => error ** -2);
    const total = weights.reduce((sum, weight) => sum + weight, 0);
    const mean = logs.reduce((sum, value, i) => sum + value * weights[i], 0) / total;
    const square = logs.reduce((sum, value, i) => sum + weights[i] * (value - mean) ** 2, 0);
    const found = dissipationConstant(stations, decay.law);
    const close = { relative: 1e-9, because: "closed form" };
    expectClose(found.mean.value, Math.exp(mean), close);
    expectClose(isEstimate(found.mean) ? found.mean.error?.standard : 0, 1 / Math.sqrt(total), close);
    expectClose(found.p, chiSquareTail(square, 3), close);
    expect(found.constant).toBe(true);
    const falling = xs.map((x) => stationAt(x, { C_epsilon: known((x - 1) ** -0.5, 0.02) }));
    expect(dissipationConstant(falling, decay.law).constant).toBe(false);
    const rising = xs.map((x) => stationAt(x, { C_epsilon: known((x - 1) ** 0.5, 0.02) }));
    expect(dissipationConstant(rising, decay.law).constant).toBe(false);
  });
  it("have a plain geometric mean where errors are lacking, and none without values", () => {
    const mixed = [known(1, 0.1), bare(4, "short"), bare(-1, "")].map((C_epsilon, i) =>
      stationAt(xs[i], { C_epsilon }),
    );
    const found = dissipationConstant(mixed, null);
    expectClose(found.mean.value, 2, { relative: 1e-12, because: "the root of 1 times 4" });
    expect([found.mean, found.p, found.constant]).toEqual([
      expect.objectContaining({ low: null, high: null }),
      null,
      null,
    ]);
    expect(found.exponent.value).toBeNull();
    const single = dissipationConstant([stationAt(2, { C_epsilon: known(3, 0.1) })], null);
    expect([single.mean.value, single.p]).toEqual([expect.closeTo(3, 9), null]);
    expect(dissipationConstant([stationAt(2, { C_epsilon: missing("no L11") })], null).mean).toEqual(
      missing("no L11"),
    );
    expect(dissipationConstant([], null).mean.value).toBeNull();
  });
});

describe("development and windows side by side", () => {
  const developing = lawStations(law, xs, 0.01).map((one, i) => ({
    ...one,
    isotropy_uv: known(i < 2 ? 1.3 : 1.02, 0.001),
    isotropy_uw: known(i < 3 ? 1.6 : 1.4, 0.001),
    balance: known(i < 4 ? 0.8 : 0.95, 0.001),
    S_dudx: bare(i < 1 ? -0.2 : -0.4, ""),
  }));
  const decay = fitDecay(developing, settings);
  it("has a place for each criterion, ratios near 1 or near their last value either way", () => {
    const { criteria, tolerance } = developmentLength(developing, decay, settings);
    expect(tolerance).toBe(0.1);
    expect(criteria.map(({ key, inside }) => [key, inside.value])).toEqual([
      ["isotropy_uv", xs[2]],
      ["isotropy_uv_settled", xs[2]],
      ["isotropy_uw", null],
      ["isotropy_uw_settled", xs[3]],
      ["S_dudx", xs[1]],
      ["balance", xs[4]],
      ["window", xs[0]],
    ]);
    // 0.91 is 1/1.1: 10 % below as 1.1 is above
    const edge = developing.map((one) => ({ ...one, balance: bare(0.9091, "") }));
    const found = developmentLength(edge, decay, settings).criteria.find(({ key }) => key === "balance");
    expect(found?.inside.value).toBe(xs[0]);
    const below = developing.map((one) => ({ ...one, balance: bare(0.909, "") }));
    expect(developmentLength(below, decay, settings).criteria[5].inside.value).toBeNull();
  });
  it("names its tolerance, the reference length and the first L11 there is", () => {
    const found = developmentLength(
      developing.map((one, i) => ({ ...one, L11: i < 2 ? missing("none") : known(i, 0.1) })),
      decay,
      { ...settings, developmentTolerance: 0.05, referenceLength: 0.3 },
    );
    expect([found.tolerance, found.length, found.inflowL11.value]).toEqual([0.05, 0.3, 2]);
    expect(found.criteria[0].words).toMatch(/within 5 % of 1/);
    expect(developmentLength([], decay, settings).inflowL11.value).toBeNull();
  });
  it("says of the window's start whether a test chose it, or that there is no law", () => {
    const start = (choice: Partial<DecaySettings>) => {
      const all = { ...settings, ...choice };
      return developmentLength(developing, fitDecay(developing, all), all).criteria[6].inside;
    };
    expect(start({})).toMatchObject({ value: xs[0], why_low: "set by hand" });
    expect(start({ window: "auto" })).toMatchObject({ why_low: expect.stringMatching(/test/) });
    expect(start({ window: [98, 99] })).toMatchObject({ value: null });
  });
  it("scans every first and every last station with the other end kept", () => {
    const { first, last } = windowScan(
      developing,
      fitDecay(developing, { ...settings, window: [xs[1], xs[6]] }),
      {
        ...settings,
        window: [xs[1], xs[6]],
      },
    );
    expect(first.map(({ x, stations, adopted }) => [x, stations, adopted])).toEqual(
      xs.slice(0, 7).map((x, i) => [x, 7 - i, i === 1]),
    );
    expect(last.map(({ x, stations, adopted }) => [x, stations, adopted])).toEqual(
      xs.slice(1).map((x, i) => [x, i + 1, i === 5]),
    );
    for (const { n, x0, p } of first.slice(0, 3)) {
      expectClose(n.value, 1.25, { relative: 1e-6, because: "an exact law" });
      expectClose(x0.value, 1, { relative: 1e-5, because: "an exact law" });
      expectClose(p, 1, { relative: 1e-6, because: "no scatter" });
    }
    expect([...first, ...last].some(({ inUnion }) => inUnion)).toBe(false);
  });
  it("scans nothing without a window, and no station at or before a held origin", () => {
    const none = { ...settings, window: [98, 99] as const };
    const scan = windowScan(developing, fitDecay(developing, none), none);
    expect([scan.first, scan.last]).toEqual([[], []]);
    const held = { ...settings, x0: xs[1] };
    expect(windowScan(developing, fitDecay(developing, held), held).first.map(({ x }) => x)).toEqual(
      xs.slice(2),
    );
  });
});
