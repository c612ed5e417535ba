import { assert, assertNever } from "../core/failure.ts";
import type { CaseSheet } from "./caseSheet.ts";
import { moveBody, setBody } from "./changeBody.ts";
import { setReduction } from "./changeReduction.ts";
import type { AddedFiles, Workspace, WorkspaceCase, WorkspaceChange } from "./workspace.ts";

export const emptyWorkspace: Workspace = { schema: 1, title: "", cases: [], axis: "x", picked: [] };

/**
 * The workspace after one change; the one before is left as it was, and is returned itself where the change
 * changes nothing. Marks are given in the order of arrival, the lowest free one, and kept for a case's life.
 */
export function changeWorkspace(workspace: Workspace, change: WorkspaceChange): Workspace {
  switch (change.kind) {
    case "add-cases":
      return addCases(workspace, change.cases);
    case "add-files":
      return addFiles(workspace, change);
    case "remove-case":
      return removeCase(workspace, change.caseId);
    case "edit-sheet":
      return editSheet(workspace, change.caseId, change.edit);
    case "edit-every-sheet":
      return onSheet(workspace, null, (sheet) => ({ ...sheet, ...change.edit }));
    case "set-window":
      return onFit(workspace, change.caseId, { window: change.window });
    case "hold-origin":
      return onFit(workspace, change.caseId, { x0: change.x0 });
    case "hold-exponent":
      return onFit(workspace, change.caseId, { n: change.n });
    case "set-body":
      return setBody(workspace, change);
    case "move-body":
      return moveBody(workspace, change);
    case "set-reduction":
      return setReduction(workspace, change);
    case "place-file":
      return placeFile(workspace, change.caseId, change.name, change.x);
    case "set-axis":
      return workspace.axis === change.axis ? workspace : { ...workspace, axis: change.axis };
    case "pick":
      return isPicked(workspace, change.station)
        ? workspace
        : { ...workspace, picked: [...workspace.picked, change.station] };
    case "unpick":
      return isPicked(workspace, change.station)
        ? { ...workspace, picked: workspace.picked.filter((each) => !sameStation(each, change.station)) }
        : workspace;
    case "set-title":
      return workspace.title === change.title ? workspace : { ...workspace, title: change.title };
    case "clear":
      return emptyWorkspace;
    default:
      return assertNever(change);
  }
}

/** A case that is there already (by its id) is not added again. */
function addCases(workspace: Workspace, added: readonly Omit<WorkspaceCase, "mark">[]): Workspace {
  const cases = [...workspace.cases];
  for (const each of added) {
    if (cases.some(({ id }) => id === each.id)) continue;
    cases.push({ ...each, mark: lowestFree(cases.map(({ mark }) => mark)) });
  }
  return cases.length === workspace.cases.length ? workspace : { ...workspace, cases };
}

function addFiles(workspace: Workspace, { caseId, files, sources }: AddedFiles): Workspace {
  assert(files.length === sources.length, "every entry of a sheet needs its source");
  if (files.length === 0 || !workspace.cases.some(({ id }) => id === caseId)) return workspace;
  const cases = workspace.cases.map((each) =>
    each.id === caseId
      ? {
          ...each,
          sheet: { ...each.sheet, files: [...each.sheet.files, ...files] },
          sources: [...each.sources, ...sources],
        }
      : each,
  );
  return { ...workspace, cases };
}

function lowestFree(taken: readonly number[]): number {
  let mark = 0;
  while (taken.includes(mark)) mark++;
  return mark;
}

function removeCase(workspace: Workspace, caseId: string): Workspace {
  if (!workspace.cases.some(({ id }) => id === caseId)) return workspace;
  return {
    ...workspace,
    cases: workspace.cases.filter(({ id }) => id !== caseId),
    picked: workspace.picked.filter((station) => station.caseId !== caseId),
  };
}

/** A case that is given another name is still the one that the others are held against. */
function editSheet(workspace: Workspace, caseId: string, edit: Partial<CaseSheet>): Workspace {
  const before = workspace.cases.find(({ id }) => id === caseId)?.sheet.case;
  const edited = onSheet(workspace, caseId, (sheet) => ({ ...sheet, ...edit }));
  const name = edit.case;
  if (name === undefined || name === before) return edited;
  return onSheet(edited, null, (sheet) =>
    sheet.compare.against !== null && sheet.compare.against === before
      ? { ...sheet, compare: { ...sheet.compare, against: name } }
      : sheet,
  );
}

/** Changes the sheet of one case (null: of all). */
function onSheet(
  workspace: Workspace,
  caseId: string | null,
  edit: (sheet: CaseSheet, of: WorkspaceCase) => CaseSheet,
): Workspace {
  if (caseId !== null && !workspace.cases.some(({ id }) => id === caseId)) return workspace;
  const cases = workspace.cases.map((each) =>
    caseId === null || each.id === caseId ? { ...each, sheet: edit(each.sheet, each) } : each,
  );
  return { ...workspace, cases };
}

function onFit(workspace: Workspace, caseId: string, fit: Partial<CaseSheet["fit"]>): Workspace {
  return onSheet(workspace, caseId, (sheet) => ({ ...sheet, fit: { ...sheet.fit, ...fit } }));
}

/** The file is known by its name in the drop or by its path in the sheet. */
function placeFile(workspace: Workspace, caseId: string, name: string, x: number | null): Workspace {
  return onSheet(workspace, caseId, (sheet, { sources }) => ({
    ...sheet,
    files: sheet.files.map((file, i) =>
      (sources[i] ? sources[i].name === name : file.path === name) ? { ...file, x } : file,
    ),
  }));
}

const sameStation = (a: Workspace["picked"][number], b: Workspace["picked"][number]) =>
  a.caseId === b.caseId && a.x === b.x;

function isPicked(workspace: Workspace, station: Workspace["picked"][number]): boolean {
  return workspace.picked.some((each) => sameStation(each, station));
}
