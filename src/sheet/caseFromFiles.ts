import type { PlainFailure } from "../core/failure.ts";
import type { Preview, Role } from "../core/records.ts";
import type { CaseSheet } from "./caseSheet.ts";
import { defaultCaseSheet } from "./defaultCaseSheet.ts";
import type { LeftOut, PlannedCase, Question } from "./dropPlan.ts";
import type { Previews } from "./planDrop.ts";
import { positionQuestions } from "./positionQuestions.ts";

/**
 * A case made of files that no sheet names: layout and coordinate as recognised, all else by default or asked.
 * Files that are no record, or of another layout than most, are left out with the reason.
 * @param folder the top folder they lie in; "" for loose files
 * @param names  their paths in the drop
 */
export function caseFromFiles(
  folder: string,
  names: readonly string[],
  previews: Previews,
): { readonly case: PlannedCase | null; readonly leftOut: readonly LeftOut[] } {
  const leftOut: LeftOut[] = [];
  const tables: Preview[] = [];
  for (const name of names) {
    const preview = previews.get(name);
    if (preview && !("code" in preview)) tables.push(preview);
    else leftOut.push({ name, reason: preview ? reasonOf(preview) : "It was not looked at." });
  }
  const recognised = tables.filter(isRecognised);
  const candidates = recognised.length > 0 ? recognised : tables;
  const layout = commonLayout(candidates);
  const members = candidates.filter((table) => table.layout === layout);
  for (const table of tables) {
    if (!members.includes(table)) leftOut.push({ name: table.file, reason: whyNot(table, layout) });
  }
  if (members.length === 0) return { case: null, leftOut };
  return { case: planned(folder, layout, members, previews), leftOut };
}

function planned(
  folder: string,
  layout: CaseSheet["layout"],
  members: readonly Preview[],
  previews: Previews,
): PlannedCase {
  const names = members.map(({ file }) => file);
  const path = (name: string) => (folder === "" ? name : name.slice(folder.length + 1));
  const inTime = layout === "profile" && !has(members[0], "x") && has(members[0], "t");
  const sheet: CaseSheet = {
    ...defaultCaseSheet,
    case: folder || commonName(names),
    layout,
    along: inTime ? "t" : "x",
    files: names.map((name) => ({ path: path(name), x: null })),
  };
  const unclear: Question[] = members
    .filter((table) => !isRecognised(table))
    .map(({ file }) => ({ key: "columns", file }));
  const general = ["case", "kinematicViscosity", "reference.length", "reference.speed"] as const;
  const questions = [
    ...general.map((key) => ({ key })),
    ...unclear,
    ...positionQuestions(sheet, names, previews),
  ];
  return { sheet, sheetName: null, fromSheet: false, names, questions };
}

const carrying: readonly Role[] = ["u", "uu", "vv", "ww", "u_rms", "v_rms", "w_rms", "q"];

function isRecognised({ columns }: Preview): boolean {
  return columns.some(({ role }) => role !== null && carrying.includes(role));
}

function has({ columns }: Preview, role: Role): boolean {
  return columns.some((column) => column.role === role);
}

/** The layout of most files; where they are even, series before lines before profile. */
function commonLayout(tables: readonly Preview[]): CaseSheet["layout"] {
  const count = (layout: CaseSheet["layout"]) => tables.filter((table) => table.layout === layout).length;
  const layouts = ["series", "lines", "profile"] as const;
  return layouts.reduce((most, layout) => (count(layout) > count(most) ? layout : most));
}

const layoutNames = {
  series: ["a time series", "time series"],
  lines: ["a table of lines", "tables of lines"],
  profile: ["a profile", "profiles"],
} as const;

function whyNot(table: Preview, layout: CaseSheet["layout"]): string {
  if (isRecognised(table)) {
    return `It is ${layoutNames[table.layout][0]} among ${layoutNames[layout][1]}: drop it in a folder of its own.`;
  }
  const headings = table.columns.map(({ heading }) => heading).filter((heading) => heading !== "");
  const seen = headings.length > 0 ? `its headings are ${headings.join(", ")}` : "it has no headings";
  return `No velocity was recognised in it; ${seen}.`;
}

function reasonOf({ message, found }: PlainFailure): string {
  return `${message}${found === undefined ? "" : ` (found ${found})`}.`;
}

/** What loose files have in common at the beginning of their names: `run_x0200.csv`, `run_x0400.csv` -> `run`. */
function commonName(names: readonly string[]): string {
  const stems = names.map((name) => name.replace(/(?:\.[A-Za-z][A-Za-z0-9]*)+$/, ""));
  let shared = stems[0];
  for (const stem of stems) while (!stem.startsWith(shared)) shared = shared.slice(0, -1);
  const tidy = shared
    .replace(/(?:[\s_.=-]|(?<![A-Za-z])[xX](?=[\d._=-]*$)|\d)+$/, "")
    .replace(/^[\s_.-]+/, "");
  return tidy.length > 1 ? tidy : "case";
}
