import type { Flag } from "../../flag.ts";
import type { PositionSource } from "../../records.ts";
import type { Component } from "../stationPart.ts";

export type LineDirection = "x" | "y" | "z";

/** Where the points of every snapshot of a file stand: straight parallel lines of the same points. */
export interface LineGrid {
  readonly file: string;
  readonly position: PositionSource;
  readonly along: LineDirection;
  /** Measured components, in the order of every list below. */
  readonly components: readonly Component[];
  /** x of the stations, ascending; of lines along x every point is one. */
  readonly stations: readonly number[];
  /** Coordinates along the line, ascending. */
  readonly points: Float64Array;
  /** Places of the parallel lines across; null where the file does not tell. */
  readonly across: readonly { readonly y: number | null; readonly z: number | null }[];
}

/** One station's lines from one file, reduced: nothing in it grows with the number of snapshots. */
export interface LinePart {
  readonly origin: { readonly file: string; readonly x: number; readonly position: PositionSource };
  readonly along: LineDirection;
  readonly components: readonly Component[];
  /** Along the line; of lines along x the neighbours on both sides are among them. */
  readonly points: Float64Array;
  readonly across: LineGrid["across"];
  readonly snapshots: number;
  /** Times of the first and the last snapshot. */
  readonly start: number;
  readonly end: number;
  readonly lowestSpeed: number;
  /** What plain sums are taken about: means of the first snapshot. */
  readonly reference: Float64Array;
  readonly blocks: LineBlocks;
  readonly memory: MemorySums;
  /** Values of the only snapshot, so that the next file can be compared with it; null where there are more. */
  readonly single: readonly Float64Array[] | null;
  /** Null along x, and where the points are not equally spaced. */
  readonly spectra: LateralTotals | null;
  /** Null across the stream, and where the points are not equally spaced. */
  readonly pairs: StreamwisePairs | null;
  readonly flags: readonly Flag[];
}

/** Blocks of whole snapshots. */
export interface LineBlocks {
  readonly rows: number;
  /** Snapshots in a block; the last may have fewer. */
  readonly size: number;
  /** A row a block: joint moments. */
  readonly moments: Float64Array;
  /** A row a block: sums that add up plainly; see lateralFields and streamwiseFields. */
  readonly sums: Float64Array;
  readonly fields: readonly string[];
}

/** Products of point values with those some snapshots earlier, all components together, about the reference. */
export interface MemorySums {
  /** Lag 0 … in snapshots. */
  readonly products: Float64Array;
  readonly counts: Float64Array;
  /** Σ of the later and of the earlier values of these pairs, component by component within each lag. */
  readonly later: Float64Array;
  readonly earlier: Float64Array;
}

/** Sums over all lines and snapshots about the reference, a list a component. */
export interface LateralTotals {
  /** Lines times snapshots. */
  readonly lines: number;
  /** Σ of the values at each point of the line. */
  readonly profile: readonly Float64Array[];
  /** Σ |X_f|² of the line padded with as many zeros, f = 0 … points: even f are those of the line itself. */
  readonly padded: readonly Float64Array[];
  /** Σ |X_f|² under a Hann window, f = 0 … ⌊points/2⌋. */
  readonly hann: readonly Float64Array[];
}

/** Sums over pairs m steps up- and downstream of the station, a number a half separation m = 0, 1 …. */
export interface StreamwisePairs {
  readonly counts: Float64Array;
  /** What u is taken about downstream and upstream: every file has references of its own. */
  readonly afterReference: Float64Array;
  readonly beforeReference: Float64Array;
  /** Σ of the value downstream, upstream, their squares, and their product; of u. */
  readonly after: Float64Array;
  readonly before: Float64Array;
  readonly afterSquared: Float64Array;
  readonly beforeSquared: Float64Array;
  readonly product: Float64Array;
}

/** Step between equally spaced points; null where they are not. */
export function equalSpacing(points: Float64Array): number | null {
  const count = points.length;
  if (count < 2) return null;
  const step = (points[count - 1] - points[0]) / (count - 1);
  // printed coordinates are rounded: what counts is that no step differs by more than a hundredth
  for (let i = 1; i < count; i++) if (Math.abs(points[i] - points[i - 1] - step) > 0.01 * step) return null;
  return step > 0 ? step : null;
}
