import { ReductionFailure } from "../core/failure.ts";
import type { Flag } from "../core/flag.ts";
import type { ProfileRow, ReadSettings, SourceNote } from "../core/records.ts";
import type { ByteSource } from "./byteSource.ts";
import { headingList } from "./headingList.ts";
import { readHead } from "./readHead.ts";
import { withoutRows } from "./readRecords.ts";
import { readRows } from "./readRows.ts";
import { tidyLength } from "./recognisePosition.ts";
import { surveyTable, type TableForm } from "./surveyTable.ts";
import { takeColumns } from "./takeColumns.ts";
import { tallyFlags } from "./tallyFlags.ts";

export interface ProfileReading {
  /** In the order of the file. */
  readonly rows: ProfileRow[];
  readonly source: SourceNote;
  readonly flags: Flag[];
}

/**
 * Reads statistics along a stream (or in time) that were reduced elsewhere. A cell may be empty: its value is
 * absent from that row. The coordinate may not.
 * @throws empty-file, heading-only, not-a-record, ambiguous-columns, no-velocity, no-position, not-a-number
 */
export async function readProfile(
  source: ByteSource,
  settings: ReadSettings,
  options: { onBytes?(bytes: number): void } = {},
): Promise<ProfileReading> {
  const form = surveyTable(await readHead(source), settings);
  const all = takeColumns(form, { ...settings, layout: "profile" });
  const along = settings.along ?? "x";
  const place = all.find(({ role }) => role === along);
  if (place === undefined) throw withoutCoordinate(form, along);
  const values = all.filter(({ role }) => !coordinates.has(role));
  if (values.every(({ role }) => role === "U" || role === "se")) {
    throw withoutStatistics(form);
  }
  const columns = [place, ...values];
  const plan = { columns, sparse: columns.map((_, i) => i > 0), missing: settings.missing };
  const rows: ProfileRow[] = [];
  const take = (numbers: Float64Array, line: number) => {
    const x = tidyLength(tidyLength(numbers[0]) - settings.zero);
    const given = values.flatMap(({ role }, i) =>
      Number.isNaN(numbers[i + 1]) ? [] : [[role, numbers[i + 1]]],
    );
    rows.push({ file: source.name, line, x, values: Object.fromEntries(given) });
  };
  const tally = await readRows(source, form, plan, take, options.onBytes);
  if (rows.length === 0) throw withoutRows(form);
  const note: SourceNote = { name: source.name, bytes: source.bytes, x: null, position: "column" };
  return { rows, source: note, flags: tallyFlags(tally) };
}

const coordinates: ReadonlySet<string> = new Set(["x", "y", "z", "t", "u", "v", "w"]);

function withoutStatistics(form: TableForm): ReductionFailure {
  return new ReductionFailure(
    "no-velocity",
    {
      message: "No variance, rms value or decaying quantity was recognised",
      found: headingList(form),
      expected: "a column uu, u_rms or q",
      remedy: "Say under columns in the sheet which column is which, or leave the file out.",
    },
    { file: form.file, line: form.headingLine || form.firstLine },
  );
}

function withoutCoordinate(form: TableForm, along: "x" | "t"): ReductionFailure {
  return new ReductionFailure(
    "no-position",
    {
      message: `The profile has no ${along} column`,
      found: headingList(form),
      expected: along === "x" ? "a column x (or t, with along set to t)" : "a column t",
      remedy: `Name the column under columns.${along} in the sheet.`,
    },
    { file: form.file, line: form.headingLine || form.firstLine },
  );
}
