import type { SourceFile } from "../../engine/protocol.ts";
import type { DropPlan, LeftOut, PlannedCase } from "../../sheet/dropPlan.ts";
import type { AddedFiles, WorkspaceCase, WorkspaceSource } from "../../sheet/workspace.ts";

/** A drop's cases beside those that are here: new ones, files that join one, and what is to be said of it. */
export interface JoinedCases {
  readonly cases: readonly Omit<WorkspaceCase, "mark">[];
  readonly additions: readonly AddedFiles[];
  readonly leftOut: readonly LeftOut[];
  readonly warnings: readonly string[];
}

/**
 * A folder that was dropped before brings further files to the case it made, where that has the same layout and
 * no sheet of its own; a file that is here already is left out. Any other case of a name that is taken gets a
 * number: a file with a known name and another content makes it another record, not a further one.
 * @param drop tells the cases of this drop from those of others
 */
export function joinCases(
  { cases: planned, leftOut, warnings }: DropPlan,
  here: readonly WorkspaceCase[],
  byName: ReadonlyMap<string, SourceFile>,
  drop: string,
): JoinedCases {
  const out = {
    cases: [] as Omit<WorkspaceCase, "mark">[],
    additions: [] as AddedFiles[],
    leftOut: [...leftOut],
    warnings: [...warnings],
  };
  const taken = here.map(({ sheet }) => sheet.case);
  for (const [i, one] of planned.entries()) {
    const sources = sourcesOf(one, byName);
    const home = here.find((each) => isHome(each, one, sources));
    if (home) {
      join(home, one, sources, out);
      continue;
    }
    const name = freeName(one.sheet.case, taken);
    if (name !== one.sheet.case)
      out.warnings.push(`A case ${one.sheet.case} is here already; the one dropped now is called ${name}.`);
    taken.push(name);
    const { sheet, fromSheet } = one;
    out.cases.push({ id: `${drop}-${i + 1}`, sheet: { ...sheet, case: name }, fromSheet, sources });
  }
  return out;
}

function join(
  home: WorkspaceCase,
  { sheet }: PlannedCase,
  sources: readonly WorkspaceSource[],
  out: { additions: AddedFiles[]; leftOut: LeftOut[]; warnings: string[] },
): void {
  const known = new Set(home.sources.map(({ name }) => name));
  const fresh = sources.map(({ name }) => !known.has(name));
  for (const { name } of sources.filter((_, i) => !fresh[i]))
    out.leftOut.push({ name, reason: `It is in ${home.sheet.case} already.` });
  const added = {
    caseId: home.id,
    files: sheet.files.filter((_, i) => fresh[i]),
    sources: sources.filter((_, i) => fresh[i]),
  };
  if (added.sources.length === 0) return;
  out.additions.push(added);
  const count = added.sources.length;
  const what = count === 1 ? added.sources[0].name : `${count} files`;
  out.warnings.push(
    `The folder of ${home.sheet.case} was dropped again: ${what} ${count === 1 ? "was" : "were"} added to that case.`,
  );
}

/** Whether a case here was made of the same folder, and holds none of these names with another content. */
function isHome(
  { sheet, fromSheet, sources }: WorkspaceCase,
  one: PlannedCase,
  dropped: readonly WorkspaceSource[],
): boolean {
  const folder = topOf(dropped[0]?.name ?? "");
  if (folder === "" || fromSheet || one.fromSheet || sheet.layout !== one.sheet.layout) return false;
  const prints = new Map(sources.map(({ name, fingerprint }) => [name, fingerprint]));
  return (
    sources.every(({ name }) => topOf(name) === folder) &&
    dropped.every(({ name, fingerprint }) => (prints.get(name) ?? fingerprint) === fingerprint)
  );
}

const topOf = (name: string) => (name.includes("/") ? name.slice(0, name.indexOf("/")) : "");

/** One for each entry of the sheet's files. */
function sourcesOf({ names }: PlannedCase, byName: ReadonlyMap<string, SourceFile>): WorkspaceSource[] {
  return names.flatMap((name) => {
    const source = byName.get(name);
    return source ? [{ name, bytes: source.bytes, fingerprint: source.fingerprint }] : [];
  });
}

/** Cases are told apart by their names. */
function freeName(wanted: string, taken: readonly string[]): string {
  let name = wanted;
  for (let i = 2; taken.includes(name); i++) name = `${wanted} (${i})`;
  return name;
}
