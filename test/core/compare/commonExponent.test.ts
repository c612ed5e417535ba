import { describe, expect, it } from "vitest";
import { commonExponent } from "../../../src/core/compare/commonExponent.ts";
import { type FitPoint, fitWindow, type WindowFit } from "../../../src/core/decay/fitWindow.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";
import { plainSettings, spacedFrom } from "../../support/lawStations.ts";

/** A fit to fourteen stations with 2 % scatter, told or to be found from the residuals. */
function drawn(x0: number, n: number, seed: number, told: boolean): WindowFit {
  const random = seededRandom(seed);
  const points: FitPoint[] = spacedFrom(x0, x0 + 8, x0 + 100, 14).map((x) => {
    const q = 0.06 * (x - x0) ** -n * Math.exp(0.02 * random.gaussian());
    return { x, q, smoothedError: told ? 0.02 : null };
  });
  const fitted = fitWindow(points, plainSettings);
  if ("refused" in fitted) throw new Error(fitted.refused);
  return fitted;
}

describe("one exponent for two cases", () => {
  it.each([true, false])("is rejected 5 times in 100 where they decay alike (errors known: %s)", (told) => {
    let [rejected, held] = [0, 0];
    for (let seed = 0; seed < 300; seed++) {
      const { p, low, high } = commonExponent([
        drawn(3, 1.25, 1000 + seed, told),
        drawn(12, 1.25, 5000 + seed, told),
      ]);
      if (p < 0.05) rejected++;
      if ((low ?? 0) < 1.25 && 1.25 < (high ?? Infinity)) held++;
    }
    // 300 at 5 %: 15 with a standard deviation of 3.8
    expect(rejected).toBeGreaterThanOrEqual(3);
    expect(rejected).toBeLessThanOrEqual(30);
    expect(held).toBeGreaterThanOrEqual(270);
    expect(held).toBeLessThanOrEqual(297);
  });
  it("is rejected where they do not", () => {
    expect(commonExponent([drawn(3, 1.25, 1, true), drawn(12, 1.5, 2, true)]).p).toBeLessThan(0.001);
  });
  it("is that of a case compared with itself, with an interval narrower by the root of two", () => {
    const one = drawn(3, 1.25, 3, true);
    const { n, p, low, high } = commonExponent([one, one]);
    expectClose(n, one.fit.n, { relative: 1e-6, because: "the search ends at a millionth of an error" });
    expectClose(p, 1, { absolute: 1e-3, because: "nothing is lost by sharing" });
    const reach = 1.96 * (one.fit.standardError?.n ?? 0);
    expectClose((high ?? 0) - (low ?? 0), (2 * reach) / Math.SQRT2, {
      relative: 0.03,
      because: "nearly parabolic",
    });
  });
});

describe("one exponent for three cases", () => {
  const three = (exponents: readonly number[], seed: number, told: boolean) =>
    commonExponent(exponents.map((n, i) => drawn(3 * i, n, 100 * seed + i, told)));

  it.each([true, false])("is rejected 5 times in 100 where they decay alike (errors known: %s)", (told) => {
    let rejected = 0;
    let foretold = 0;
    for (let seed = 0; seed < 300; seed++) {
      const { p, AICc } = three([1.25, 1.25, 1.25], seed, told);
      if (p < 0.05) rejected++;
      if (AICc && AICc.common < AICc.own) foretold++;
    }
    // 300 at 5 %: 15 with a standard deviation of 3.8
    expect(rejected).toBeGreaterThanOrEqual(4);
    expect(rejected).toBeLessThanOrEqual(27);
    expect(foretold).toBeGreaterThan(250);
  });
  it("is rejected, by AICc too, where one of them decays otherwise", () => {
    const { p, AICc } = three([1.25, 1.25, 1.5], 1, true);
    expect(p).toBeLessThan(1e-3);
    expect(AICc?.own).toBeLessThan(AICc?.common ?? 0);
  });
  it("is tested by F as soon as the scatter of one case has to tell its errors", () => {
    const told = drawn(3, 1.25, 8, true);
    expect(told.scattered).toBe(false);
    expect(commonExponent([told, told]).test).toBe("chi-square");
    expect(commonExponent([told, drawn(3, 1.25, 8, false)]).test).toBe("F");
  });
  it("has the AICc of its sum of squares and its seven numbers", () => {
    const fits = [1.25, 1.25, 1.25].map((n, i) => drawn(3 * i, n, 7 + i, true));
    const { AICc, sum } = commonExponent(fits);
    // 42 stations, 3 levels, 3 origins, 1 exponent
    expectClose(AICc?.common, sum + 14 + (2 * 7 * 8) / (42 - 8), { relative: 1e-12, because: "definition" });
    const own = fits.reduce((total, { fit }) => total + fit.residualSum, 0);
    expectClose(AICc?.own, own + 18 + (2 * 9 * 10) / (42 - 10), { relative: 1e-12, because: "definition" });
  });
});
