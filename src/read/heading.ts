import { unitOf } from "./unitFactors.ts";

/** One column's heading as the file has it, taken apart. */
export interface Heading {
  /** As it stands in the file, without quotes. */
  readonly text: string;
  /** Without its unit. */
  readonly name: string;
  /** As written; null where there is none. */
  readonly unit: string | null;
}

const bracketed = /^(.+?)[\s_/]*(\[([^[\]]*)\]|\(([^()]*)\))$/;
const spoken = /^(.+?)\s*(?:\/|,|\bin\b)\s*(\S.*)$/;
const appended = /^([A-Za-z][\w']*?)_([cm]?m2?_s[23]?|mm|cm|m|s|ms|us|mps)$/;

/**
 * A heading and the unit in it: `u [m/s]`, `u (m/s)`, `u / m/s`, `t in ms`, `x_mm`.
 * What stands in square brackets is always a unit; elsewhere only what is known as one: `u (probe 1)` has none.
 */
export function parseHeading(field: string): Heading {
  const text = field
    .trim()
    .replace(/^"(.*)"$/, "$1")
    .trim();
  const brackets = bracketed.exec(text);
  if (brackets) {
    const unit = (brackets[3] ?? brackets[4]).trim();
    if (brackets[3] !== undefined || unitOf(unit)) return { text, name: brackets[1].trim(), unit };
  }
  const words = spoken.exec(text) ?? appended.exec(text);
  if (words) {
    const unit = words[2]
      .trim()
      .replace(/^\((.*)\)$/, "$1")
      .replace(/^([cm]?m2?)_(s[23]?)$/, "$1/$2");
    if (unitOf(unit)) return { text, name: words[1].trim(), unit };
  }
  return { text, name: text, unit: null };
}

/** The unit a field of a units row gives; null where it can be none. "" and "-": the column has no unit. */
export function parseUnit(field: string): string | null {
  const text = field
    .trim()
    .replace(/^"(.*)"$/, "$1")
    .replace(/^[[(](.*)[\])]$/, "$1")
    .trim();
  return text === "" || unitOf(text) !== null ? text : null;
}
