import { describe, expect, it } from "vitest";
import { nextSession } from "../../../src/app/session/nextSession.ts";
import type { Held, Plan, Reduced, Session, Work } from "../../../src/app/session/session.ts";
import type { PlainFailure } from "../../../src/core/failure.ts";
import { sheet } from "../fixtures.ts";

const nothingAside = { leftOut: [], failures: [], warnings: [] };
const planOf = (...ids: string[]): Plan => ({
  cases: ids.map((id) => ({ id, sheet: { ...sheet, case: id }, fromSheet: false, sources: [] })),
  files: [],
  previews: [],
  aside: nothingAside,
});
const failure: PlainFailure = {
  code: "not-a-record",
  message: "holds no columns of numbers",
  remedy: "Leave it out",
  where: { file: "notes.txt" },
};
const work: Work = { key: "k", files: 2, filesDone: 0, bytes: 10, bytesDone: 0 };
const reduced: Reduced = { key: "k", stations: [], sources: [], flags: [], failures: [], complete: true };

const offered = (session: Session) => nextSession(session, { kind: "offered", files: 3, bytes: 30 });
const withCases = (...ids: string[]) =>
  nextSession(offered({ kind: "empty" }), { kind: "planned", plan: planOf(...ids) });
function heldIn(session: Session): Held {
  if (session.kind === "empty" || session.kind === "failed" || session.held === null)
    throw new Error(`nothing is held in ${session.kind}`);
  return session.held;
}
const names = (session: Session) => heldIn(session).history.present.cases.map(({ id }) => id);

describe("a session", () => {
  it("reads what is dropped on an empty page and is ready with its cases", () => {
    expect(offered({ kind: "empty" })).toMatchObject({ kind: "reading", held: null, offer: { files: 3 } });
    const session = withCases("screen");
    expect(session.kind).toBe("ready");
    expect(names(session)).toEqual(["screen"]);
  });

  it("fails only where nothing could be used and nothing was there before", () => {
    const aside = { ...nothingAside, failures: [failure] };
    const plan = { ...planOf(), aside };
    const session = nextSession(offered({ kind: "empty" }), { kind: "planned", plan });
    expect(session).toEqual({ kind: "failed", aside });
  });

  it("keeps what is loaded when a later drop holds nothing of use, and says why beside it", () => {
    const session = nextSession(offered(withCases("screen")), {
      kind: "planned",
      plan: { ...planOf(), aside: { ...nothingAside, failures: [failure] } },
    });
    expect(names(session)).toEqual(["screen"]);
    expect(heldIn(session).aside.failures).toEqual([failure]);
  });

  it("keeps the first case's mark when another joins", () => {
    const session = nextSession(offered(withCases("screen")), {
      kind: "planned",
      plan: planOf("simulation"),
    });
    expect(heldIn(session).history.present.cases.map(({ mark }) => mark)).toEqual([0, 1]);
  });

  it("is reducing until the last of its cases is in", () => {
    let session = withCases("screen", "simulation");
    session = nextSession(session, { kind: "started", caseId: "screen", work });
    session = nextSession(session, { kind: "started", caseId: "simulation", work });
    session = nextSession(session, { kind: "progressed", caseId: "screen", filesDone: 1, bytesDone: 4 });
    expect(session).toMatchObject({ kind: "reducing", work: { screen: { filesDone: 1, bytesDone: 4 } } });
    session = nextSession(session, { kind: "reduced", caseId: "screen", reduced });
    expect(session.kind).toBe("reducing");
    expect(heldIn(session).reductions.screen).toBe(reduced);
    expect(nextSession(session, { kind: "stopped", caseId: "simulation" }).kind).toBe("ready");
  });

  it("does not hear of a case's end twice", () => {
    const session = withCases("screen");
    expect(nextSession(session, { kind: "reduced", caseId: "screen", reduced })).toBe(session);
  });

  it("takes a change back and makes it again, also while records are being reduced", () => {
    let session = nextSession(withCases("screen"), { kind: "started", caseId: "screen", work });
    session = nextSession(session, {
      kind: "changed",
      change: { kind: "set-window", caseId: "screen", window: [0.3, 1.8] },
    });
    const windowOf = (at: Session) => heldIn(at).history.present.cases[0].sheet.fit.window;
    expect(windowOf(session)).toEqual([0.3, 1.8]);
    const back = nextSession(session, { kind: "undone" });
    expect(windowOf(back)).toBe("auto");
    expect(windowOf(nextSession(back, { kind: "redone" }))).toEqual([0.3, 1.8]);
  });

  it("has nothing to take back right after the first drop", () => {
    const session = withCases("screen");
    expect(names(nextSession(session, { kind: "undone" }))).toEqual(["screen"]);
  });

  it("makes no step of a change that changes nothing", () => {
    const session = nextSession(withCases("screen"), {
      kind: "changed",
      change: { kind: "set-axis", axis: "x" },
    });
    expect(heldIn(session).history.past).toHaveLength(0);
  });
});
