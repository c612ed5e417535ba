import { describe, expect, it } from "vitest";
import { joinLines } from "../../../../src/core/station/lines/joinLines.ts";
import type { LineGrid } from "../../../../src/core/station/lines/linePart.ts";
import { rememberedSnapshots } from "../../../../src/core/station/lines/snapshotMemory.ts";
import { snapshotTime } from "../../../../src/core/station/lines/snapshotTime.ts";
import { withoutRepeatedEnd } from "../../../../src/core/station/lines/withoutRepeatedEnd.ts";
import { expectClose } from "../../../support/expectClose.ts";
import { close, grid, partsOf, size, snapshotsOf, spacing } from "./smallLines.ts";

describe("a line that repeats its first point", () => {
  const closed = snapshotsOf(2, 4).map((snapshot) =>
    snapshot.map((column) => {
      const longer = new Float64Array((column.length / size) * (size + 1));
      for (let l = 0; l * size < column.length; l++) {
        longer.set(column.subarray(l * size, (l + 1) * size), l * (size + 1));
        longer[l * (size + 1) + size] = column[l * size];
      }
      return longer;
    }),
  );
  const longGrid = { ...grid, points: Float64Array.from({ length: size + 1 }, (_, i) => 3 + i * spacing) };
  const reduce = (given: readonly Float64Array[][], periodic: boolean | "auto", of: LineGrid = longGrid) => {
    const reducer = withoutRepeatedEnd(of, periodic);
    given.forEach((snapshot, i) => {
      reducer.add(0.1 * i, snapshot);
    });
    return reducer.finish();
  };
  it("is given without it", () => {
    expect(reduce(closed, "auto")).toEqual(partsOf(snapshotsOf(2, 4)));
    expect(reduce(closed, true)[0].points.length).toBe(size);
    expect(reduce(closed, false)[0].points.length).toBe(size + 1);
  });
  it("in one component, or in one line only, does so by chance: nothing is left out", () => {
    for (const [c, at] of [
      [1, size],
      [2, 4 * (size + 1) - 1],
    ]) {
      const open = closed.map((snapshot) => snapshot.map((column) => column.slice()));
      open[0][c][at] += 1e-9;
      expect(reduce(open, "auto")[0].points.length).toBe(size + 1);
    }
  });
  it("and all its others too does not tell: a stream at rest is left as it is", () => {
    const still = closed.map((snapshot) => snapshot.map((column) => column.fill(2)));
    expect(reduce(still, "auto")[0].points.length).toBe(size + 1);
  });
  it("is no part where nothing was added", () =>
    expect(withoutRepeatedEnd(longGrid, true).finish()).toEqual([]));
});

describe("snapshots one after another", () => {
  /** One pattern of zero mean times a factor a snapshot: the correlation is that of the factors. */
  const made = (factors: readonly number[], level = 0, files = 1) => {
    const pattern = Float64Array.from({ length: 4 * size }, (_, i) => (i % 2 === 0 ? 1 : -1));
    const even = pattern.map((value) => value * 1);
    const own = { ...grid, points: Float64Array.from({ length: 16 }, (_, i) => i), stations: [1] };
    const column = (f: number) => Float64Array.from({ length: 32 }, (_, i) => level + f * even[i]);
    const snaps = factors.map((f) => [0, 1, 2].map(() => column(f)));
    if (files === 1) return joinLines(partsOf(snaps, own));
    return joinLines(
      snaps.flatMap((snapshot, i) => partsOf([snapshot], { ...own, file: `${100 + i}.csv` }, 0.1 * i)),
    );
  };
  const rhoOf = (factors: readonly number[]) =>
    Array.from({ length: rememberedSnapshots + 1 }, (_, m) => {
      if (m >= factors.length) return Number.NaN;
      const mean = (of: number[]) => of.reduce((sum, value) => sum + value, 0) / of.length;
      return mean(factors.slice(m).map((f, i) => f * factors[i])) / mean(factors.map((f) => f * f));
    });

  it("count for the time they span over twice dt (1/2 + Σ ρ), up to the first ρ ≤ 0", () => {
    const factors = [2, 2.2, 1.5, 0.4, -1, -1.2, -0.3, 0.8, 1.4, 2, 1.1, 0.2, -0.9, -1.6];
    const rho = rhoOf(factors);
    const zero = rho.findIndex((value) => value <= 0);
    expect(zero).toBeGreaterThan(1);
    let steps = 0.5;
    for (let m = 1; m < zero; m++) steps += rho[m];
    for (const files of [1, 2]) {
      const { time, neighbours, independent } = snapshotTime(made(factors, 7, files));
      expectClose(time, steps * 0.1, close);
      expectClose(neighbours, rho[1], close);
      expectClose(independent, (14 * 0.1) / (2 * steps * 0.1), close);
    }
  });
  it("that have not lost their memory over those kept go on as an exponential through the last", () => {
    const factors = Array.from({ length: 40 }, (_, i) => 3 + Math.cos(i / 8));
    const rho = rhoOf(factors);
    const keep = rho[8] ** (1 / 8);
    let steps = 0.5 + (rho[8] * keep) / (1 - keep);
    for (let m = 1; m <= 8; m++) steps += rho[m];
    const { time, independent } = snapshotTime(made(factors));
    expectClose(time, steps * 0.1, { relative: 1e-7, because: "1 - keep is a small difference" });
    expectClose(independent, Math.max(1, 4 / (2 * steps * 0.1)), { relative: 1e-7, because: "the same" });
  });
  it("that never change count as one, and one is one", () => {
    const frozen = snapshotTime(made(new Array<number>(6).fill(2)));
    expectClose(frozen.time, 0.5, close);
    expectClose(frozen.independent, 1, close);
    expect(snapshotTime(made([2]))).toEqual({ time: null, neighbours: null, independent: 1 });
  });
  it("that alternate are independent, each of them", () => {
    const { time, independent } = snapshotTime(made([1, -1, 1, -1, 1, -1]));
    expectClose(time, 0.05, close);
    expectClose(independent, 6, close);
  });
});
