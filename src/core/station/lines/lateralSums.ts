import { anyFourier } from "../../signal/anyFourier.ts";
import { hannWindow } from "../../signal/hannWindow.ts";
import { bandBorders } from "../bandBorders.ts";
import { bandSize, incrementLags, lineComponents } from "./lineFields.ts";
import { equalSpacing, type LateralTotals, type LineGrid } from "./linePart.ts";

/** What is summed over the lines of one station beside their moments. */
export interface LateralSums {
  /**
   * Takes the station's lines of one snapshot.
   * @param columns  a column a component
   * @param from     index of the station's first value
   * @param reference what the sums are taken about
   * @param row      out: the block's sums, in the order of lateralFields
   */
  add(columns: readonly Float64Array[], from: number, reference: Float64Array, row: Float64Array): void;
  totals(): LateralTotals | null;
}

/** Sums of one station on lateral lines. */
export function startLateralSums(grid: LineGrid): LateralSums {
  const { components, across, points } = grid;
  const size = points.length;
  const even = equalSpacing(points) !== null && size >= 4;
  const longitudinal = components.indexOf(lineComponents(grid.along)[0]);
  const spectra = components.map(() => startLineSpectra(size));
  const line = new Float64Array(size);
  let lines = 0;

  function addComponent(c: number, value: number, row: Float64Array, at: number): void {
    if (!even) return;
    if (c === longitudinal) addIncrements(line, row);
    addEnds(line, row, at + 2 * c);
    const bands = spectra[c].bands;
    const plain = at + 2 * components.length + c * bands;
    spectra[c].add(line, value, row, plain, plain + components.length * bands);
  }
  return {
    add(columns, from, reference, row) {
      const at = 1 + 3 * incrementLags(size).length + 2;
      for (let l = 0; l < across.length; l++) {
        lines++;
        row[0]++;
        columns.forEach((column, c) => {
          line.set(column.subarray(from + l * size, from + (l + 1) * size));
          addComponent(c, reference[c], row, at);
        });
      }
    },
    totals: () =>
      even
        ? {
            lines,
            profile: spectra.map((one) => one.profile),
            padded: spectra.map((one) => one.padded),
            hann: spectra.map((one) => one.hann),
          }
        : null,
  };
}

function addIncrements(line: Float64Array, row: Float64Array): void {
  const size = line.length;
  let at = 1;
  for (const lag of incrementLags(size)) {
    let square = 0;
    let cube = 0;
    for (let i = lag; i < size; i++) {
      const d = line[i] - line[i - lag];
      square += d * d;
      cube += d * d * d;
    }
    row[at] += size - lag;
    row[at + 1] += square;
    row[at + 2] += cube;
    at += 3;
  }
  for (let i = 2; i < size - 2; i++) {
    const d = (8 * (line[i + 1] - line[i - 1]) - (line[i + 2] - line[i - 2])) / 12;
    row[at] += 1;
    row[at + 1] += d * d;
  }
}

function addEnds(line: Float64Array, row: Float64Array, at: number): void {
  let near = 0;
  for (let i = 1; i < line.length; i++) near += (line[i] - line[i - 1]) ** 2;
  row[at] += near;
  row[at + 1] += (line[0] - line[line.length - 1]) ** 2;
}

/** Spectral sums of one component. */
function startLineSpectra(size: number) {
  const padded = new Float64Array(size + 1);
  const hann = new Float64Array(Math.floor(size / 2) + 1);
  const profile = new Float64Array(size);
  const work = new Float64Array(2 * size);
  const borders = bandBorders(bandSize(size));

  function addPadded(row: Float64Array, at: number): void {
    const transform = anyFourier(2 * size).forward(work);
    for (let f = 0; f <= size; f++) padded[f] += transform[2 * f] ** 2 + transform[2 * f + 1] ** 2;
    addBands(borders, hann.length - 1, transform, 2, row, at);
  }
  function addHann(row: Float64Array, at: number): void {
    const window = hannWindow(size);
    for (let i = 0; i < size; i++) work[i] *= window[i];
    const transform = anyFourier(size).forward(work);
    for (let f = 0; f < hann.length; f++) hann[f] += transform[2 * f] ** 2 + transform[2 * f + 1] ** 2;
    addBands(borders, hann.length - 1, transform, 1, row, at);
  }
  return {
    padded,
    hann,
    profile,
    bands: borders.length,
    add(line: Float64Array, reference: number, row: Float64Array, plainAt: number, hannAt: number): void {
      for (let i = 0; i < size; i++) {
        work[i] = line[i] - reference;
        profile[i] += work[i];
      }
      work.fill(0, size);
      addPadded(row, plainAt);
      addHann(row, hannAt);
    },
  };
}

/** Σ f² |X_f|² by bands; `every` is 2 for the transform of a line padded to twice its length. */
function addBands(
  borders: readonly number[],
  highest: number,
  transform: Float64Array,
  every: number,
  row: Float64Array,
  at: number,
): void {
  let end = highest + 1;
  for (let band = 0; band < borders.length; band++) {
    let sum = 0;
    for (let f = borders[band]; f < end; f++) {
      const re = transform[2 * every * f];
      const im = transform[2 * every * f + 1];
      sum += f * f * (re * re + im * im);
    }
    row[at + band] += sum;
    end = borders[band];
  }
}
