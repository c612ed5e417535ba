import type { SheetBody } from "./caseSheet.ts";
import type { BodyEdit, Workspace } from "./workspace.ts";

/** A body that stands nowhere yet needs its position first: other edits leave it out. */
export function setBody(workspace: Workspace, { caseId, body }: BodyEdit): Workspace {
  return onBodies(workspace, (before, id) => {
    if (caseId !== null && id !== caseId) return before;
    if (body === null) return null;
    const standing =
      before ?? (body.x === undefined ? null : { x: body.x, chord: null, Tu: null, L11: null });
    return standing === null ? null : { ...standing, ...body };
  });
}

/** One marker stands for the bodies of all cases: those that stand where it stood go along, others keep their distance. */
export function moveBody(workspace: Workspace, { from, to }: { from: number; to: number }): Workspace {
  return onBodies(workspace, (before) => {
    if (before === null) return null;
    // twelve digits: the sum of two decimal numbers is to be a decimal number again
    const x = before.x === from ? to : Number((before.x + (to - from)).toPrecision(12));
    return { ...before, x };
  });
}

/** The same workspace where no body changes. */
function onBodies(
  workspace: Workspace,
  edit: (before: SheetBody | null, caseId: string) => SheetBody | null,
): Workspace {
  const cases = workspace.cases.map((each) => {
    const body = edit(each.sheet.body, each.id);
    return sameBody(body, each.sheet.body) ? each : { ...each, sheet: { ...each.sheet, body } };
  });
  return cases.every((each, i) => each === workspace.cases[i]) ? workspace : { ...workspace, cases };
}

function sameBody(a: SheetBody | null, b: SheetBody | null): boolean {
  if (a === null || b === null) return a === b;
  return a.x === b.x && a.chord === b.chord && a.Tu === b.Tu && a.L11 === b.L11;
}
