import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../../src/core/quantity.ts";
import { chiSquareTail } from "../../../../src/core/signal/distributions/chiSquareTail.ts";
import { seededRandom } from "../../../../src/core/signal/seededRandom.ts";
import { joinLines } from "../../../../src/core/station/lines/joinLines.ts";
import { lateralGradients } from "../../../../src/core/station/lines/lineGradients.ts";
import type { LineGrid, LinePart } from "../../../../src/core/station/lines/linePart.ts";
import { fewestSnapshots, lineSampling } from "../../../../src/core/station/lines/lineSampling.ts";
import { lateralScales } from "../../../../src/core/station/lines/lineScaleRoutes.ts";
import { type LineSpectra, lineSpectra } from "../../../../src/core/station/lines/lineSpectra.ts";
import { reduceLines } from "../../../../src/core/station/lines/reduceLines.ts";
import { startLines } from "../../../../src/core/station/lines/startLines.ts";
import type { ReduceSettings, StationResult } from "../../../../src/core/stationResult.ts";
import { expectClose } from "../../../support/expectClose.ts";
import { lineSettings } from "./madeLines.ts";

const exact = { relative: 1e-9, absolute: 1e-13, because: "a closed form" };
const nu = 3e-3;
const settings: ReduceSettings = { ...lineSettings, kinematicViscosity: nu };
const [size, spacing] = [32, 0.05];
const length = size * spacing;

/** A periodic line of harmonics m = 1 … 9 of amplitude e^(-m rate), their phases new in every snapshot. */
const rates = { u: 0.9, v: 0.7, w: 0.8 } as const;
const names = ["u", "v", "w"] as const;
function harmonics(count: number, seed: number, level = 4): Float64Array[][] {
  const { uniform } = seededRandom(seed);
  return Array.from({ length: count }, () =>
    names.map((name) => {
      const phases = Array.from({ length: 9 }, () => 2 * Math.PI * uniform());
      return Float64Array.from({ length: size }, (_, i) =>
        phases.reduce(
          (sum, phase, m) =>
            sum + Math.exp(-(m + 1) * rates[name]) * Math.cos((2 * Math.PI * (m + 1) * i) / size + phase),
          name === "u" ? level : 0,
        ),
      );
    }),
  );
}
const sumOver = (rate: number, of: (m: number) => number) => {
  let sum = 0;
  for (let m = 1; m <= 9; m++) sum += (Math.exp(-2 * m * rate) / 2) * of(m);
  return sum;
};
const variance = (name: (typeof names)[number]) => sumOver(rates[name], () => 1);
const gradient = (name: (typeof names)[number]) =>
  sumOver(rates[name], (m) => ((2 * Math.PI * m) / length) ** 2);

const grid: LineGrid = {
  file: "line.csv",
  position: "column",
  along: "y",
  components: names,
  stations: [1.5],
  points: Float64Array.from({ length: size }, (_, i) => i * spacing),
  across: [{ y: null, z: null }],
};
function partOf(snapshots: readonly Float64Array[][], of: LineGrid = grid): LinePart {
  const reducer = startLines(of);
  snapshots.forEach((snapshot, i) => {
    reducer.add(10 * i, snapshot);
  });
  return reducer.finish()[0];
}
const snapshots = harmonics(24, 6);
const part = partOf(snapshots);
const periodic = { ...settings, periodic: true } as const;
const station = reduceLines([part], periodic);
const valueOfKey = (of: StationResult, name: string) =>
  ((of as unknown as Record<string, Quantity>)[name] ?? of.routes[name]).value;
const whyOf = (quantity: Quantity) => (isEstimate(quantity) ? "" : quantity.why);
const codes = ({ flags }: StationResult) => flags.map(({ code }) => code);

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

describe("the dissipation of increments along a line", () => {
  it("of the second order is the largest (D_LL/2)^(3/2)/r from lambda to L11, of the third that of -5/4 D_LLL/r", () => {
    const lags = [1, 2, 3, 4, 6, 8, 12, 16];
    // with a seventh harmonic the Taylor scale lies below the integral one
    const flat = snapshots.map((snapshot) =>
      snapshot.map((column, c) =>
        column.map((value, i) => value + (c === 1 ? 0.1 * Math.sin((2 * Math.PI * 7 * i) / size) : 0)),
      ),
    );
    const wavy = reduceLines([partOf(flat)], periodic);
    const [lambda, L11] = [wavy.lambda.value ?? 0, wavy.L11.value ?? 0];
    const bounds = lags.map((lag) => {
      const r = lag * spacing;
      let [n, square, cube] = [0, 0, 0];
      for (const [, v] of flat)
        for (let i = lag; i < size; i++) {
          n++;
          square += (v[i] - v[i - lag]) ** 2;
          cube += (v[i] - v[i - lag]) ** 3;
        }
      return { r, second: (square / n / 2) ** 1.5 / r, third: (-1.25 * cube) / n / r };
    });
    const between = bounds.filter(({ r }) => r >= lambda && r <= L11);
    expect(between.length).toBeGreaterThan(0);
    expectClose(
      wavy.routes["epsilon_second-order"].value,
      Math.max(...between.map(({ second }) => second)),
      exact,
    );
    expectClose(
      wavy.routes["epsilon_third-order"].value,
      Math.max(...bounds.map(({ third }) => third)),
      exact,
    );
  });
  it("and the skewness come from the separation nearest twice eta", () => {
    // a viscosity for which eta is 1.4 steps: increments over three
    const g = gradient("v");
    const wanted = (1.4 * spacing) ** 2 * Math.sqrt(15 * g);
    const own = reduceLines([part], { ...periodic, kinematicViscosity: wanted });
    let [n, square, cube, two, four] = [0, 0, 0, 0, 0];
    for (const [, v] of snapshots) {
      for (let i = 3; i < size; i++) {
        n++;
        square += (v[i] - v[i - 3]) ** 2;
        cube += (v[i] - v[i - 3]) ** 3;
      }
      for (let i = 2; i < size; i++) two += ((v[i] - v[i - 2]) / (2 * spacing)) ** 2;
      for (let i = 2; i < size - 2; i++)
        four += ((8 * (v[i + 1] - v[i - 1]) - (v[i + 2] - v[i - 2])) / (12 * spacing)) ** 2;
    }
    expectClose(own.S_dudx.value, cube / n / (square / n) ** 1.5, exact);
    expectClose(own.routes.gradient_difference2.value, two / (24 * (size - 2)), exact);
    expectClose(own.routes.gradient_difference4.value, four / (24 * (size - 4)), exact);
  });
});

describe("how well lines are sampled", () => {
  const lines = joinLines([part]);
  const across = [0, 1, 3].map((z) => ({ y: null, z }));

  it("is told in independent snapshots, lengths of 2 L11, and lines L11 apart", () => {
    const found = lineSampling({ ...lines, across }, 8, 0.5, 0.7, true);
    expectClose(found.samples, 24 * 3 * (8 / 1), exact);
    expectClose(found.scaleError?.standard, Math.sqrt((4 * 0.7) / (24 * 3 * 8)), exact);
    // three lines over an extent of 3 with L11 = 2: 1 + 3/2 of them
    expectClose(lineSampling({ ...lines, across }, 8, 2, 0.7, true).samples, 24 * 2.5 * 2, exact);
    const both = across.map(({ z }) => ({ y: 2 * z, z }));
    expectClose(
      lineSampling({ ...lines, across: both }, 8, 4, 0.7, true).samples,
      24 * Math.min(3, 2.5 * 1.75),
      exact,
    );
    expectClose(lineSampling({ ...lines, across }, 8, null, null, true).samples, 24, exact);
    expectClose(lineSampling(lines, 8, 10, 0.7, true).samples, 24, exact);
    expectClose(lineSampling(lines, null, 0.5, 0.7, true).samples, 24, exact);
  });
  it("has an error of L11 by the pairs there are: on an open line half the reach less", () => {
    expectClose(
      lineSampling(lines, 8, 0.5, 0.7, false).scaleError?.standard,
      Math.sqrt(2.8 / (24 * 7.65)),
      exact,
    );
    expectClose(
      lineSampling(lines, null, 0.5, 0.7, false).scaleError?.standard,
      Math.sqrt(2.8 / (24 * 0.7)),
      exact,
    );
    expect(lineSampling(lines, 8, null, null, true).scaleError).toBeNull();
  });
  it("needs ten independent snapshots, and groups them by two", () => {
    const of = (count: number) =>
      lineSampling(joinLines([partOf(snapshots.slice(0, count))]), 8, 0.5, 0.7, true);
    expect(fewestSnapshots).toBe(10);
    expect([of(9).groups, of(9).scaleError]).toEqual([null, null]);
    expect(of(9).why).toMatch(/there are 9.0 independent snapshots; 10/);
    expect([of(10).groups?.count, of(10).why]).toEqual([10, ""]);
    expect(of(24).groups?.count).toBe(12);
  });
});

describe("a correlation along a line that does not cross zero", () => {
  const lines = joinLines([part]);
  const spectraOf = (at: (l: number) => number): LineSpectra => {
    const covariance = Float64Array.from({ length: 17 }, (_, l) => at(l));
    const density = Float64Array.from({ length: 17 }, () => 1);
    const three = <T>(one: T) => [one, one, one];
    return {
      step: 0.5,
      length: 16,
      periodic: true,
      lines: 100,
      density: three(density),
      covariance: three(covariance),
    };
  };
  const area = ((1 + 0.1) / 2) * 16;
  it("is integrated up to half the line where it is next to nothing there", () => {
    const falling = (end: number) =>
      lateralScales(
        lines,
        spectraOf((l) => 3 * (1 + ((end - 1) * l) / 16)),
        "zero-crossing",
      );
    const scatter = (end: number) => Math.sqrt((2 * ((1 + end) / 2) * 8) / 1600);
    const border = 0.1 + 2 * scatter(0.3);
    expect(border).toBeGreaterThan(0.25);
    const found = falling(0.1);
    expect(found.toHalf).toBe(true);
    expectClose(found.scale, area * 0.5, exact);
    expectClose(Number(found.routes["zero-crossing"]), area * 0.5, exact);
    expectClose(found.tauStar, 8, exact);
    expect(falling(border - 0.01).toHalf).toBe(true);
    const open = falling(border + 0.01);
    expect([open.toHalf, open.tauStar, open.scale]).toEqual([undefined, null, null]);
    expectClose(open.least, ((1 + border + 0.01) / 2) * 8, exact);
    expect(open.routes["zero-crossing"]).toMatch(/of separation: the integral length is/);
  });
  it("has none where there is no fluctuation, no component along the line, or no spectrum", () => {
    const why = (found: ReturnType<typeof lateralScales>) => found.routes.model;
    expect(
      why(
        lateralScales(
          lines,
          spectraOf(() => 0),
          "model",
        ),
      ),
    ).toBe("the fluctuation is zero");
    expect(why(lateralScales(lines, null, "model"))).toMatch(/not equally spaced/);
    const alone = { ...lines, components: ["u" as const] };
    expect(
      why(
        lateralScales(
          alone,
          spectraOf(() => 1),
          "model",
        ),
      ),
    ).toMatch(/^v, the component along the line/);
  });
});

describe("what lines cannot give", () => {
  const two = partOf(
    snapshots.map(([u, v]) => [u, v]),
    { ...grid, components: ["u", "v"] },
  );
  const alone = partOf(
    snapshots.map(([u]) => [u]),
    { ...grid, components: ["u"] },
  );
  it("u and v: w is taken like u across the line, and is missing by name", () => {
    const found = reduceLines([two], periodic);
    expect(codes(found)).toContain("axisymmetry-assumed");
    for (const q of [
      found.ww,
      found.uw,
      found.vw,
      found.isotropy_uw,
      found.routes.skewness_w,
      found.routes.K_w,
    ])
      expect(whyOf(q)).toBe("w was not measured");
    expect(whyOf(found.routes.L_w)).toBe("w was not measured");
    expect(whyOf(found.routes["epsilon_all-gradients"])).toMatch(/not all three/);
    expectClose(found.k.value, variance("u") / 2 + variance("v"), exact);
    expectClose(found.epsilon.value, 3 * nu * (gradient("v") + 2 * gradient("u")), exact);
  });
  it("u alone across a line: no component along it, so no length and no gradient", () => {
    const found = reduceLines([alone], periodic);
    expect(codes(found)).toContain("isotropy-assumed");
    expectClose(found.k.value, 1.5 * variance("u"), exact);
    for (const q of [found.L11, found.lambda, found.epsilon, found.eta])
      expect(whyOf(q)).toMatch(/^v(, the component along the line,)? was not measured/);
    expect(whyOf(found.epsilon_inertial)).toMatch(/no spectrum along the line/);
    expect(found.curves).toBeNull();
  });
  it("a stream at rest: lengths stand, times and the intensity do not", () => {
    const found = reduceLines([partOf(harmonics(24, 6, -1))], periodic);
    expectClose(found.L11.value, station.L11.value ?? 0, exact);
    expect(whyOf(found.T_int)).toMatch(/mean velocity is not positive/);
    expect(whyOf(found.Tu)).toMatch(/mean velocity is not positive/);
    expectClose(found.facts.step, spacing, exact);
    expectClose(found.curves?.lag[1], spacing, exact);
    expectClose(
      reduceLines([partOf(harmonics(24, 6, -1))], { ...periodic, referenceSpeed: 2 }).Tu.value,
      (station.Tu.value ?? 0) * 2,
      exact,
    );
  });
  it("a short line, a mean that varies, no viscosity, a large-eddy simulation are flagged", () => {
    expect(codes(station)).toEqual([]);
    // one wave in the line: its L11 is L/(2π)
    const wave = Array.from({ length: 12 }, (_, s) =>
      names.map((name) =>
        Float64Array.from(
          { length: size },
          (_unused, i) => (name === "u" ? 4 : 0) + Math.cos((2 * Math.PI * i) / size + s),
        ),
      ),
    );
    const short = reduceLines([partOf(wave)], periodic).flags.find(({ code }) => code === "short-box");
    expectClose(short?.value, 2 * Math.PI, { relative: 0.004, because: "trapezoids of eight steps" });
    const les = reduceLines([part], { ...periodic, kind: "les", kinematicViscosity: null });
    expect(codes(les)).toEqual(expect.arrayContaining(["resolved-scales", "no-viscosity"]));
    for (const q of [les.epsilon, les.lambda, les.Re_lambda, les.C_epsilon])
      expect(whyOf(q)).toMatch(/decay law/);
    expect(codes(station)).not.toContain("no-viscosity");
    expect(codes(station)).not.toContain("resolution");
    const thin = reduceLines([part], { ...periodic, kinematicViscosity: 1e-6 });
    const highest = (Math.PI / spacing) * (thin.eta.value ?? 0);
    expect(highest).toBeLessThan(0.9);
    expectClose(thin.flags.find(({ code }) => code === "resolution")?.value, highest, exact);
  });
  it("fewer than ten snapshots have no interval, and count by themselves", () => {
    const few = reduceLines([partOf(snapshots.slice(0, 6))], periodic);
    expect(few.flags.find(({ code }) => code === "short-record")?.value).toBe(6);
    expect(few.facts.integralTimes).toBe(12);
    expect(few.facts.groups).toBe(0);
    for (const q of [few.U, few.L11, few.C_epsilon])
      expect(isEstimate(q) && q.low === null && /6.0 independent snapshots/.test(q.why_low ?? "")).toBe(true);
  });
  it("an inertial range that is chosen and not there leaves nothing adopted, and the reason", () => {
    const found = reduceLines([part], { ...periodic, dissipation: "inertial" });
    for (const q of [found.epsilon, found.lambda, found.eta, found.C_epsilon])
      expect(whyOf(q)).toMatch(/Re_lambda is/);
    expectClose(found.routes.lambda_gradient.value, station.lambda.value ?? 0, exact);
  });
  it("points that are not equally spaced have neither spectra nor gradients", () => {
    const uneven = partOf(snapshots, { ...grid, points: grid.points.map((y) => y + 0.01 * y * y) });
    const found = reduceLines([uneven], periodic);
    expect(codes(found)).toContain("unequal-steps");
    expect(whyOf(found.lambda)).toMatch(/not equally spaced/);
    expect(whyOf(found.routes.L_v)).toMatch(/not equally spaced/);
    expect([found.facts.step, found.facts.segment, found.facts.k1max_eta, found.facts.lagLimit]).toEqual([
      null,
      null,
      null,
      null,
    ]);
    expectClose(found.facts.lines?.length, uneven.points[size - 1], exact);
  });
});

describe("the mean along a line", () => {
  it("is tested over stretches of four L11 or more, each with its error", () => {
    // a line of white noise: L11 is half a step of it, so that there are as many stretches as are looked at, 16
    const { gaussian } = seededRandom(12);
    const white = Array.from({ length: 20 }, () =>
      names.map((name) =>
        Float64Array.from(
          { length: 128 },
          (_, i) => gaussian() + (name === "u" ? 3 + 0.12 * (i < 64 ? 1 : -1) : 0),
        ),
      ),
    );
    const long = { ...grid, points: Float64Array.from({ length: 128 }, (_, i) => i * spacing) };
    const found = reduceLines([partOf(white, long)], periodic);
    const flag = found.flags.find(({ code }) => code === "inhomogeneous");
    const scale = found.L11.value ?? 0;
    const mean = found.U.value ?? 0;
    let chi2 = 0;
    for (let s = 0; s < 16; s++) {
      let sum = 0;
      for (const [u] of white) for (let i = 8 * s; i < 8 * (s + 1); i++) sum += (u[i] - mean) / 160;
      chi2 +=
        sum ** 2 /
        ((2 * (found.uu.value ?? 0) * scale) /
          (((found.facts.lines?.independentSnapshots ?? 0) * 128 * spacing) / 16));
    }
    const p = chiSquareTail(chi2, 15);
    expect(p).toBeLessThan(0.01);
    expectClose(flag?.value, p, { relative: 1e-6, because: "a tail probability" });
  });
});
