import type { ReduceSettings } from "../core/stationResult.ts";
import type { CaseSheet } from "./caseSheet.ts";

/** What of a sheet decides how a record is reduced. */
export function reduceSettings(sheet: CaseSheet): ReduceSettings {
  const { kinematicViscosity, kind, simultaneous, periodic, sensorLength, reduce } = sheet;
  const referenceSpeed = sheet.reference.speed;
  return { kinematicViscosity, referenceSpeed, kind, simultaneous, periodic, sensorLength, ...reduce };
}
