import type { DecayResult } from "../../core/decayResult.ts";
import type { Quantity } from "../../core/quantity.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatPosition, formatProbability } from "../../figures/formatNumber.ts";
import { formatScaled } from "../../figures/formatQuantity.ts";
import type { TableSettings } from "../stationsCsv.ts";
import { texText } from "./texText.ts";

/** A case with its fit, as the table needs it. */
export interface FittedCase {
  readonly name: string;
  readonly decay: DecayResult;
  /** Reference length and its letter; null: positions in the unit of x. */
  readonly length: number | null;
  readonly symbol: string;
  readonly settings: TableSettings;
}

/** The laws of all cases as a LaTeX table (package booktabs), with 95 % intervals and what they rest on. */
export function fitsTable(cases: readonly FittedCase[]): string {
  const origin = cases.every(({ settings }) => settings.along === "t") ? "t_0" : "x_0";
  return [
    "% needs \\usepackage{booktabs}",
    "\\begin{table}",
    "\\centering\\footnotesize\\setlength{\\tabcolsep}{2.5pt}",
    "\\caption{Power laws fitted to the decay, with 95\\,\\% intervals.}",
    "\\begin{tabular}{llrllrr}",
    "\\toprule",
    `case & window & stations & $n$ & $${origin}$ & $A$ & $p(\\chi^2)$ \\\\`,
    "\\midrule",
    ...cases.map((each) => `${row(each).join(" & ")} \\\\`),
    "\\bottomrule",
    "\\end{tabular}",
    "\\end{table}",
    "",
  ].join("\n");
}

function row({ name, decay, length, symbol, settings }: FittedCase): string[] {
  const { window, stations, n, x0, A, p } = decay;
  const plain = unitOf(settings.along === "t" ? "T" : "L", settings.units);
  const unit = length === null ? plain : symbol;
  const factor = length === null ? 1 : 1 / length;
  const place = (x: number) => formatPosition(x * factor);
  return [
    texText(name),
    `${texText(`${place(window[0])} to ${place(window[1])}`)}${unitText(unit, length !== null)}`,
    String(stations),
    quantity(n, 1),
    `${quantity(x0, factor)}${x0.value === null ? "" : unitText(unit, length !== null)}`,
    quantity(A, 1),
    p === null ? "--" : `$${formatProbability(p).replace("\u202f", "\\,")}$`,
  ];
}

function quantity(of: Quantity, factor: number): string {
  const { value, interval, power } = formatScaled(of, { factor, unit: "" });
  const times = power === null ? "" : `$\\,\\times\\,10^{${power}}$`;
  return `${texText(value)}${interval === null ? "" : ` (${texText(interval)})`}${times}`;
}

const unitText = (unit: string, isSymbol: boolean) =>
  unit === "" ? "" : `\\,${isSymbol ? `$${unit === "ℓ" ? "\\ell" : unit}$` : texText(unit)}`;
