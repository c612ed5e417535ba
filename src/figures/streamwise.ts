import { labelOf } from "../core/catalogue.ts";
import { lawDistance } from "../core/decay/lawDistance.ts";
import { withReference } from "../core/symbolRuns.ts";
import { unitOf } from "../core/unitText.ts";
import type { FigureAxis, FigureCase, FigureOptions } from "./figureSpec.ts";
import { symbolHtml } from "./symbolHtml.ts";

/** Where a station stands on the chosen axis; null where its case has no such axis. */
export function streamwise(of: FigureCase, x: number, axis: FigureAxis): number | null {
  if (axis === "x") return x;
  if (axis === "x/ell") return of.length === null ? null : x / of.length;
  const law = of.decay?.law ?? null;
  return law === null ? null : lawDistance(law, x) / law.length;
}

/** The axis that every case has: the one asked for, else x. */
export function commonAxis(cases: readonly FigureCase[], wanted: FigureAxis): FigureAxis {
  const has = (of: FigureCase) => streamwise(of, 0, wanted) !== null;
  return cases.length > 0 && cases.every(has) ? wanted : "x";
}

/** The letter of the reference length where the cases agree on it, else ℓ. */
export function referenceSymbol(cases: readonly FigureCase[]): string {
  const symbols = new Set(cases.map(({ symbol }) => symbol));
  return symbols.size === 1 ? [...symbols][0] : "ℓ";
}

/** Whether lengths on a common axis are multiples of a reference length. */
export function isDivided(cases: readonly FigureCase[]): boolean {
  return cases.length > 0 && cases.every(({ length }) => length !== null);
}

/** The title of the streamwise axis, unit in brackets. */
export function streamwiseTitle(
  cases: readonly FigureCase[],
  axis: FigureAxis,
  { units, along }: Pick<FigureOptions, "units" | "along">,
): string {
  const divided = axis === "x/ell" || (axis === "(x-x0)/ell" && isDivided(cases));
  const spatial = axis === "x" ? "x" : divided ? axis : "x-x0";
  const runsInFlight = axis === "(x-x0)/ell" && cases.some(({ decay }) => decay?.law?.flight);
  const label = labelOf(spatial.replaceAll("x", along === "t" ? "t" : runsInFlight ? "s" : "x"));
  const title = symbolHtml(withReference(label.symbol, referenceSymbol(cases)));
  return titleWithUnit(title, divided ? "" : unitOf(label.dimension, units));
}

export function titleWithUnit(title: string, unit: string): string {
  return unit === "" ? title : `${title} (${unit})`;
}
