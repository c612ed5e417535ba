import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { dissipationFromInertialRange } from "../../../src/core/station/inertialRange.ts";
import { localSpectrum } from "../../../src/core/station/localSpectrum.ts";
import { meanSquareRate } from "../../../src/core/station/meanSquareRate.ts";
import { noiseFloor } from "../../../src/core/station/noiseFloor.ts";
import { profileStation } from "../../../src/core/station/profileStation.ts";
import statistics from "../../reference/jhtdb/jhtdb_published_statistics.json" with { type: "json" };
import { expectClose } from "../../support/expectClose.ts";
import { readRows } from "../../support/readRows.ts";
import {
  asDensity,
  columnsOf,
  gradientOf,
  interpolated,
  varianceOf,
} from "../../support/tabulatedSpectrum.ts";
import { settings } from "./records.ts";

const reference = (name: string) => new URL(`../../reference/${name}`, import.meta.url);
describe("the spectrum of a tidal channel, Grant, Stewart & Moilliet (1962), appendix 1", () => {
  it("gives their dissipation, 0.610 cm²/s³", () => {
    const table = columnsOf(
      readRows(reference("grant1962/grant_stewart_moilliet1962_phi.csv")),
      "k_per_cm",
      "phi_cm3_s2",
    );
    const rising = { k: table.k.toReversed(), E: table.E.toReversed() };
    const spectrum = asDensity(interpolated(rising, "flat"), rising.k[rising.k.length - 1], 1 << 15);
    // nu of sea water is not printed with the spectrum: 0.01329 cm²/s is that for which its integral is theirs
    expectClose(15 * 0.01329 * gradientOf(spectrum), 0.61, {
      relative: 0.03,
      because: "fifteen points over three and a half decades: the rule of integration",
    });
  });
});

describe("the decaying box of AGARD-AR-345, data set HOM02 (Wray 1997)", () => {
  const nu = 3.5014006e-4;
  const rows = readRows(reference("agard_hom02/hom02_spectra_selected.csv"));
  const history = readRows(reference("agard_hom02/hom02_history.csv")).map((row) => ({
    t: Number(row.time),
    K: Number(row.kinetic_energy_K),
    epsilon: nu * Number(row.mean_square_vorticity),
  }));
  const at = (t: number, of: (row: (typeof history)[number]) => number) => {
    const after = history.findIndex((row) => row.t >= t);
    const [a, b] = [history[after - 1], history[after]];
    return of(a) + ((of(b) - of(a)) * (t - a.t)) / (b.t - a.t);
  };
  const times = [...new Set(rows.map((row) => row.time))];
  const spectra = times.map((time) => {
    const own = rows.filter((row) => row.time === time);
    const read = (name: string) => own.map((row) => Number(row[name]));
    return {
      t: Number(time),
      k: read("k"),
      E: read("E"),
      E11: read("E11_longitudinal"),
      E22: read("E22_transverse"),
    };
  });

  it.each(spectra)(
    "at t = $t has, from its E11, the energy and the dissipation of its history",
    ({ t, k, E11 }) => {
      const size = 2 * (k.length - 1);
      const density = Float64Array.from(E11, (value) => 2 * Math.PI * value);
      const step = (2 * Math.PI) / size;
      // the file's first bin is a half bin already
      const uu = density.reduce((sum, value) => sum + value, 0) / (size * step);
      expectClose(
        1.5 * uu,
        at(t, ({ K }) => K),
        { relative: 0.004, because: "the history is interpolated in time" },
      );
      const rate = meanSquareRate(density, size, step, noiseFloor(density, size, Infinity));
      expectClose(
        15 * nu * rate,
        at(t, ({ epsilon }) => epsilon),
        {
          relative: 0.015,
          because: "shells of unit width, and a box that is isotropic within a percent at small scales",
        },
      );
    },
  );
  it.each(spectra.filter(({ t }) => t > 2.4))(
    "at t = $t has the E22 that follows from E11 where the box holds many waves",
    (one) => {
      const [k, E11, E22] = [one.k, one.E11, one.E22].map((list) => Float64Array.from(list.slice(1)));
      const local = localSpectrum(k, E11, E22, null);
      // the simulation holds nothing beyond 241, and a slope is taken over a third to either side
      const used = Array.from(local.k1).flatMap((k1, i) => (k1 > 12 && k1 < 120 ? [i] : []));
      expect(used.length).toBeGreaterThan(15);
      for (const i of used) {
        expectClose(local.E22_isotropic[i], local.E22?.[i] ?? 0, {
          relative: 0.05,
          because: `one box at one time, k1 = ${local.k1[i].toFixed(0)}`,
        });
      }
    },
  );
  // R_lambda printed in the heads of the data set's files
  it.each([
    [0.9616, 104.5],
    [1.4941, 70.45],
    [2.0439, 65.11],
    [4.3366, 60.41],
  ])("at t = %d has the Taylor Reynolds number %d", (t, published) => {
    const values = { uu: (2 / 3) * at(t, ({ K }) => K), epsilon: at(t, ({ epsilon }) => epsilon) };
    const row = { file: "hom02_history.csv", line: 1, x: t, values };
    const { Re_lambda } = profileStation(row, { ...settings, kinematicViscosity: nu });
    expectClose(Re_lambda.value, published, {
      relative: 0.002,
      because: "the history is interpolated in time",
    });
  });
});

describe("forced isotropic turbulence, JHTDB isotropic1024 (Li et al. 2008, J. Turbulence 9, N31)", () => {
  const [published] = statistics.sets;
  const shells = readFileSync(reference("jhtdb/jhtdb_isotropic1024_spectrum.txt"), "utf8")
    .trim()
    .split("\n")
    .slice(2)
    .map((line) => line.trim().split(/\s+/).map(Number));
  // all of a shell's energy at its own wavenumber, as in the sums by which the figures were published
  const oneSided = (k1: number) =>
    shells.reduce((sum, [k, E]) => (k > k1 ? sum + (E / k) * (1 - (k1 / k) ** 2) : sum), 0);
  const spectrum = asDensity(oneSided, 482, 1 << 13);
  const { density, size, step } = spectrum;
  const uu = varianceOf(spectrum);
  const epsilon =
    15 * Number(published.nu) * meanSquareRate(density, size, step, noiseFloor(density, size, Infinity));

  it("has the published energy, dissipation, Taylor scale and Reynolds number", () => {
    const digits = { relative: 0.005, because: "three published digits" };
    expectClose(1.5 * uu, Number(published.K), digits);
    expectClose(epsilon, published.eps, digits);
    expectClose(Math.sqrt((15 * Number(published.nu) * uu) / epsilon), Number(published.lambda), digits);
    const row = { file: "jhtdb", line: 1, x: 0, values: { uu, epsilon } };
    const { Re_lambda, eta } = profileStation(row, { ...settings, kinematicViscosity: Number(published.nu) });
    expectClose(Re_lambda.value, published.R_lambda, digits);
    expectClose(eta.value, published.eta, digits);
  });
  it("has the published integral scale, from the low end of E11", () => {
    expectClose(density[0] / (2 * uu), published.L11, {
      relative: 0.01,
      because: "three digits",
    });
  });
  it("has an inertial range, whose level is within what measurements of it have given", () => {
    const k1 = Float64Array.from({ length: size / 2 }, (_, i) => ((i + 1) * 964) / size);
    const E = density.subarray(1).map((value) => value / (2 * Math.PI));
    const found = Number(dissipationFromInertialRange(k1, E, published.R_lambda));
    // Sreenivasan (1995), Phys. Fluids 7, 2778, collected C1 = 0.53 ± 0.055; the program's is 0.49
    expectClose(0.49 * (found / published.eps) ** (2 / 3), 0.53, {
      absolute: 0.055,
      because: "the scatter of the constant",
    });
  });
});
