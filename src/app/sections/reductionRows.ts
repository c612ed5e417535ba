import { unitOf } from "../../core/unitText.ts";
import { formatCount, formatDigits, withUnit } from "../../figures/formatNumber.ts";
import type { CaseSheet } from "../../sheet/caseSheet.ts";
import type { SettingRow } from "./definitionRows.ts";
import { integralRoutes } from "./stationSettings.ts";

export const kinds = { none: "not said", measurement: "measurement", dns: "DNS", les: "LES" } as const;
export const dissipations = {
  auto: "automatic",
  gradient: "gradients",
  decay: "decay",
  inertial: "inertial range",
} as const;
export const yesNo = { auto: "automatic", true: "yes", false: "no" } as const;

export const probesTaken = { agreeing: "those that agree", all: "all of them" } as const;
export const stamps = { ask: "ask", even: "constant step", written: "as written" } as const;

type Said = (sheet: CaseSheet) => string | null;
const ofSeries =
  (text: (sheet: CaseSheet) => string): Said =>
  (sheet) =>
    sheet.layout === "series" ? text(sheet) : null;
const ofRecords =
  (text: (sheet: CaseSheet) => string): Said =>
  (sheet) =>
    sheet.layout === "profile" ? null : text(sheet);
const length = (value: number, { units }: CaseSheet) => withUnit(formatDigits(value, 3), unitOf("L", units));
const time = (value: number, { units }: CaseSheet) => withUnit(formatDigits(value, 3), unitOf("T", units));

const rows: readonly (readonly [name: string, said: Said])[] = [
  ["kind", ({ kind }) => kinds[kind ?? "none"]],
  [
    "start-up",
    ofRecords((sheet) => (sheet.startup === 0 ? "none left out" : `${time(sheet.startup, sheet)} left out`)),
  ],
  ["T_int", ofRecords(({ reduce }) => integralRoutes[reduce.integralScale])],
  ["correlation", ofSeries(({ reduce }) => reduce.correlation)],
  ["removed", ofSeries(({ reduce }) => (reduce.detrend === "mean" ? "record mean" : "linear trend"))],
  [
    "segments",
    ofSeries(({ reduce }) =>
      reduce.segment === null ? "from T_int" : `${formatCount(reduce.segment)} samples`,
    ),
  ],
  ["Taylor", ofSeries(({ reduce }) => (reduce.taylorCorrection ? "corrected" : "not corrected"))],
  ["ε", ({ reduce }) => dissipations[reduce.dissipation]],
  [
    "rounded times",
    ({ layout, read }) => (layout === "series" && read.times !== "ask" ? stamps[read.times] : null),
  ],
  [
    "probes",
    ({ layout, reduce }) =>
      layout === "series" && reduce.probes === "all" ? probesTaken[reduce.probes] : null,
  ],
  // what is seldom set is listed once it is
  ["sampled together", ({ simultaneous }) => (simultaneous === "auto" ? null : yesNo[`${simultaneous}`])],
  [
    "lines close",
    ({ layout, periodic }) => (layout === "lines" && periodic !== "auto" ? yesNo[`${periodic}`] : null),
  ],
  ["sensor", (sheet) => (sheet.sensorLength === null ? null : length(sheet.sensorLength, sheet))],
  ["lateral size", (sheet) => (sheet.extent === null ? null : length(sheet.extent, sheet))],
  ["x = 0 at", (sheet) => (sheet.zero === 0 ? null : length(sheet.zero, sheet))],
];

/** The choices of the reduction in words: one where the cases agree, else one for each that differs. */
export function reductionRows(sheets: readonly CaseSheet[]): SettingRow[] {
  return rows.flatMap(([name, said]): SettingRow[] => {
    const words = new Set(sheets.map(said).filter((text) => text !== null));
    return words.size === 0 ? [] : [[name, [...words].join(", ")]];
  });
}
