import { describe, expect, it } from "vitest";
import { isEstimate } from "../../../../src/core/quantity.ts";
import { seededRandom } from "../../../../src/core/signal/seededRandom.ts";
import { joinLines } from "../../../../src/core/station/lines/joinLines.ts";
import { lateralGradients } from "../../../../src/core/station/lines/lineGradients.ts";
import { lineSpectra } from "../../../../src/core/station/lines/lineSpectra.ts";
import { reduceLines } from "../../../../src/core/station/lines/reduceLines.ts";
import { expectClose } from "../../../support/expectClose.ts";
import {
  codes,
  exact,
  gradient,
  grid,
  harmonics,
  length,
  names,
  nu,
  part,
  partOf,
  periodic,
  rates,
  size,
  snapshots,
  spacing,
  station,
  sumOver,
  valueOfKey,
  variance,
} from "./harmonicLines.ts";

describe("a periodic line of harmonics", () => {
  it("has their variances and mean-square gradients, each component in its place along y", () => {
    const known = {
      ...{ U: 4, uu: variance("u"), vv: variance("v"), ww: variance("w") },
      ...{
        gradient: gradient("v"),
        gradient_u: gradient("v"),
        gradient_v: gradient("u"),
        gradient_w: gradient("w"),
      },
    };
    for (const [name, value] of Object.entries(known)) expectClose(valueOfKey(station, name), value, exact);
  });
  it("has what follows from them by definition", () => {
    const [uu, vv, ww] = names.map(variance);
    const [g, g2, g3] = [gradient("v"), gradient("u"), gradient("w")];
    const k = (uu + vv + ww) / 2;
    const epsilon = 3 * nu * (g + g2 + g3);
    const lambda = Math.sqrt(vv / g);
    const L11 = station.L11.value ?? 0;
    const known = {
      ...{
        k,
        Tu: Math.sqrt((2 * k) / 3) / 4,
        isotropy_uv: Math.sqrt(uu / vv),
        isotropy_uw: Math.sqrt(uu / ww),
      },
      ...{
        epsilon,
        epsilon_gradient: epsilon,
        "epsilon_all-gradients": epsilon,
        "epsilon_u-gradient": 15 * nu * g,
      },
      ...{ lambda, lambda_f: Math.SQRT2 * lambda, lambda_gradient: lambda, eta: (nu ** 3 / epsilon) ** 0.25 },
      ...{ Re_lambda: (Math.sqrt(vv) * lambda) / nu, K_v: (2 * g) / g2, K_w: (2 * g) / g3 },
      ...{ Re_L: (Math.sqrt(vv) * L11) / nu, C_epsilon: (epsilon * L11) / vv ** 1.5, T_int: L11 / 4 },
    };
    for (const [name, value] of Object.entries(known)) expectClose(valueOfKey(station, name), value, exact);
  });
  it("has L11 up to the zero crossing of Σ a² cos(2π m r/L)/2, and the scales across to the same", () => {
    const rho = (name: (typeof names)[number], l: number) =>
      sumOver(rates[name], (m) => Math.cos((2 * Math.PI * m * l) / size));
    let last = 0;
    while (rho("v", last + 1) > 0) last++;
    const [a, b] = [rho("v", last), rho("v", last + 1)];
    const star = last + a / (a - b);
    const area = (name: (typeof names)[number]) => {
      let sum = 0;
      for (let l = 1; l <= last; l++) sum += (rho(name, l - 1) + rho(name, l)) / 2;
      const end = rho(name, last) + (rho(name, last + 1) - rho(name, last)) * (star - last);
      return (spacing * (sum + ((star - last) * (rho(name, last) + end)) / 2)) / rho(name, 0);
    };
    expectClose(station.L11.value, area("v"), exact);
    expectClose(station.routes.L_v.value, area("u"), exact);
    expectClose(station.routes.L_w.value, area("w"), exact);
    expectClose(station.facts.tauStar, (star * spacing) / 4, exact);
    expectClose(
      isEstimate(station.L11) ? station.L11.error?.standard : 0,
      Math.sqrt((4 * star * spacing) / (24 * length)),
      exact,
    );
  });
  it("has curves of its spectra in wavenumber and its correlations over U", () => {
    const { curves } = station;
    if (curves === null) throw new Error("no curves");
    const unit = (2 * Math.PI) / length;
    expectClose(curves.k1[0], unit, exact);
    expectClose(curves.k1[2], 3 * unit, exact);
    for (const m of [1, 2, 5]) {
      expectClose(curves.E11[m - 1] * unit, Math.exp(-2 * m * rates.v) / 2, exact);
      expectClose((curves.E22?.[m - 1] ?? 0) * unit, Math.exp(-2 * m * rates.u) / 2, exact);
      expectClose((curves.E33?.[m - 1] ?? 0) * unit, Math.exp(-2 * m * rates.w) / 2, exact);
      expectClose(
        curves.rho_u[m],
        sumOver(rates.v, (n) => Math.cos((2 * Math.PI * n * m) / size)) / variance("v"),
        exact,
      );
      expectClose(
        curves.rho_v?.[m],
        sumOver(rates.u, (n) => Math.cos((2 * Math.PI * n * m) / size)) / variance("u"),
        exact,
      );
      expectClose(curves.lag[m], (m * spacing) / 4, exact);
    }
    // 24 independent snapshots of one line: two degrees of freedom a bin each
    expectClose(curves.freedom, 48, exact);
    expectClose(curves.freedoms?.[0], 48, exact);
  });
  it("tells how it was sampled", () => {
    const { facts } = station;
    const L11 = station.L11.value ?? 0;
    expect(facts.lines).toMatchObject({
      ...{ along: "y", points: size, periodic: true, parallel: 1, snapshots: 24, independentSnapshots: 24 },
    });
    expectClose(facts.lines?.length, length, exact);
    expectClose(facts.lines?.spacing, spacing, exact);
    expectClose(facts.lines?.independentSamples, (24 * length) / (2 * L11), exact);
    expectClose(facts.integralTimes, (24 * length) / L11, exact);
    expectClose(facts.recoveredVariance, 1, exact);
    expectClose(facts.step, spacing / 4, exact);
    expectClose(facts.lagLimit, (17 * spacing) / 4, exact);
    expectClose(facts.k1max_eta, (Math.PI / spacing) * (station.eta.value ?? 0), exact);
    expect([facts.segment, facts.segments, facts.groups]).toEqual([size, 24, 12]);
    expect([facts.cutoff, facts.noiseFloor, facts.shareBeyondCutoff, facts.taylorFactor]).toEqual([
      null,
      null,
      null,
      null,
    ]);
    expect([station.x, station.duration, station.samples]).toEqual([1.5, 230, 24 * size]);
    expect(station.sources).toEqual([{ name: "line.csv", bytes: 0, x: 1.5, position: "column" }]);
    expect([station.blocks?.rows, station.blocks?.step, station.blocks?.start]).toEqual([24, 10, 0]);
  });
  it("has intervals by leaving out groups of snapshots: those of a mean over them", () => {
    // groups of two snapshots: the jackknife of a ratio of sums; of U, the error of the mean of twelve
    const level = harmonics(24, 6).map((snapshot, i) => {
      const add = Math.sin(i * i);
      return snapshot.map((column, c) => (c === 0 ? column.map((value) => value + add) : column));
    });
    const found = reduceLines([partOf(level)], periodic).U;
    const means = Array.from(
      { length: 12 },
      (_, g) => (Math.sin((2 * g) ** 2) + Math.sin((2 * g + 1) ** 2)) / 2,
    );
    const mean = means.reduce((sum, value) => sum + value, 0) / 12;
    const square = means.reduce((sum, value) => sum + (value - mean) ** 2, 0);
    expectClose(found.value, 4 + mean, exact);
    expectClose(isEstimate(found) ? found.error?.standard : 0, Math.sqrt(square / 11 / 12), exact);
  });
  it("along z has w in the place of v", () => {
    const turned = snapshots.map(([u, v, w]) => [u, w, v]);
    const z = reduceLines([partOf(turned, { ...grid, along: "z" })], periodic);
    for (const name of ["L11", "gradient", "lambda", "epsilon", "Re_lambda", "S_dudx"])
      expectClose(valueOfKey(z, name), valueOfKey(station, name) ?? 0, exact);
    // across stand first the other lateral component, then u
    expectClose(z.routes.K_v.value, station.routes.K_w.value ?? 0, exact);
    expectClose(z.routes.L_w.value, station.routes.L_v.value ?? 0, exact);
  });
  it("of which a spectrum ends in noise is cut, and says so", () => {
    const { gaussian } = seededRandom(4);
    const noisy = harmonics(24, 6).map((snapshot) =>
      snapshot.map((column) => column.map((value) => value + 0.003 * gaussian())),
    );
    const found = reduceLines([partOf(noisy)], periodic);
    expect(codes(found)).toContain("noise-floor");
    // white noise of variance s² up to π/dy
    expectClose(found.facts.noiseFloor, (0.003 ** 2 * spacing) / Math.PI, {
      relative: 0.3,
      because: "six bins of 24 snapshots: a tenth, and the signal's own end",
    });
    expect(found.facts.cutoff).toBeGreaterThan(0);
    expectClose(found.gradient.value, gradient("v"), { relative: 0.01, because: "noise of 1 % of v'" });
  });
  it("of which neighbours are not correlated has no gradient", () => {
    const lines = joinLines([part]);
    const spectra = lineSpectra(lines, true);
    expect(lateralGradients(lines, spectra, 0.99 * spacing)).toEqual([]);
    expect(lateralGradients(lines, spectra, 1.01 * spacing).length).toBe(3);
    expect(lateralGradients(lines, spectra, null).length).toBe(3);
    expect(lateralGradients(lines, null, 1)).toEqual([]);
  });
  it("taken for an open one has the gradient of the window taken out again", () => {
    // one harmonic each, which a Hann window widens to its neighbours: m² becomes m² + 1/3
    const single = Array.from({ length: 12 }, (_, s) =>
      [1, 2, 2].map((m, c) =>
        Float64Array.from(
          { length: size },
          (_unused, i) => (c === 0 ? 4 : 0) + Math.cos((2 * Math.PI * m * i) / size + s),
        ),
      ),
    );
    const lines = joinLines([partOf(single)]);
    const found = lateralGradients(lines, lineSpectra(lines, false), null);
    expect(found.map(({ name }) => name)).toEqual(names);
    found.forEach(({ rate, rows }, c) => {
      expectClose(rate, ((2 * Math.PI * (c === 0 ? 1 : 2)) / length) ** 2 / 2, exact);
      const mean = rows.reduce((sum, value) => sum + value, 0) / (12 * size);
      expectClose(mean, rate, exact);
    });
  });
});
