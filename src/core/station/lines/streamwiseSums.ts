import { equalSpacing, type LineGrid, type StreamwisePairs } from "./linePart.ts";

/** Half separations up to which pairs are formed, in steps. */
const mostHalves = 128;

/** What is summed over one station of lines along x beside its moments. */
export interface StreamwiseSums {
  /**
   * Takes one snapshot.
   * @param columns    a column a component, all lines at the first x, then all at the next …
   * @param references by station, what the pairs are taken about
   * @param row        out: the block's sums, in the order of streamwiseFields
   */
  add(columns: readonly Float64Array[], references: readonly Float64Array[], row: Float64Array): void;
  pairs(): StreamwisePairs | null;
}

/**
 * Sums of the station number `at` of lines along x. Differences and pairs need equal steps; those of the fourth
 * order two neighbours on both sides.
 */
export function startStreamwiseSums(grid: LineGrid, at: number): StreamwiseSums {
  const { points, components } = grid;
  const lines = grid.across.length;
  const step = equalSpacing(points);
  const side = step === null ? 0 : Math.min(at, points.length - 1 - at);
  const halves = Math.min(side, mostHalves) + 1;
  const sums = Array.from({ length: 5 }, () => new Float64Array(halves));
  const counts = new Float64Array(halves);
  const [afterReference, beforeReference] = [new Float64Array(halves), new Float64Array(halves)];
  const width = 2 * components.length + 2;

  function addOrder(columns: readonly Float64Array[], l: number, row: Float64Array, fourth: boolean): void {
    const offset = fourth ? width : 0;
    row[offset] += 1;
    columns.forEach((column, c) => {
      const over = (m: number) => column[(at + m) * lines + l] - column[(at - m) * lines + l];
      const d = (fourth ? (8 * over(1) - over(2)) / 6 : over(1)) / (2 * (step ?? 1));
      row[offset + 1 + 2 * c] += d;
      row[offset + 2 + 2 * c] += d * d;
      if (c === 0) row[offset + width - 1] += d * d * d;
    });
  }
  function addPairs(u: Float64Array, references: readonly Float64Array[], l: number): void {
    for (let m = 0; m < halves; m++) {
      afterReference[m] = references[at + m][0];
      beforeReference[m] = references[at - m][0];
      const a = u[(at + m) * lines + l] - afterReference[m];
      const b = u[(at - m) * lines + l] - beforeReference[m];
      counts[m] += 1;
      [a, b, a * a, b * b, a * b].forEach((value, i) => {
        sums[i][m] += value;
      });
    }
  }
  return {
    add(columns, references, row) {
      for (let l = 0; l < lines; l++) {
        if (side >= 1) addOrder(columns, l, row, false);
        if (side >= 2) addOrder(columns, l, row, true);
        if (step !== null) addPairs(columns[0], references, l);
      }
    },
    pairs: () => {
      if (step === null) return null;
      const [after, before, afterSquared, beforeSquared, product] = sums;
      const about = { afterReference, beforeReference };
      return { counts, ...about, after, before, afterSquared, beforeSquared, product };
    },
  };
}
