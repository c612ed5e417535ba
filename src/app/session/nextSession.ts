import { assertNever } from "../../core/failure.ts";
import { changeWorkspace, emptyWorkspace } from "../../sheet/changeWorkspace.ts";
import type { Workspace, WorkspaceChange } from "../../sheet/workspace.ts";
import { firstPicks } from "./firstPicks.ts";
import { advance, redo, startHistory, undo } from "./history.ts";
import type { Aside, Held, Offer, Plan, Reduced, Session, Work } from "./session.ts";
import type { SessionEvent } from "./sessionEvent.ts";
import { withKnownCases } from "./withKnownCases.ts";

/**
 * The session after an event; pure. An event that does not belong to the state it meets (an answer that
 * comes after its case was removed, say) leaves the session as it is.
 */
export function nextSession(session: Session, event: SessionEvent): Session {
  switch (event.kind) {
    case "offered":
      return offered(session, { files: event.files, looked: 0, bytes: event.bytes });
    case "looked":
      return session.kind === "reading"
        ? { ...session, offer: { ...session.offer, looked: event.looked } }
        : session;
    case "planned":
      return session.kind === "reading" ? planned(session.held, event.plan) : session;
    case "started":
      return withWork(session, event.caseId, event.work);
    case "progressed":
      return progressed(session, event);
    case "reduced":
      return settled(session, event.caseId, (held) => ({
        ...held,
        history: withFirstPicks(held, event.caseId, event.reduced),
        reductions: { ...held.reductions, [event.caseId]: event.reduced },
      }));
    case "stopped":
      return settled(session, event.caseId, (held) => held);
    case "changed":
      return withHistory(session, (held) =>
        advance(held.history, changeWorkspace(held.history.present, event.change)),
      );
    case "undone":
      return withHistory(session, (held) => undo(held.history));
    case "redone":
      return withHistory(session, (held) => redo(held.history));
    case "restored":
      // work that is under way goes on: it would tell of cases that are not there any more
      return session.kind === "reducing" ? session : { kind: "ready", held: event.held };
    case "argued":
      return withHeld(session, (held) => ({ ...held, argued: withKnownCases(held.argued, event.argued) }));
    default:
      return assertNever(event);
  }
}

/** What is loaded, in whatever state. */
export function heldOf(session: Session): Held | null {
  return session.kind === "empty" || session.kind === "failed" ? null : session.held;
}

/** A drop waits while records are being reduced: the shell offers it when they are. */
function offered(session: Session, offer: Offer): Session {
  return session.kind === "reading" || session.kind === "reducing"
    ? session
    : { kind: "reading", held: heldOf(session), offer };
}

/** Cases of a drop join those that are here; a drop without a case only leaves its reasons. */
function planned(held: Held | null, plan: Plan): Session {
  if (plan.cases.length === 0 && held === null) return { kind: "failed", aside: plan.aside };
  const before: Held = held ?? {
    history: startHistory<Workspace>(emptyWorkspace),
    files: [],
    previews: [],
    reductions: {},
    aside: { leftOut: [], failures: [], warnings: [] },
    argued: null,
  };
  const changes: WorkspaceChange[] = [
    ...(plan.additions ?? []).map((added) => ({ kind: "add-files" as const, ...added })),
    ...(plan.cases.length === 0 ? [] : [{ kind: "add-cases" as const, cases: plan.cases }]),
  ];
  const after = changes.reduce(changeWorkspace, before.history.present);
  const added = after === before.history.present ? before.history : advance(before.history, after);
  return {
    kind: "ready",
    held: {
      ...before,
      history: held === null ? startHistory(added.present) : added,
      files: [...before.files, ...plan.files],
      previews: [...before.previews, ...plan.previews],
      aside: joined(before.aside, plan.aside),
    },
  };
}

function joined(a: Aside, b: Aside): Aside {
  return {
    leftOut: [...a.leftOut, ...b.leftOut],
    failures: [...a.failures, ...b.failures],
    warnings: [...a.warnings, ...b.warnings],
  };
}

function withWork(session: Session, caseId: string, work: Work): Session {
  if (session.kind === "ready") return { kind: "reducing", held: session.held, work: { [caseId]: work } };
  if (session.kind !== "reducing") return session;
  return { ...session, work: { ...session.work, [caseId]: work } };
}

function progressed(
  session: Session,
  { caseId, filesDone, bytesDone, done }: Extract<SessionEvent, { kind: "progressed" }>,
): Session {
  if (session.kind !== "reducing" || !Object.hasOwn(session.work, caseId)) return session;
  const work = { ...session.work[caseId], filesDone, bytesDone, ...(done ? { done } : {}) };
  return { ...session, work: { ...session.work, [caseId]: work } };
}

/** A case's work has ended; with the last one the session is ready. */
function settled(session: Session, caseId: string, change: (held: Held) => Held): Session {
  if (session.kind !== "reducing") return session;
  const { [caseId]: ended, ...work } = session.work;
  if (ended === undefined) return session;
  const held = change(session.held);
  return Object.keys(work).length === 0 ? { kind: "ready", held } : { kind: "reducing", held, work };
}

/** A case that comes in for the first time brings two stations for the spectra; that is no step of undo. */
function withFirstPicks({ history, reductions }: Held, caseId: string, reduced: Reduced): Held["history"] {
  if (Object.hasOwn(reductions, caseId)) return history;
  const pick = (workspace: Workspace, x: number) =>
    changeWorkspace(workspace, { kind: "pick", station: { caseId, x } });
  return { ...history, present: firstPicks(reduced.stations).reduce(pick, history.present) };
}

function withHistory(session: Session, change: (held: Held) => Held["history"]): Session {
  return withHeld(session, (held) => ({ ...held, history: change(held) }));
}

function withHeld(session: Session, change: (held: Held) => Held): Session {
  if (session.kind === "empty" || session.kind === "failed") return session;
  return session.held === null ? session : { ...session, held: change(session.held) };
}
