import { ReductionFailure } from "../core/failure.ts";
import type { Flag } from "../core/flag.ts";
import type { PositionSource, ReadSettings, Role } from "../core/records.ts";
import type { LineGrid } from "../core/station/lines/linePart.ts";
import type { ByteSource } from "./byteSource.ts";
import { lineGrid } from "./gridOfPoints.ts";
import { LineRows } from "./lineRows.ts";
import { readHead } from "./readHead.ts";
import { type ReadSummary, withoutRows, withoutVelocity } from "./readRecords.ts";
import { readRows } from "./readRows.ts";
import { recognisePosition, tidyLength } from "./recognisePosition.ts";
import { recogniseTime } from "./recogniseTime.ts";
import { SnapshotSorter } from "./snapshotSorter.ts";
import { surveyTable, type TableForm } from "./surveyTable.ts";
import { type TakenColumn, takeColumns } from "./takeColumns.ts";
import { tallyFlags } from "./tallyFlags.ts";

/** Takes the lines of a file: asked once, when the first snapshot is there. */
export interface LineSink {
  grid(grid: LineGrid): {
    /** In order of time. The arrays are used again: copy what is kept. */
    add(t: number, columns: readonly Float64Array[]): void;
  };
}

/**
 * Reads a table of lines, a row a point and time, in any order of rows; or one snapshot without a time column,
 * whose time a comment tells. Memory holds one snapshot, or the table where its rows are not in order of time.
 * @throws empty-file, heading-only, not-a-record, ambiguous-columns, no-velocity, no-time, no-position,
 * different-points, backward-time, not-a-number
 */
export async function readLines(
  source: ByteSource,
  settings: ReadSettings,
  sink: LineSink,
  options: { onBytes?(bytes: number): void; window?: number; mostRows?: number } = {},
): Promise<Omit<ReadSummary, "places">> {
  const form = surveyTable(await readHead(source), settings);
  const columns = takeColumns(form, settings);
  const take = takenFrom(form, columns, settings);
  const rows = new LineRows(take.values.length);
  const { window = 2 ** 20, mostRows = 2 ** 23 } = options;
  const lines = new SnapshotSorter(rows, form.file, snapshotSink(form, take, settings, sink), {
    window,
    mostRows,
  });
  const plan = { columns, sparse: columns.map(() => false), missing: settings.missing };
  const at = (values: Float64Array, index: number) => (index < 0 ? 0 : values[index]);
  const tally = await readRows(
    source,
    form,
    plan,
    (values, line) => {
      const t = take.t < 0 ? take.time : values[take.t];
      rows.add(t, at(values, take.x), at(values, take.y), at(values, take.z), values, take.values, line);
      lines.next();
    },
    options.onBytes,
  );
  if (tally.rows === 0) throw withoutRows(form);
  lines.finish();
  const flags = [...tallyFlags(tally), ...cutFlag(lines)];
  const note = { name: source.name, bytes: source.bytes, x: take.only, position: take.position };
  return { sources: [note], flags, rows: tally.rows, leftOut: tally.leftOutCount };
}

/** Where each role stands in a row; -1: it is not there. */
interface Taken {
  readonly t: number;
  readonly x: number;
  readonly y: number;
  readonly z: number;
  readonly values: readonly number[];
  readonly components: readonly ("u" | "v" | "w")[];
  /** Of a file without a time column. */
  readonly time: number;
  /** x of the file; null: each row's own. */
  readonly only: number | null;
  readonly position: PositionSource;
}

function takenFrom(form: TableForm, columns: readonly TakenColumn[], settings: ReadSettings): Taken {
  const find = (role: Role) => columns.findIndex((column) => column.role === role);
  const components = (["u", "v", "w"] as const).filter((role) => find(role) >= 0);
  if (!components.includes("u")) throw withoutVelocity(form);
  const [t, x, y, z] = (["t", "x", "y", "z"] as const).map(find);
  if (x < 0 && y < 0 && z < 0) throw withoutPoints(form);
  const time = t < 0 ? recogniseTime(form.comments, settings.units) : 0;
  if (time === null) throw withoutTime(form);
  const values = components.map(find);
  return { t, x, y, z, values, components, time, ...originOf(form, x, settings) };
}

function originOf(form: TableForm, x: number, settings: ReadSettings): Pick<Taken, "only" | "position"> {
  if (settings.x !== null) return { only: tidyLength(settings.x - settings.zero), position: "sheet" };
  if (x >= 0) return { only: null, position: "column" };
  const told = recognisePosition(form.file, form.comments, settings.units);
  if (told) return { only: tidyLength(told.x - settings.zero), position: told.source };
  throw new ReductionFailure(
    "no-position",
    {
      message: "The file names no position",
      found: "no x column, no comment line with x, no number after x in the name",
      expected: "an x for the lines",
      remedy: "Give x for this file in the sheet, or add a line `# x = 0.2` above the rows.",
    },
    { file: form.file },
  );
}

function snapshotSink(form: TableForm, take: Taken, settings: ReadSettings, sink: LineSink) {
  let taker: ReturnType<LineSink["grid"]> | null = null;
  let start: number | null = null;
  return {
    begin(points: Parameters<typeof lineGrid>[0]) {
      if (take.only !== null && points.x.length > 1) throw severalPlaces(form, points.x, take);
      const place = (x: number) => take.only ?? tidyLength(tidyLength(x) - settings.zero);
      const rest = { file: form.file, position: take.position, components: take.components };
      taker = sink.grid(lineGrid(points, { y: take.y >= 0, z: take.z >= 0 }, place, rest));
    },
    add(t: number, columns: readonly Float64Array[]) {
      start ??= t;
      if (t - start >= settings.startup * (1 - 1e-12)) taker?.add(t, columns);
    },
  };
}

function cutFlag({ cut }: SnapshotSorter): Flag[] {
  if (cut === null) return [];
  const text = `The last snapshot, at t = ${cut.t}, is not whole: the file ends at line ${cut.line}. It was left out.`;
  return [{ code: "damaged-file", text, value: cut.line }];
}

const headingsOf = ({ headings }: TableForm) =>
  headings.map(({ text }, i) => text || `column ${i + 1}`).join(", ");

function withoutPoints(form: TableForm): ReductionFailure {
  return new ReductionFailure(
    "no-position",
    {
      message: "No column tells the points of a line apart",
      found: headingsOf(form),
      expected: "a column y or z (or x, for lines along the stream)",
      remedy: 'Name the column under columns.y or columns.z in the sheet, or give layout "series".',
    },
    { file: form.file, line: form.headingLine || form.firstLine },
  );
}

function withoutTime(form: TableForm): ReductionFailure {
  return new ReductionFailure(
    "no-time",
    {
      message: "The file does not tell the time of its snapshots",
      found: headingsOf(form),
      expected: "a column t, or for a single snapshot a comment line such as `# t = 0.35`",
      remedy: "Name the time column under columns.t in the sheet, or add the comment line.",
    },
    { file: form.file, line: form.headingLine || form.firstLine },
  );
}

function severalPlaces(form: TableForm, x: Float64Array, take: Taken): ReductionFailure {
  return new ReductionFailure(
    "ambiguous-columns",
    {
      message: "One position is given for a file that holds several",
      found: `x from ${x[0]} to ${x[x.length - 1]}`,
      expected: "one x in the column",
      remedy: "Leave x of this file out of the sheet: its column has it.",
    },
    { file: form.file, line: form.headingLine || form.firstLine, column: take.x + 1 },
  );
}
