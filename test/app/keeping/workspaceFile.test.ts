import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { isWorkspaceFile } from "../../../src/app/keeping/isWorkspaceFile.ts";
import { keptPage, withOpened } from "../../../src/app/keeping/keptPage.ts";
import { numbersFromJson, numbersToJson } from "../../../src/app/keeping/numbersJson.ts";
import { readWorkspaceText, workspaceText } from "../../../src/app/keeping/workspaceFile.ts";
import { undo } from "../../../src/app/session/history.ts";
import type { Held } from "../../../src/app/session/session.ts";
import { ReductionFailure } from "../../../src/core/failure.ts";
import { defaultCaseSheet } from "../../../src/sheet/defaultCaseSheet.ts";
import { stationAt } from "../fixtures.ts";

describe("JSON of numbers", () => {
  it("keeps every bit of every double, in arrays and alone", () => {
    fc.assert(
      fc.property(fc.array(fc.double()), fc.double({ noNaN: true }), (values, alone) => {
        const back = numbersFromJson(numbersToJson({ values: Float64Array.from(values), alone, note: "a" }));
        expect(back).toEqual({ values: Float64Array.from(values), alone, note: "a" });
        expect(Object.is((back as { alone: number }).alone, alone)).toBe(true);
      }),
      { seed: 5, numRuns: 300 },
    );
  });
  it("holds arrays longer than a call has arguments", () => {
    const values = Float64Array.from({ length: 200_000 }, (_, i) => Math.sin(i));
    expect(numbersFromJson(numbersToJson([values]))).toEqual([values]);
  });
});

const held: Held = {
  history: {
    past: [],
    present: {
      schema: 1,
      title: "",
      axis: "x",
      picked: [{ caseId: "a-1", x: 0.3 }],
      cases: [
        {
          id: "a-1",
          mark: 0,
          sheet: { ...defaultCaseSheet, case: "screen", files: [{ path: "x0300.csv", x: 0.3 }] },
          fromSheet: false,
          sources: [{ name: "x0300.csv", bytes: 10, fingerprint: "p" }],
        },
      ],
    },
    future: [],
  },
  files: [],
  previews: [],
  reductions: {
    "a-1": { key: "k", stations: [stationAt(0.3)], sources: [], flags: [], failures: [], complete: true },
  },
  aside: { leftOut: [], failures: [], warnings: [] },
  argued: null,
};
const text = workspaceText(keptPage(held));

describe("a workspace file", () => {
  it("gives back what was decided and what was found, under names of its own", () => {
    const page = readWorkspaceText(text, "w.json", "new");
    const { cases, picked } = page.history.present;
    expect(cases[0]).toEqual({ ...held.history.present.cases[0], id: "new-a-1" });
    expect(picked).toEqual([{ caseId: "new-a-1", x: 0.3 }]);
    expect(page.reductions["new-a-1"]).toEqual(held.reductions["a-1"]);
  });

  it("is known by its beginning, and no case sheet is taken for one", async () => {
    expect(await isWorkspaceFile(new Blob([text]))).toBe(true);
    expect(await isWorkspaceFile(new Blob([JSON.stringify({ case: "a", kind: "waneline workspace" })]))).toBe(
      false,
    );
  });

  it("that an earlier version saved gets the defaults of keys that have come since", () => {
    const earlier = text.replace(/"coordinate":"auto",?/, "").replace(/"startup":0,?/, "");
    expect(earlier).not.toBe(text);
    const { sheet } = readWorkspaceText(earlier, "w.json", "new").history.present.cases[0];
    expect(sheet).toEqual(held.history.present.cases[0].sheet);
  });

  it.each([
    ["cut", text.slice(0, text.length / 2), /ends or is broken/],
    ["of a later schema", text.replace('"schema":1', '"schema":99'), /schema 99/],
    ["without its cases", text.replace('"workspace":', '"works":'), /missing or of another kind/],
    ["with a sheet that none could be", text.replace('"startup":0', '"startup":"soon"'), /startup|sheet/],
  ])("%s is refused with its name, and nothing else happens", (_, damaged, why) => {
    try {
      readWorkspaceText(damaged, "w.json", "new");
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(ReductionFailure);
      const { message, facts, where } = error as ReductionFailure;
      expect(`${message} ${facts.found}`).toMatch(why);
      expect(where.file).toBe("w.json");
    }
  });

  it("opened on a page takes its place in one step, and undo brings back what stood there", () => {
    const after = withOpened(held, readWorkspaceText(text, "w.json", "new"));
    expect(after.history.present.cases.map(({ id }) => id)).toEqual(["new-a-1"]);
    expect(undo(after.history).present).toBe(held.history.present);
    expect(Object.keys(after.reductions).sort()).toEqual(["a-1", "new-a-1"]);
  });
});
