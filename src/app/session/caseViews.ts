import type { DecayResult, DecaySettings } from "../../core/decayResult.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { decaySettings } from "../../sheet/decaySettings.ts";
import type { WorkspaceCase } from "../../sheet/workspace.ts";
import { caseKey } from "./caseKey.ts";
import type { CaseView } from "./caseView.ts";
import { fitNow } from "./fitNow.ts";
import type { Draft } from "./pageStore.ts";
import type { Argued, ArguedCase, Held, Reduced, Session, Work } from "./session.ts";
import { withBody } from "./withBody.ts";

/** Everything one view follows from. */
interface Ground {
  readonly of: WorkspaceCase;
  readonly reduced: Reduced | null;
  readonly argued: Argued | null;
  readonly draft: Draft | null;
  readonly work: Work | null;
}

/**
 * What a case was fitted from: results and settings. Equal keys, equal fits. A body and what development is asked to
 * keep to change no fit: they are seen to in withBody.
 */
export function fitKey(reduced: Reduced, settings: DecaySettings): string {
  const { body: _body, developmentTolerance: _tolerance, ...fitted } = settings;
  return `${reduced.key} ${reduced.stations.length} ${JSON.stringify(fitted)}`;
}

/**
 * The views of a session's cases. A view keeps its identity while its ground does, so that lanes and figures
 * of the other cases stand still while one is dragged. A case's fit is taken from the worker's argument where
 * that is up to date; a given window is fitted here, within the frame; an automatic one waits for the worker.
 */
export function createCaseViews(): (session: Session, drafts: readonly Draft[]) => readonly CaseView[] {
  const kept = new Map<string, { ground: Ground; view: CaseView }>();
  let last: readonly CaseView[] = [];
  return (session, drafts) => {
    const held = session.kind === "empty" || session.kind === "failed" ? null : session.held;
    if (held === null) return [];
    const views = held.history.present.cases.map((of) => {
      const ground = groundOf(of, held, session, drafts);
      const before = kept.get(of.id);
      if (before && sameGround(before.ground, ground)) return before.view;
      const view = viewOf(ground, before?.view ?? null);
      kept.set(of.id, { ground, view });
      return view;
    });
    if (views.length !== last.length || views.some((view, i) => view !== last[i])) last = views;
    return last;
  };
}

function groundOf(of: WorkspaceCase, held: Held, session: Session, drafts: readonly Draft[]): Ground {
  return {
    of,
    reduced: held.reductions[of.id] ?? null,
    argued: held.argued,
    draft: drafts.find((draft) => draft.caseId === of.id) ?? null,
    work: session.kind === "reducing" ? (session.work[of.id] ?? null) : null,
  };
}

function sameGround(a: Ground, b: Ground): boolean {
  return (
    a.of === b.of &&
    a.reduced === b.reduced &&
    a.draft === b.draft &&
    a.work === b.work &&
    a.argued?.keys[a.of.id] === b.argued?.keys[b.of.id]
  );
}

function viewOf({ of, reduced, argued, draft, work }: Ground, before: CaseView | null): CaseView {
  const { sheet } = of;
  const base = {
    id: of.id,
    name: sheet.case,
    mark: of.mark,
    length: sheet.reference.length,
    symbol: sheet.reference.symbol,
    units: sheet.units,
    along: sheet.along,
    of,
    reduced,
    argued: arguedLast(of, argued)?.decay ?? null,
    work,
  };
  if (reduced === null || reduced.stations.length === 0)
    return { ...base, stations: [], decay: null, stale: work !== null };
  // reduced with other settings, and its records may not be here to be reduced with these
  const late = work !== null || reduced.key !== caseKey(of);
  const settings = drafted(decaySettings(sheet), draft);
  const fit = fitOf(reduced, settings, of.id, argued, draft !== null);
  if (fit) return { ...base, ...fit, stale: late };
  // the worker is at it: what is known stays, and is marked where it belongs to other settings
  const known = before !== null && before.reduced === reduced && before.decay !== null;
  return known
    ? { ...base, stations: before.stations, decay: before.decay, stale: true }
    : { ...base, stations: reduced.stations, decay: null, stale: true };
}

function arguedLast({ id, sheet }: WorkspaceCase, argued: Argued | null): ArguedCase | null {
  const last = argued?.cases[id];
  return last ? withBody(last, decaySettings(sheet)) : null;
}

function fitOf(
  reduced: Reduced,
  settings: DecaySettings,
  caseId: string,
  argued: Argued | null,
  inHand: boolean,
): { stations: readonly StationResult[]; decay: DecayResult } | null {
  if (argued !== null && argued.keys[caseId] === fitKey(reduced, settings))
    return withBody(argued.cases[caseId], settings);
  if (settings.window !== "auto") return fitNow(reduced.stations, settings);
  // an origin in the hand: the automatic window stands still until it rests
  const last = argued?.cases[caseId]?.decay;
  return inHand && last?.law ? fitNow(reduced.stations, { ...settings, window: last.window }) : null;
}

/** The settings with what is in the hand just now. */
function drafted(settings: DecaySettings, draft: Draft | null): DecaySettings {
  if (draft === null) return settings;
  return {
    ...settings,
    ...(draft.window === undefined ? {} : { window: draft.window }),
    ...(draft.origin === undefined ? {} : { x0: draft.origin }),
  };
}
