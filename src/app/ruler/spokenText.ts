import { isEstimate } from "../../core/quantity.ts";
import { formatNumber } from "../../figures/formatNumber.ts";
import { positionDecimals } from "../../figures/positionDecimals.ts";
import { exponentReading, originReading } from "./readings.ts";
import type { RulerBody, RulerCase, RulerStation } from "./rulerProps.ts";
import { type Edge, edgeStation } from "./snapWindow.ts";

/** What the ruler is said to show: unit of x and the decimals that tell its stations apart. */
export interface SpokenScale {
  readonly units: string;
  readonly decimals: number;
}

const unitWords: Readonly<Record<string, string>> = {
  m: "metres",
  mm: "millimetres",
  cm: "centimetres",
  s: "seconds",
  ms: "milliseconds",
};

export function spokenUnit(unit: string): string {
  return unitWords[unit] ?? unit;
}

/** "0.30 metres". */
export function spokenPlace(x: number, { units, decimals }: SpokenScale): string {
  const number = formatNumber(x, decimals);
  return units === "" ? number : `${number} ${spokenUnit(units)}`;
}

/** "Start of fit window, screen". */
export function bracketName(edge: Edge, caseName: string): string {
  return `${edge === "start" ? "Start" : "End"} of fit window, ${caseName}`;
}

/** "0.30 metres, station 4 of 16". */
export function bracketPlace(
  stations: readonly number[],
  window: readonly [number, number],
  edge: Edge,
  scale: SpokenScale,
): string {
  const at = edgeStation(stations, window, edge);
  return `${spokenPlace(stations[at], scale)}, station ${at + 1} of ${stations.length}`;
}

/** "fitted, 3.2 M. Enter to hold." */
export function originPlace(one: RulerCase, x0: number | null, units: string): string {
  const shown = x0 === null ? one.x0 : { value: x0, low: null, high: null };
  const place = withSpokenUnit(originReading({ ...one, x0: shown }, units));
  return one.originHeld ? `held, ${place}. Delete to free.` : `fitted, ${place}. Enter to hold.`;
}

/** "Station 0.40 metres, picked as a; Tu 6.00 percent; well sampled." */
export function stationName(station: RulerStation, letter: string | null, scale: SpokenScale): string {
  const place = `Station ${spokenPlace(station.x, scale)}`;
  const picked = letter === null ? "" : `, picked as ${letter}`;
  if (station.quality === "waiting") return `${place}${picked}, not yet read.`;
  if (station.quality === "read") return `${place}${picked}, read.`;
  if (station.quality === "none")
    return `${place}${picked}, no interval: ${station.why ?? "not determined"}.`;
  const Tu =
    station.Tu === null ? "" : `; Tu ${formatNumber(station.Tu * 100, tuDecimals(station.Tu))} percent`;
  return `${place}${picked}${Tu}; ${station.quality === "well" ? "well" : "fairly"} sampled.`;
}

/** Three significant digits of a percentage. */
function tuDecimals(Tu: number): number {
  return Math.max(0, Math.min(4, 2 - Math.floor(Math.log10(Math.max(Tu * 100, 1e-4)))));
}

/** "n 1.25, 95 percent 1.20 to 1.31; virtual origin 3.2 M." */
export function lawSpoken(one: RulerCase, units: string): string {
  if (!isEstimate(one.n)) return `${one.name}: no exponent, ${one.n.why}.`;
  const n = exponentReading(one);
  const interval = n.interval === null ? "" : `, 95 percent ${n.interval}`;
  const x0 = isEstimate(one.x0) ? `; virtual origin ${withSpokenUnit(originReading(one, units))}` : "";
  return `n ${n.value}${interval}${x0}.`;
}

/** "Body, heated tube"; "Body" where it has no name of its own. */
export function bodyName({ name }: RulerBody): string {
  return name === "body" ? "Body" : `Body, ${name}`;
}

/** "Body, 0.90 metres; Tu 3.34 percent in screen." */
export function bodySpoken({ x, readings = "" }: RulerBody, scale: SpokenScale): string {
  const decimals = Math.max(scale.decimals, positionDecimals([x]));
  const place = `Body, ${spokenPlace(x, { ...scale, decimals })}`;
  return readings === "" ? `${place}.` : `${place}; ${readings}.`;
}

function withSpokenUnit({ value, unit }: { readonly value: string; readonly unit: string }): string {
  return unit === "" ? value : `${value} ${spokenUnit(unit)}`;
}
