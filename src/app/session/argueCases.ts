import type { CompareSettings } from "../../core/comparison.ts";
import type { StationCurves, StationResult } from "../../core/stationResult.ts";
import type { Engine } from "../../engine/protocol.ts";
import { compareSettings } from "../../sheet/compareSettings.ts";
import { decaySettings } from "../../sheet/decaySettings.ts";
import { fitKey } from "./caseViews.ts";
import type { Argued, ArguedCase, Held } from "./session.ts";

/** What is asked of the worker after a change has come to rest: fits of every case, and the comparison. */
export interface ArgumentAsk {
  readonly key: string;
  readonly keys: Readonly<Record<string, string>>;
  readonly cases: readonly {
    readonly id: string;
    readonly name: string;
    readonly stations: readonly StationResult[];
    readonly settings: ReturnType<typeof decaySettings>;
  }[];
  readonly compare: CompareSettings;
}

/** The ask that what is loaded leads to; null while no case has stations. */
export function argumentAsk({ history, reductions }: Held): ArgumentAsk | null {
  const cases = history.present.cases.flatMap(({ id, sheet }) => {
    const reduced = reductions[id];
    if (!reduced || reduced.stations.length === 0) return [];
    const settings = decaySettings(sheet);
    return [{ id, name: sheet.case, stations: reduced.stations, settings, key: fitKey(reduced, settings) }];
  });
  if (cases.length === 0) return null;
  const compare = compareSettings(history.present.cases[0].sheet);
  return {
    key: JSON.stringify([
      cases.map(({ id, name, key }) => [id, name, key]),
      compare,
      placeOfTu(cases, compare),
    ]),
    keys: Object.fromEntries(cases.map(({ id, key }) => [id, key])),
    cases,
    compare,
  };
}

/** Where equal Tu is looked for: a body that is moved takes it along, unless it was chosen. */
function placeOfTu(cases: ArgumentAsk["cases"], { at, against }: CompareSettings): number | null {
  const base = cases.find(({ name }) => name === against) ?? cases[0];
  return at ?? base.settings.body?.x ?? null;
}

/** Asks the worker. Of the curves only the spectra go along: nothing else is compared, and copying them costs time. */
export async function argueCases(engine: Engine, ask: ArgumentAsk): Promise<Argued> {
  const argument = await engine.run("argue", {
    cases: ask.cases.map(({ name, stations, settings }) => ({
      name,
      stations: stations.map((station) => ({ ...station, curves: spectrumAlone(station.curves) })),
      settings,
    })),
    compare: ask.compare,
  });
  const cases = argument.cases.map(({ stations, decay }, i): [string, ArguedCase] => [
    ask.cases[i].id,
    { stations: withCurves(stations, ask.cases[i].stations), decay },
  ]);
  return {
    key: ask.key,
    keys: ask.keys,
    cases: Object.fromEntries(cases),
    comparisons: argument.comparisons,
  };
}

/** The spectrum of u as it is kept, without all that takes most of the room. */
function spectrumAlone(curves: StationCurves | null): StationCurves | null {
  if (curves === null) return null;
  const { k1, E11, freedom, freedoms } = curves;
  const none = new Float64Array(0);
  const rest = { E22: null, E33: null, lag: none, rho_u: none, rho_v: null, rho_w: null };
  return { k1, E11, freedom, ...(freedoms ? { freedoms } : {}), ...rest };
}

function withCurves(derived: readonly StationResult[], reduced: readonly StationResult[]): StationResult[] {
  const byPosition = new Map(reduced.map((station) => [station.x, station]));
  return derived.map((station) => {
    const own = byPosition.get(station.x);
    return { ...station, curves: own?.curves ?? null, blocks: own?.blocks ?? null };
  });
}
