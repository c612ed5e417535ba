import type { CompareSettings } from "../../core/comparison.ts";
import type { StationResult } from "../../core/stationResult.ts";
import type { Engine } from "../../engine/protocol.ts";
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
  const { compare } = history.present.cases[0].sheet;
  return {
    key: JSON.stringify([cases.map(({ id, name, key }) => [id, name, key]), compare]),
    keys: Object.fromEntries(cases.map(({ id, key }) => [id, key])),
    cases,
    compare,
  };
}

/** Asks the worker. Curves stay here: a fit does not need them, and copying them would cost more than the fit. */
export async function argueCases(engine: Engine, ask: ArgumentAsk): Promise<Argued> {
  const argument = await engine.run("argue", {
    cases: ask.cases.map(({ name, stations, settings }) => ({
      name,
      stations: stations.map((station) => ({ ...station, curves: null })),
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

function withCurves(derived: readonly StationResult[], reduced: readonly StationResult[]): StationResult[] {
  const byPosition = new Map(reduced.map((station) => [station.x, station]));
  return derived.map((station) => {
    const own = byPosition.get(station.x);
    return { ...station, curves: own?.curves ?? null, blocks: own?.blocks ?? null };
  });
}
