import type { DecayResult } from "../../core/decayResult.ts";
import type { Quantity } from "../../core/quantity.ts";
import type { StationResult } from "../../core/stationResult.ts";
import type { CaseView } from "../session/caseView.ts";

/** Where a number comes from: a station, or the fit of a case. */
export type FoundNumber =
  | { readonly kind: "station"; readonly view: CaseView; readonly station: StationResult }
  | { readonly kind: "decay"; readonly view: CaseView; readonly decay: DecayResult };

/** The station or the fit that holds this very quantity; null where it was made on the page. */
export function foundNumber(cases: readonly CaseView[], quantity: Quantity): FoundNumber | null {
  for (const view of cases) {
    const { decay } = view;
    if (decay && inFit(decay).includes(quantity)) return { kind: "decay", view, decay };
    for (const station of view.stations)
      if (Object.values(station).includes(quantity) || Object.values(station.routes).includes(quantity))
        return { kind: "station", view, station };
  }
  return null;
}

function inFit(decay: DecayResult): readonly Quantity[] {
  const { n, x0, A, given_window, lambda_route, epsilon_route, growth } = decay;
  return [n, x0, A, growth.m, ...[given_window, lambda_route, epsilon_route].flatMap((of) => [of.n, of.x0])];
}
