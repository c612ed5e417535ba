import { type PlainFailure, ReductionFailure } from "../core/failure.ts";
import type { Preview } from "../core/records.ts";
import { caseFromFiles } from "./caseFromFiles.ts";
import type { DropPlan, LeftOut, PlannedCase } from "./dropPlan.ts";
import { folderOf, naturalOrder } from "./matchFiles.ts";
import { positionQuestions } from "./positionQuestions.ts";
import { parseJson, readCaseSheet } from "./readCaseSheet.ts";
import { sheetFiles } from "./sheetFiles.ts";

export interface DroppedName {
  /** Path in the drop. */
  readonly name: string;
  readonly bytes: number;
}
export interface DroppedText {
  readonly name: string;
  readonly text: string;
}
export type Previews = ReadonlyMap<string, Preview | PlainFailure>;

/**
 * What to do with a drop. Sheets make cases of the files they name; of the rest each top folder is a case, named
 * after it, and loose files are one. A folder in which a sheet names files makes no other case.
 * @param files    every file dropped, sheets included
 * @param sheets   the JSON files among them, with their text; one that is no case sheet is left out
 * @param previews first looks, by name; a file without one is taken on the word of its sheet
 */
export function planDrop(
  files: readonly DroppedName[],
  sheets: readonly DroppedText[],
  previews: Previews,
): DropPlan {
  const plan = {
    cases: [] as PlannedCase[],
    leftOut: [] as LeftOut[],
    failures: [] as PlainFailure[],
    warnings: [] as string[],
  };
  const texts = new Set(sheets.map(({ name }) => name));
  const names = files.map(({ name }) => name).filter((name) => !texts.has(name));
  const claimed = new Set<string>();
  const ordered = [...sheets].sort((a, b) => naturalOrder(withoutEnding(a.name), withoutEnding(b.name)));
  for (const sheet of ordered) planSheet(sheet, names, previews, plan, claimed);
  const settled = new Set([...claimed].map(topOf));
  for (const [folder, members] of byTop(names.filter((name) => !claimed.has(name)))) {
    if (settled.has(folder))
      plan.leftOut.push(...members.map((name) => ({ name, reason: "No case sheet names it." })));
    else planFolder(folder, members, previews, plan);
  }
  return { ...plan, cases: named(plan.cases, plan.warnings) };
}

/** "a.json" stands before "a-2.json", as its folder does: the full stop would sort behind the hyphen. */
const withoutEnding = (name: string) => name.replace(/\.[^./]*$/, "");

interface Draft {
  readonly cases: PlannedCase[];
  readonly leftOut: LeftOut[];
  readonly failures: PlainFailure[];
  readonly warnings: string[];
}

function planSheet(
  { name, text }: DroppedText,
  names: readonly string[],
  previews: Previews,
  plan: Draft,
  claimed: Set<string>,
): void {
  try {
    if (!isSheet(parseJson(text, name))) {
      plan.leftOut.push({ name, reason: "It is JSON and no case sheet." });
      return;
    }
    const { sheet, warnings } = readCaseSheet(text, name);
    plan.warnings.push(...warnings);
    const found = sheetFiles(sheet, name, names);
    plan.failures.push(...found.failures);
    for (const each of found.names) claimed.add(each);
    if (found.names.length === 0) return;
    const complete = { ...sheet, files: found.files };
    const questions = positionQuestions(complete, found.names, previews);
    plan.cases.push({ sheet: complete, sheetName: name, fromSheet: true, names: found.names, questions });
  } catch (error) {
    if (!(error instanceof ReductionFailure)) throw error;
    plan.failures.push(error.plain());
  }
}

/** Two of the three keys that a sheet must have: the third may have been forgotten, and that is to be said. */
function isSheet(value: unknown): boolean {
  if (value === null || typeof value !== "object" || Array.isArray(value)) return false;
  return ["case", "layout", "files"].filter((key) => Object.hasOwn(value, key)).length >= 2;
}

function planFolder(folder: string, members: readonly string[], previews: Previews, plan: Draft): void {
  const made = caseFromFiles(folder, [...members].sort(naturalOrder), previews);
  plan.leftOut.push(...made.leftOut);
  if (made.case) plan.cases.push(made.case);
}

/** The top folder of a path; "" for a loose file. */
function topOf(name: string): string {
  return folderOf(name) === "" ? "" : name.slice(0, name.indexOf("/"));
}

function byTop(names: readonly string[]): Map<string, string[]> {
  const folders = new Map<string, string[]>();
  for (const name of names) {
    const members = folders.get(topOf(name));
    if (members) members.push(name);
    else folders.set(topOf(name), [name]);
  }
  return folders;
}

/** Results are told apart by the case's name, so a second case of one name gets a number. */
function named(cases: readonly PlannedCase[], warnings: string[]): PlannedCase[] {
  const taken = new Set<string>();
  return cases.map((each) => {
    const wanted = each.sheet.case;
    let name = wanted;
    for (let i = 2; taken.has(name); i++) name = `${wanted} (${i})`;
    taken.add(name);
    if (name === wanted) return each;
    warnings.push(`Two cases are called ${wanted}; the second is called ${name} here.`);
    return { ...each, sheet: { ...each.sheet, case: name } };
  });
}
