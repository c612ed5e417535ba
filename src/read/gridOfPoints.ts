import { ReductionFailure } from "../core/failure.ts";
import type { LineDirection, LineGrid } from "../core/station/lines/linePart.ts";
import type { LineRows } from "./lineRows.ts";
import { tidyLength } from "./recognisePosition.ts";

/** Fewest points that make a line: across the stream, and along it where differences need neighbours. */
const fewestAcross = 8;
const fewestAlong = 5;

/** Points of one snapshot: their coordinates, and how the lines run through them. */
export interface PointGrid {
  readonly along: LineDirection;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly z: Float64Array;
}

/**
 * How lines run through the points of a snapshot: along y or z where most points lie there, else along x.
 * @param rows  of the file
 * @param order of the snapshot's rows, any
 * @throws not-a-record      too few points for a line
 * @throws different-points  points that do not form parallel lines, or one of them twice
 */
export function gridOfPoints(rows: LineRows, order: Uint32Array, file: string): PointGrid {
  const [x, y, z] = [rows.x, rows.y, rows.z].map((column) => distinct(column, order));
  const across = Math.max(y.length, z.length);
  const lateral = across >= fewestAcross && (across >= x.length || across >= 32);
  if (!lateral && x.length < fewestAlong) throw noLine(rows, order, file, Math.max(across, x.length));
  const along = lateral ? (y.length >= z.length ? "y" : "z") : "x";
  if (x.length * y.length * z.length !== order.length)
    throw noGrid(rows, order, file, [x.length, y.length, z.length]);
  return { along, x, y, z };
}

/** Whether row a stands before row b: by x, then across, then along the line. */
export function placeOrder({ along }: PointGrid, rows: LineRows): (a: number, b: number) => number {
  const { x, y, z } = rows;
  if (along === "y") return (a, b) => x[a] - x[b] || z[a] - z[b] || y[a] - y[b];
  return (a, b) => x[a] - x[b] || y[a] - y[b] || z[a] - z[b];
}

/**
 * The grid as the reduction takes it.
 * @param has   which coordinates the file tells
 * @param place x of a row as the case counts it
 */
export function lineGrid(
  { along, x, y, z }: PointGrid,
  has: { readonly y: boolean; readonly z: boolean },
  place: (x: number) => number,
  rest: Pick<LineGrid, "file" | "position" | "components">,
): LineGrid {
  const stations = Array.from(x, place);
  const known = (value: number, told: boolean) => (told ? tidyLength(value) : null);
  const pairs = (ys: readonly (number | null)[], zs: readonly (number | null)[]) =>
    ys.flatMap((one) => zs.map((other) => ({ y: one, z: other })));
  const ys = along === "y" ? [null] : Array.from(y, (value) => known(value, has.y));
  const zs = along === "z" ? [null] : Array.from(z, (value) => known(value, has.z));
  const points = along === "y" ? y : along === "z" ? z : Float64Array.from(stations);
  return { ...rest, along, stations, points, across: pairs(ys, zs) };
}

function distinct(column: Float64Array, order: Uint32Array): Float64Array {
  return Float64Array.from(new Set(Array.from(order, (row) => column[row]))).sort();
}

function noLine(rows: LineRows, order: Uint32Array, file: string, points: number): ReductionFailure {
  return new ReductionFailure(
    "not-a-record",
    {
      message: `There is no line in the snapshot at t = ${rows.t[order[0]]}`,
      found: points === 1 ? "one point" : `${points} points in a row`,
      expected: `${fewestAcross} points or more along y or z, or ${fewestAlong} along x, at each time`,
      remedy: 'Give layout "series" for records of single probes, or name the column of y or z.',
    },
    { file, line: rows.line[order[0]] },
  );
}

function noGrid(
  rows: LineRows,
  order: Uint32Array,
  file: string,
  [nx, ny, nz]: readonly number[],
): ReductionFailure {
  const seen = new Set<string>();
  const twice = order.find((row) => {
    const key = `${rows.x[row]} ${rows.y[row]} ${rows.z[row]}`;
    if (seen.has(key)) return true;
    seen.add(key);
    return false;
  });
  const facts =
    twice === undefined
      ? {
          message: `The points of the snapshot at t = ${rows.t[order[0]]} do not form parallel lines of the same points`,
          found: `${order.length} points with ${nx} x, ${ny} y and ${nz} z`,
          expected: `${nx * ny * nz}`,
          remedy: "Sample all lines of a file at the same points, or give each line a file of its own.",
        }
      : {
          message: `Two rows stand at one point and one time, t = ${rows.t[twice]}`,
          found: `x = ${rows.x[twice]}, y = ${rows.y[twice]}, z = ${rows.z[twice]} once more`,
          expected: "one row for each point and time",
          remedy: "Leave the repeated rows out, or add the coordinate (y or z) that tells the lines apart.",
        };
  return new ReductionFailure("different-points", facts, { file, line: rows.line[twice ?? order[0]] });
}
