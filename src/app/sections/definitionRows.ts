import type { DecayResult } from "../../core/decayResult.ts";
import { isEstimate, type Quantity, scaled } from "../../core/quantity.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { unitOf } from "../../core/unitText.ts";
import {
  formatCount,
  formatDigits,
  formatPosition,
  formatProbability,
  withUnit,
} from "../../figures/formatNumber.ts";
import type { CaseSheet } from "../../sheet/caseSheet.ts";

/** A setting as it worked out: what it is called, and what it was. */
export type SettingRow = readonly [name: string, text: string];

/** Another route to the same quantity. */
export interface Alternative {
  /** Key of the label that names it. */
  readonly key: string;
  /** Key of the label whose unit and digits it is shown with. */
  readonly shownAs: string;
  readonly quantity: Quantity;
}

const ofTimes = ["T_int", "L11", "L_v", "L_w", "Re_L", "C_epsilon"];
const ofGradients = [
  ...["lambda", "lambda_f", "gradient", "epsilon", "epsilon_gradient", "eta", "Re_lambda", "C_epsilon"],
  ...["balance", "S_dudx"],
];
const integralRoutes = {
  "zero-crossing": "integral to the first zero",
  "one-over-e": "lag at 1/e",
  exponential: "exponential fit",
  "low-frequency": "low-frequency limit",
  model: "model spectrum",
} as const;

/** What a number of a station rests on: record, correlation, spectrum, correction, and how its interval was made. */
export function stationSettings(key: string, station: StationResult, sheet: CaseSheet): SettingRow[] {
  const { facts } = station;
  const time = unitOf("T", sheet.units);
  const rows: (SettingRow | null)[] = [
    recordRow(station, time),
    ...(ofTimes.includes(key) ? timeRows(station, sheet, time) : []),
    ...(ofGradients.includes(key) ? gradientRows(station, sheet) : []),
    key === "epsilon" && facts.dissipationReason !== undefined ? ["adopted", facts.dissipationReason] : null,
    ["interval", intervalText(key, station)],
  ];
  return rows.filter((row) => row !== null);
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
  const { lagLimit, tauStar } = facts;
  if (lagLimit === null && tauStar === null) return [];
  const lag = (value: number) => withUnit(formatDigits(value, 3), time);
  return [
    ["route", integralRoutes[reduce.integralScale]],
    [
      "correlation",
      `${reduce.correlation}, ${reduce.detrend === "mean" ? "record mean" : "linear trend"} removed`,
    ],
    tauStar === null ? null : ["first zero", lag(tauStar)],
    lagLimit === null ? null : ["lags up to", lag(lagLimit)],
  ];
}

function gradientRows({ facts }: StationResult, { reduce, units }: CaseSheet): (SettingRow | null)[] {
  const { segment, segments, recoveredVariance, cutoff, shareBeyondCutoff, taylorFactor, k1max_eta } = facts;
  const percent = (share: number) => withUnit(formatDigits(100 * share, 2), "%");
  const wave = unitOf("1/L", units);
  return [
    segment === null
      ? null
      : ["segments", `${formatCount(segments)} of ${formatCount(segment)} samples, Hann, half overlapping`],
    recoveredVariance === null ? null : ["recovered variance", percent(recoveredVariance)],
    segment === null
      ? null
      : ["cut-off", cutoff === null ? "none" : withUnit(formatDigits(cutoff, 3), wave === "" ? "" : `rad/m`)],
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

function intervalText(key: string, { facts }: StationResult): string {
  if (facts.integralTimes === null) return "from the errors given in the profile, where there are any";
  if (facts.groups === 0) return "none: the record is too short";
  if (key === "L11" || key === "T_int") return "relative error √(4 τ*/T) of the integral time";
  const groups = `jackknife over ${facts.groups} groups of blocks`;
  return `${groups}, Student’s t with ${facts.groups - 1} degrees of freedom`;
}

/** What a number of a fit rests on. */
export function fitSettings(decay: DecayResult, sheet: CaseSheet): SettingRow[] {
  const unit = unitOf(sheet.along === "t" ? "T" : "L", sheet.units);
  const { window, windowChosen, chi2_reduced, p, together } = decay;
  const how = windowChosen === "auto" ? "automatic" : "given";
  const interval =
    windowChosen === "auto"
      ? "profile likelihood, the union over later starts"
      : "profile likelihood in this window";
  const rows: (SettingRow | null)[] = [
    [
      "window",
      `${formatPosition(window[0])} to ${withUnit(formatPosition(window[1]), unit)}, ${decay.stations} stations, ${how}`,
    ],
    ["residuals", decay.residuals === "log" ? "of ln q" : "of q"],
    ["weights", decay.weights === "sampling" ? "from the sampling errors" : "equal"],
    ["interval", interval],
    together == null ? null : ["sampled together", `${together.groups} common groups of blocks`],
    chi2_reduced === null
      ? null
      : [
          "reduced χ²",
          `${formatDigits(chi2_reduced, 2)}${p === null ? "" : `, p = ${formatProbability(p)}`}`,
        ],
    decay.converged ? null : ["search", `not converged after ${decay.iterations} steps`],
  ];
  return rows.filter((row) => row !== null);
}

const times = ["zero-crossing", "one-over-e", "exponential", "low-frequency", "model"].map(
  (of) => `T_int_${of}`,
);
const rates = ["epsilon_u-gradient", "epsilon_all-gradients", "epsilon_second-order", "epsilon_third-order"];
const byRoutes: Readonly<Record<string, readonly string[]>> = {
  T_int: times,
  lambda: ["lambda_gradient", "lambda_f"],
  eta: ["eta_gradient"],
  Re_lambda: ["Re_lambda_gradient"],
  epsilon: rates,
  epsilon_gradient: rates,
  gradient: [
    "gradient_difference2",
    "gradient_difference2_expected",
    "gradient_difference4",
    "gradient_difference4_expected",
  ],
  isotropy_uv: ["K_v", "K_w"],
  isotropy_uw: ["K_v", "K_w"],
};

/** The same quantity by every other route at this station. */
export function stationAlternatives(key: string, station: StationResult): Alternative[] {
  const { routes, U } = station;
  if (key === "L11")
    return times.flatMap((route) => {
      const time = routes[route];
      if (time === undefined || !isEstimate(U)) return [];
      return [{ key: route, shownAs: "L11", quantity: scaled(time, U.value) }];
    });
  const fields =
    key.startsWith("epsilon") || key === "balance"
      ? (["epsilon_gradient", "epsilon_decay", "epsilon_inertial"] as const).filter((each) => each !== key)
      : [];
  return [
    ...fields.map((each) => ({ key: each, shownAs: each, quantity: station[each] })),
    ...(byRoutes[key] ?? []).flatMap((route) =>
      routes[route] === undefined ? [] : [{ key: route, shownAs: route, quantity: routes[route] }],
    ),
  ];
}

/** Exponent or origin by the other routes; names are those of the table of fits. */
export function fitAlternatives(
  key: string,
  decay: DecayResult,
): readonly (readonly [name: string, quantity: Quantity])[] {
  if (key !== "n" && key !== "x0") return [];
  const { given_window, lambda_route, epsilon_route } = decay;
  return [
    ["given this window", given_window[key]],
    ["line of the Taylor scale", lambda_route[key]],
    ["law of the dissipation", epsilon_route[key]],
  ];
}
