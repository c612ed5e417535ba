import type { Quantity } from "../../core/quantity.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatCount, formatDigits, withUnit } from "../../figures/formatNumber.ts";
import type { CaseSheet } from "../../sheet/caseSheet.ts";
import type { SettingRow } from "./definitionRows.ts";
import { lineMeaning } from "./lineMeaning.ts";

const isTime = (key: string) =>
  /^(T_int|L11|L_[vw]|Re_L|C_epsilon|tauStar|lagLimit|integralScaleSpread)/.test(key);
const isGradient = (key: string) =>
  /^(lambda|gradient|epsilon|eta|Re_lambda|C_epsilon|balance|S_dudx|K_[vw]|k1max_eta|cutoff|noiseFloor|share|taylor)/.test(
    key,
  );
const isSpectral = (key: string) => /^(segment|recovered|local_slope|E\d\d)/.test(key);

export const integralRoutes = {
  "zero-crossing": "integral to the first zero",
  "one-over-e": "lag at 1/e",
  exponential: "exponential fit",
  "low-frequency": "low-frequency limit",
  model: "model spectrum",
} as const;

/** What a number of a station rests on: record, correlation, spectrum, correction, and how its interval was made. */
export function stationSettings(
  key: string,
  station: StationResult,
  sheet: CaseSheet,
  quantity?: Quantity,
): SettingRow[] {
  const { facts } = station;
  const time = unitOf("T", sheet.units);
  const meaning = lineMeaning(key, facts);
  const rows: (SettingRow | null)[] = [
    key === "x" || key === "t" ? positionRow(station) : null,
    recordRow(station, time),
    sheet.startup > 0 && station.duration !== null
      ? ["left out at the start", withUnit(formatDigits(sheet.startup, 3), time)]
      : null,
    probesRow(station),
    meaning === null ? null : ["on this line", meaning],
    ...(isTime(key) ? timeRows(station, sheet, time) : []),
    ...(isGradient(key) || isSpectral(key) ? segmentRows(station) : []),
    ...(isGradient(key) ? gradientRows(station, sheet) : []),
    key === "epsilon" && facts.dissipationReason !== undefined ? ["adopted", facts.dissipationReason] : null,
    hasInterval(quantity) ? ["interval", intervalText(key, station)] : null,
  ];
  return rows.filter((row) => row !== null);
}

/** A count or a setting has none to explain. */
const hasInterval = (quantity: Quantity | undefined) =>
  quantity === undefined || quantity.value === null || quantity.low !== null || quantity.high !== null;

export const origins = {
  sheet: "case sheet",
  column: "x column",
  comment: "comment line",
  name: "file name",
  hand: "typed here",
} as const;

function positionRow({ sources }: StationResult): SettingRow | null {
  const [source] = sources;
  if (source === undefined || source.position === null) return null;
  const more = sources.length > 1 ? `, and of ${sources.length - 1} more` : "";
  return ["told by", `${origins[source.position]}, ${source.name}${more}`];
}

function recordRow({ samples, duration, facts }: StationResult, time: string): SettingRow | null {
  if (duration === null) return null;
  const lengths =
    facts.integralTimes === null ? "" : `, ${formatDigits(facts.integralTimes, 2)} integral times`;
  return [
    "record",
    `${formatCount(samples)} samples, ${withUnit(formatDigits(duration, 3), time)}${lengths}`,
  ];
}

function timeRows({ facts }: StationResult, { reduce }: CaseSheet, time: string): (SettingRow | null)[] {
  const { lagLimit, tauStar, integralScaleSpread: spread, lines } = facts;
  if (lagLimit === null && tauStar === null) return [];
  const lag = (value: number) => withUnit(formatDigits(value, 3), time);
  const removed = reduce.detrend === "mean" ? "record mean" : "linear trend";
  return [
    ["route", integralRoutes[reduce.integralScale]],
    spread == null ? null : ["spread of the routes", `largest over smallest ${formatDigits(spread, 2)}`],
    [
      "correlation",
      lines === undefined
        ? `${reduce.correlation}, ${removed} removed`
        : lines.periodic
          ? "circular, about the mean of the station"
          : "of the pairs within the line, about the mean of the station",
    ],
    tauStar === null ? null : ["first zero", lag(tauStar)],
    lagLimit === null ? null : ["lags up to", lag(lagLimit)],
  ];
}

function segmentRows({ facts }: StationResult): (SettingRow | null)[] {
  const { segment, segments, recoveredVariance, lines } = facts;
  if (segment === null) return [];
  const window = lines?.periodic === true ? "no window" : lines ? "Hann" : "Hann, half overlapping";
  return [
    ["segments", `${formatCount(segments)} of ${formatCount(segment)} samples, ${window}`],
    recoveredVariance === null ? null : ["recovered variance", percent(recoveredVariance)],
  ];
}

function gradientRows({ facts }: StationResult, { reduce, units }: CaseSheet): (SettingRow | null)[] {
  const { segment, cutoff, noiseFloor, shareBeyondCutoff, taylorFactor, k1max_eta } = facts;
  return [
    segment === null
      ? null
      : ["cut-off", cutoff === null ? "none" : withUnit(formatDigits(cutoff, 3), unitOf("1/L", units))],
    noiseFloor === null
      ? null
      : ["noise floor", withUnit(formatDigits(noiseFloor, 2), unitOf("L³/T²", units))],
    cutoff === null || shareBeyondCutoff === null ? null : ["beyond the cut-off", percent(shareBeyondCutoff)],
    facts.cutoffSensitivity == null
      ? null
      : ["cut moved by 1/20 decade", `λ by ${percent(facts.cutoffSensitivity)}`],
    taylorFactor === null
      ? null
      : [
          "Taylor’s hypothesis",
          reduce.taylorCorrection ? `divided by ${formatDigits(taylorFactor, 4)}` : "not corrected",
        ],
    k1max_eta === null ? null : ["resolution, k₁η up to", formatDigits(k1max_eta, 2)],
  ];
}

/** How several probes at one x make the station. */
function probesRow({ probes = [] }: StationResult): SettingRow | null {
  if (probes.length < 2) return null;
  const apart = probes.filter(({ setAside }) => setAside).length;
  const unlike = probes.filter(({ agrees }) => agrees === false).length;
  if (apart > 0) return ["probes", `${probes.length - apart} that agree; ${apart} set aside`];
  if (unlike > 0) return ["probes", `${probes.length}, of which not all agree`];
  const untold = probes.some(({ agrees }) => agrees === null);
  return [
    "probes",
    `${probes.length}, averaged${untold ? "; whether they agree is not known" : ": they agree"}`,
  ];
}

function intervalText(key: string, { facts, duration }: StationResult): string {
  if (facts.integralTimes === null)
    return duration === null
      ? "from the errors given in the profile, where there are any"
      : "none: the integral time is not known";
  if (facts.groups === 0) return "none: the record is too short";
  if (/^(L11|T_int|L_[vw]$)/.test(key)) {
    return facts.lines === undefined
      ? "relative error √(4 τ*/T) of the integral time"
      : "relative error from the separation at the first zero and the length of all independent lines";
  }
  const groups = `jackknife over ${facts.groups} groups of ${facts.lines === undefined ? "blocks" : "snapshots"}`;
  const student = `Student’s t with ${facts.groups - 1} degrees of freedom`;
  if (key === "epsilon_inertial")
    return `${groups} and, of resampled spectra, the choice of the range; ${student}`;
  return `${groups}, ${student}`;
}

const percent = (share: number) => withUnit(formatDigits(100 * share, 2), "%");
