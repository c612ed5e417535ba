import type { ReadSettings } from "../core/records.ts";
import { inCaseUnit, unitOf, unscaled } from "./unitFactors.ts";

const number = "([+-]?(?:\\d+\\.?\\d*|\\.\\d+)(?:[eE][+-]?\\d+)?)";
const unit = "\\s*(?:\\[([^\\]]+)\\]|([a-zA-Z\u00b5\u03bc]+))?";
const step = new RegExp(
  `(?:^|[\\s,;(])(?:dt|delta[ _]?t|\u0394t|(?:time|sampling)?[ _]?step|sampling (?:interval|period))\\s*[=:]\\s*${number}${unit}`,
  "i",
);
const rate = new RegExp(
  `(?:^|[\\s,;(])(?:f_?s|f_?samp\\w*|(?:sampling|sample|acquisition|scan)[ _]?(?:rate|frequency)|rate)\\s*[=:]\\s*${number}${unit}`,
  "i",
);

/**
 * The time between samples that a comment line tells: `dt = 5e-5`, `sampling rate = 20 kHz`.
 * @param comments without their marks
 * @returns the step in the unit of the case; null where none is told
 */
export function recogniseStep(comments: readonly string[], units: ReadSettings["units"]): number | null {
  for (const comment of comments) {
    const told = fromTold(step.exec(comment), "time", units);
    if (told !== null) return told;
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
  const known = unitOf(found[2] ?? found[3] ?? "");
  const scale = known?.kind === kind && units === "SI" ? known.scale : unscaled;
  const value = inCaseUnit(Number(found[1]), scale);
  return value > 0 ? value : null;
}
