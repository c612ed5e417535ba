import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../../src/core/quantity.ts";
import { seededRandom } from "../../../../src/core/signal/seededRandom.ts";
import type { LineGrid } from "../../../../src/core/station/lines/linePart.ts";
import { reduceLines } from "../../../../src/core/station/lines/reduceLines.ts";
import { startLines } from "../../../../src/core/station/lines/startLines.ts";
import { zeroCrossing } from "../../../../src/core/station/zeroCrossing.ts";
import { expectClose } from "../../../support/expectClose.ts";
import { lineSettings } from "./madeLines.ts";

const close = { relative: 1e-9, absolute: 1e-11, because: "the definition, summed in another order" };
const [stations, lines, snapshots, spacing] = [11, 2, 14, 0.25];
const grid: LineGrid = {
  file: "stream.csv",
  position: "column",
  along: "x",
  components: ["u", "v", "w"],
  stations: Array.from({ length: stations }, (_, i) => 1 + i * spacing),
  points: Float64Array.from({ length: stations }, (_, i) => 1 + i * spacing),
  across: [0, 100].map((z) => ({ y: 0, z })),
};
const random = seededRandom(21);
/** Values that resemble their neighbours upstream, about a mean that falls along x, with a skewness of their own. */
const values = Array.from({ length: snapshots }, () =>
  [0, 1, 2].map((c) => {
    const column = new Float64Array(stations * lines);
    for (let l = 0; l < lines; l++) {
      let value = 0;
      for (let i = 0; i < stations; i++) {
        value = 0.5 * value + random.gaussian() ** 2 - 1;
        column[i * lines + l] = value + (c === 0 ? 6 - 0.1 * i : 0) + (c === 1 ? 0.3 * i : 0);
      }
    }
    return column;
  }),
);
const settings = { ...lineSettings, kinematicViscosity: 1e-3 };
function partsOf(of: LineGrid = grid) {
  const reducer = startLines(of);
  values.forEach((snapshot, t) => {
    reducer.add(2 * t, snapshot);
  });
  return reducer.finish();
}
const parts = partsOf();
const at = 5;
const station = reduceLines([parts[at]], settings);
const whyOf = (quantity: Quantity) => (isEstimate(quantity) ? "" : quantity.why);
const mean = (x: readonly number[]) => x.reduce((sum, value) => sum + value, 0) / x.length;
/** Something at every snapshot and line about one station. */
const each = (of: (on: (m: number) => number) => number, c = 0, i = at) =>
  values.flatMap((snapshot) => [0, 1].map((l) => of((m) => snapshot[c][(i + m) * lines + l])));
const power = (x: readonly number[], p: number) => mean(x.map((value) => (value - mean(x)) ** p));
const fourth = (on: (m: number) => number) => (8 * (on(1) - on(-1)) - (on(2) - on(-2))) / (12 * spacing);
const second = (on: (m: number) => number) => (on(1) - on(-1)) / (2 * spacing);

describe("a station of lines along the stream", () => {
  const [u, v, w] = [0, 1, 2].map((c) => each((on) => on(0), c));

  it("has moments over snapshots and lines, each about its mean", () => {
    const co = (x: readonly number[], y: readonly number[]) =>
      mean(x.map((value, i) => (value - mean(x)) * (y[i] - mean(y))));
    const known = {
      U: mean(u),
      uu: power(u, 2),
      vv: power(v, 2),
      ww: power(w, 2),
      uv: co(u, v),
      uw: co(u, w),
      vw: co(v, w),
    };
    for (const [name, value] of Object.entries(known))
      expectClose((station as unknown as Record<string, Quantity>)[name].value, value, close);
    [u, v, w].forEach((x, c) => {
      expectClose(station.routes[`skewness_${"uvw"[c]}`].value, power(x, 3) / power(x, 2) ** 1.5, close);
      expectClose(station.routes[`flatness_${"uvw"[c]}`].value, power(x, 4) / power(x, 2) ** 2, close);
    });
    expect([station.x, station.samples, station.duration]).toEqual([1 + at * spacing, snapshots * lines, 26]);
  });
  it("has errors by leaving out snapshots: of the skewness about the mean of what is left", () => {
    const groups = 10;
    const group = (s: number) => Math.min(groups - 1, Math.floor((groups * (s + 0.5)) / snapshots));
    const skewness = (of: readonly number[]) => power(of, 3) / power(of, 2) ** 1.5;
    const flat = (of: readonly number[]) => Math.log(power(of, 4) / power(of, 2) ** 2);
    for (const [name, statistic] of [
      ["skewness_v", skewness],
      ["flatness_v", flat],
    ] as const) {
      const whole = statistic(v);
      const left = Array.from({ length: groups }, (_, g) =>
        statistic(v.filter((_value, i) => group(Math.floor(i / lines)) !== g)),
      );
      const h = Array.from(
        { length: groups },
        (_, g) =>
          snapshots / Array.from({ length: snapshots }, (_s, s) => s).filter((s) => group(s) === g).length,
      );
      const centre = groups * whole - left.reduce((sum, value, g) => sum + (1 - 1 / h[g]) * value, 0);
      const variance =
        left.reduce(
          (sum, value, g) => sum + (h[g] * whole - (h[g] - 1) * value - centre) ** 2 / (h[g] - 1),
          0,
        ) / groups;
      const found = station.routes[name];
      expectClose(isEstimate(found) ? found.error?.standard : 0, Math.sqrt(variance), close);
    }
  });
  it("has the variance of differences of the fourth order, those of the second beside it", () => {
    ["gradient_u", "gradient_v", "gradient_w"].forEach((name, c) => {
      expectClose(station.routes[name].value, power(each(fourth, c), 2), close);
    });
    expectClose(station.routes.gradient_difference4.value, power(each(fourth), 2), close);
    const slopes = each(second);
    expectClose(station.routes.gradient_difference2.value, power(slopes, 2), close);
    expectClose(station.S_dudx.value, power(slopes, 3) / power(slopes, 2) ** 1.5, close);
    const [g, g2, g3] = [0, 1, 2].map((c) => power(each(fourth, c), 2));
    expectClose(station.epsilon.value, 3e-3 * (g + g2 + g3), close);
    expectClose(station.lambda.value, Math.sqrt(power(u, 2) / g), close);
  });
  it("has L11 from the correlation of points up- and downstream, two steps further apart each", () => {
    const rho = Array.from({ length: at + 1 }, (_, m) => {
      const [a, b] = [each((on) => on(m)), each((on) => on(-m))];
      const product = mean(a.map((value, i) => (value - mean(a)) * (b[i] - mean(b))));
      return product / Math.sqrt(power(a, 2) * power(b, 2));
    });
    const { at: crossing, area } = zeroCrossing(Float64Array.from(rho));
    if (crossing === null) throw new Error("no crossing");
    expectClose(station.L11.value, 2 * spacing * area, close);
    expectClose(station.facts.tauStar, (2 * spacing * crossing) / mean(u), close);
    expectClose(station.T_int.value, (2 * spacing * area) / mean(u), close);
    // of lines along x each independent snapshot and line gives it once
    const independent = station.facts.lines?.independentSnapshots ?? 0;
    const standard = Math.sqrt((4 * crossing) / (independent * 2 * crossing));
    expectClose(isEstimate(station.L11) ? station.L11.error?.standard : 0, standard, close);
    expect(whyOf(station.routes.T_int_model)).toBe("a point has no spectrum along x");
    expect(whyOf(station.routes.L_v)).toMatch(/only the correlation of u/);
  });
  it("next to the end has differences of the second order, and at it none", () => {
    const next = reduceLines([parts[1]], settings);
    expectClose(next.gradient.value, power(each(second, 0, 1), 2), close);
    expect(whyOf(next.routes.gradient_difference4)).toMatch(/too near the end/);
    const last = reduceLines([parts[stations - 1]], settings);
    expect(whyOf(last.gradient)).toMatch(/too near the end/);
    expect(whyOf(last.L11)).toMatch(/too near the end/);
    const far = reduceLines([parts[stations - 2]], settings);
    expectClose(far.gradient.value, power(each(second, 0, stations - 2), 2), close);
    const third = reduceLines([parts[2]], settings);
    expectClose(third.gradient.value, power(each(fourth, 0, 2), 2), close);
  });
  it("of unequal steps has moments alone", () => {
    const [uneven] = partsOf({ ...grid, points: grid.points.map((x, i) => x + (i === 7 ? 0.01 : 0)) }).slice(
      at,
      at + 1,
    );
    const found = reduceLines([uneven], settings);
    expectClose(found.uu.value, power(u, 2), close);
    expect(whyOf(found.gradient)).toMatch(/not equally spaced/);
    expect(whyOf(found.L11)).toMatch(/not equally spaced/);
    expect(found.flags.map(({ code }) => code)).toContain("unequal-steps");
  });
  it("tells how it was sampled: no length, no periods, no spectrum", () => {
    expect(station.facts.lines).toMatchObject({
      along: "x",
      length: null,
      periodic: false,
      parallel: 2,
      snapshots,
    });
    expect([station.curves, station.facts.segment, station.facts.recoveredVariance]).toEqual([
      null,
      null,
      null,
    ]);
    expectClose(station.facts.step, spacing / mean(u), close);
    expectClose(station.facts.k1max_eta, (Math.PI / spacing) * (station.eta.value ?? 0), close);
    expect(whyOf(station.epsilon_inertial)).toMatch(/no spectrum along the line/);
    expect(whyOf(station.routes["epsilon_second-order"])).toMatch(/no spectrum along the line/);
  });
  it("of files by time, put together, is that of all", () => {
    const half = (from: number, to: number) => {
      const reducer = startLines({ ...grid, file: `${from}.csv` });
      values.slice(from, to).forEach((snapshot, t) => {
        reducer.add(2 * (from + t), snapshot);
      });
      return reducer.finish()[at];
    };
    const found = reduceLines([half(6, snapshots), half(0, 6)], settings);
    for (const name of ["U", "uu", "uv", "gradient", "L11", "S_dudx", "k"] as const)
      expectClose(found[name].value, station[name].value ?? 0, close);
    expect(found.sources.map(({ name }) => name)).toEqual(["0.csv", "6.csv"]);
    const single = reduceLines(
      values.map((_, t) => half(t, t + 1)),
      settings,
    );
    for (const name of ["U", "uu", "gradient", "L11", "k"] as const)
      expectClose(single[name].value, station[name].value ?? 0, close);
    expectClose(
      single.facts.lines?.independentSnapshots,
      station.facts.lines?.independentSnapshots ?? 0,
      close,
    );
  });
});
