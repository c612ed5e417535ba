import type { Dimension } from "../core/catalogue.ts";
import type { Quantity } from "../core/quantity.ts";
import type { StationResult } from "../core/stationResult.ts";
import { stationQuantities } from "./resultsFile.ts";

type Key = (typeof stationQuantities)[number];

const dimensions: Record<Key, Dimension> = {
  U: "L/T",
  uu: "L²/T²",
  vv: "L²/T²",
  ww: "L²/T²",
  uv: "L²/T²",
  uw: "L²/T²",
  vw: "L²/T²",
  k: "L²/T²",
  Tu: "1",
  isotropy_uv: "1",
  isotropy_uw: "1",
  T_int: "T",
  L11: "L",
  lambda: "L",
  gradient: "1/T²",
  epsilon: "L²/T³",
  epsilon_gradient: "L²/T³",
  epsilon_decay: "L²/T³",
  epsilon_inertial: "L²/T³",
  eta: "L",
  Re_lambda: "1",
  Re_L: "1",
  C_epsilon: "1",
  S_dudx: "1",
  balance: "1",
  q: "1",
};

/** Units in plain letters: not every spreadsheet takes a file for UTF-8. */
const units: Record<Dimension, string> = {
  "1": "",
  L: "m",
  T: "s",
  "L/T": "m/s",
  "L²/T²": "m2/s2",
  "L²/T³": "m2/s3",
  "1/T²": "1/s2",
  "1/L": "1/m",
  "L³/T²": "m3/s2",
  "L²/T": "m2/s",
};

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
    const text = settings.units === "SI" ? units[dimension] : "";
    return text === "" ? "" : ` [${text}]`;
  };
  const triple = (key: Key) => [key, `${key} low`, `${key} high`].map((each) => each + unit(dimensions[key]));
  const place = settings.along === "x" ? `x${unit("L")}` : `t${unit("T")}`;
  const heading = ["case", place, "samples", `duration${unit("T")}`];
  const rows = [
    [...heading, ...stationQuantities.flatMap(triple), "flags", "missing"].map(textCell),
    ...stations.map((station) => row(name, station)),
  ];
  return `${rows.map((cells) => cells.join(",")).join("\n")}\n`;
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
