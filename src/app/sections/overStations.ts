import { labelOf } from "../../core/catalogue.ts";
import { bare, type Quantity } from "../../core/quantity.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { displayOf, unitOf } from "../../core/unitText.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import type { FoundNumber } from "./foundNumber.ts";

/** What a NumberButton needs for a number that no single result holds. */
interface PageNumber {
  readonly of: string;
  readonly quantity: Quantity;
  readonly at: FoundNumber;
}

/** A number that stands for all stations of a case, with its least and greatest and where they are. */
export function overStations(
  view: CaseView,
  key: string,
  shown: string,
  of: (station: StationResult) => number | null,
): PageNumber {
  const label = labelOf(key);
  const { factor, unit } = displayOf(label, view.units);
  const values = view.stations.flatMap((station) => {
    const value = of(station);
    return value === null ? [] : [{ value, x: station.x }];
  });
  const text = ({ value, x }: (typeof values)[number]) =>
    `${withUnit(formatDigits(value * factor, Math.min(label.digits, 4)), unit)} at ${placeOf(view, x)}`;
  const sorted = [...values].sort((a, b) => a.value - b.value);
  const rows =
    sorted.length === 0
      ? []
      : ([
          ["stations", String(sorted.length)],
          ["least", text(sorted[0])],
          ["greatest", text(sorted[sorted.length - 1])],
        ] as const);
  return {
    of: key,
    quantity: bare(sorted[0]?.value ?? 0, "several stations at once: each has its own"),
    at: { kind: "page", view, shown: withUnit(shown, unit), rows },
  };
}

/** How many stations a case has, with the first and the last of them. */
export function stationCount(view: CaseView): PageNumber {
  const { stations } = view;
  const rows =
    stations.length === 0
      ? []
      : ([
          ["first", placeOf(view, stations[0].x)],
          ["last", placeOf(view, stations[stations.length - 1].x)],
          ["files", String(view.of.sources.length)],
        ] as const);
  return {
    of: "stations",
    quantity: bare(stations.length, "counted, not estimated"),
    at: { kind: "page", view, shown: String(stations.length), rows },
  };
}

const placeOf = (view: CaseView, x: number) =>
  withUnit(formatPosition(x), unitOf(view.along === "t" ? "T" : "L", view.units));
