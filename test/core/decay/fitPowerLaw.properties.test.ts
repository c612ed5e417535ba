import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fitPowerLaw } from "../../../src/core/decay/fitPowerLaw.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";
import { spacedFrom } from "../../support/lawStations.ts";

const profile = fc
  .record({
    n: fc.double({ min: 0.8, max: 2.6, noNaN: true }),
    x0: fc.double({ min: -5, max: 8, noNaN: true }),
    count: fc.integer({ min: 8, max: 30 }),
    span: fc.double({ min: 6, max: 20, noNaN: true }),
    seed: fc.integer({ min: 1, max: 1e6 }),
    residuals: fc.constantFrom("log" as const, "linear" as const),
  })
  .map(({ n, x0, count, span, seed, residuals }) => {
    const random = seededRandom(seed);
    const x = spacedFrom(x0, x0 + 8, x0 + 8 * span, count);
    const error = x.map(() => 0.01 + 0.01 * random.uniform());
    const q = x.map((at, i) => 0.05 * (at - x0) ** -n * Math.exp(error[i] * random.gaussian()));
    return { x, q, error, residuals };
  });
const same = { relative: 1e-6, because: "both fits end at a millionth of a standard error" };
const runs = { seed: 20261201, numRuns: 60 };

describe("a fitted power law", () => {
  it("scales A alone when q is scaled", () => {
    fc.assert(
      fc.property(profile, fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (p, c) => {
        const [one, other] = [p.q, p.q.map((q) => c * q)].map((q) => fitPowerLaw({ ...p, q }, p));
        expectClose(other.A / one.A, c, same);
        expectClose(other.n, one.n, same);
        expectClose(other.x0 - one.x0, 0, { absolute: 1e-6, because: "a millionth of the unit of x" });
      }),
      runs,
    );
  });

  it("moves x0 alone when x is moved", () => {
    fc.assert(
      fc.property(profile, fc.double({ min: -1000, max: 1000, noNaN: true }), (p, shift) => {
        const [one, other] = [p.x, p.x.map((x) => x + shift)].map((x) => fitPowerLaw({ ...p, x }, p));
        expectClose(other.x0 - one.x0, shift, {
          relative: 1e-6,
          absolute: 1e-5,
          because: "x loses digits when moved",
        });
        expectClose(other.n, one.n, same);
        expectClose(Math.log(other.A), Math.log(one.A), same);
      }),
      runs,
    );
  });

  it("gives the same law in mm as in m, ell to match", () => {
    fc.assert(
      fc.property(profile, (p) => {
        const metres = fitPowerLaw(p, { ...p, length: 0.025 });
        const millimetres = fitPowerLaw({ ...p, x: p.x.map((x) => 1000 * x) }, { ...p, length: 25 });
        expectClose(millimetres.x0, 1000 * metres.x0, {
          relative: 1e-6,
          absolute: 1e-3,
          because: "x0 may be near 0",
        });
        expectClose(millimetres.n, metres.n, same);
        expectClose(millimetres.A, metres.A, { relative: 1e-5, because: "A lies far outside the stations" });
      }),
      runs,
    );
  });

  it("does not know the order of its stations", () => {
    fc.assert(
      fc.property(profile, (p) => {
        const turned = { x: [...p.x].reverse(), q: [...p.q].reverse(), error: [...p.error].reverse() };
        const [one, other] = [fitPowerLaw(p, p), fitPowerLaw(turned, p)];
        expectClose(other.n, one.n, same);
        expectClose(other.A, one.A, { relative: 1e-5, because: "sums are added in another order" });
      }),
      runs,
    );
  });

  it("returns the law itself from stations that lie on it", () => {
    fc.assert(
      fc.property(profile, fc.double({ min: 0.5, max: 3, noNaN: true }), (p, n) => {
        const x0 = p.x[0] - 3;
        const q = p.x.map((x) => 0.02 * (x - x0) ** -n);
        const fit = fitPowerLaw({ ...p, q }, p);
        expect(fit.converged).toBe(true);
        expectClose(fit.n, n, { relative: 1e-8, because: "exact stations leave rounding only" });
        expectClose(fit.x0, x0, { absolute: 1e-7, because: "exact stations leave rounding only" });
      }),
      runs,
    );
  });
});
