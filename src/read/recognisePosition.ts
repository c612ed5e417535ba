import type { PositionSource, ReadSettings } from "../core/records.ts";
import { inCaseUnit, unitOf } from "./unitFactors.ts";
import { valueOfWritten, writtenNumber } from "./writtenNumber.ts";

/** A position that was found outside the columns, in the unit of the case. */
export interface FoundPosition {
  readonly x: number;
  readonly y: number | null;
  readonly z: number | null;
  readonly source: Extract<PositionSource, "comment" | "name">;
  /** The piece of text it was read from. */
  readonly matched: string;
  /** How it was read, for the page. */
  readonly rule: string;
}

const number = "[+-]?(?:\\d+\\.?\\d*|\\.\\d+)(?:[eE][+-]?\\d+)?";
const spoken = new RegExp(
  "(?:^|[\\s,;(])((?:x|x[ _-]?pos(?:ition)?|pos(?:ition)?|(station)|x[ _-]?probe|probe[ _-]?x)" +
    `\\s*(?:[[(]([^\\])]+)[\\])]\\s*)?[=:]\\s*(${writtenNumber})\\s*` +
    "(?:\\[([^\\]]+)\\]|([a-zA-Z\u00b5\u03bc]+)(?![\\w/]))?)",
  "i",
);
const across = (axis: string) =>
  new RegExp(`(?:^|[\\s,;(])${axis}\\s*[=:]\\s*(${writtenNumber})\\s*([a-z\u00b5\u03bc]+(?![\\w/]))?`, "i");
const three = new RegExp(
  `(?:position|probe|point|location|coordinates?|xyz|x,\\s*y,\\s*z)[^\\d+.-]*(${number})[\\s,;]+(${number})[\\s,;]+(${number})(?![\\d.]|[\\s,;]+[\\d.])`,
  "i",
);
/** x, not part of a word, then digits at once or after = _ or a blank; `0p2` is 0.2. */
const inName = /(?<![A-Za-z])[xX](?:[=_ ]?)([+-]?\d+(?:[.p]\d+)?)[_ ]?(mm|cm|um|km|m)?(?![A-Za-z0-9])/;

/**
 * A probe's position from the comment lines of its file or, failing that, from the file's name (or its folders').
 * In a name a whole number of three or more digits is taken as millimetres where the case is in SI: `x0200` is
 * 0.2 m; a shorter one without a unit could as well count probes or meshes and is not taken.
 * @param comments without their marks
 * @param name     path of the file
 */
export function recognisePosition(
  name: string,
  comments: readonly string[],
  units: ReadSettings["units"],
): FoundPosition | null {
  for (const comment of comments) {
    const found = fromComment(comment, units);
    if (found) return found;
  }
  for (const part of name.split("/").reverse()) {
    const found = fromName(part, units);
    if (found) return found;
  }
  return null;
}

function fromComment(comment: string, units: ReadSettings["units"]): FoundPosition | null {
  const listed = three.exec(comment);
  if (listed) {
    const [x, y, z] = listed.slice(1, 4).map(Number);
    return { x, y, z, source: "comment", matched: listed[0], rule: "three coordinates in a comment line" };
  }
  const found = spoken.exec(comment);
  if (!found) return null;
  const [, matched, counted, before, digits, inside, after] = found;
  const unit = before ?? inside ?? after;
  if (counted !== undefined && unit === undefined && /^\d+$/.test(digits)) return null; // the third, or at 3 m?
  const x = placed(valueOfWritten(digits), unit, units);
  if (x === null) return null;
  const [y, z] = ["y", "z"].map((axis) => {
    const [, value, unit] = across(axis).exec(comment) ?? [];
    return value === undefined ? null : placed(valueOfWritten(value), unit, units);
  });
  return { x, y, z, source: "comment", matched: matched.trim(), rule: "a comment line" };
}

function fromName(part: string, units: ReadSettings["units"]): FoundPosition | null {
  const stem = part.replace(/(?:\.[A-Za-z][A-Za-z0-9]*)+$/, "");
  const found = inName.exec(stem);
  if (!found) return null;
  const [matched, digits, unit] = found;
  const value = Number(digits.replace("p", "."));
  const place = { y: null, z: null, source: "name", matched } as const;
  if (unit !== undefined) {
    const x = placed(value, unit, units);
    return x === null ? null : { x, ...place, rule: `after x in the name, in ${unit}` };
  }
  if (/[.p]/.test(digits) || units === "nondimensional") {
    return { x: value, ...place, rule: "after x in the name, in the unit of the case" };
  }
  if (digits.replace(/^[+-]/, "").length < 3) return null;
  return { x: tidyLength(value / 1000), ...place, rule: "after x in the name, in mm" };
}

function placed(value: number | null, text: string | undefined, units: ReadSettings["units"]): number | null {
  if (value === null) return null;
  if (text === undefined) return value;
  const unit = unitOf(text);
  if (unit?.kind !== "length") return unit === null ? value : null;
  return units === "SI" ? tidyLength(inCaseUnit(value, unit.scale)) : null;
}

/** 350 mm is 0.35 m and not 0.35000000000000003 m: positions are printed and compared. */
export function tidyLength(value: number): number {
  return Number(value.toPrecision(15));
}
