import { describe, expect, it } from "vitest";
import { againstWarning } from "../../src/sheet/againstWarning.ts";
import type { CaseSheet } from "../../src/sheet/caseSheet.ts";
import { changeWorkspace, emptyWorkspace } from "../../src/sheet/changeWorkspace.ts";
import { compareSettings } from "../../src/sheet/compareSettings.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";

const sheet = (name: string, against: string | null): CaseSheet => ({
  ...defaultCaseSheet,
  case: name,
  compare: { ...defaultCaseSheet.compare, against },
});

describe("the case that all others are held against", () => {
  it("may be any of the cases, and is warned of where it is none", () => {
    const cases = [sheet("screen", "inflow"), sheet("inflow", null)];
    expect(againstWarning(cases, "a.json")).toBeNull();
    expect(againstWarning(cases.slice(0, 1), "a.json")).toBe(
      'a.json: key compare.against names "inflow", and the cases are "screen"; they were compared with the first',
    );
    expect(againstWarning([], "a.json")).toBeNull();
  });
  it("is the same case under another name", () => {
    const added = changeWorkspace(emptyWorkspace, {
      kind: "add-cases",
      cases: ["screen", "inflow"].map((name) => ({
        id: name,
        sheet: sheet(name, "inflow"),
        fromSheet: true,
        sources: [],
      })),
    });
    const renamed = changeWorkspace(added, {
      kind: "edit-sheet",
      caseId: "inflow",
      edit: { case: "synthetic" },
    });
    expect(renamed.cases.map((each) => each.sheet.compare.against)).toEqual(["synthetic", "synthetic"]);
    const other = changeWorkspace(added, { kind: "edit-sheet", caseId: "screen", edit: { case: "mesh" } });
    expect(other.cases.map((each) => each.sheet.compare.against)).toEqual(["inflow", "inflow"]);
  });
});

describe("a sheet that was kept from before a choice came in", () => {
  it("has the default of that choice", () => {
    const old = { ...defaultCaseSheet, compare: { align: "Tu", tolerance: 0.2 } } as unknown as CaseSheet;
    expect(compareSettings(old)).toEqual({ ...defaultCaseSheet.compare, align: "Tu", tolerance: 0.2 });
  });
});
