import type { ReduceSettings } from "../stationResult.ts";
import { type IntegralTimes, integralTimes } from "./integralTimes.ts";
import { type JoinedCorrelation, joinCorrelations } from "./joinCorrelations.ts";
import { type JoinedRecord, joinParts } from "./joinParts.ts";
import { type JoinedSpectra, joinSpectra } from "./joinSpectra.ts";
import type { StationPart } from "./stationPart.ts";

/** Records of one station put together, with what their sums give at once. */
export interface StationBasis {
  readonly record: JoinedRecord;
  readonly correlation: JoinedCorrelation | null;
  readonly spectra: JoinedSpectra | null;
  readonly times: IntegralTimes;
}

export function stationBasis(parts: readonly StationPart[], settings: ReduceSettings): StationBasis {
  const record = joinParts(parts, settings);
  const correlation = joinCorrelations(record, settings.correlation === "unbiased");
  const spectra = joinSpectra(record);
  const times = integralTimes(correlation, spectra, settings.integralScale, record.untimed ?? undefined);
  return { record, correlation, spectra, times };
}
