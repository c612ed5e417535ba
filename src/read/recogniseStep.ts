import type { ReadSettings } from "../core/records.ts";
import { inCaseUnit, unitOf, unscaled } from "./unitFactors.ts";
import { valueOfWritten, writtenNumber } from "./writtenNumber.ts";

/** `= 20 kHz`, `[kHz] = 20`, `(kHz): 20`; a table writes its own separator in place of the sign. */
const told =
  "\\s*(?:[[(]([^\\])]+)[\\])]\\s*)?[=:;\\t]\\s*" +
  `(${writtenNumber})\\s*(?:\\[([^\\]]+)\\]|([a-zA-Z\u00b5\u03bc]+))?`;
const step = new RegExp(
  `(?:^|[\\s,;(])(?:dt|delta[ _]?t|\u0394t|(?:time|sampling)?[ _]?step|sampling (?:interval|period))${told}`,
  "i",
);
const rate = new RegExp(
  `(?:^|[\\s,;(])(?:f_?s|f_?samp\\w*|(?:sampling|sample|acquisition|scan)[ _]?(?:rate|frequency)|rate)${told}`,
  "i",
);

/**
 * The time between samples that a comment line tells: `dt = 5e-5`, `sampling rate = 20 kHz`.
 * @param comments without their marks
 * @returns the step in the unit of the case; null where none is told
 */
export function recogniseStep(comments: readonly string[], units: ReadSettings["units"]): number | null {
  for (const comment of comments) {
    const time = fromTold(step.exec(comment), "time", units);
    if (time !== null) return time;
    const frequency = fromTold(rate.exec(comment), "rate", units);
    if (frequency !== null) return 1 / frequency;
  }
  return null;
}

function fromTold(
  found: RegExpExecArray | null,
  kind: "time" | "rate",
  units: ReadSettings["units"],
): number | null {
  if (!found) return null;
  const known = unitOf(found[1] ?? found[3] ?? found[4] ?? "");
  const scale = known?.kind === kind && units === "SI" ? known.scale : unscaled;
  const value = valueOfWritten(found[2]);
  return value !== null && value > 0 ? inCaseUnit(value, scale) : null;
}
