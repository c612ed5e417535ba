import { describe, expect, it } from "vitest";
import { isotropicRecord } from "../../../sample-data/maker/synthesise.mjs";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { bandAt, inertialLeaves } from "../../../src/core/station/inertialLeaves.ts";
import { inertialRange } from "../../../src/core/station/inertialRange.ts";
import { inertialScales } from "../../../src/core/station/inertialScales.ts";
import { reduceLines } from "../../../src/core/station/lines/reduceLines.ts";
import { startLines } from "../../../src/core/station/lines/startLines.ts";
import { expectClose } from "../../support/expectClose.ts";
import { lineGrid, lineSettings } from "./lines/madeLines.ts";
import { stationOf } from "./records.ts";

const exact = { relative: 1e-12, because: "the same formula" };
const k1 = Float64Array.from({ length: 4000 }, (_, i) => i + 1);
const kolmogorov = (epsilon: number) => k1.map((k) => 0.49 * epsilon ** (2 / 3) * k ** (-5 / 3));

describe("the level of an inertial range without a part of the record", () => {
  const range = inertialRange(k1, kolmogorov(2), 300);
  if (typeof range === "string") throw new Error(range);
  const bands = range.spectrum.x.map((x) => bandAt(8000, Math.exp(x)));
  const levels = [1, 1.3, 0.7, 1.1, 0.9];
  const groups = { count: 5, of: Int32Array.from([0, 0, 1, 2, 2, 3, 4]), repeats: 1 };
  const blocks = Array.from(groups.of, (group) => ({
    segments: 3,
    powers: new Float64Array(Math.max(...bands) + 1).fill(3 * levels[group]),
  }));

  it("is that of the spectrum of the rest, to the power 3/2", () => {
    const total = Array.from(groups.of).reduce((sum, group) => sum + levels[group], 0);
    const { without } = inertialLeaves(range, bands, blocks, groups);
    without.forEach((value, group) => {
      const held = Array.from(groups.of).filter((one) => one === group).length;
      const rest = (total - held * levels[group]) / (7 - held);
      expectClose(value, range.epsilon * (rest / (total / 7)) ** 1.5, exact);
    });
  });
  it("does not depend on the choice of a range where the spectrum moves as a whole", () => {
    expect(inertialLeaves(range, bands, blocks, groups).choice).toBeLessThan(1e-9);
  });
  it("depends on it where bands move by themselves, and is the same again", () => {
    const uneven = blocks.map(({ segments, powers }, block) => ({
      segments,
      powers: powers.map((power, band) => power * (1 + 0.3 * Math.sin(5 * band + 7 * block))),
    }));
    const { choice } = inertialLeaves(range, bands, uneven, groups);
    expect(choice).toBeGreaterThan(0.01);
    expect(inertialLeaves(range, bands, uneven, groups).choice).toBe(choice);
  });
  it("lies in the band of its frequency, counted down from the highest", () => {
    expect(bandAt(8000, 4000)).toBe(0);
    expect(bandAt(8000, 4000 * 10 ** -0.0501)).toBe(1);
    expect(bandAt(8000, 4000 * 10 ** -1.0001)).toBe(20);
  });
});

describe("scales from an inertial-range dissipation", () => {
  it("are the isotropic relations, with and without each group; the choice of the range goes with their powers", () => {
    const epsilon = { value: 4, without: [3.9, 4.2], further: 0.04 };
    const { lambda, eta, Re_lambda, C_over_L } = inertialScales(
      epsilon,
      { value: 1, without: [0.9, 1.1] },
      1e-3,
    );
    expectClose(lambda.without[0], Math.sqrt((15e-3 * 0.9) / 3.9), exact);
    expectClose(eta.without[1], (1e-9 / 4.2) ** 0.25, exact);
    expectClose(Re_lambda.value, Math.sqrt(15e-3 / 4) / 1e-3, exact);
    expectClose(C_over_L.without[1], 4.2 / 1.1 ** 1.5, exact);
    expect([lambda, eta, Re_lambda, C_over_L].map(({ further }) => further)).toEqual([
      0.02, 0.01, 0.02, 0.04,
    ]);
  });
});

// Pope's model spectrum (2000, eqs. 6.246-6.248) at Re_lambda 300, every four eta
const flow = { k: 1.5, epsilon: 100 / 9, viscosity: 1.5e-5, U: 10, step: 5.27e-5 };
const standard = (quantity: Quantity) => (isEstimate(quantity) ? quantity.error?.standard : undefined);

describe("a record of Re_lambda 300 whose dissipation is that of its inertial range", () => {
  const { u, v, w } = isotropicRecord({ ...flow, samples: 146_000, seed: 2 });
  const chosen = { kinematicViscosity: flow.viscosity, dissipation: "inertial" } as const;
  const station = stationOf({ u, v, w }, chosen, { step: flow.step });

  it("has its error, and the scales that follow theirs", () => {
    // forty such records of 1000 integral times scatter by 0.055, 0.029, 0.014 and 0.039: found by making them
    for (const [key, spread] of [
      ["epsilon", 0.055],
      ["lambda", 0.029],
      ["eta", 0.014],
      ["Re_lambda", 0.039],
    ] as const)
      expectClose(Math.log((standard(station[key]) ?? 0) / spread), 0, {
        absolute: Math.log(2),
        because: "the error of one record, of few independent stretches, scatters itself",
      });
    expect(station.epsilon).toEqual(station.epsilon_inertial);
    expect(standard(station.C_epsilon)).toBeGreaterThan(0.1);
  });
  it("has an interval that holds the dissipation put in, less the tenth that a finite Reynolds number takes", () => {
    const { value, low, high } = station.epsilon_inertial as { value: number; low: number; high: number };
    expect(low).toBeLessThan(0.95 * flow.epsilon);
    expect(high).toBeGreaterThan(0.95 * flow.epsilon);
    expect(low < value && value < high).toBe(true);
  });
});

describe("lines across a stream of Re_lambda 300", () => {
  const wish = { along: "y", size: 4096, spacing: flow.step * flow.U, snapshots: 80, seed: 1 } as const;
  const reducer = startLines(lineGrid(wish));
  for (let i = 0; i < wish.snapshots; i++) {
    const { u, v, w } = isotropicRecord({ ...flow, samples: wish.size, seed: 100 + i });
    // the component along the line has the longitudinal spectrum
    reducer.add(i, [v.map((value) => value + flow.U), u.map((value) => value - flow.U), w]);
  }
  const station = reduceLines(reducer.finish(), { ...lineSettings, kinematicViscosity: flow.viscosity });

  it("have an inertial range too, with an interval from their snapshots", () => {
    expectClose(standard(station.epsilon_inertial), 0.05, {
      relative: 1,
      because: "some two thousand integral lengths in 80 snapshots",
    });
    expectClose(station.epsilon_inertial.value, 0.95 * flow.epsilon, {
      relative: 0.25,
      because: "three standard errors",
    });
  });
});
