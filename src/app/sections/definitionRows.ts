import type { DecayResult } from "../../core/decayResult.ts";
import { isEstimate, type Quantity, scaled } from "../../core/quantity.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatDigits, formatPosition, formatProbability, withUnit } from "../../figures/formatNumber.ts";
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
const differences = [
  ...["gradient_u", "gradient_difference2", "gradient_difference2_expected"],
  ...["gradient_difference4", "gradient_difference4_expected"],
];
/** Routes to the same quantity, by how its key begins; the first that fits. */
const families: readonly (readonly [start: string, routes: readonly string[]])[] = [
  ["T_int", times],
  ["lambda", ["lambda_gradient", "lambda_f"]],
  ["eta", ["eta_gradient"]],
  ["Re_lambda", ["Re_lambda_gradient"]],
  ["epsilon", rates],
  ["gradient_v", []],
  ["gradient_w", []],
  ["gradient", differences],
  ["isotropy", ["K_v", "K_w"]],
  ["K_", ["K_v", "K_w"]],
];

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
      ? (["epsilon", "epsilon_gradient", "epsilon_decay", "epsilon_inertial"] as const).filter(
          (each) => each !== key && !(key === "balance" && each === "epsilon"),
        )
      : [];
  const family = families.find(([start]) => key.startsWith(start))?.[1] ?? [];
  return [
    ...fields.map((each) => ({ key: each, shownAs: each, quantity: station[each] })),
    ...family
      .filter((route) => route !== key && routes[route] !== undefined)
      .map((route) => ({ key: route, shownAs: route, quantity: routes[route] })),
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
