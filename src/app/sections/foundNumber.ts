import type { Comparison } from "../../core/comparison.ts";
import type { DecayResult } from "../../core/decayResult.ts";
import type { Quantity } from "../../core/quantity.ts";
import type { StationResult } from "../../core/stationResult.ts";
import type { CaseView } from "../session/caseView.ts";
import type { SettingRow } from "./definitionRows.ts";

/** Where a number comes from: a station, the fit of a case, two cases side by side, or several results at once. */
export type FoundNumber =
  | { readonly kind: "station"; readonly view: CaseView; readonly station: StationResult }
  | { readonly kind: "decay"; readonly view: CaseView; readonly decay: DecayResult }
  | {
      readonly kind: "comparison";
      readonly comparison: Comparison;
      readonly views: readonly CaseView[];
    }
  | {
      readonly kind: "page";
      readonly view: CaseView;
      /** As it stands on the page: "81 to 1 000". */
      readonly shown: string;
      readonly rows: readonly SettingRow[];
    };

/** The station, the fit or the comparison that holds this very quantity; null where it was made on the page. */
export function foundNumber(
  cases: readonly CaseView[],
  comparisons: readonly Comparison[],
  quantity: Quantity,
): FoundNumber | null {
  for (const view of cases) {
    const { decay } = view;
    if (decay && holds(decay, quantity)) return { kind: "decay", view, decay };
    for (const station of view.stations) {
      const { curves: _, blocks: __, ...numbers } = station;
      if (holds(numbers, quantity)) return { kind: "station", view, station };
    }
  }
  const comparison = comparisons.find((each) => holds(each, quantity));
  if (comparison === undefined) return null;
  const views = comparison.cases.flatMap((name) => cases.find((view) => view.name === name) ?? []);
  return { kind: "comparison", comparison, views };
}

/** Whether a result holds this very quantity, however deep: lists of plain numbers are passed by. */
function holds(result: unknown, quantity: Quantity): boolean {
  if (result === quantity) return true;
  if (result === null || typeof result !== "object" || ArrayBuffer.isView(result)) return false;
  if (Array.isArray(result))
    return typeof result[0] === "object" && result.some((one) => holds(one, quantity));
  return Object.values(result).some((inner) => holds(inner, quantity));
}
