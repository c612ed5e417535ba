import type { Preview, ReadSettings, Role } from "../core/records.ts";
import type { ByteSource } from "./byteSource.ts";
import { parseNumber } from "./parseNumber.ts";
import { type Head, readHead } from "./readHead.ts";
import type { RecognisedColumns } from "./recogniseColumns.ts";
import { looksLikeLines } from "./recogniseLines.ts";
import { recognisePosition, tidyLength } from "./recognisePosition.ts";
import { recogniseStep } from "./recogniseStep.ts";
import { surveyTable, type TableForm } from "./surveyTable.ts";
import { recogniseOrOrder, takeColumns } from "./takeColumns.ts";
import { inCaseUnit, type Scale, unitOf, unscaled } from "./unitFactors.ts";

const shownRows = 8;
const recognisedAll = { separator: null, decimal: null, heading: null };

/**
 * A first look at a file, from its head alone. What the settings give is used, the rest recognised; a doubt about
 * columns is told (`clashes`, or roles that are null) and not thrown, so that it can be mended.
 * The position is in the file's own axis: `zero` is not subtracted.
 * @throws empty-file, heading-only, not-a-record, ambiguous-columns (a comma for both, names that fit no rows,
 * a choice of the settings that names no column)
 */
export async function previewFile(
  source: ByteSource,
  settings: Partial<ReadSettings> = {},
): Promise<Preview> {
  const head = await readHead(source);
  const form = surveyTable(head, { ...recognisedAll, ...settings });
  const layout = settings.layout ?? null;
  const seen = recogniseOrOrder(form, form.headings, layout, false);
  const units = settings.units ?? "SI";
  const columns = previewColumns(form, seen, settings);
  const columnOf = (role: Role) => {
    const at = columns.find((column) => column.role === role);
    const unit = at?.unit == null ? null : unitOf(at.unit);
    return { index: at ? at.number - 1 : -1, scale: (units === "SI" ? unit?.scale : null) ?? unscaled };
  };
  return {
    file: source.name,
    bytes: source.bytes,
    separator: form.separator,
    decimal: form.decimal,
    heading: form.headingLine,
    layout: layoutOf(form, columns, seen, layout),
    columns,
    firstRows: form.headRows.slice(0, shownRows),
    comments: form.comments,
    position: positionOf(form, columnOf("x"), settings, units),
    step: stepOf(form, columnOf, settings.step ?? null, units),
    estimatedRows: estimateRows(head, form),
    ...(seen.clashes.length > 0 ? { clashes: seen.clashes } : {}),
  };
}

/** Lines are told by their rows alone: their headings are those of records. */
function layoutOf(
  form: TableForm,
  columns: Preview["columns"],
  seen: RecognisedColumns,
  given: Preview["layout"] | null,
): Preview["layout"] {
  if (given !== null || seen.layout !== "series") return seen.layout;
  const roles = columns.map(({ role }) => role);
  return looksLikeLines(form, roles) ? "lines" : "series";
}

/** Choices of the settings go before what was recognised. */
function previewColumns(form: TableForm, seen: RecognisedColumns, settings: Partial<ReadSettings>) {
  const roles = settings.columns ? chosenRoles(form, seen, settings) : seen.roles;
  return form.headings.map(({ name, unit }, i) => {
    const role = roles[i] ?? null;
    const choice = role === null ? undefined : settings.columns?.[role];
    return { heading: name, number: i + 1, role, unit: choice?.unit ?? unit };
  });
}

function chosenRoles(
  form: TableForm,
  seen: RecognisedColumns,
  settings: Partial<ReadSettings>,
): (Role | null)[] {
  const roles: (Role | null)[] = form.headings.map(() => null);
  const taken = takeColumns(form, {
    columns: settings.columns ?? null,
    units: settings.units ?? "SI",
    layout: seen.layout,
  });
  for (const { role, index } of taken) roles[index] = role;
  return roles;
}

interface Column {
  readonly index: number;
  readonly scale: Scale;
}

function positionOf(
  form: TableForm,
  column: Column,
  settings: Partial<ReadSettings>,
  units: ReadSettings["units"],
): Preview["position"] {
  if (settings.x != null) return { x: settings.x, source: "sheet", matched: null };
  if (column.index >= 0) {
    const places = new Set(numbersOf(form, column));
    const [x] = places;
    const matched = form.headings[column.index].text || `column ${column.index + 1}`;
    return { x: places.size === 1 ? tidyLength(x) : null, source: "column", matched };
  }
  const told = recognisePosition(form.file, form.comments, units);
  return told
    ? { x: told.x, source: told.source, matched: told.matched, rule: told.rule }
    : { x: null, source: null, matched: null };
}

/** Between the first two rows of one place: in a table written time by time the rows between are other probes'. */
function stepOf(
  form: TableForm,
  columnOf: (role: Role) => Column,
  given: number | null,
  units: ReadSettings["units"],
): number | null {
  const time = columnOf("t");
  if (time.index < 0) return given ?? recogniseStep(form.comments, units);
  const places = (["x", "y", "z"] as const).map(columnOf).filter(({ index }) => index >= 0);
  const [first, ...rest] = form.headRows;
  const second = rest.find((row) => places.every(({ index }) => row[index] === first?.[index]));
  if (first === undefined || second === undefined) return null;
  const [from, to] = [first, second].map((row) => parseNumber(row[time.index] ?? "", form.decimal));
  const step = tidyLength(inCaseUnit(to - from, time.scale));
  return Number.isFinite(step) ? step : null;
}

function numbersOf(form: TableForm, { index, scale }: Column): number[] {
  return form.headRows
    .map((row) => inCaseUnit(parseNumber(row[index] ?? "", form.decimal), scale))
    .filter((value) => !Number.isNaN(value));
}

function estimateRows(head: Head, form: TableForm): number {
  if (head.whole) return form.headRows.length;
  return Math.round((head.textBytes / head.characters) * form.headRows.length);
}
