import type { StationResult } from "../stationResult.ts";
import { mostCuts } from "./cutList.ts";
import type { StationPart } from "./stationPart.ts";

/** Where the records of a station were cut, in order of record and place; nothing where nowhere. */
export function stationCuts(parts: readonly StationPart[]): Pick<StationResult, "cuts" | "cuts_more"> {
  const all = parts.flatMap(({ origin: { file, y, z }, cuts }) =>
    (cuts?.first ?? []).map((cut) => ({ file, y, z, ...cut })),
  );
  if (all.length === 0) return {};
  const listed = all.slice(0, mostCuts);
  const more = parts.reduce((sum, { cuts }) => sum + (cuts?.more ?? 0), 0) + all.length - listed.length;
  return { cuts: listed, ...(more > 0 ? { cuts_more: more } : {}) };
}
