import { describe, expect, it } from "vitest";
import { seededRandom } from "../../../../src/core/signal/seededRandom.ts";
import { bandBorders } from "../../../../src/core/station/bandBorders.ts";
import { isPeriodic } from "../../../../src/core/station/lines/isPeriodic.ts";
import { joinLines } from "../../../../src/core/station/lines/joinLines.ts";
import {
  bandSize,
  incrementLags,
  lateralFields,
  lineComponents,
  streamwiseFields,
} from "../../../../src/core/station/lines/lineFields.ts";
import { equalSpacing, type LineGrid, type LinePart } from "../../../../src/core/station/lines/linePart.ts";
import { lineSpectra } from "../../../../src/core/station/lines/lineSpectra.ts";
import { rememberedSnapshots } from "../../../../src/core/station/lines/snapshotMemory.ts";
import { snapshotTime } from "../../../../src/core/station/lines/snapshotTime.ts";
import { startLines } from "../../../../src/core/station/lines/startLines.ts";
import { withoutRepeatedEnd } from "../../../../src/core/station/lines/withoutRepeatedEnd.ts";
import { expectClose } from "../../../support/expectClose.ts";
import { lineSettings } from "./madeLines.ts";

const [size, spacing, lines] = [15, 0.5, 2];
const grid: LineGrid = {
  file: "lines.csv",
  position: "column",
  along: "y",
  components: ["u", "v", "w"],
  stations: [1, 2],
  points: Float64Array.from({ length: size }, (_, i) => 3 + i * spacing),
  across: [
    { y: null, z: 0 },
    { y: null, z: 1 },
  ],
};
const levels = [5, 0.3, -0.2];
const close = { relative: 1e-9, absolute: 1e-11, because: "the definition, summed in another order" };

/** Snapshots of two stations of two lines each; neighbours along a line and in time resemble each other. */
function snapshotsOf(count: number, seed: number, points = size): Float64Array[][] {
  const { gaussian } = seededRandom(seed);
  let last = [0, 1, 2].map(() => new Float64Array(2 * lines * points));
  return Array.from({ length: count }, () => {
    last = last.map((column) => {
      let value = 0;
      return column.map((before, i) => {
        value = (i % points === 0 ? 0 : 0.6 * value) + gaussian();
        return 0.5 * before + value;
      });
    });
    return last.map((column, c) => column.map((value) => value + levels[c]));
  });
}
function partsOf(snapshots: readonly Float64Array[][], of: LineGrid = grid, t0 = 0): LinePart[] {
  const reducer = startLines(of);
  snapshots.forEach((snapshot, i) => {
    reducer.add(t0 + 0.1 * i, snapshot);
  });
  return reducer.finish();
}
const snapshots = snapshotsOf(5, 3);
const [first, second] = partsOf(snapshots);
/** The lines of the second station: by snapshot, component and line. */
const linesOf = (snapshot: Float64Array[], c: number, s = 1) =>
  [0, 1].map((l) => snapshot[c].slice((s * lines + l) * size, (s * lines + l + 1) * size));
/** |X_f|² of a sequence, by the definition. */
function powerAt(x: Float64Array, f: number, length = x.length): number {
  let [re, im] = [0, 0];
  x.forEach((value, i) => {
    re += value * Math.cos((2 * Math.PI * f * i) / length);
    im += value * Math.sin((2 * Math.PI * f * i) / length);
  });
  return re * re + im * im;
}
const hann = (x: Float64Array) =>
  x.map((value, i) => (value * (1 - Math.cos((2 * Math.PI * i) / x.length))) / 2);

describe("the sums of one station of lines", () => {
  const fields = second.blocks.fields;
  const width = fields.length;
  const sumAt = (name: string, row = 2) => second.blocks.sums[row * width + fields.indexOf(name)];
  const own = [0, 1, 2].map((c) => linesOf(snapshots[2], c));

  it("are of one snapshot a row, with the first one's means for a reference", () => {
    expect([second.blocks.rows, second.blocks.size, second.snapshots]).toEqual([5, 1, 5]);
    expect([second.start, second.end, second.origin.x, first.origin.x]).toEqual([0, 0.4, 2, 1]);
    for (const c of [0, 1, 2]) {
      const all = linesOf(snapshots[0], c).flatMap((line) => [...line]);
      expectClose(second.reference[c], all.reduce((sum, value) => sum + value, 0) / all.length, close);
    }
    expect(second.lowestSpeed).toBe(Math.min(...snapshots.flatMap(([u]) => [...u])));
    expect(second.single).toBeNull();
  });
  it("have increments of the component along the line, their squares and cubes", () => {
    expect(sumAt("lines")).toBe(2);
    expect(incrementLags(size)).toEqual([1, 2, 3, 4, 6]);
    for (const lag of [1, 2, 3, 4, 6]) {
      let [n, square, cube] = [0, 0, 0];
      for (const line of own[1])
        for (let i = lag; i < size; i++) {
          n++;
          square += (line[i] - line[i - lag]) ** 2;
          cube += (line[i] - line[i - lag]) ** 3;
        }
      expect(sumAt(`n_${lag}`)).toBe(n);
      expectClose(sumAt(`square_${lag}`), square, close);
      expectClose(sumAt(`cube_${lag}`), cube, close);
    }
  });
  it("have the difference of the fourth order, and the steps between neighbours and across the ends", () => {
    let square = 0;
    for (const line of own[1])
      for (let i = 2; i < size - 2; i++)
        square += ((8 * (line[i + 1] - line[i - 1]) - (line[i + 2] - line[i - 2])) / 12) ** 2;
    expect(sumAt("fourths")).toBe(2 * (size - 4));
    expectClose(sumAt("fourth_square"), square, close);
    ["u", "v", "w"].forEach((name, c) => {
      let [near, ends] = [0, 0];
      for (const line of own[c]) {
        ends += (line[0] - line[size - 1]) ** 2;
        for (let i = 1; i < size; i++) near += (line[i] - line[i - 1]) ** 2;
      }
      expectClose(sumAt(`near_${name}`), near, close);
      expectClose(sumAt(`ends_${name}`), ends, close);
    });
  });
  it("have f² |X_f|² in bands, of the line as it is and under a Hann window, about the reference", () => {
    const borders = bandBorders(bandSize(size));
    expect(bandSize(size)).toBe(14);
    ["u", "v", "w"].forEach((name, c) => {
      let end = 8;
      borders.forEach((from, band) => {
        let [plain, windowed] = [0, 0];
        for (const line of own[c]) {
          const x = line.map((value) => value - second.reference[c]);
          for (let f = from; f < end; f++) {
            plain += f * f * powerAt(x, f);
            windowed += f * f * powerAt(hann(x), f);
          }
        }
        end = from;
        expectClose(sumAt(`plain_${name}_${band}`), plain, close);
        expectClose(sumAt(`hann_${name}_${band}`), windowed, close);
      });
    });
  });
  it("have totals over all snapshots: profile, and power of the padded and of the windowed line", () => {
    const { spectra } = second;
    expect(spectra?.lines).toBe(10);
    const all = snapshots.flatMap((snapshot) =>
      linesOf(snapshot, 2).map((line) => line.map((value) => value - second.reference[2])),
    );
    for (const i of [0, 7, size - 1]) {
      expectClose(
        spectra?.profile[2][i],
        all.reduce((sum, line) => sum + line[i], 0),
        close,
      );
    }
    expect(spectra?.padded[2].length).toBe(size + 1);
    for (let f = 0; f <= size; f++) {
      expectClose(
        spectra?.padded[2][f],
        all.reduce((sum, line) => sum + powerAt(line, f, 2 * size), 0),
        close,
      );
    }
    expect(spectra?.hann[2].length).toBe(8);
    for (let f = 0; f < 8; f++) {
      expectClose(
        spectra?.hann[2][f],
        all.reduce((sum, line) => sum + powerAt(hann(line), f), 0),
        close,
      );
    }
  });
  it("are none but moments where the points are not equally spaced", () => {
    const points = grid.points.map((y, i) => (i === 4 ? y + 0.02 * spacing : y));
    const [part] = partsOf(snapshots, { ...grid, points });
    expect([part.spectra, part.pairs]).toEqual([null, null]);
    expect(part.blocks.sums[fields.indexOf("n_1")]).toBe(0);
    expect(part.blocks.sums[0]).toBe(2);
    expect(part.blocks.moments).toEqual(first.blocks.moments);
  });
});

describe("the fields of lines", () => {
  it("name the component along the line first", () => {
    expect((["x", "y", "z"] as const).map(lineComponents)).toEqual([
      ["u", "v", "w"],
      ["v", "u", "w"],
      ["w", "v", "u"],
    ]);
  });
  it("are in the order of the sums", () => {
    const names = lateralFields(["u", "v"], 4);
    expect(names.slice(0, 9)).toEqual([
      "lines",
      "n_1",
      "square_1",
      "cube_1",
      "n_2",
      "square_2",
      "cube_2",
      "fourths",
      "fourth_square",
    ]);
    expect(names.slice(9, 13)).toEqual(["near_u", "ends_u", "near_v", "ends_v"]);
    expect(names[13]).toBe("plain_u_0");
    expect(names.length).toBe(13 + 4 * bandBorders(4).length);
    expect(streamwiseFields(["u", "v"])).toEqual(
      ["second", "fourth"].flatMap((o) => [`n_${o}`, `${o}_u`, `${o}_uu`, `${o}_v`, `${o}_vv`, `${o}_cube`]),
    );
  });
  it("hold separations of 1, 2, 3, 4, 6, 8 … up to half the line, and two at least", () => {
    expect(incrementLags(64)).toEqual([1, 2, 3, 4, 6, 8, 12, 16, 24, 32]);
    expect(incrementLags(3)).toEqual([1, 2]);
    expect(incrementLags(2)).toEqual([1]);
    expect(incrementLags(6)).toEqual([1, 2, 3]);
  });
  it("need equal steps, to a hundredth of one", () => {
    const of = (...points: number[]) => equalSpacing(Float64Array.from(points));
    expectClose(of(0, 1.0, 2.009, 3), 1, close);
    expect(of(0, 1, 2.011, 3)).toBeNull();
    expect(of(0, 0.989, 2, 3)).toBeNull();
    expect([of(1), of(2, 2), of(3, 2, 1)]).toEqual([null, null, null]);
    expect(of(1, 3)).toBe(2);
  });
});

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
