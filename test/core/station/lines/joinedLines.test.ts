import { describe, expect, it } from "vitest";
import { isPeriodic } from "../../../../src/core/station/lines/isPeriodic.ts";
import { joinLines } from "../../../../src/core/station/lines/joinLines.ts";
import type { LinePart } from "../../../../src/core/station/lines/linePart.ts";
import { lineSpectra } from "../../../../src/core/station/lines/lineSpectra.ts";
import { expectClose } from "../../../support/expectClose.ts";
import { lineSettings } from "./madeLines.ts";
import {
  close,
  grid,
  hann,
  lines,
  linesOf,
  partsOf,
  powerAt,
  second,
  size,
  snapshots,
  snapshotsOf,
  spacing,
} from "./smallLines.ts";

describe("lines of several files put together", () => {
  const later = snapshotsOf(4, 8);
  const [, more] = partsOf(later, { ...grid, file: "later.csv" }, 5);
  const joined = joinLines([more, second]);
  const all = [...snapshots, ...later];
  const meanOf = (c: number) => {
    const values = all.flatMap((snapshot) => linesOf(snapshot, c).flatMap((line) => [...line]));
    return values.reduce((sum, value) => sum + value, 0) / values.length;
  };

  it("are in the order of time, about the mean of all, a row a snapshot", () => {
    expect(joined.parts.map(({ origin }) => origin.file)).toEqual(["lines.csv", "later.csv"]);
    expect([joined.snapshots, joined.rows.length, joined.start, joined.blockSnapshots]).toEqual([9, 9, 0, 1]);
    expectClose(joined.end, 5.3, close);
    expect(joined.samples).toBe(9 * lines * size);
    const [mu, mw] = [meanOf(0), meanOf(2)];
    expectClose(joined.means[0], mu, close);
    const row = joined.rows[6];
    const at = (name: string) => row[joined.fields.indexOf(name)];
    const [u, w] = [0, 2].map((c) => linesOf(all[6], c).flatMap((line) => [...line]));
    const sum = (of: (u: number, w: number) => number) =>
      u.reduce((total, x, i) => total + of(x - mu, w[i] - mw), 0);
    expect(at("weight")).toBe(lines * size);
    expectClose(
      at("u"),
      sum((x) => x),
      close,
    );
    expectClose(
      at("uu"),
      sum((x) => x * x),
      close,
    );
    expectClose(
      at("uw"),
      sum((x, y) => x * y),
      close,
    );
    expectClose(
      at("www"),
      sum((_, y) => y ** 3),
      close,
    );
    expectClose(
      at("uuuu"),
      sum((x) => x ** 4),
      close,
    );
    expect(at("lines")).toBe(2);
  });
  it("of the same snapshots, each a line in a file of its own, are added row by row", () => {
    const halves = [0, 1].map((l) => {
      const own = { ...grid, file: `line${l}.csv`, stations: [2], across: [grid.across[l]] };
      return partsOf(
        snapshots.map((snapshot) => snapshot.map((_, c) => linesOf(snapshot, c)[l])),
        own,
      )[0];
    });
    const [apart, together] = [joinLines([halves[1], halves[0]]), joinLines([second])];
    expect([apart.snapshots, apart.rows.length]).toEqual([5, 5]);
    expect(apart.across).toEqual(grid.across);
    apart.rows.forEach((row, i) => {
      joined.fields.forEach((name, f) => {
        // sums of spectra are about each part's own reference
        if (!/plain|hann/.test(name)) expectClose(row[f], together.rows[i][f], close);
      });
    });
  });
  it("are refused where one line is there twice at one time, or has other points, components or direction", () => {
    const other = (change: Partial<LinePart>) => () => joinLines([second, { ...more, ...change }]);
    expect(() => joinLines([second, { ...more, start: 0.4 }])).toThrow(/there twice at x = 2/);
    expect(() => joinLines([second, { ...more, start: 0.41 }])).not.toThrow();
    expect(other({ along: "z" })).toThrow(/same points/);
    expect(other({ components: ["u", "v"] })).toThrow(/same points/);
    expect(other({ points: more.points.slice(1) })).toThrow(/same points/);
    expect(other({ points: more.points.map((y, i) => (i === 3 ? y + 1e-5 : y)) })).toThrow(/same points/);
    expect(other({ points: more.points.map((y) => y + 1e-6) })).not.toThrow();
  });
  it.each([true, false])(
    "have the spectrum and the covariance of all about the common mean; periodic: %s",
    (periodic) => {
      const found = lineSpectra(joined, periodic);
      if (found === null) throw new Error("no spectra");
      expect([found.step, found.length, found.lines]).toEqual([spacing, size * spacing, 18]);
      const c = 1;
      const mean = meanOf(c);
      const centred = all.flatMap((snapshot) =>
        linesOf(snapshot, c).map((line) => line.map((value) => value - mean)),
      );
      for (let f = 0; f <= 7; f++) {
        const power = centred.reduce((sum, line) => sum + powerAt(periodic ? line : hann(line), f), 0);
        const g = f === 0 ? 1 : 2;
        expectClose(found.density[c][f], (g * power * spacing) / (18 * size * (periodic ? 1 : 3 / 8)), close);
        let product = 0;
        for (const line of centred)
          for (let i = 0; i < size; i++) {
            if (periodic) product += line[i] * line[(i + f) % size];
            else if (i >= f) product += line[i] * line[i - f];
          }
        expectClose(found.covariance[c][f], product / (18 * (periodic ? size : size - f)), close);
      }
    },
  );
  it("have the last wavenumber of an even line once: the variance is the sum of the circular spectrum", () => {
    const points = grid.points.slice(0, 14);
    const even = snapshotsOf(3, 5, 14);
    const found = lineSpectra(joinLines([partsOf(even, { ...grid, points })[0]]), true);
    const sum = found?.density[0].reduce((total, value) => total + value, 0) ?? 0;
    expectClose(sum / (14 * spacing), found?.covariance[0][0] ?? 0, close);
  });
  it("have no spectra where one of them has none", () => {
    expect(lineSpectra(joinLines([{ ...second, spectra: null }, more]), true)).toBeNull();
  });
});

describe("whether a line closes on itself", () => {
  /** Rows of one component: mean-square steps between neighbours and across the ends, as shares of 2 uu. */
  const linesWith = (near: number, ends: number) => {
    const fields = ["weight", "u", "uu", "lines", "near_u", "ends_u"];
    const row = Float64Array.of(30, 0, 30 * 4, 2, near * 8 * 2 * (size - 1), ends * 8 * 2);
    return { ...joinLines([second]), components: ["u" as const], fields, rows: [row, row] };
  };
  it("is told by the step across its ends: below the geometric mean of neighbours and strangers", () => {
    expect(isPeriodic(linesWith(0.04, 0.19), lineSettings)).toBe(true);
    expect(isPeriodic(linesWith(0.04, 0.21), lineSettings)).toBe(false);
  });
  it("is not told of a line too coarse, nor of one without equal steps, nor along x; the sheet may tell", () => {
    expect(isPeriodic(linesWith(0.249, 0.1), lineSettings)).toBe(true);
    expect(isPeriodic(linesWith(0.251, 0.1), lineSettings)).toBe(false);
    const closed = linesWith(0.04, 0.1);
    expect(isPeriodic({ ...closed, spacing: null }, lineSettings)).toBe(false);
    expect(isPeriodic({ ...closed, along: "x" }, lineSettings)).toBe(false);
    expect(isPeriodic(closed, { ...lineSettings, periodic: false })).toBe(false);
    expect(isPeriodic(linesWith(0.9, 0.9), { ...lineSettings, periodic: true })).toBe(true);
  });
  it("weighs components by their own variance, and passes over one that is still", () => {
    const fields = ["weight", "uu", "vv", "lines", "near_u", "ends_u", "near_v", "ends_v"];
    const at = (share: number, variance: number) => share * 2 * variance;
    const [u, v] = [1, 1e6];
    const n = size - 1;
    const row = Float64Array.of(1, u, v, 1, at(0.04, u) * n, at(0.3, u), at(0.04, v) * n, at(0.05, v));
    const both = { ...joinLines([second]), components: ["u", "v"] as const, fields, rows: [row] };
    // (0.3 + 0.05)/2 against √0.04
    expect(isPeriodic(both, lineSettings)).toBe(true);
    const still = Float64Array.of(1, u, 0, 1, at(0.04, u) * n, at(0.3, u), 0, 0);
    // halved: 0.15 against √0.02
    expect(isPeriodic({ ...both, rows: [still] }, lineSettings)).toBe(false);
  });
});
