import { describe, expect, it } from "vitest";
import { changeWorkspace, emptyWorkspace } from "../../src/sheet/changeWorkspace.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";
import type { Workspace, WorkspaceChange } from "../../src/sheet/workspace.ts";

const changed = (changes: readonly WorkspaceChange[], from: Workspace = emptyWorkspace) =>
  changes.reduce(changeWorkspace, from);
const two = changed([
  {
    kind: "add-cases",
    cases: ["a", "b"].map((id) => ({
      id,
      sheet: { ...defaultCaseSheet, case: id },
      fromSheet: false,
      sources: [],
    })),
  },
]);
const set = (body: Extract<WorkspaceChange, { kind: "set-body" }>["body"], caseId: string | null = null) =>
  ({ kind: "set-body", caseId, body }) as const;
const bodies = ({ cases }: Workspace) => cases.map(({ sheet }) => sheet.body);

describe("a body", () => {
  it("stands at one place in all cases, or in one alone", () => {
    const alike = changed([set({ x: 0.9 })], two);
    expect(bodies(alike).map((body) => body?.x)).toEqual([0.9, 0.9]);
    expect(bodies(changed([set({ x: 1.2 }, "b")], alike)).map((body) => body?.x)).toEqual([0.9, 1.2]);
  });
  it("keeps what is not edited, and is gone from every sheet when it is taken away", () => {
    const whole = changed([set({ x: 0.9, chord: 0.1 }), set({ Tu: 0.025 }), set({ x: 1 })], two);
    expect(bodies(whole)[1]).toEqual({ x: 1, chord: 0.1, Tu: 0.025, L11: null });
    expect(bodies(changed([set(null)], whole))).toEqual([null, null]);
  });
  it("that stands nowhere has no targets", () => {
    expect(changed([set({ Tu: 0.025 })], two)).toBe(two);
  });
  it("moves with the marker: what stood apart keeps its distance, in decimal numbers", () => {
    const apart = changed([set({ x: 0.9 }), set({ x: 1.2 }, "b")], two);
    const moved = changed([{ kind: "move-body", from: 0.9, to: 1.05 }], apart);
    expect(bodies(moved).map((body) => body?.x)).toEqual([1.05, 1.35]);
    expect(bodies(apart)[0]?.x).toBe(0.9);
  });
  it("that stays where it is leaves no step to be taken back", () => {
    const standing = changed([set({ x: 0.9 })], two);
    expect(changed([set({ x: 0.9 })], standing)).toBe(standing);
    expect(changed([{ kind: "move-body", from: 0.9, to: 0.9 }], standing)).toBe(standing);
  });
});
