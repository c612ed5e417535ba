import { describe, expect, it } from "vitest";
import { deriveStations } from "../../../src/core/decay/deriveStations.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { lawBand } from "../../../src/core/decay/lawBand.ts";
import { scalesFromDissipation } from "../../../src/core/decay/scalesFromDissipation.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate, missing } from "../../../src/core/quantity.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";
import { readRows } from "../../support/readRows.ts";

const table4 = readRows(
  new URL("../../reference/cbc1971/cbc1971_table4_gross_properties.csv", import.meta.url),
);
// "U0 M/nu = 34000" with U0 = 10 m/s and M = 5.08 cm (section 2 of the paper), cm²/s
const nuOfPaper = (1000 * 5.08) / 34000;

describe.each(table4)("Comte-Bellot & Corrsin (1971), table 4, tU0/M = $tU0_over_M", (row) => {
  const scales = scalesFromDissipation(
    known(Number(row.u1_rms_cm_s) ** 2, 0.01),
    known(Number(row.epsilon_cm2_s3), 0.02),
    known(Number(row.L_f_longitudinal_cm), 0.05),
    nuOfPaper,
  );
  const because = "the table's u' and epsilon are rounded to three digits";

  it("has the published lambda", () =>
    expectClose(scales.lambda.value, Number(row.lambda_g_cm), { relative: 0.006, because }));
  it("has the published R_lambda", () =>
    expectClose(scales.Re_lambda.value, Number(row.R_lambda), { relative: 0.008, because }));
  it("has the published eta", () =>
    expectClose(scales.eta.value, Number(row.eta_cm), {
      relative: 0.01,
      because: "eta is given to two digits",
    }));
});

const law = { A: 0.06, x0: 0.075, n: 1.25, ell: 0.025, U: 6, nu: 1.5e-5, B: 0.005, m: 0.375 };
const xs = spacedFrom(law.x0, 0.2, 2, 16);
const settings: DecaySettings = { ...plainSettings, referenceLength: law.ell, kinematicViscosity: law.nu };
const derive = (stations: StationResult[], choice: Partial<DecaySettings> = {}) => {
  const all = { ...settings, ...choice };
  return deriveStations(stations, fitDecay(stations, all), all);
};

describe("what follows from the law", () => {
  it("is a dissipation that balances the measured one where the turbulence decays freely", () => {
    for (const station of derive(lawStations(law, xs, 0.01)))
      expectClose(station.balance.value, 1, { relative: 1e-6, because: "the stations lie on the law" });
  });
  it("is the same whether k was measured or u alone", () => {
    const alone = lawStations(law, xs, 0.01).map(({ x, U, uu }) => stationAt(x, { U, uu, duration: 1 }));
    const whole = derive(lawStations(law, xs, 0.01));
    for (const [i, { epsilon_decay }] of derive(alone).entries())
      expectClose(epsilon_decay.value, whole[i].epsilon_decay.value ?? 0, {
        relative: 1e-6,
        because: "the law is isotropic",
      });
  });
  it("leaves what was measured alone where the gradient is adopted", () => {
    const before = lawStations(law, xs, 0.01);
    derive(before).forEach((station, i) => {
      expect(station.epsilon).toBe(before[i].epsilon);
      expect(station.lambda).toBe(before[i].lambda);
    });
  });
  it("fixes epsilon, lambda, eta and Re_lambda where the decay is adopted, as for an LES", () => {
    const unresolved = lawStations(law, xs, 0.01).map((station) => ({
      ...station,
      epsilon: missing("not derived yet"),
      lambda: missing("not derived yet"),
      eta: missing("not derived yet"),
    }));
    const truth = lawStations(law, xs, 0.01);
    derive(unresolved, { kind: "les" }).forEach((station, i) => {
      for (const key of ["epsilon", "lambda", "eta", "Re_lambda"] as const)
        expectClose(station[key].value, truth[i][key].value ?? 0, {
          relative: 1e-6,
          because: "isotropic, on the law",
        });
    });
  });
  it("keeps the dissipation a profile brings, and gives one to a profile without", () => {
    const profile = lawStations(law, xs, 0.01).map((station) => ({ ...station, duration: null }));
    expect(derive(profile)[3].epsilon).toBe(profile[3].epsilon);
    const without = profile.map((station) => ({ ...station, epsilon: missing("no such column") }));
    const derived = derive(without)[3];
    expect(derived.epsilon).toEqual(derived.epsilon_decay);
    expect(derived.lambda).toBe(without[3].lambda);
  });
  it("says nothing outside its window or without a law", () => {
    const outside = derive(lawStations(law, xs, 0.01), { window: [xs[4], xs[12]] });
    expect(outside[3].epsilon_decay.value).toBeNull();
    expect(outside[4].epsilon_decay.value).not.toBeNull();
    const refused = derive(lawStations(law, xs, 0.01), { window: [xs[0], xs[2]], kind: "les" });
    expect(refused[1].epsilon).toMatchObject({ value: null, why: expect.stringContaining("three stations") });
  });
  it("is n k/(t - t0) in a decay along time", () => {
    const box = xs.map((t) =>
      stationAt(t, { k: known(2 * t ** -1.4, 0.01), uu: known((4 / 3) * t ** -1.4, 0.01) }),
    );
    const stations = derive(box, { along: "t", quantity: "k" });
    expectClose(stations[5].epsilon_decay.value, (1.4 * 2 * xs[5] ** -1.4) / xs[5], {
      relative: 1e-6,
      because: "-dk/dt of the law",
    });
  });
});

describe("the band of a law and its dissipation", () => {
  it("hold the truth 95 times in 100 at the middle of the window", () => {
    const random = seededRandom(5);
    let [band, dissipation] = [0, 0];
    const truth = lawStations(law, xs, 0.02)[8];
    for (let trial = 0; trial < 300; trial++) {
      const stations = lawStations(law, xs, 0.02, () => Math.exp(0.02 * random.gaussian()));
      const all: DecaySettings = { ...settings, window: [xs[0], xs[15]] };
      const decay = fitDecay(stations, all);
      if (decay.law === null) continue;
      const { low, high } = lawBand(decay.law, [xs[8]]);
      const q = (truth.k.value ?? 0) / 36;
      if ((low[0] ?? 9) < q && q < (high[0] ?? 0)) band++;
      const { epsilon_decay } = deriveStations(stations, decay, all)[8];
      const epsilon = truth.epsilon.value ?? 0;
      if (
        isEstimate(epsilon_decay) &&
        (epsilon_decay.low ?? 9e9) < epsilon &&
        epsilon < (epsilon_decay.high ?? 0)
      )
        dissipation++;
    }
    for (const held of [band, dissipation]) {
      expect(held).toBeGreaterThanOrEqual(270);
      expect(held).toBeLessThanOrEqual(298);
    }
  });
});
