import { describe, expect, it } from "vitest";
import { changeWorkspace, emptyWorkspace } from "../../src/sheet/changeWorkspace.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";
import type { Workspace, WorkspaceCase, WorkspaceChange } from "../../src/sheet/workspace.ts";

const made = (id: string): Omit<WorkspaceCase, "mark"> => ({
  id,
  sheet: {
    ...defaultCaseSheet,
    case: id,
    files: [
      { path: "x1.csv", x: null },
      { path: "x2.csv", x: 2 },
    ],
  },
  fromSheet: false,
  sources: [
    { name: `${id}/x1.csv`, bytes: 1, fingerprint: "1" },
    { name: `${id}/x2.csv`, bytes: 1, fingerprint: "2" },
  ],
});
const add = (...ids: string[]): WorkspaceChange => ({ kind: "add-cases", cases: ids.map(made) });

/** Frozen through and through: a change that wrote into the value before it would throw. */
function frozen<T>(value: T): T {
  if (value !== null && typeof value === "object") {
    for (const inner of Object.values(value)) frozen(inner);
    Object.freeze(value);
  }
  return value;
}
const changed = (changes: readonly WorkspaceChange[], from: Workspace = emptyWorkspace) =>
  changes.reduce((workspace, change) => frozen(changeWorkspace(workspace, frozen(change))), frozen(from));
const marks = ({ cases }: Workspace) => cases.map(({ id, mark }) => [id, mark]);

describe("a case's mark", () => {
  it("is the lowest free one when the case arrives", () => {
    expect(marks(changed([add("a", "b"), add("c")]))).toEqual([
      ["a", 0],
      ["b", 1],
      ["c", 2],
    ]);
  });
  it("is kept for life, and given again only when its case has gone", () => {
    const workspace = changed([add("a", "b", "c"), { kind: "remove-case", caseId: "b" }, add("d", "e")]);
    expect(marks(workspace)).toEqual([
      ["a", 0],
      ["c", 2],
      ["d", 1],
      ["e", 3],
    ]);
  });
  it("stays when the same case is added again", () => {
    const before = changed([add("a")]);
    expect(changed([add("a")], before)).toBe(before);
  });
});

describe("a change", () => {
  const start = changed([add("a", "b")]);
  it.each<[WorkspaceChange, (workspace: Workspace) => unknown, unknown]>([
    [
      { kind: "set-window", caseId: "a", window: [1, 2] },
      ({ cases }) => cases.map(({ sheet }) => sheet.fit.window),
      [[1, 2], "auto"],
    ],
    [
      { kind: "hold-origin", caseId: "b", x0: 0.1 },
      ({ cases }) => cases.map(({ sheet }) => sheet.fit.x0),
      [null, 0.1],
    ],
    [
      { kind: "hold-exponent", caseId: "a", n: 1.2 },
      ({ cases }) => cases.map(({ sheet }) => sheet.fit.n),
      [1.2, null],
    ],
    [
      { kind: "place-file", caseId: "a", name: "a/x1.csv", x: 0.4 },
      ({ cases }) => cases[0].sheet.files.map(({ x }) => x),
      [0.4, 2],
    ],
    [
      { kind: "edit-sheet", caseId: "a", edit: { case: "screen" } },
      ({ cases }) => cases.map(({ sheet }) => sheet.case),
      ["screen", "b"],
    ],
    [
      { kind: "edit-every-sheet", edit: { kinematicViscosity: 1 } },
      ({ cases }) => cases.map(({ sheet }) => sheet.kinematicViscosity),
      [1, 1],
    ],
    [{ kind: "set-axis", axis: "x/ell" }, ({ axis }) => axis, "x/ell"],
    [{ kind: "set-title", title: "duct" }, ({ title }) => title, "duct"],
    [{ kind: "pick", station: { caseId: "a", x: 1 } }, ({ picked }) => picked, [{ caseId: "a", x: 1 }]],
    [{ kind: "clear" }, (workspace) => workspace, emptyWorkspace],
  ])("%j does what it says and leaves the value before as it was", (change, look, expected) => {
    const copy = structuredClone(start);
    expect(look(changed([change], start))).toEqual(expected);
    expect(start).toEqual(copy);
  });
  it.each<WorkspaceChange>([
    { kind: "remove-case", caseId: "gone" },
    { kind: "set-window", caseId: "gone", window: "auto" },
    { kind: "set-axis", axis: "x" },
    { kind: "unpick", station: { caseId: "a", x: 9 } },
  ])("%j that changes nothing returns the value itself", (change) => {
    expect(changeWorkspace(start, change)).toBe(start);
  });
  it("that removes a case takes its picked stations with it", () => {
    const picked = changed(
      [
        { kind: "pick", station: { caseId: "a", x: 1 } },
        { kind: "pick", station: { caseId: "b", x: 1 } },
        { kind: "pick", station: { caseId: "b", x: 1 } },
        { kind: "remove-case", caseId: "a" },
      ],
      start,
    );
    expect(picked.picked).toEqual([{ caseId: "b", x: 1 }]);
    expect(changed([{ kind: "unpick", station: { caseId: "b", x: 1 } }], picked).picked).toEqual([]);
  });
});
