import { ReductionFailure } from "../core/failure.ts";
import { gridOfPoints, type PointGrid, placeOrder } from "./gridOfPoints.ts";
import type { LineRows } from "./lineRows.ts";

/** Takes the snapshots of a file in order of time. */
export interface SnapshotSink {
  /** Asked once, when the first snapshot is whole. */
  begin(grid: PointGrid): void;
  /** Values of one snapshot, in order of x, then across, then along the line; the arrays are used again. */
  add(t: number, columns: readonly Float64Array[]): void;
}

/** Rows that are sorted in memory before anything is handed on, and the most that ever are. */
const window = 2 ** 20;
const mostRows = 2 ** 23;

/**
 * Puts the rows of a table of lines into snapshots. Rows may come in any order; a table that is longer than the
 * window must come snapshot by snapshot, or be short enough to be sorted as a whole.
 */
export class SnapshotSorter {
  /** Time of a last snapshot that was left out since it is not whole; null for none. */
  cut: { readonly t: number; readonly line: number } | null = null;
  snapshots = 0;
  private grid: PointGrid | null = null;
  private streaming = false;
  private order: Uint32Array = new Uint32Array(0);
  private columns: readonly Float64Array[] = [];
  private first = new Float64Array(0);

  constructor(
    private readonly rows: LineRows,
    private readonly file: string,
    private readonly sink: SnapshotSink,
    private readonly limits = { window, mostRows },
  ) {}

  /** A row was added to the rows. */
  next(): void {
    const { rows } = this;
    const newest = rows.count - 1;
    if (this.streaming) {
      if (newest > 0 && rows.t[newest] !== rows.t[newest - 1]) this.passOn(newest);
      return;
    }
    if (rows.count < this.limits.window) return;
    if (rows.count === this.limits.window && inOrder(rows)) {
      this.streaming = true;
      let from = 0;
      for (let i = 1; i < rows.count; i++) if (rows.t[i] !== rows.t[i - 1]) from = i;
      this.handOn(identity(0, from), false);
      rows.drop(from);
    } else if (rows.count > this.limits.mostRows) throw this.tooLong(rows.line[newest]);
  }

  /** Hands on what is left. */
  finish(): void {
    const order = identity(0, this.rows.count);
    const { t } = this.rows;
    if (!inOrder(this.rows)) order.sort((a, b) => t[a] - t[b] || a - b);
    this.handOn(order, true);
  }

  private passOn(end: number): void {
    if (!(this.rows.t[end] > this.rows.t[0])) throw this.backward(this.rows.line[end]);
    this.handOn(identity(0, end), false);
    this.rows.drop(end);
  }

  /** Rows in order of time, cut into snapshots. */
  private handOn(order: Uint32Array, ending: boolean): void {
    const { t } = this.rows;
    for (let from = 0; from < order.length; ) {
      let to = from + 1;
      while (to < order.length && t[order[to]] === t[order[from]]) to++;
      this.snapshot(order.subarray(from, to), ending && to === order.length);
      from = to;
    }
  }

  private snapshot(own: Uint32Array, last: boolean): void {
    const { rows, sink } = this;
    if (this.grid === null) {
      this.grid = gridOfPoints(rows, own, this.file);
      sink.begin(this.grid);
      this.columns = rows.values.map(() => new Float64Array(own.length));
    }
    const size = this.columns[0].length;
    const t = rows.t[own[0]];
    // a run that was ended leaves its last snapshot unfinished
    if (last && own.length < size && this.snapshots > 0) {
      this.cut = { t, line: rows.line[own[own.length - 1]] };
      return;
    }
    if (own.length !== size) throw this.differs(own, size);
    const sorted = this.sorted(own);
    this.refuseStrangers(sorted);
    this.columns.forEach((column, c) => {
      for (let i = 0; i < size; i++) column[i] = rows.values[c][sorted[i]];
    });
    this.snapshots++;
    sink.add(t, this.columns);
  }

  /** In order of place; mostly that of the snapshot before. */
  private sorted(own: Uint32Array): Uint32Array {
    const compare = placeOrder(this.grid as PointGrid, this.rows);
    if (this.order.length !== own.length) this.order = identity(0, own.length);
    const guess = this.order.map((i) => own[i]);
    if (guess.every((row, i) => i === 0 || compare(guess[i - 1], row) < 0)) return guess;
    const places = identity(0, own.length).sort((a, b) => compare(own[a], own[b]));
    this.order = places;
    return places.map((i) => own[i]);
  }

  /** The first snapshot's coordinates are those of all. */
  private refuseStrangers(sorted: Uint32Array): void {
    const { x, y, z } = this.rows;
    if (this.first.length === 0) {
      this.first = Float64Array.from(
        { length: 3 * sorted.length },
        (_, i) => [x, y, z][i % 3][sorted[(i - (i % 3)) / 3]],
      );
    }
    const { first } = this;
    const at = sorted.findIndex(
      (row, i) =>
        !near(x[row], first[3 * i]) || !near(y[row], first[3 * i + 1]) || !near(z[row], first[3 * i + 2]),
    );
    if (at < 0) return;
    // one strange point shifts all behind it in the order: told is the one that no first snapshot's is like
    const known = new Set(
      Array.from(sorted, (_, i) => `${first[3 * i]} ${first[3 * i + 1]} ${first[3 * i + 2]}`),
    );
    const odd = sorted.find((row) => !known.has(`${x[row]} ${y[row]} ${z[row]}`)) ?? sorted[at];
    throw this.stranger(
      odd,
      [0, 1, 2].map((i) => first[3 * at + i]),
    );
  }

  private stranger(row: number, [x, y, z]: readonly number[]): ReductionFailure {
    const { rows } = this;
    return new ReductionFailure(
      "different-points",
      {
        message: `The snapshot at t = ${rows.t[row]} has other points than the first`,
        found: `x = ${rows.x[row]}, y = ${rows.y[row]}, z = ${rows.z[row]}`,
        expected: `x = ${x}, y = ${y}, z = ${z}`,
        remedy: "Sample every snapshot at the same points, one row for each.",
      },
      { file: this.file, line: rows.line[row] },
    );
  }

  private differs(own: Uint32Array, size: number): ReductionFailure {
    const { rows } = this;
    return new ReductionFailure(
      "different-points",
      {
        message: `The snapshot at t = ${rows.t[own[0]]} has another number of points than the first`,
        found: `${own.length}`,
        expected: `${size}`,
        remedy: "Sample every snapshot at the same points, one row for each.",
      },
      { file: this.file, line: rows.line[own[Math.min(own.length, size) - 1]] },
    );
  }

  private backward(line: number): ReductionFailure {
    return new ReductionFailure(
      "backward-time",
      {
        message: `Time runs backward from one snapshot to the next, in a table of more than ${this.limits.window} rows`,
        found: `a time before t = ${this.rows.t[0]}`,
        expected: "snapshots in order of time",
        remedy: "Sort the table by time, or give each run a file of its own.",
      },
      { file: this.file, line },
    );
  }

  private tooLong(line: number): ReductionFailure {
    return new ReductionFailure(
      "not-a-record",
      {
        message: "The rows of a snapshot do not stand together, and the table is too long to be sorted",
        found: `more than ${this.limits.mostRows} rows`,
        expected: "all points of one time, then all of the next",
        remedy: "Sort the table by time, or give each line a file of its own.",
      },
      { file: this.file, line },
    );
  }
}

/** Times never fall. */
function inOrder({ t, count }: LineRows): boolean {
  for (let i = 1; i < count; i++) if (!(t[i] >= t[i - 1])) return false;
  return true;
}

function identity(from: number, to: number): Uint32Array {
  return Uint32Array.from({ length: to - from }, (_, i) => from + i);
}

function near(a: number, b: number): boolean {
  return Math.abs(a - b) <= 1e-9 * (Math.abs(a) + Math.abs(b));
}
