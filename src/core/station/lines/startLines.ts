import {
  additiveSeries,
  type BlockSeries,
  blockRow,
  mostBlocks,
  startBlocks,
  trimmed,
} from "../../signal/blockList.ts";
import { fillJoint, type JointLayout, jointLayout } from "../../signal/jointMoments.ts";
import { mergeJoint } from "../../signal/mergeJoint.ts";
import { startLateralSums } from "./lateralSums.ts";
import { lateralFields, streamwiseFields } from "./lineFields.ts";
import type { LineGrid, LinePart } from "./linePart.ts";
import { startMemory } from "./snapshotMemory.ts";
import { startStreamwiseSums } from "./streamwiseSums.ts";

/** Snapshots of one grid as they are read: one in, and at the end a part for each station. */
export interface LineReducer {
  /**
   * Takes the next snapshot; keeps no reference to its arrays.
   * @param t        its time, later than the last one's
   * @param columns  a column a component: station after station, line after line, point after point
   */
  add(t: number, columns: readonly Float64Array[]): void;
  finish(): LinePart[];
}

/** Sums of one station, whichever way its lines run. */
interface Station {
  readonly moments: BlockSeries;
  readonly sums: BlockSeries;
  readonly reference: Float64Array;
  add(columns: readonly Float64Array[], row: Float64Array): void;
  totals(): Pick<LinePart, "spectra" | "pairs">;
}

/**
 * Begins the reduction of the lines of one file. What is kept is sums, by blocks of whole snapshots, and the last
 * few snapshots: memory does not grow with their number.
 */
export function startLines(grid: LineGrid): LineReducer {
  const { components, stations: places, across, points } = grid;
  const perStation = across.length * (grid.along === "x" ? 1 : points.length);
  const layout = jointLayout(components.length);
  const fields = grid.along === "x" ? streamwiseFields(components) : lateralFields(components, points.length);
  const references = places.map(() => new Float64Array(components.length));
  const stations = places.map((_, s) => startStation(grid, s, layout, fields.length, references));
  const blocks = startBlocks(
    1,
    stations.flatMap(({ moments, sums }) => [moments, sums]),
  );
  const memory = startMemory(places.length, perStation, components.length);
  const moment = new Float64Array(layout.length);
  const seen = { snapshots: 0, start: 0, end: 0, lowest: Number.POSITIVE_INFINITY };
  let single: Float64Array[] | null = null;

  return {
    add(t, columns) {
      if (seen.snapshots === 0) {
        seen.start = t;
        single = columns.map((column) => column.slice());
        for (const [s, reference] of references.entries()) setMeans(reference, columns, s, perStation);
      } else single = null;
      seen.snapshots++;
      seen.end = t;
      for (const u of columns[0]) if (u < seen.lowest) seen.lowest = u;
      blocks.begin(1);
      for (const [s, { moments, sums, add }] of stations.entries()) {
        fillJoint(moment, layout, columns, s * perStation, (s + 1) * perStation, null);
        mergeJoint(blockRow(moments, blocks.current), moment, layout);
        add(columns, blockRow(sums, blocks.current));
      }
      memory.add(columns, references);
    },
    finish: () =>
      stations.map(({ moments, sums, reference, totals }, s) => ({
        origin: { file: grid.file, x: places[s], position: grid.position },
        along: grid.along,
        components,
        // a part is given away with its buffers: none may be shared with another
        points: points.slice(),
        across,
        snapshots: seen.snapshots,
        start: seen.start,
        end: seen.end,
        lowestSpeed: seen.lowest,
        reference,
        blocks: {
          rows: blocks.rows,
          size: blocks.size,
          moments: trimmed(moments, blocks.rows),
          sums: trimmed(sums, blocks.rows),
          fields,
        },
        memory: memory.of(s),
        single:
          single === null ? null : single.map((column) => column.slice(s * perStation, (s + 1) * perStation)),
        ...totals(),
        flags: [],
      })),
  };
}

function startStation(
  grid: LineGrid,
  s: number,
  layout: JointLayout,
  width: number,
  references: readonly Float64Array[],
): Station {
  const reference = references[s];
  const moments: BlockSeries = {
    width: layout.length,
    data: new Float64Array(layout.length * mostBlocks),
    merge: (into, from) => mergeJoint(into, from, layout),
  };
  const sums = additiveSeries(width);
  if (grid.along === "x") {
    const own = startStreamwiseSums(grid, s);
    return {
      ...{ moments, sums, reference },
      add: (columns, row) => own.add(columns, references, row),
      totals: () => ({ spectra: null, pairs: own.pairs() }),
    };
  }
  const own = startLateralSums(grid);
  const from = s * grid.across.length * grid.points.length;
  return {
    ...{ moments, sums, reference },
    add: (columns, row) => own.add(columns, from, reference, row),
    totals: () => ({ spectra: own.totals(), pairs: null }),
  };
}

function setMeans(reference: Float64Array, columns: readonly Float64Array[], s: number, count: number): void {
  columns.forEach((column, c) => {
    let sum = 0;
    for (let i = s * count; i < (s + 1) * count; i++) sum += column[i];
    reference[c] = sum / count;
  });
}
