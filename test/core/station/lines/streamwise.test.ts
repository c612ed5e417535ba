import { describe, expect, it } from "vitest";
import type { Quantity } from "../../../../src/core/quantity.ts";
import { reduceLines } from "../../../../src/core/station/lines/reduceLines.ts";
import { startLines } from "../../../../src/core/station/lines/startLines.ts";
import { expectClose } from "../../../support/expectClose.ts";
import { eta, lineSettings, madeSnapshots, speed, truth } from "./madeLines.ts";

const size = 256;
const spacing = 2 * eta;
const lines = 3;
const snapshots = madeSnapshots({ along: "y", size, spacing, lines, snapshots: 200, seed: 8 });

/** The lateral lines laid along x: the component along them becomes u, and the mean velocity falls along x. */
const meanAt = (i: number) => speed * (1 - 0.1 * (i / size));
const fields = snapshots.map(([u, v, w]) =>
  [v, u, w].map((column, c) => {
    const turned = new Float64Array(size * lines);
    for (let l = 0; l < lines; l++)
      for (let i = 0; i < size; i++)
        turned[i * lines + l] = column[l * size + i] + (c === 0 ? meanAt(i) : c === 1 ? -speed : 0);
    return turned;
  }),
);
const x = Float64Array.from({ length: size }, (_, i) => 1 + i * spacing);
const reducer = startLines({
  file: "streamwise",
  position: "column",
  along: "x",
  components: ["u", "v", "w"],
  stations: [...x],
  points: x,
  across: [0, 1, 2].map((z) => ({ y: 0, z: 100 * z })),
});
fields.forEach((field, t) => {
  reducer.add(t, field);
});
const parts = reducer.finish();
const stationAt = (i: number) => reduceLines([parts[i]], lineSettings);
const exact = { relative: 1e-10, because: "the same sums in another order" };
const whyOf = (quantity: Quantity) => (quantity as { why?: string }).why ?? "";

describe("lines along the stream", () => {
  const at = 128;
  const station = stationAt(at);

  it("make a station of every x, its moments over snapshots and parallel lines", () => {
    expect(parts).toHaveLength(size);
    const values = fields.flatMap(([u]) => [...u.subarray(at * lines, (at + 1) * lines)]);
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    expectClose(station.U.value, mean, exact);
    expectClose(station.uu.value, values.reduce((sum, u) => sum + (u - mean) ** 2, 0) / values.length, exact);
    expect(station.samples).toBe(200 * lines);
    expect(station.x).toBe(x[at]);
  });

  it("have gradients by differences of the fourth order, the mean's own slope left out", () => {
    const slopes = fields.flatMap(([u]) =>
      [0, 1, 2].map((l) => {
        const on = (m: number) => u[(at + m) * lines + l];
        return (8 * (on(1) - on(-1)) - (on(2) - on(-2))) / (12 * spacing);
      }),
    );
    const mean = slopes.reduce((sum, slope) => sum + slope, 0) / slopes.length;
    const square = slopes.reduce((sum, slope) => sum + (slope - mean) ** 2, 0) / slopes.length;
    expectClose(station.gradient.value, square, exact);
    expectClose(station.routes.gradient_difference4.value, square, exact);
    expectClose(station.epsilon.value, truth.epsilon, {
      relative: 0.12,
      because:
        "600 gradients at one point have a standard error of some 4 %, and differences at 2 eta lose as much",
    });
  });

  it("give L11 by the correlation of points around the station, as far as the line goes", () => {
    expectClose(station.L11.value, truth.L11, { relative: 0.3, because: "600 pairs at each separation" });
    const near = stationAt(6);
    expect(near.L11.value).toBe(null);
    expect(whyOf(near.L11)).toContain("does not fall to zero within");
    expect(whyOf(stationAt(0).L11)).toBe("the station is too near the end of its line");
  });

  it("say why an end of the line has no gradient, and one next to it has that of the second order", () => {
    expect(whyOf(stationAt(0).gradient)).toContain("too near the end of its line");
    const next = stationAt(1);
    expectClose(next.gradient.value, next.routes.gradient_difference2.value ?? 0, exact);
    expect(whyOf(next.routes.gradient_difference4)).toContain("too near the end");
  });

  it("have no spectrum at a point, and say so", () => {
    expect(station.curves).toBe(null);
    expect(whyOf(station.epsilon_inertial)).toContain("no spectrum");
  });

  it("hold k within its interval at nineteen of twenty places, more or less", () => {
    const held = Array.from({ length: 16 }, (_, i) => stationAt(16 * i)).filter(({ k }) => {
      const { low, high } = k as { low: number; high: number };
      return low <= truth.k && truth.k <= high;
    });
    // 16 draws of 0.95 give fewer than 12 once in two thousand
    expect(held.length).toBeGreaterThanOrEqual(12);
  });
});
