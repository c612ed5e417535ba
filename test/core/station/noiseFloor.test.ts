import { describe, expect, it } from "vitest";
import { isotropicRecord } from "../../../sample-data/maker/synthesise.mjs";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { noiseFloor } from "../../../src/core/station/noiseFloor.ts";
import { expectClose } from "../../support/expectClose.ts";
import { stationOf } from "./records.ts";

// Pope (2000) eqs. (6.246)-(6.248) with Re_lambda = 51 and 200; eta in m
const flows = {
  51: { k: 0.24, epsilon: 10, viscosity: 1.5e-5, U: 10 },
  200: { k: 3, epsilon: 100, viscosity: 1.5e-5, U: 10 },
};
const levels = [0.005, 0.01, 0.02, 0.05];
const seeds = [1, 2, 3];

type Found = { change: Record<number, number>; clean: (string | undefined)[] };

/** Mean relative change of lambda by noise of each level, and whether the clean record was taken for a noisy one. */
function changes(reynolds: 51 | 200, spacing: number): Found {
  const flow = flows[reynolds];
  const step = (spacing * (flow.viscosity ** 3 / flow.epsilon) ** 0.25) / flow.U;
  const change: Record<number, number> = {};
  const clean: (string | undefined)[] = [];
  for (const seed of seeds) {
    const { u, truth } = isotropicRecord({ ...flow, step, samples: 1 << 15, seed });
    const pure = stationOf({ u }, {}, { step });
    clean.push(pure.flags.find(({ code }) => code === "noise-floor")?.text);
    for (const level of levels) {
      const random = seededRandom(1000 * seed + Math.round(1e4 * level));
      const noisy = u.map((x) => x + level * Math.sqrt(truth.uu) * random.gaussian());
      const lambda = stationOf({ u: noisy }, {}, { step }).lambda.value ?? Number.NaN;
      change[level] = (change[level] ?? 0) + (lambda / (pure.lambda.value ?? 0) - 1) / seeds.length;
    }
  }
  return { change, clean };
}

describe.each([
  [51, 0.25],
  [51, 0.5],
  [51, 1],
  [51, 2],
  [200, 1],
  [200, 2],
] as const)("white noise under a record of Re_lambda %d sampled every %d eta", (reynolds, spacing) => {
  const { change, clean } = changes(reynolds, spacing);
  it.each(levels)("of %d u' changes lambda by less than a hundredth on average", (level) => {
    expectClose(change[level], 0, { absolute: 0.01, because: "the bar set for noise of 0.5 to 5 % of u'" });
  });
  it("is not seen where there is none", () => {
    expect(clean).toEqual(seeds.map(() => undefined));
  });
});

describe("a record cut by noise of 5 % of u'", () => {
  const flow = flows[51];
  const step = (2 * (flow.viscosity ** 3 / flow.epsilon) ** 0.25) / flow.U;
  const { u, truth } = isotropicRecord({ ...flow, step, samples: 1 << 15, seed: 1 });
  const random = seededRandom(77);
  const sigma = 0.05 * Math.sqrt(truth.uu);
  const station = stationOf({ u: u.map((x) => x + sigma * random.gaussian()) }, {}, { step });

  it("tells the level of the noise it subtracted", () => {
    // white noise of variance s² up to Nyquist, pi/(U dt)
    const level = sigma ** 2 / (Math.PI / (flow.U * step));
    expectClose(station.facts.noiseFloor, level, {
      relative: 0.06,
      because: "the spectrum's own end adds a little",
    });
  });
  it("tells the share beyond the cut, and how much of lambda hangs on where the cut is", () => {
    expect(station.facts.shareBeyondCutoff).toBeGreaterThan(0.02);
    expect(station.facts.shareBeyondCutoff).toBeLessThan(0.12);
    expect(station.facts.cutoffSensitivity).toBeGreaterThan(0);
    expect(station.facts.cutoffSensitivity).toBeLessThan(0.01);
  });
  it("has differences that hold the noise: by s²/2 over the step squared more than the spectrum lets expect", () => {
    const { gradient_difference2, gradient_difference2_expected } = station.routes;
    const excess = (gradient_difference2.value ?? 0) - (gradient_difference2_expected.value ?? 0);
    expectClose(excess, sigma ** 2 / 2 / (flow.U * step) ** 2, {
      relative: 0.18,
      because: "three standard errors of the mean product of the two differences over 32768 samples",
    });
  });
  it("is flagged, as noisy and as extrapolated", () => {
    const texts = station.flags.map(({ code, text }) => `${code}: ${text}`).join("\n");
    expect(texts).toMatch(/noise-floor: .* added from an exponential/);
    expect(texts).toMatch(/resolution: .* extrapolated beyond/);
  });
});

describe("the rule for a noise floor", () => {
  const size = 4096;
  // a closed form: an exponential above a level, no scatter
  const spectrum = (rate: number, floor: number) =>
    Float64Array.from({ length: size / 2 + 1 }, (_, f) => Math.exp(-rate * f) + floor);

  it("finds the level, and cuts where the spectrum has fallen to twice that", () => {
    const rule = noiseFloor(spectrum(0.01, 1e-4), size, 10);
    expectClose(rule.floor, 1e-4, {
      relative: 3e-3,
      because: "the exponential itself: e^-13.65/0.01 over 683 bins",
    });
    const crossing = -Math.log(1e-4) / 0.01;
    expectClose(rule.cutBin, crossing, { relative: 0.13, because: "a band is a twentieth of a decade" });
  });
  it("puts back what an exponential spectrum holds beyond the cut", () => {
    const rule = noiseFloor(spectrum(0.01, 1e-4), size, 10);
    let below = 0;
    for (let f = 0; f < rule.cutBin; f++) below += f * f * Math.exp(-0.01 * f);
    expectClose(rule.shareBeyond, 1 - below / (2 / 0.01 ** 3), {
      relative: 0.06,
      because: "the mean of a band a twentieth of a decade wide lies 5 % above the exponential at its centre",
    });
  });
  it("sees a floor that shows in the last twelfth only", () => {
    const low = spectrum(0.004, 3e-3);
    expect(noiseFloor(low, size, 10).slope).toBeLessThan(-1);
    expectClose(noiseFloor(low, size, 10).floor, 3.4e-3, {
      relative: 0.01,
      because: "the mean over the last twelfth, the exponential's own 4.0e-4 included",
    });
  });
  it("leaves a spectrum alone that falls to its end", () => {
    const rule = noiseFloor(spectrum(0.01, 0), size, 10);
    expect([rule.floor, rule.cut, rule.tail]).toEqual([0, 0, null]);
  });
});
