import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { oneDimensionalSpectra } from "../../../sample-data/maker/oneDimensionalSpectra.mjs";
import { synthesiseRecord } from "../../../sample-data/maker/synthesise.mjs";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import consistency from "../../reference/cbc1971/cbc1971_consistency.json" with { type: "json" };
import statistics from "../../reference/jhtdb/jhtdb_published_statistics.json" with { type: "json" };
import { expectClose } from "../../support/expectClose.ts";
import { readRows } from "../../support/readRows.ts";
import { interpolated } from "../../support/tabulatedSpectrum.ts";
import { stationOf } from "./records.ts";

const reference = (name: string) => new URL(`../../reference/${name}`, import.meta.url);

function expectHolds(quantity: Quantity, value: number): void {
  const ends = isEstimate(quantity) ? [quantity.low, quantity.high] : [null, null];
  const [low, high] = ends.map((end) => end ?? Number.NaN);
  expect(low <= value && value <= high, `${value} in [${low}, ${high}]`).toBe(true);
}

describe("a record made of the spectrum of JHTDB isotropic1024 (Li et al. 2008), 500 integral times long", () => {
  const [published] = statistics.sets;
  const shells = readFileSync(reference("jhtdb/jhtdb_isotropic1024_spectrum.txt"), "utf8")
    .trim()
    .split("\n")
    .slice(2)
    .map((line) => line.trim().split(/\s+/).map(Number));
  const energy = (kappa: number) => (kappa < 0.5 ? 0 : (shells[Math.round(kappa) - 1]?.[1] ?? 0));
  const spectra = oneDimensionalSpectra(energy, [0.005, 482.4]);
  const U = 10;
  const step = (2 * published.eta) / U;
  const signal = synthesiseRecord({ spectra, U, step, samples: 1 << 17, seed: 2 });
  const station = stationOf(signal, { kinematicViscosity: Number(published.nu) }, { step });

  it.each([
    ["k", published.K],
    ["epsilon", published.eps],
    ["lambda", published.lambda],
    ["eta", published.eta],
    ["Re_lambda", published.R_lambda],
    ["L11", published.L11],
  ] as const)("holds the published %s in its interval", (name, value) =>
    expectHolds(station[name], Number(value)),
  );
  it("is isotropic at small scales and in its stresses", () => {
    expectHolds(station.routes.K_v, 1);
    expectHolds(station.routes.K_w, 1);
    expectHolds(station.routes.rho_uv, 0);
    expectHolds(station.routes.L_v_ratio, 1);
  });
  it("has an inertial range, and a second-order bound not far from the dissipation", () => {
    expectClose(station.epsilon_inertial.value, published.eps, {
      relative: 0.4,
      because: "the constant is known to 0.055 in 0.53, its power 3/2 counts, and half a decade scatters",
    });
    expectClose(station.routes["epsilon_second-order"].value, published.eps, {
      relative: 0.25,
      because: "constant 2.0 to a tenth, its power 3/2 counts; a bound only asymptotically",
    });
  });
  it("has the lateral spectrum that isotropy asks for, scale by scale", () => {
    const local = station.curves?.local;
    const ratios = Array.from(local?.k1 ?? []).flatMap((k1, i) =>
      k1 > 10 && k1 < 400 ? [Math.log((local?.E22_isotropic[i] ?? 0) / (local?.E22?.[i] ?? 0))] : [],
    );
    expect(ratios.length).toBeGreaterThan(25);
    const mean = ratios.reduce((sum, value) => sum + value / ratios.length, 0);
    expectClose(mean, 0, {
      absolute: 0.03,
      because: "thirty bands of a hundred and more degrees of freedom",
    });
  });
  it("tells why its dissipation is the one adopted", () => {
    expect(station.facts.dissipationReason).toMatch(/all three components/);
  });
});

describe.each([0, 1, 2])(
  "a record made of the spectrum of Comte-Bellot & Corrsin (1971), table 2(a), station %d of table 4",
  (i) => {
    // cm and s; nu = U0 M/34000, stated in their section 2
    const gross = readRows(reference("cbc1971/cbc1971_table4_gross_properties.csv"))[i];
    const [u, epsilon] = [Number(gross.u1_rms_cm_s), Number(gross.epsilon_cm2_s3)];
    const ratio = consistency.one_dimensional_M_5p08[i];
    const column = `E11_tU0M${ratio.tU0_over_M}_cm3_s2`;
    const rows = readRows(reference("cbc1971/cbc1971_table2a_E11_M5.08cm.csv")).filter(
      (row) => row[column] !== "",
    );
    const table = { k: rows.map((row) => Number(row.k1_per_cm)), E: rows.map((row) => Number(row[column])) };
    const [nu, U] = [0.149412, 1000];
    const last = table.k[table.k.length - 1];
    const highest = 1.005 * last;
    const k1 = Float64Array.from({ length: 700 }, (_, j) => 0.01 * 10 ** (j / 200)).filter((k) => k < last);
    const E11 = k1.map(interpolated(table, "flat"));
    const step = Math.PI / highest / U;
    const signal = synthesiseRecord({ spectra: { k1, E11, E22: E11 }, U, step, samples: 1 << 15, seed: 3 });
    const station = stationOf({ u: signal.u }, { kinematicViscosity: nu }, { step });

    it("has the variance, the dissipation and lambda of the table within three standard errors", () => {
      const published = {
        uu: ratio.u2 * u ** 2,
        epsilon: ratio.eps_measured * epsilon,
        lambda: Math.sqrt((15 * nu * ratio.u2 * u ** 2) / (ratio.eps_measured * epsilon)),
      };
      for (const key of ["uu", "epsilon", "lambda"] as const) {
        const found = station[key];
        const standard = isEstimate(found) ? (found.error?.standard ?? 0) : 0;
        expect(standard).toBeGreaterThan(0);
        expect(standard).toBeLessThan(0.06);
        expectClose(Math.log((found.value ?? 0) / published[key]), 0, {
          absolute: 3 * standard,
          because: `the error of ${key} as the record tells it`,
        });
      }
    });
    it("has no inertial range, and says that its Reynolds number is too low for one", () => {
      const { epsilon_inertial } = station;
      expect(isEstimate(epsilon_inertial)).toBe(false);
      if (!isEstimate(epsilon_inertial)) expect(epsilon_inertial.why).toMatch(/needs more than 100/);
    });
    it("carries the assumption of isotropy to all that is formed with v and w", () => {
      const flag = station.flags.find(({ code }) => code === "isotropy-assumed");
      expect(flag?.concerns).toEqual(expect.arrayContaining(["k", "Tu", "epsilon", "eta", "C_epsilon"]));
      expect(flag?.concerns).not.toContain("uu");
      expect(station.facts.dissipationReason).toMatch(/as if isotropic/);
    });
  },
);
