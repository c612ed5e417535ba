import type { BlockTable } from "../stationResult.ts";
import type { IntegralTimes } from "./integralTimes.ts";
import { blockAreas } from "./joinCorrelations.ts";
import type { JoinedRecord } from "./joinParts.ts";
import type { ComponentGradient } from "./stationGradients.ts";
import type { StructureSums } from "./structureSums.ts";

/** Rows of a station: sums of every block about the record's mean, that add up plainly. */
export interface StationRows {
  readonly table: BlockTable;
  readonly rows: readonly Float64Array[];
  readonly column: Readonly<Record<string, number>>;
}

/**
 * The station's blocks with all that their quantities are made of: the sums of blockFields about the record's
 * own mean (a field named u is Σ(u - U)), then rate_u … = Σ weight <(du/dt)²> with the record's cut held,
 * area_u … = Σ of the lag products up to the record's first zero crossing, times the lag, and of the increments
 * at the lags of the structure functions their number and the sums of their squares and cubes.
 */
export function stationRows(
  record: JoinedRecord,
  gradients: readonly ComponentGradient[],
  times: IntegralTimes,
  structure: StructureSums | null,
): StationRows {
  const { tauStar } = times;
  const areas =
    tauStar === null || record.spectral.length === 0
      ? []
      : record.components.map((name) => ({ name, rows: blockAreas(record, name, tauStar) }));
  const added = [
    ...gradients.map(({ name, rows }) => ({ field: `rate_${name}`, rows })),
    ...areas.map(({ name, rows }) => ({ field: `area_${name}`, rows })),
    ...structureColumns(structure),
  ];
  const fields = [...record.fields, ...added.map(({ field }) => field)];
  const data = new Float64Array(record.rows.length * fields.length);
  const rows = record.rows.map((row, block) => {
    const full = data.subarray(block * fields.length, (block + 1) * fields.length);
    full.set(row);
    added.forEach((one, i) => {
      full[record.fields.length + i] = one.rows[block];
    });
    return full;
  });
  const { step, start, blockSamples } = record;
  return {
    table: { fields, rows: rows.length, data, blockSamples, step, start },
    rows,
    column: Object.fromEntries(fields.map((name, i) => [name, i])),
  };
}

function structureColumns(structure: StructureSums | null): { field: string; rows: Float64Array }[] {
  if (structure === null) return [];
  const { second, third } = structure;
  return [
    { field: "increments_second", rows: second.counts },
    { field: "increment_squared", rows: second.sums },
    { field: "increments_third", rows: third.counts },
    { field: "increment_cubed", rows: third.sums },
  ];
}
