import { ReductionFailure } from "../core/failure.ts";
import type { ColumnChoice, Layout, ReadSettings, Role } from "../core/records.ts";
import type { Heading } from "./heading.ts";
import { headingList } from "./headingList.ts";
import { recogniseColumns } from "./recogniseColumns.ts";
import type { TableForm } from "./surveyTable.ts";
import { caseUnit, roleKind, type Scale, unitOf, unscaled } from "./unitFactors.ts";

/** A column that is read: where it stands, what it is, and how its numbers become those of the case. */
export interface TakenColumn extends Scale {
  readonly role: Role;
  /** 0-based. */
  readonly index: number;
}
type Choices = Pick<ReadSettings, "columns" | "units"> & { readonly layout: Layout | null };

/**
 * The columns to read: those chosen in the settings, the rest recognised by headings (or, in a file without
 * headings, by their order where that leaves no doubt). A column chosen as 0 is not used.
 * @throws ambiguous-columns a choice that names no column, two columns for one role, a unit that does not fit
 */
export function takeColumns(form: TableForm, settings: Choices): TakenColumn[] {
  const chosen = new Map<Role, { index: number; unit: string | null }>();
  const settled = new Set<Role>();
  for (const [role, choice] of Object.entries(settings.columns ?? {}) as [Role, ColumnChoice][]) {
    settled.add(role);
    if (choice.from === 0) continue;
    const index = columnOf(form, role, choice.from);
    chosen.set(role, { index, unit: choice.unit ?? form.headings[index].unit });
  }
  const used = new Set([...chosen.values()].map(({ index }) => index));
  const free = form.headings.map((heading, i) => (used.has(i) ? nameless : heading));
  const recognised = recogniseOrOrder(form, free, settings.layout, settled.size > 0);
  for (const { role, columns } of recognised.clashes) {
    if (!settled.has(role)) throw clash(form, role, columns);
  }
  recognised.roles.forEach((role, index) => {
    if (role !== null && !settled.has(role)) chosen.set(role, { index, unit: form.headings[index].unit });
  });
  return [...chosen].map(([role, { index, unit }]) => ({
    role,
    index,
    ...scaleOf(form, role, index, unit, settings.units),
  }));
}

const nameless: Heading = { text: "", name: "", unit: null };

/** Roles by headings; without any heading by order: t first where the first column only rises, then u, v, w. */
export function recogniseOrOrder(
  form: TableForm,
  headings: readonly Heading[],
  layout: Layout | null,
  chosen: boolean,
): ReturnType<typeof recogniseColumns> {
  if (form.headingLine > 0 || chosen || layout === "profile") return recogniseColumns(headings, layout);
  const first = form.headRows.slice(0, 200).map((row) => Number(row[0]?.replace(",", ".")));
  const timed = first.length > 1 && first.every((value, i) => i === 0 || value > first[i - 1]);
  const order: Role[] = timed && form.width > 1 ? ["t", "u", "v", "w"] : ["u", "v", "w"];
  const roles = headings.map((_, i) => (form.width <= order.length ? order[i] : null));
  return { layout: layout ?? "series", roles, clashes: [] };
}

function columnOf(form: TableForm, role: Role, from: string | number): number {
  if (typeof from === "number") {
    if (from <= form.width) return from - 1;
    throw noSuchColumn(form, role, `column ${from}`, `${form.width} columns`);
  }
  const wanted = from.trim();
  const ways: ((heading: Heading) => boolean)[] = [
    ({ text }) => text === wanted,
    ({ name }) => name === wanted,
    ({ text, name }) => [text, name].some((each) => each.toLowerCase() === wanted.toLowerCase()),
  ];
  for (const way of ways) {
    const at = form.headings.flatMap((heading, i) => (way(heading) ? [i] : []));
    if (at.length === 1) return at[0];
    if (at.length > 1)
      throw clash(
        form,
        role,
        at.map((i) => i + 1),
      );
  }
  const names = headingList(form);
  throw noSuchColumn(form, role, `"${from}"`, form.headingLine > 0 ? names : "a file without headings");
}

function scaleOf(
  form: TableForm,
  role: Role,
  index: number,
  text: string | null,
  units: ReadSettings["units"],
): Scale {
  const kind = roleKind[role];
  const unit = text === null ? null : unitOf(text);
  if (text === null || text === "" || unit?.kind === "fraction" || (kind === null && unit === null)) {
    if (text !== "%" || kind === null) return unit?.scale ?? unscaled;
  } else if (units === "SI" && unit && (kind === null || unit.kind === kind)) {
    return unit.scale;
  }
  throw new ReductionFailure(
    "ambiguous-columns",
    {
      message: `The unit of column "${form.headings[index].name || index + 1}", read as ${role}, does not fit`,
      found: `${text}`,
      expected:
        units === "SI" && kind !== null
          ? `a unit as ${caseUnit[kind]}`
          : "no unit: the case is non-dimensional",
      remedy: `Give the unit in the sheet under columns.${role}, or choose another column.`,
    },
    { file: form.file, ...(form.headingLine > 0 ? { line: form.headingLine } : {}), column: index + 1 },
  );
}

function clash(form: TableForm, role: Role, columns: readonly number[]): ReductionFailure {
  return new ReductionFailure(
    "ambiguous-columns",
    {
      message: `Several columns could be ${role}`,
      found: columns.map((column) => form.headings[column - 1].text || `column ${column}`).join(", "),
      expected: "one column",
      remedy: `Name the column meant under columns.${role}.`,
    },
    { file: form.file, line: form.headingLine || form.firstLine, column: columns[0] },
  );
}

function noSuchColumn(form: TableForm, role: Role, wanted: string, there: string): ReductionFailure {
  return new ReductionFailure(
    "ambiguous-columns",
    {
      message: `There is no ${wanted} to be read as ${role}`,
      found: there,
      remedy: `Mend columns.${role}: a heading of the file, or a column number from 1.`,
    },
    { file: form.file, line: form.headingLine || form.firstLine },
  );
}
