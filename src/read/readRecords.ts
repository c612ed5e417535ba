import { ReductionFailure } from "../core/failure.ts";
import type { Flag } from "../core/flag.ts";
import type { ReadSettings, RecordOrigin, SourceNote, VelocityBlock } from "../core/records.ts";
import type { ByteSource } from "./byteSource.ts";
import { headingList } from "./headingList.ts";
import { ProbeRouter } from "./probeRouter.ts";
import { readHead } from "./readHead.ts";
import { readRows } from "./readRows.ts";
import { recognisePosition, tidyLength } from "./recognisePosition.ts";
import { recogniseStep } from "./recogniseStep.ts";
import { surveyTable, type TableForm } from "./surveyTable.ts";
import { type TakenColumn, takeColumns } from "./takeColumns.ts";
import { tallyFlags } from "./tallyFlags.ts";

/** Takes the samples of one probe, in order of time. The arrays are used again: copy what is kept. */
export interface BlockSink {
  add(block: VelocityBlock): void;
}
/** Takes what is read: asked once for each probe, when its first samples are there. */
export interface RecordSink {
  record(origin: RecordOrigin): BlockSink;
}
/** Where in its file a record's samples stand: lines and columns, 1-based. */
export interface RecordPlace {
  /** The very object that the sink was given. */
  readonly origin: RecordOrigin;
  readonly firstLine: number;
  readonly lastLine: number;
  /** The first sample that is earlier than the one before it; null: there is none. */
  readonly backwardLine: number | null;
  readonly timeColumn: number | null;
  readonly uColumn: number | null;
}
export interface ReadSummary {
  /** One for each position of the file. */
  readonly sources: SourceNote[];
  readonly flags: Flag[];
  readonly rows: number;
  /** Lines between the rows that held none. */
  readonly leftOut: number;
  readonly places: readonly RecordPlace[];
}

/**
 * Streams one file of velocities, probe by probe, as column blocks in the units of the case.
 * A table with x, y or z columns may hold several probes, one after the other or time by time: each row goes to
 * the probe of its position. A position given in the settings goes before a column, a comment, the name.
 * @param options.onBytes hears how many bytes have been read since it was last told
 * @throws empty-file, heading-only, not-a-record, ambiguous-columns, no-velocity, no-time, no-position, not-a-number
 */
export async function readRecords(
  source: ByteSource,
  settings: ReadSettings,
  sink: RecordSink,
  options: { onBytes?(bytes: number): void } = {},
): Promise<ReadSummary> {
  const form = surveyTable(await readHead(source), settings);
  const columns = takeColumns(form, settings);
  const origin = originOf(form, columns, settings);
  const router = new ProbeRouter(columns, origin, settings, sink);
  const plan = { columns, sparse: columns.map(() => false), missing: settings.missing };
  const tally = await readRows(
    source,
    form,
    plan,
    (values, line) => router.route(values, line),
    options.onBytes,
  );
  router.finish();
  if (tally.rows === 0) throw withoutRows(form);
  const sources = router.positions().map((x) => ({
    name: source.name,
    bytes: source.bytes,
    x,
    position: origin.position,
  }));
  return {
    sources,
    flags: tallyFlags(tally),
    rows: tally.rows,
    leftOut: tally.leftOutCount,
    places: router.places(),
  };
}

/** Where the file's probes stand and what their step is, as far as all of them share it. */
function originOf(form: TableForm, columns: readonly TakenColumn[], settings: ReadSettings): RecordOrigin {
  const has = (role: string) => columns.some((column) => column.role === role);
  if (!has("u") && !has("v") && !has("w")) throw withoutVelocity(form);
  if (!has("u")) throw withoutVelocity(form, "The streamwise velocity u was not found");
  const step = has("t") ? null : (settings.step ?? recogniseStep(form.comments, settings.units));
  if (!has("t") && step === null) throw withoutTime(form);
  const told = recognisePosition(form.file, form.comments, settings.units);
  const across = { file: form.file, y: told?.y ?? null, z: told?.z ?? null, step };
  if (settings.x !== null) return { ...across, x: tidyLength(settings.x - settings.zero), position: "sheet" };
  if (has("x")) return { ...across, x: 0, position: "column" }; // each row's own
  if (told) return { ...across, x: tidyLength(told.x - settings.zero), position: told.source };
  throw withoutPosition(form);
}

const headingsOf = (form: TableForm) =>
  form.headingLine > 0
    ? `the headings ${headingList(form)}`
    : `${form.width} ${form.width === 1 ? "column" : "columns"} without headings`;
const headingPlace = (form: TableForm) => ({ file: form.file, line: form.headingLine || form.firstLine });

/** A table in which nothing was recognised. */
export function withoutVelocity(form: TableForm, message = "No velocity was recognised"): ReductionFailure {
  return new ReductionFailure(
    "no-velocity",
    {
      message,
      found: headingsOf(form),
      expected: "a column u (and v, w)",
      remedy: "Say which column is u under columns in the sheet, or leave the file out.",
    },
    headingPlace(form),
  );
}

function withoutTime(form: TableForm): ReductionFailure {
  return new ReductionFailure(
    "no-time",
    {
      message: "The file has no time column and tells no time between samples",
      found: headingsOf(form),
      expected: "a column t, or a comment line such as `# dt = 5e-5`",
      remedy: "Give the time between samples under read.step in the sheet, or name the time column.",
    },
    headingPlace(form),
  );
}

function withoutPosition(form: TableForm): ReductionFailure {
  return new ReductionFailure(
    "no-position",
    {
      message: "The file names no position",
      found: "no x column, no comment line with x, no number after x in the name",
      expected: "an x for the probe",
      remedy: "Give x for this file in the sheet, or add a line `# x = 0.2` above the rows.",
    },
    { file: form.file },
  );
}

/** A heading, and then no row. */
export function withoutRows(form: TableForm): ReductionFailure {
  return new ReductionFailure(
    "heading-only",
    {
      message: "The file has a heading and no rows",
      found: headingsOf(form),
      expected: "one row of numbers in each line",
      remedy: "Export the record again with its rows, or leave the file out.",
    },
    headingPlace(form),
  );
}
