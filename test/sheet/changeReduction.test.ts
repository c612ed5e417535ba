import { describe, expect, it } from "vitest";
import type { ReductionEdit } from "../../src/sheet/changeReduction.ts";
import { changeWorkspace, emptyWorkspace } from "../../src/sheet/changeWorkspace.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";
import type { Workspace } from "../../src/sheet/workspace.ts";

const start: Workspace = {
  ...emptyWorkspace,
  cases: ["a", "b"].map((id, mark) => ({
    ...{ id, mark, fromSheet: false, sources: [] },
    sheet: {
      ...defaultCaseSheet,
      case: id,
      reduce: { ...defaultCaseSheet.reduce, segment: id === "a" ? 4096 : null },
      fit: { ...defaultCaseSheet.fit, window: [0.3, 1.8], x0: 0.1 },
      body: { x: 1.2, chord: null, Tu: null, L11: null },
    },
  })),
  picked: [
    { caseId: "a", x: 0.3 },
    { caseId: "b", x: 0.3 },
  ],
};
const reducedBy = (caseId: string | null, edit: ReductionEdit) =>
  changeWorkspace(start, { kind: "set-reduction", caseId, edit });
const sheets = ({ cases }: Workspace) => cases.map(({ sheet }) => sheet);

describe("a choice of the reduction", () => {
  it("made for all cases leaves to each what was chosen for it alone", () => {
    const [a, b] = sheets(reducedBy(null, { reduce: { integralScale: "model" } }));
    expect([a.reduce.integralScale, b.reduce.integralScale]).toEqual(["model", "model"]);
    expect([a.reduce.segment, b.reduce.segment]).toEqual([4096, null]);
  });
  it("made for one case leaves the other as it was", () => {
    const [a, b] = sheets(reducedBy("b", { startup: 0.5, kind: "les" }));
    expect(a).toBe(start.cases[0].sheet);
    expect([b.startup, b.kind]).toEqual([0.5, "les"]);
  });
  it("that is made already changes nothing", () => {
    expect(reducedBy(null, { startup: 0, reduce: { correlation: "biased" } })).toBe(start);
  });
  it("of the zero of x moves window, origin, body and picks of its case to the same places in the flow", () => {
    const changed = reducedBy("a", { zero: 0.1 });
    const [{ fit, body }] = sheets(changed);
    expect([fit.window, fit.x0, body?.x]).toEqual([[0.2, 1.7], 0, 1.1]);
    expect(changed.picked).toEqual([
      { caseId: "a", x: 0.2 },
      { caseId: "b", x: 0.3 },
    ]);
  });
});
