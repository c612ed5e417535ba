import { describe, expect, it } from "vitest";
import { logBins } from "../../../src/core/signal/logBins.ts";
import { dissipationFromInertialRange } from "../../../src/core/station/inertialRange.ts";
import { localSpectrum } from "../../../src/core/station/localSpectrum.ts";
import { expectClose } from "../../support/expectClose.ts";

const exact = { relative: 1e-10, because: "a closed form" };
const points = 4096;
const unit = 0.7;
const k1 = Float64Array.from({ length: points }, (_, i) => (i + 1) * unit);
const borders = logBins(1, points + 1, 20);

/** A spectrum that is constant in each twentieth of a decade: its bands' means are known to all digits. */
function banded(of: (k: number) => number): Float64Array {
  const E = new Float64Array(points);
  for (let b = 0; b + 1 < borders.length; b++) {
    const centre = ((borders[b] + borders[b + 1] - 1) / 2) * unit;
    E.fill(of(centre), borders[b] - 1, borders[b + 1] - 1);
  }
  return E;
}

describe("the dissipation of an inertial range", () => {
  const inertial = (epsilon: number) => (k: number) => 0.49 * epsilon ** (2 / 3) * k ** (-5 / 3);
  const epsilonOf = (of: (k: number) => number, reynolds = 300) =>
    dissipationFromInertialRange(k1, banded(of), reynolds);

  it("is that of E11 = 0.49 epsilon^(2/3) k1^(-5/3)", () => {
    expectClose(Number(epsilonOf(inertial(2.7))), 2.7, exact);
  });
  it("is not given without a viscosity, nor at Re_lambda up to 100", () => {
    expect(epsilonOf(inertial(2.7), Number.NaN)).toMatch(/viscosity/);
    expect(epsilonOf(inertial(2.7), 100)).toMatch(/Re_lambda is 100: /);
    expectClose(Number(epsilonOf(inertial(2.7), 100.001)), 2.7, exact);
  });
  it("is taken from slopes within 0.1 of -5/3, and from no others", () => {
    for (const [away, given] of [
      [0.099, true],
      [-0.099, true],
      [0.101, false],
      [-0.101, false],
    ] as const) {
      const found = epsilonOf((k) => k ** (-5 / 3 + away));
      expect(typeof found === "number", String(away)).toBe(given);
    }
  });
  it("needs half a decade: -5/3 over a quarter of one between steeper and flatter ends is none", () => {
    const [a, b] = [100, 100 * 10 ** 0.3];
    const bent = (k: number) => {
      if (k < a) return (k / a) ** -1;
      return k < b ? (k / a) ** (-5 / 3) : (b / a) ** (-5 / 3) * (k / b) ** -3;
    };
    expect(epsilonOf(bent)).toMatch(/half decade/);
  });
  it("comes from the half decade nearest to -5/3, wherever that lies", () => {
    // slopes of -1.60 below and -5/3 above 200 rad/m, and the other way round
    const join = (low: number, high: number) => (k: number) =>
      k < 200 ? (k / 200) ** low : (k / 200) ** high;
    const level = (200 ** (5 / 3) / 0.49) ** 1.5;
    for (const of of [join(-1.6, -5 / 3), join(-5 / 3, -1.6)]) {
      const found = Number(epsilonOf(of));
      expectClose(found, level, exact);
    }
  });
  it("passes over bands that hold nothing", () => {
    const holed = banded(inertial(2.7));
    const b = borders.findIndex((border) => border > 300);
    holed.fill(0, borders[b] - 1, borders[b + 1] - 1);
    expectClose(Number(dissipationFromInertialRange(k1, holed, 300)), 2.7, exact);
  });
  it("is not read from bands of fewer than three points", () => {
    // 36 points: half a decade of bands, of which those of one and of two points do not count
    const few = 40;
    const E = banded(inertial(2.7)).subarray(0, few);
    expect(dissipationFromInertialRange(k1.subarray(0, few), E, 300)).toMatch(/half decade/);
  });
});

describe("the local slope of a spectrum", () => {
  const power = (n: number) => (k: number) => k ** n;

  it("of a power law is its exponent, and E22 of isotropic flow (1 + n)/2 of E11: Pope (2000) eq. 6.218", () => {
    const found = localSpectrum(k1, banded(power(-1.7)), null, null);
    expect(found.k1.length).toBeGreaterThan(30);
    found.k1.forEach((k, i) => {
      expectClose(found.slope[i], -1.7, exact);
      expectClose(found.E11[i], k ** -1.7, exact);
      expectClose(found.E22_isotropic[i], (found.E11[i] * 2.7) / 2, exact);
    });
    expect([found.E22, found.E33]).toEqual([null, null]);
  });
  it("stands where an eighth of a decade lies on both sides, beside E22 and E33 of the same bands", () => {
    const found = localSpectrum(k1, banded(power(-1)), banded(power(-2)), banded(power(-3)));
    const centres = borders.slice(1).map((end, b) => ((borders[b] + end - 1) / 2) * unit);
    const reach = 10 ** 0.125;
    expect(found.k1[0]).toBeGreaterThanOrEqual(centres[0] * reach);
    const last = found.k1[found.k1.length - 1];
    expect(last * reach).toBeLessThanOrEqual(centres[centres.length - 1] * 1.001);
    // and nowhere else: a point for every band between
    const between = centres.filter(
      (k) => k >= k1[0] * reach && k * reach <= centres[centres.length - 1] * 1.0003,
    );
    expect(found.k1.length).toBe(between.filter((k) => k >= found.k1[0]).length);
    found.k1.forEach((k, i) => {
      expectClose(found.E22?.[i], k ** -2, exact);
      expectClose(found.E33?.[i], k ** -3, exact);
    });
  });
  it("of a spectrum that bends is the least-squares slope over a quarter of a decade around it", () => {
    const bent = (k: number) => Math.exp(-0.3 * Math.log(k) ** 2);
    const found = localSpectrum(k1, banded(bent), null, null);
    const i = found.k1.length - 5;
    const logs = borders
      .slice(1)
      .map((end, b) => Math.log(((borders[b] + end - 1) / 2) * unit))
      .filter((x) => Math.abs(x - Math.log(found.k1[i])) <= (Math.LN10 / 8) * (1 + 1e-9));
    const centre = logs.reduce((sum, x) => sum + x, 0) / logs.length;
    const xy = logs.reduce((sum, x) => sum + (x - centre) * -0.3 * x * x, 0);
    const xx = logs.reduce((sum, x) => sum + (x - centre) ** 2, 0);
    expectClose(found.slope[i], xy / xx, { relative: 1e-9, because: "a closed form" });
  });
  it("is not told where a band is empty, nor from fewer than three bands, and of no spectrum there is none", () => {
    const holed = banded(power(-1));
    const b = borders.findIndex((border) => border > 300);
    holed.fill(0, borders[b] - 1, borders[b + 1] - 1);
    const centre = ((borders[b] + borders[b + 1] - 1) / 2) * unit;
    const found = localSpectrum(k1, holed, null, null);
    expect([...found.k1].some((k) => Math.abs(k / centre - 1) < 1e-9)).toBe(false);
    for (const slope of found.slope) expectClose(slope, -1, exact);
    expect(localSpectrum(new Float64Array(0), new Float64Array(0), null, null).k1.length).toBe(0);
    // of the lowest bands, a point each, three lie within a quarter of a decade first at the fifth
    const low = localSpectrum(k1, banded(power(-1)), null, null).k1[0];
    expect(low / unit).toBeGreaterThan(2.5);
  });
});
