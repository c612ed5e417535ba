import { describe, expect, it } from "vitest";
import { covarianceIntervals } from "../../../src/core/decay/covarianceIntervals.ts";
import { lawAt, lawBand, lawChangeVariance, lawVariance } from "../../../src/core/decay/lawBand.ts";
import type { PowerLaw } from "../../../src/core/decayResult.ts";
import { expectClose } from "../../support/expectClose.ts";

const law: PowerLaw = {
  A: 0.3,
  x0: 0.4,
  n: 1.3,
  length: 0.5,
  covariance: [0.02, -0.004, 0.006, -0.004, 0.003, -0.002, 0.006, -0.002, 0.005],
  quantile: 2.2,
  freedom: 9,
  flight: null,
};
const differences = { relative: 1e-6, because: "central differences" };

/** g' C g for any number of the law, its derivatives by ln A, x0 and n taken numerically. */
function propagated(of: (law: PowerLaw) => number): number {
  const step = 1e-5;
  const moved = (at: number, by: number): PowerLaw => {
    if (at === 0) return { ...law, A: law.A * Math.exp(by) };
    return at === 1 ? { ...law, x0: law.x0 + by } : { ...law, n: law.n + by };
  };
  const g = [0, 1, 2].map((at) => (of(moved(at, step)) - of(moved(at, -step))) / (2 * step));
  return law.covariance.reduce((sum, c, k) => sum + g[Math.floor(k / 3)] * c * g[k % 3], 0);
}
const lnAt = (x: number) => (of: PowerLaw) => Math.log(lawAt(of, x) ?? 0);

describe("a law at a place", () => {
  it("is A ((x - x0)/ell)^(-n), and nothing at or before its origin", () => {
    expectClose(lawAt(law, 1.4), 0.3 * 2 ** -1.3, { relative: 1e-14, because: "closed form" });
    expect([lawAt(law, 0.4), lawAt(law, 0.1)]).toEqual([null, null]);
  });
  it.each([0.5, 0.9, 3, 20])(
    "has an error of ln q and of ln(-dq/dx) that the covariance gives, x = %d",
    (x) => {
      expectClose(lawVariance(law, x, 0), propagated(lnAt(x)), differences);
      // -dq/dx = n q/(x - x0)
      const slope = (of: PowerLaw) => Math.log((of.n * (lawAt(of, x) ?? 0)) / (x - of.x0));
      expectClose(lawVariance(law, x, 1), propagated(slope), differences);
    },
  );
  it("has no error to tell at or before its origin", () => {
    expect([lawVariance(law, 0.4, 0), lawVariance(law, 0.2, 1)]).toEqual([0, 0]);
  });
  it("changes between two places with an error in which A cancels", () => {
    const change = (of: PowerLaw) => lnAt(3)(of) - lnAt(0.9)(of);
    expectClose(lawChangeVariance(law, 0.9, 3), propagated(change), differences);
    expectClose(lawChangeVariance(law, 3, 0.9), propagated(change), differences);
    expect(lawChangeVariance(law, 2, 2)).toBe(0);
  });
  it("never has a variance below zero, though rounding of a covariance may ask for it", () => {
    const bad = { ...law, covariance: [-1, 0, 0, 0, -1, 0, 0, 0, -1] };
    expect([lawVariance(bad, 2, 0), lawChangeVariance(bad, 1, 2)]).toEqual([0, 0]);
  });
});

describe("the band of a law", () => {
  it("lies t errors of ln q either side, and is null up to the origin", () => {
    const { q, low, high } = lawBand(law, [0.2, 1.4, 5]);
    expect([q[0], low[0], high[0]]).toEqual([null, null, null]);
    [1.4, 5].forEach((x, i) => {
      const value = q[i + 1] ?? 0;
      expectClose(value, lawAt(law, x) ?? 0, { relative: 1e-14, because: "the same" });
      const reach = 2.2 * Math.sqrt(propagated(lnAt(x)));
      expectClose(Math.log((high[i + 1] ?? 0) / value), reach, differences);
      expectClose(Math.log(value / (low[i + 1] ?? 1)), reach, differences);
    });
  });
});

describe("the symmetric intervals of a covariance", () => {
  it("are t standard errors either way", () => {
    const { n, x0 } = covarianceIntervals(law);
    const rounding = { relative: 1e-12, because: "closed form" };
    if (n.value === null || x0.value === null) throw new Error("missing");
    expectClose(n.high, 1.3 + 2.2 * Math.sqrt(0.005), rounding);
    expectClose(n.low, 1.3 - 2.2 * Math.sqrt(0.005), rounding);
    expectClose(x0.high, 0.4 + 2.2 * Math.sqrt(0.003), rounding);
    expectClose(x0.low, 0.4 - 2.2 * Math.sqrt(0.003), rounding);
  });
  it("are none for what was held", () => {
    const held = covarianceIntervals({ ...law, covariance: [0.02, 0, 0, 0, 0, 0, 0, 0, 0.005] });
    expect(held.x0).toMatchObject({ value: 0.4, low: null, high: null });
    expect(held.n).not.toMatchObject({ low: null });
  });
});
