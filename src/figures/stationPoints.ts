import type { Quantity } from "../core/quantity.ts";
import type { StationResult } from "../core/stationResult.ts";
import type { FigureAxis, FigureCase, FigureTable } from "./figureSpec.ts";
import type { PlottedPoint } from "./stationTrace.ts";
import { streamwise } from "./streamwise.ts";
import { isUsed } from "./windowOf.ts";

/** Fields of a station that hold a quantity. */
export type QuantityKey = {
  [K in keyof StationResult]-?: StationResult[K] extends Quantity ? K : never;
}[keyof StationResult];

/** One quantity along the stream, times a factor. What is missing leaves a gap. */
export function stationPoints(
  of: FigureCase,
  key: QuantityKey,
  axis: FigureAxis,
  factor = 1,
): PlottedPoint[] {
  return of.stations.map((station) => {
    const { low, high, value } = endsOf(station[key]);
    const times = (end: number | null) => (end === null ? null : end * factor);
    return {
      x: streamwise(of, station.x, axis),
      y: times(value),
      low: times(low),
      high: times(high),
      used: isUsed(of, station.x),
      station: station.x,
    };
  });
}

/** Value and ends of a quantity; nulls where it is missing. */
export function endsOf(quantity: Quantity): {
  value: number | null;
  low: number | null;
  high: number | null;
} {
  return quantity.value === null
    ? { value: null, low: null, high: null }
    : { value: quantity.value, low: quantity.low, high: quantity.high };
}

/** The numbers of a figure against x: a row a station, three columns a quantity, in the case's own units. */
export function stationTable(
  cases: readonly FigureCase[],
  keys: readonly QuantityKey[],
  axis: FigureAxis,
): FigureTable {
  const place = axis === "x" ? [] : [axis];
  return {
    heading: [
      "case",
      "x",
      ...place,
      "in_window",
      ...keys.flatMap((key) => [key, `${key}_low`, `${key}_high`]),
    ],
    rows: cases.flatMap((of) =>
      of.stations.map((station) => [
        of.name,
        station.x,
        ...(axis === "x" ? [] : [streamwise(of, station.x, axis)]),
        isUsed(of, station.x) ? 1 : 0,
        ...keys.flatMap((key) => {
          const { value, low, high } = endsOf(station[key]);
          return [value, low, high];
        }),
      ]),
    ),
  };
}
