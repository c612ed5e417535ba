import { isEstimate, missing } from "../../core/quantity.ts";
import type { Preview } from "../../core/records.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { bestPlans } from "../../export/sentences/narrowingSentences.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { lawTuFactor } from "../ruler/lawTuFactor.ts";
import type { LaneState, RulerCase, RulerPlan, RulerStation } from "../ruler/rulerProps.ts";
import { bytesText } from "../sections/bytesText.ts";
import type { CaseView } from "../session/caseView.ts";

/** Integral times from which a station counts as well sampled, and from which it has intervals at all. */
const wellSampled = 1000;

/** Lanes of the ruler from the views of the cases; a view that did not change gives the same lane again. */
export function createRulerCases(): (
  cases: readonly CaseView[],
  late: boolean,
  previews: readonly Preview[],
  plans: boolean,
) => readonly RulerCase[] {
  const kept = new WeakMap<CaseView, { late: boolean; plans: boolean; lane: RulerCase }>();
  return (cases, late, previews, plans) =>
    cases.map((view) => {
      const known = kept.get(view);
      if (known?.late === (late && view.stale) && known.plans === plans) return known.lane;
      const lane = laneOf(view, late, previews, plans);
      kept.set(view, { late: late && view.stale, plans, lane });
      return lane;
    });
}

function laneOf(view: CaseView, late: boolean, previews: readonly Preview[], plans: boolean): RulerCase {
  const { decay, stations, of } = view;
  return {
    id: view.id,
    name: view.name,
    mark: view.mark,
    stations: stations.length > 0 ? stations.map(stationOf) : waitingStations(view, previews),
    law: decay?.law ?? null,
    lawTu: decay === null ? null : lawTuFactor(decay, meanSpeed(view)),
    window: decay === null || decay.points.length === 0 ? null : decay.window,
    windowChosen: decay?.windowChosen ?? "auto",
    n: decay?.n ?? missing("no law yet"),
    x0: decay?.x0 ?? missing("no law yet"),
    originHeld: of.sheet.fit.x0 !== null,
    length: view.length,
    symbol: view.symbol,
    state: stateOf(view, late),
    ...(plans ? { plans: plansOf(view) } : {}),
  };
}

function plansOf(view: CaseView): readonly RulerPlan[] {
  return bestPlans(arguedOf(view)?.argument.narrowing ?? []).map(({ kind, x }) => ({ kind, x }));
}

function stationOf(station: StationResult): RulerStation {
  const { Tu, facts } = station;
  const base = { x: station.x, Tu: isEstimate(Tu) ? Tu.value : null };
  if (isEstimate(Tu) && (Tu.low === null || Tu.high === null))
    return { ...base, quality: "none", why: Tu.why_low ?? Tu.why_high ?? "no interval" };
  const times = facts.integralTimes;
  return { ...base, quality: times === null || times >= wellSampled ? "well" : "fair" };
}

/**
 * Positions that the sheet, a name or a comment gives are known before a file is reduced. A station is read when
 * every file that stands there is.
 */
function waitingStations({ of, work }: CaseView, previews: readonly Preview[]): RulerStation[] {
  const byName = new Map(previews.map(({ file, position }) => [file, position.x]));
  const done = new Set(work?.done);
  const read = new Map<number, boolean>();
  for (const [i, file] of of.sheet.files.entries()) {
    const name = of.sources[i]?.name ?? "";
    const x = file.x ?? byName.get(name) ?? null;
    if (x !== null) read.set(x, (read.get(x) ?? true) && done.has(name));
  }
  return [...read]
    .sort(([a], [b]) => a - b)
    .map(([x, isRead]) => ({ x, Tu: null, quality: isRead ? "read" : "waiting" }));
}

function stateOf({ work, stale, decay, stations }: CaseView, late: boolean): LaneState {
  if (work)
    return {
      kind: "reading",
      done: work.filesDone,
      total: work.files,
      amount: bytesText(work.bytesDone, work.bytes),
    };
  if (decay?.law) return stale && late ? { kind: "stale" } : { kind: "ready" };
  if (stations.length === 0) return { kind: "open", note: "no station could be reduced" };
  return { kind: "open", note: decay ? `${decay.stations} stations: no law` : "no law yet" };
}

/** Mean of U over the window: what Tu is formed with, unless a reference speed is given. */
function meanSpeed({ stations, decay, of }: CaseView): number | null {
  if (of.sheet.reference.speed !== null) return of.sheet.reference.speed;
  const used = new Set(decay?.points.filter((point) => point.used).map((point) => point.x));
  const speeds = stations.filter(({ x }) => used.has(x)).flatMap(({ U }) => (isEstimate(U) ? [U.value] : []));
  return speeds.length === 0 ? null : speeds.reduce((sum, speed) => sum + speed, 0) / speeds.length;
}
