import type { ReadSettings } from "../core/records.ts";
import { inCaseUnit, unitOf, unscaled } from "./unitFactors.ts";
import { valueOfWritten, writtenNumber } from "./writtenNumber.ts";

const instant = new RegExp(
  `(?:^|[\\s,;(])(?:t|time)\\s*(?:[[(]([^\\])]+)[\\])]\\s*)?[=:]\\s*(${writtenNumber})\\s*(?:\\[([^\\]]+)\\]|([a-zA-Z\u00b5\u03bc]+))?`,
  "i",
);

/**
 * The time of a file's only snapshot, as a comment line tells it: `t = 0.35 s`.
 * @param comments without their marks
 * @returns the time in the unit of the case; null where none is told
 */
export function recogniseTime(comments: readonly string[], units: ReadSettings["units"]): number | null {
  for (const comment of comments) {
    const found = instant.exec(comment);
    const value = found === null ? null : valueOfWritten(found[2]);
    if (found === null || value === null) continue;
    const known = unitOf(found[1] ?? found[3] ?? found[4] ?? "");
    return inCaseUnit(value, known?.kind === "time" && units === "SI" ? known.scale : unscaled);
  }
  return null;
}
