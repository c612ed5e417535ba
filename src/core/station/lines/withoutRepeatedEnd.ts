import type { LineGrid, LinePart } from "./linePart.ts";
import { type LineReducer, startLines } from "./startLines.ts";

/**
 * Begins the reduction of lines, and leaves the last point of each out where it repeats the first: periodic lines are
 * often written with both ends, which would count one point twice and make the period a step too long. The first
 * snapshot decides: an exact repetition in every line and component is no chance.
 * @param periodic  as in the sheet; false: nothing is left out
 */
export function withoutRepeatedEnd(grid: LineGrid, periodic: boolean | "auto"): LineReducer {
  const size = grid.points.length;
  let reducer: LineReducer | null = null;
  let shorter: Float64Array[] | null = null;

  function begin(columns: readonly Float64Array[]): LineReducer {
    if (grid.along === "x" || periodic === false || !repeats(columns, size)) return startLines(grid);
    shorter = columns.map(({ length }) => new Float64Array((length / size) * (size - 1)));
    return startLines({ ...grid, points: grid.points.slice(0, -1) });
  }
  return {
    add(t, columns) {
      reducer ??= begin(columns);
      if (shorter === null) return reducer.add(t, columns);
      for (const [c, column] of columns.entries()) shorten(column, size, shorter[c]);
      reducer.add(t, shorter);
    },
    finish: (): LinePart[] => reducer?.finish() ?? [],
  };
}

function repeats(columns: readonly Float64Array[], size: number): boolean {
  const constant = columns.every((column) => column.every((value) => value === column[0]));
  return (
    !constant &&
    columns.every((column) => {
      for (let from = 0; from < column.length; from += size)
        if (column[from] !== column[from + size - 1]) return false;
      return true;
    })
  );
}

function shorten(column: Float64Array, size: number, out: Float64Array): void {
  for (let from = 0, to = 0; from < column.length; from += size, to += size - 1)
    out.set(column.subarray(from, from + size - 1), to);
}
