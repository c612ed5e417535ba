import type { CaseSheet, SheetRead, SheetReduce } from "./caseSheet.ts";
import type { Workspace, WorkspaceCase } from "./workspace.ts";

/** What decides how records are taken and reduced, and can be changed by hand. */
export interface ReductionEdit
  extends Partial<
    Pick<CaseSheet, "kind" | "zero" | "simultaneous" | "periodic" | "startup" | "extent" | "sensorLength">
  > {
  readonly reduce?: Partial<SheetReduce>;
  readonly read?: Partial<SheetRead>;
}
export interface ReductionChange {
  /** Null: every case alike. */
  readonly caseId: string | null;
  readonly edit: ReductionEdit;
}

/**
 * The workspace with one case (or every one) reduced otherwise; itself where that changes nothing. With the zero of x
 * move the positions that were set by hand, so that each stays at the place in the flow where it was set.
 */
export function setReduction(workspace: Workspace, { caseId, edit }: ReductionChange): Workspace {
  const cases = workspace.cases.map((each) =>
    caseId === null || each.id === caseId ? withReduction(each, edit) : each,
  );
  if (cases.every((each, i) => each === workspace.cases[i])) return workspace;
  const picked = workspace.picked.map((station) => {
    const i = cases.findIndex(({ id }) => id === station.caseId);
    const shift = i < 0 ? 0 : cases[i].sheet.zero - workspace.cases[i].sheet.zero;
    return shift === 0 ? station : { ...station, x: moved(station.x, shift) };
  });
  return { ...workspace, cases, picked };
}

function withReduction(of: WorkspaceCase, edit: ReductionEdit): WorkspaceCase {
  const { sheet } = of;
  const { reduce, read, ...plain } = edit;
  const next = {
    ...sheet,
    ...plain,
    reduce: { ...sheet.reduce, ...reduce },
    read: { ...sheet.read, ...read },
  };
  return JSON.stringify(next) === JSON.stringify(sheet)
    ? of
    : { ...of, sheet: shifted(next, next.zero - sheet.zero) };
}

function shifted(sheet: CaseSheet, shift: number): CaseSheet {
  if (shift === 0) return sheet;
  const { fit, body } = sheet;
  const [window, x0] = [fit.window, fit.x0];
  return {
    ...sheet,
    fit: {
      ...fit,
      window: window === "auto" ? window : [moved(window[0], shift), moved(window[1], shift)],
      x0: x0 === null ? null : moved(x0, shift),
    },
    body: body === null ? null : { ...body, x: moved(body.x, shift) },
  };
}

/** Twelve digits: the difference of two decimal numbers is to be a decimal number again, as stations' positions are. */
const moved = (x: number, shift: number) => Number((x - shift).toPrecision(12));
