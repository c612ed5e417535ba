import type { Role } from "../core/records.ts";
import { equalSpacing } from "../core/station/lines/linePart.ts";
import { parseNumber } from "./parseNumber.ts";
import { recogniseTime } from "./recogniseTime.ts";
import type { TableForm } from "./surveyTable.ts";

/** Equally spaced points at one time from which on a table is one of lines, and no rake of probes. */
const fewestAcross = 16;
const fewestAlong = 32;

/**
 * Whether a table of velocities holds lines: many equally spaced y (or z, or more x) at one time, whatever the order
 * of its rows. A table without times holds one snapshot where a comment tells its time.
 * @param roles  one for each column
 */
export function looksLikeLines(form: TableForm, roles: readonly (Role | null)[]): boolean {
  const at = (role: Role) => roles.indexOf(role);
  if (at("u") < 0) return false;
  if (at("t") < 0 && recogniseTime(form.comments, "SI") === null) return false;
  const rows = at("t") < 0 ? form.headRows : largestSnapshot(form.headRows, at("t"));
  const points = (role: Role) => {
    if (at(role) < 0) return 0;
    const found = new Set(rows.map((row) => parseNumber(row[at(role)] ?? "", form.decimal)));
    const places = Float64Array.from(found).sort();
    return places.every(Number.isFinite) && equalSpacing(places) !== null ? places.length : 0;
  };
  return points("y") >= fewestAcross || points("z") >= fewestAcross || points("x") >= fewestAlong;
}

/** The rows of the time that most rows have. */
function largestSnapshot(rows: readonly (readonly string[])[], time: number): readonly (readonly string[])[] {
  const snapshots = new Map<string, (readonly string[])[]>();
  for (const row of rows) {
    const own = snapshots.get(row[time] ?? "");
    if (own) own.push(row);
    else snapshots.set(row[time] ?? "", [row]);
  }
  return [...snapshots.values()].reduce((most, own) => (own.length > most.length ? own : most), []);
}
