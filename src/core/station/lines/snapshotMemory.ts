import type { MemorySums } from "./linePart.ts";

/** Snapshots that are remembered: enough to see whether neighbours in time are independent. */
export const rememberedSnapshots = 8;

/** How much of a snapshot is left some snapshots later, station by station. */
export interface SnapshotMemory {
  /** Takes the values of one snapshot, a column a component, station after station. */
  add(columns: readonly Float64Array[], references: readonly Float64Array[]): void;
  of(station: number): MemorySums;
}

/** A snapshot about the references, and the sum of each component at each station. */
interface Remembered {
  readonly columns: readonly Float64Array[];
  readonly sums: Float64Array;
}

/**
 * @param stations    how many
 * @param perStation  points of a snapshot at each
 * @param components  how many
 */
export function startMemory(stations: number, perStation: number, components: number): SnapshotMemory {
  const past: Remembered[] = [];
  const lags = rememberedSnapshots + 1;
  const all = Array.from({ length: stations }, () => ({
    products: new Float64Array(lags),
    counts: new Float64Array(lags),
    later: new Float64Array(lags * components),
    earlier: new Float64Array(lags * components),
  }));

  function multiply(lag: number, newest: Remembered, before: Remembered): void {
    all.forEach(({ products, counts, later, earlier }, s) => {
      counts[lag] += perStation;
      for (let c = 0; c < components; c++) {
        const [a, b] = [newest.columns[c], before.columns[c]];
        let sum = 0;
        for (let i = s * perStation; i < (s + 1) * perStation; i++) sum += a[i] * b[i];
        products[lag] += sum;
        later[lag * components + c] += newest.sums[s * components + c];
        earlier[lag * components + c] += before.sums[s * components + c];
      }
    });
  }
  return {
    add(columns, references) {
      const oldest = past.length === lags ? past.pop() : undefined;
      const newest = oldest ?? {
        columns: columns.map(({ length }) => new Float64Array(length)),
        sums: new Float64Array(stations * components),
      };
      newest.sums.fill(0);
      columns.forEach((column, c) => {
        for (let i = 0; i < column.length; i++) {
          const s = Math.floor(i / perStation);
          newest.columns[c][i] = column[i] - references[s][c];
          newest.sums[s * components + c] += newest.columns[c][i];
        }
      });
      past.unshift(newest);
      for (let lag = 0; lag < past.length; lag++) multiply(lag, newest, past[lag]);
    },
    of: (station) => all[station],
  };
}
