import type { Dimension } from "../core/catalogue.ts";
import { labelOf } from "../core/catalogue.ts";
import type { Quantity } from "../core/quantity.ts";
import type { StationResult } from "../core/stationResult.ts";
import { unitOf } from "../core/unitText.ts";
import { stationQuantities } from "./resultsFile.ts";

type Key = (typeof stationQuantities)[number];

export interface TableSettings {
  /** "nondimensional": headings without units. */
  readonly units: "SI" | "nondimensional";
  /** "t": a box that decays in time; its stations stand at times. */
  readonly along: "x" | "t";
}

/**
 * The stations of one case as a table for spreadsheets and scripts: one row each, in order of x.
 * Every quantity has three columns: its value and the ends of its 95 % interval. A cell is empty where there is
 * no number; the column `missing` says why a value is missing, `flags` lists the codes of the doubts.
 * @param name     of the case; no cell made from text can start a formula
 * @param stations in order of x
 * @returns        comma-separated text with a heading row, lines ended by a line feed
 */
export function stationsCsv(
  name: string,
  stations: readonly StationResult[],
  settings: TableSettings,
): string {
  const unit = (dimension: Dimension) => {
    const text = plainLetters(unitOf(dimension, settings.units));
    return text === "" ? "" : ` [${text}]`;
  };
  const triple = (key: Key) =>
    [key, `${key} low`, `${key} high`].map((each) => each + unit(labelOf(key).dimension));
  const place = settings.along === "x" ? `x${unit("L")}` : `t${unit("T")}`;
  const heading = ["case", place, "samples", `duration${unit("T")}`];
  const rows = [
    [...heading, ...stationQuantities.flatMap(triple), "flags", "missing"].map(textCell),
    ...stations.map((station) => row(name, station)),
  ];
  return `${rows.map((cells) => cells.join(",")).join("\n")}\n`;
}

/** Not every spreadsheet takes a file for UTF-8. */
function plainLetters(unit: string): string {
  return unit.replaceAll("²", "2").replaceAll("³", "3").replaceAll("⁻¹", "-1");
}

function row(name: string, station: StationResult): string[] {
  const { x, samples, duration, flags } = station;
  const missing = stationQuantities.flatMap((key) => {
    const quantity: Quantity = station[key];
    return quantity.value === null ? [`${key}: ${quantity.why}`] : [];
  });
  return [
    textCell(name),
    ...[x, samples, duration].map(numberCell),
    ...stationQuantities.flatMap((key) => triple(station[key])),
    textCell(flags.map(({ code }) => code).join("; ")),
    textCell(missing.join("; ")),
  ];
}

function triple(quantity: Quantity): string[] {
  if (quantity.value === null) return ["", "", ""];
  return [quantity.value, quantity.low, quantity.high].map(numberCell);
}

function numberCell(value: number | null): string {
  return value === null ? "" : String(value);
}

/** A text that a spreadsheet would take for a formula gets an apostrophe before it; a number stays one. */
function textCell(text: string): string {
  const isNumber = text !== "" && Number.isFinite(Number(text));
  const plain = !isNumber && /^\s*[=+\-@]|^[\t\r]/.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(plain) ? `"${plain.replaceAll('"', '""')}"` : plain;
}
