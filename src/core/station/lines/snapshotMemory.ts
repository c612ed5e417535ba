import type { MemorySums } from "./linePart.ts";

/** Snapshots that are remembered: enough to see whether neighbours in time are independent. */
export const rememberedSnapshots = 8;

/** How much of a snapshot is left some snapshots later, station by station. */
export interface SnapshotMemory {
  /** Takes the values of one snapshot, a column a component, station after station. */
  add(columns: readonly Float64Array[], references: readonly Float64Array[]): void;
  of(station: number): MemorySums;
}

/**
 * @param stations    how many
 * @param perStation  points of a snapshot at each
 */
export function startMemory(stations: number, perStation: number): SnapshotMemory {
  const past: Float64Array[][] = [];
  const lags = rememberedSnapshots + 1;
  const products = new Float64Array(stations * lags);
  const counts = new Float64Array(lags);

  function multiply(lag: number, columns: readonly Float64Array[], earlier: readonly Float64Array[]): void {
    counts[lag] += perStation;
    for (let s = 0; s < stations; s++) {
      let sum = 0;
      columns.forEach((column, c) => {
        for (let i = s * perStation; i < (s + 1) * perStation; i++) sum += column[i] * earlier[c][i];
      });
      products[s * lags + lag] += sum;
    }
  }
  return {
    add(columns, references) {
      const oldest = past.length < lags ? columns.map(({ length }) => new Float64Array(length)) : past.pop();
      const newest = oldest ?? [];
      columns.forEach((column, c) => {
        for (let i = 0; i < column.length; i++) {
          newest[c][i] = column[i] - references[Math.floor(i / perStation)][c];
        }
      });
      past.unshift(newest);
      for (let lag = 0; lag < past.length; lag++) multiply(lag, newest, past[lag]);
    },
    of: (station) => ({
      products: products.slice(station * lags, (station + 1) * lags),
      counts: counts.slice(),
    }),
  };
}
