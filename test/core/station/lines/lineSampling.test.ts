import { describe, expect, it } from "vitest";
import { chiSquareTail } from "../../../../src/core/signal/distributions/chiSquareTail.ts";
import { seededRandom } from "../../../../src/core/signal/seededRandom.ts";
import { joinLines } from "../../../../src/core/station/lines/joinLines.ts";
import { fewestSnapshots, lineSampling } from "../../../../src/core/station/lines/lineSampling.ts";
import { lateralScales } from "../../../../src/core/station/lines/lineScaleRoutes.ts";
import type { LineSpectra } from "../../../../src/core/station/lines/lineSpectra.ts";
import { reduceLines } from "../../../../src/core/station/lines/reduceLines.ts";
import { expectClose } from "../../../support/expectClose.ts";
import {
  exact,
  gradient,
  grid,
  names,
  part,
  partOf,
  periodic,
  size,
  snapshots,
  spacing,
} from "./harmonicLines.ts";

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
