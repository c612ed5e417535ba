import { describe, expect, it } from "vitest";
import { bandBorders } from "../../../../src/core/station/bandBorders.ts";
import {
  bandSize,
  incrementLags,
  lateralFields,
  lineComponents,
  streamwiseFields,
} from "../../../../src/core/station/lines/lineFields.ts";
import { equalSpacing } from "../../../../src/core/station/lines/linePart.ts";
import { expectClose } from "../../../support/expectClose.ts";
import {
  close,
  first,
  grid,
  hann,
  linesOf,
  partsOf,
  powerAt,
  second,
  size,
  snapshots,
  spacing,
} from "./smallLines.ts";

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
