import type { DecaySettings } from "../core/decayResult.ts";
import type { CaseSheet } from "./caseSheet.ts";

/** What of a sheet decides how the decay is fitted. */
export function decaySettings(sheet: CaseSheet): DecaySettings {
  const { along, kinematicViscosity, kind, reference } = sheet;
  return {
    ...sheet.fit,
    along,
    units: sheet.units,
    referenceLength: reference.length,
    referenceSpeed: reference.speed,
    kinematicViscosity,
    dissipation: sheet.reduce.dissipation,
    kind,
    extent: sheet.extent,
    body: sheet.body,
    developmentTolerance: sheet.development.tolerance,
    simultaneous: sheet.simultaneous,
  };
}
