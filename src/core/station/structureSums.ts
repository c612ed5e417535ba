import type { JoinedRecord } from "./joinParts.ts";

/** Of one station: the lags at which its structure functions bound the dissipation best, and their sums by row. */
export interface StructureSums {
  readonly second: IncrementRows;
  readonly third: IncrementRows;
}

/** Increments over one lag: a number a row each. */
export interface IncrementRows {
  /** s. */
  readonly lag: number;
  readonly counts: Float64Array;
  /** Σ d² of the second-order lag, Σ d³ of the third-order one; d = u(t) - u(t - lag). */
  readonly sums: Float64Array;
}

/**
 * The lags, from lambda/U to T_int, at which (D_LL)^(3/2)/r and -D_LLL/r are largest, held for every block: so
 * their scatter is that of the structure function itself, not of the choice.
 * @param record  the station
 * @param from    lambda/U, s
 * @param to      T_int, s
 * @returns       null where no lag lies between
 */
export function structureSums(record: JoinedRecord, from: number, to: number): StructureSums | null {
  const { step } = record;
  const tables = record.spectral.flatMap((part) => part.increments ?? []);
  if (tables.length === 0 || tables.length < record.spectral.length) return null;
  const lags = tables[0].lags.filter(
    (lag) => lag * step >= from && lag * step <= to && tables.every((table) => table.lags.includes(lag)),
  );
  if (lags.length === 0) return null;
  const each = lags.map((lag) => incrementRows(record, lag));
  const best = (value: (one: (typeof each)[number]) => number) =>
    each.reduce((a, b) => (value(b) > value(a) ? b : a));
  const second = best(({ lag, counts, squares }) => (total(squares) / total(counts)) ** 1.5 / lag);
  const third = best(({ lag, counts, cubes }) => total(cubes) / total(counts) / lag);
  return {
    second: { lag: second.lag * step, counts: second.counts, sums: second.squares },
    third: { lag: third.lag * step, counts: third.counts, sums: third.cubes },
  };
}

function incrementRows(record: JoinedRecord, lag: number) {
  const at = (entry: number) =>
    Float64Array.from(record.blocks, (places) => {
      let sum = 0;
      for (const { part, block } of places) {
        const { increments } = part;
        if (increments === undefined || increments === null) continue;
        const { lags, sums } = increments;
        sum += sums[(block * lags.length + lags.indexOf(lag)) * 3 + entry];
      }
      return sum / places.length;
    });
  return { lag, counts: at(0), squares: at(1), cubes: at(2) };
}

function total(values: Float64Array): number {
  return values.reduce((sum, value) => sum + value, 0);
}
