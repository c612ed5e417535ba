import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../../src/core/quantity.ts";
import { seededRandom } from "../../../../src/core/signal/seededRandom.ts";
import { joinLines } from "../../../../src/core/station/lines/joinLines.ts";
import { lateralGradients } from "../../../../src/core/station/lines/lineGradients.ts";
import type { LineGrid } from "../../../../src/core/station/lines/linePart.ts";
import { lineSpectra } from "../../../../src/core/station/lines/lineSpectra.ts";
import { reduceLines } from "../../../../src/core/station/lines/reduceLines.ts";
import { startLines } from "../../../../src/core/station/lines/startLines.ts";
import type { Component } from "../../../../src/core/station/stationPart.ts";
import { expectClose } from "../../../support/expectClose.ts";
import { lineSettings } from "./madeLines.ts";

const close = { relative: 1e-9, absolute: 1e-12, because: "a closed form" };
const spacing = 0.1;
const settings = { ...lineSettings, kinematicViscosity: 1e-2, periodic: true } as const;
const all: readonly Component[] = ["u", "v", "w"];

function partOf(
  snapshots: readonly Float64Array[][],
  components = all,
  along: LineGrid["along"] = "y",
  begin = 0,
) {
  const size = snapshots[0][0].length;
  const reducer = startLines({
    ...{ file: "line.csv", position: "column", along, components, stations: [2] },
    points: Float64Array.from({ length: size }, (_, i) => i * spacing),
    across: [{ y: null, z: null }],
  });
  snapshots.forEach((snapshot, t) => {
    reducer.add(begin + 5 * t, snapshot);
  });
  return reducer.finish()[0];
}
const line = (size: number, of: (i: number) => number) =>
  Float64Array.from({ length: size }, (_, i) => of(i));
/** Points that have nothing to do with each other, and a level of v that changes from snapshot to snapshot. */
function white(level: number, count = 80, size = 32) {
  const { gaussian } = seededRandom(31);
  return Array.from({ length: count }, (_, s) => {
    const own = level * (s % 2 === 0 ? 1 : -1);
    return [
      line(size, () => 5 + gaussian()),
      line(size, () => gaussian() + own),
      line(size, () => gaussian()),
    ];
  });
}
const whyOf = (quantity: Quantity) => (isEstimate(quantity) ? "" : quantity.why);
const flagOf = (of: ReturnType<typeof reduceLines>, code: string) =>
  of.flags.find((flag) => flag.code === code);

describe("a correlation along a line", () => {
  it("that stays at a tenth is integrated to half the line, and that is told", () => {
    const station = reduceLines([partOf(white(0.33))], settings);
    expect(flagOf(station, "no-zero-crossing")?.text).toMatch(/next to nothing at half the length/);
    expectClose(station.facts.tauStar, (16 * spacing) / (station.U.value ?? 1), close);
    expect(isEstimate(station.L11) && station.L11.low !== null).toBe(true);
    expect(isEstimate(station.routes.L_v)).toBe(true);
  });
  it("that stays high gives a lower bound, and the line counts as short against that", () => {
    const station = reduceLines([partOf(white(3))], settings);
    expect(flagOf(station, "no-zero-crossing")?.text).toMatch(/only a lower bound/);
    expect(whyOf(station.L11)).toMatch(/of separation: the integral length is .* or more/);
    expect(whyOf(station.Re_L)).toMatch(/or more/);
    expect(whyOf(station.routes.L_w)).toMatch(/does not fall to zero/);
    // 1 + 9 of ten parts stay: the area up to half the line is some nine tenths of it
    expectClose(flagOf(station, "short-box")?.value, 32 / (0.9 * 16), {
      relative: 0.03,
      because: "a first lag that falls by a tenth",
    });
    expect([station.facts.tauStar, station.T_int.value]).toEqual([null, null]);
  });
  it("of points that have nothing to do with each other gives no gradient", () => {
    const station = reduceLines([partOf(white(0))], settings);
    expect(whyOf(station.gradient)).toBe("the spectrum shows nothing above its noise floor");
    expect(whyOf(station.routes.K_v)).toBe("the spectrum shows nothing above its noise floor");
    expect(whyOf(station.routes.epsilon_inertial ?? station.epsilon_inertial)).not.toBe("");
    expect(flagOf(station, "no-zero-crossing")).toBeUndefined();
  });
});

describe("the gradient by snapshots", () => {
  it.each([true, false])("goes with the square of each one's amplitude; periodic: %s", (periodic) => {
    const amplitudes = [1, 2, 0.5, 3, 1.5, 1, 1, 2, 1, 1, 1, 0.7];
    // harmonics m = 1 … 9 of amplitude e^(-0.9 m)
    const form = (i: number) => {
      let sum = 0;
      for (let m = 1; m <= 9; m++) sum += Math.exp(-0.9 * m) * Math.cos((2 * Math.PI * m * i) / 32 + m * m);
      return sum;
    };
    const snapshots = amplitudes.map((a) =>
      [0, 1, 2].map((c) => line(32, (i) => (c === 0 ? 5 : 0) + a * form(i))),
    );
    const lines = joinLines([partOf(snapshots)]);
    const [, found] = lateralGradients(lines, lineSpectra(lines, periodic), null);
    expectClose(found.rows[3] / found.rows[0], 9, close);
    expectClose(found.rows[2] / found.rows[1], 1 / 16, close);
    let gradient = 0;
    for (let m = 1; m <= 9; m++) gradient += (((2 * Math.PI * m) / 3.2) ** 2 * Math.exp(-1.8 * m)) / 2;
    if (periodic) expectClose(found.rows[0], 32 * gradient, close);
  });
  it.each([true, false])("and with the shape of each one's spectrum; periodic: %s", (periodic) => {
    const rates = [0.9, 0.6];
    const snapshots = Array.from({ length: 12 }, (_, s) =>
      [0, 1, 2].map((c) =>
        line(32, (i) => {
          let sum = c === 0 ? 5 : 0;
          for (let m = 1; m <= 9; m++)
            sum += Math.exp(-rates[s % 2] * m) * Math.cos((2 * Math.PI * m * i) / 32 + m * m);
          return sum;
        }),
      ),
    );
    const lines = joinLines([partOf(snapshots)]);
    const spectra = lineSpectra(lines, periodic);
    const [, found] = lateralGradients(lines, spectra, null);
    // of one snapshot by itself, its own spectrum gives the same
    const alone = [0, 1].map((s) => {
      const own = joinLines([partOf([snapshots[s], snapshots[s + 2]])]);
      return lateralGradients(own, lineSpectra(own, periodic), null)[1].rate;
    });
    expectClose(found.rows[1] / found.rows[0], alone[1] / alone[0], {
      relative: 2e-3,
      because: "the last harmonic counts by a tail, which is that of both",
    });
    if (!periodic) return;
    const gradient = (rate: number) => {
      let sum = 0;
      for (let m = 1; m <= 9; m++) sum += m * m * Math.exp(-2 * rate * m);
      return sum;
    };
    expectClose(found.rows[1] / found.rows[0], gradient(0.6) / gradient(0.9), {
      relative: 2e-3,
      because: "the same tail",
    });
  });
});

describe("lines of few points or components", () => {
  const wave = (size: number, components: number) =>
    Array.from({ length: 12 }, (_, s) =>
      Array.from({ length: components }, (_unused, c) =>
        line(size, (i) => (c === 0 ? 5 : 0) + Math.cos((2 * Math.PI * i) / size + s * (c + 1))),
      ),
    );
  it("of three points are too short for a spectrum, and say so", () => {
    const station = reduceLines([partOf(wave(3, 3))], settings);
    expect(whyOf(station.gradient)).toBe("the line is too short");
    expect(station.uu.value).toBeGreaterThan(0);
  });
  it("u and w along y: v, along the line, is lacking, and taken like w in k", () => {
    const station = reduceLines([partOf(wave(16, 2), ["u", "w"])], settings);
    expect(flagOf(station, "axisymmetry-assumed")?.text).toMatch(/^v is not there/);
    expect(whyOf(station.vw)).toBe("v was not measured");
    expect(whyOf(station.isotropy_uv)).toBe("v was not measured");
    expect(whyOf(station.lambda)).toMatch(/^v, the component along the line/);
    expectClose(station.k.value, (station.uu.value ?? 0) / 2 + (station.ww.value ?? 0), close);
  });
  it("u and w along z: w is along the line, and v lacks", () => {
    const station = reduceLines([partOf(wave(16, 2), ["u", "w"], "z")], settings);
    expect(station.gradient.value).toBeGreaterThan(0);
    expect(whyOf(station.routes.gradient_v)).toBe("v was not measured");
    expect(whyOf(station.routes.K_v)).toBe("v was not measured");
    expect(whyOf(station.routes.L_v)).toBe("v was not measured");
    expect(isEstimate(station.routes.K_w)).toBe(true);
    expectClose(
      station.epsilon.value,
      3e-2 * ((station.gradient.value ?? 0) + 2 * (station.routes.gradient_w.value ?? 0)),
      close,
    );
  });
  it("with stresses between them have those of their definition", () => {
    const snapshots = wave(16, 3);
    const station = reduceLines([partOf(snapshots)], settings);
    const mean = (of: (s: Float64Array[], i: number) => number) =>
      snapshots.reduce((sum, s) => sum + s[0].reduce((total, _, i) => total + of(s, i), 0), 0) / (12 * 16);
    const means = [0, 1, 2].map((c) => mean((s, i) => s[c][i]));
    const co = (a: number, b: number) => mean((s, i) => (s[a][i] - means[a]) * (s[b][i] - means[b]));
    expectClose(station.uv.value, co(0, 1), close);
    expectClose(station.uw.value, co(0, 2), close);
    expectClose(station.vw.value, co(1, 2), close);
  });
  it("that begin at another time are the same lines", () => {
    const [early, late] = [0, 100].map((begin) =>
      reduceLines([partOf(wave(16, 3), all, "y", begin)], settings),
    );
    expect([early.duration, late.duration]).toEqual([55, 55]);
    expect([late.blocks?.start, late.blocks?.step]).toEqual([100, 5]);
    expectClose(late.facts.lines?.independentSnapshots, early.facts.lines?.independentSnapshots ?? 0, close);
    expectClose(late.L11.value, early.L11.value ?? 0, close);
  });
});
