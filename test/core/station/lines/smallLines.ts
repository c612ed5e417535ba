import { seededRandom } from "../../../../src/core/signal/seededRandom.ts";
import type { LineGrid, LinePart } from "../../../../src/core/station/lines/linePart.ts";
import { startLines } from "../../../../src/core/station/lines/startLines.ts";

export const [size, spacing, lines] = [15, 0.5, 2];
export const grid: LineGrid = {
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
export const levels = [5, 0.3, -0.2];
export const close = { relative: 1e-9, absolute: 1e-11, because: "the definition, summed in another order" };

/** Snapshots of two stations of two lines each; neighbours along a line and in time resemble each other. */
export function snapshotsOf(count: number, seed: number, points = size): Float64Array[][] {
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
export function partsOf(snapshots: readonly Float64Array[][], of: LineGrid = grid, t0 = 0): LinePart[] {
  const reducer = startLines(of);
  snapshots.forEach((snapshot, i) => {
    reducer.add(t0 + 0.1 * i, snapshot);
  });
  return reducer.finish();
}
export const snapshots = snapshotsOf(5, 3);
export const [first, second] = partsOf(snapshots);
/** The lines of the second station: by snapshot, component and line. */
export const linesOf = (snapshot: Float64Array[], c: number, s = 1) =>
  [0, 1].map((l) => snapshot[c].slice((s * lines + l) * size, (s * lines + l + 1) * size));
/** |X_f|² of a sequence, by the definition. */
export function powerAt(x: Float64Array, f: number, length = x.length): number {
  let [re, im] = [0, 0];
  x.forEach((value, i) => {
    re += value * Math.cos((2 * Math.PI * f * i) / length);
    im += value * Math.sin((2 * Math.PI * f * i) / length);
  });
  return re * re + im * im;
}
export const hann = (x: Float64Array) =>
  x.map((value, i) => (value * (1 - Math.cos((2 * Math.PI * i) / x.length))) / 2);
