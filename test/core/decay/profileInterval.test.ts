import { describe, expect, it } from "vitest";
import { fitPowerLaw } from "../../../src/core/decay/fitPowerLaw.ts";
import { profileInterval } from "../../../src/core/decay/profileInterval.ts";
import { fQuantile } from "../../../src/core/signal/distributions/fQuantile.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";
import { spacedFrom } from "../../support/lawStations.ts";

const truth = { A: 0.05, x0: 4, n: 1.25 };
const profiles = 400;

/** How often each interval holds the truth over seeded profiles. */
function coverage(count: number, span: number, scatter: number, errorsKnown: boolean) {
  const random = seededRandom(1971);
  const x = spacedFrom(truth.x0, 14, truth.x0 + 10 * span, count);
  const held = { n: 0, x0: 0, A: 0 };
  for (let trial = 0; trial < profiles; trial++) {
    const q = x.map((at) => truth.A * (at - truth.x0) ** -truth.n * Math.exp(scatter * random.gaussian()));
    const fit = fitPowerLaw({ x, q, error: errorsKnown ? x.map(() => scatter) : null });
    const drop = errorsKnown ? 3.841458820694124 : fit.variance * fQuantile(0.95, 1, fit.freedom);
    for (const key of ["n", "x0", "A"] as const) {
      const { low, high } = profileInterval(fit, key, drop);
      if ((low ?? -Infinity) < truth[key] && truth[key] < (high ?? Infinity)) held[key]++;
    }
  }
  return held;
}

describe("the profile interval of 95 %", () => {
  // 400 profiles at 95 %: the count has a standard deviation of 4.4; 363 to 397 are ± 3.9 of them
  it.each([
    [10, 8, 0.02, true],
    [10, 8, 0.05, false],
    [6, 8, 0.02, false],
    [20, 4, 0.02, true],
  ] as const)(
    "holds the truth 95 times in 100: %d stations, span %d, scatter %d",
    (count, span, scatter, known) => {
      for (const held of Object.values(coverage(count, span, scatter, known))) {
        expect(held).toBeGreaterThanOrEqual(363);
        expect(held).toBeLessThanOrEqual(397);
      }
    },
  );

  it("is open upstream where an exponential fits nearly as well, and bounds n from below alone", () => {
    const x = spacedFrom(4, 30, 60, 6);
    const q = x.map((at) => (at - 4) ** -1.25);
    const fit = fitPowerLaw({ x, q, error: x.map(() => 0.1) });
    const [x0, n] = [profileInterval(fit, "x0", 3.84), profileInterval(fit, "n", 3.84)];
    expect(x0.low).toBeNull();
    expect(x0.why_low).toMatch(/span/);
    expect(n.high).toBeNull();
    expect(n.low).toBeLessThan(fit.n);
    expect(x0.high).toBeGreaterThan(fit.x0);
  });

  it("is the estimate ± t standard errors where the origin is held: the law of ln q is then linear", () => {
    const random = seededRandom(4);
    const x = spacedFrom(4, 14, 80, 9);
    const q = x.map((at) => (at - 4) ** -1.25 * Math.exp(0.03 * random.gaussian()));
    const fit = fitPowerLaw({ x, q, error: null }, { x0: 4 });
    const drop = fit.variance * fQuantile(0.95, 1, fit.freedom);
    const { low, high } = profileInterval(fit, "n", drop);
    const reach = Math.sqrt(fQuantile(0.95, 1, 7)) * (fit.standardError?.n ?? 0);
    const because = "an end is found to a millionth of its distance";
    expectClose(low, fit.n - reach, { relative: 1e-5, because });
    expectClose(high, fit.n + reach, { relative: 1e-5, because });
  });
});
