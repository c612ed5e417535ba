import { bare } from "../../core/quantity.ts";
import type { LineFacts, StationFacts, StationResult } from "../../core/stationResult.ts";
import type { RouteColumn } from "./StationRoutes.tsx";

const counted = "counted, not estimated";
const chosen = "chosen or found for this record, not estimated";
const ofTheRecord = "it carries the error of the integral time";
const ofTheSpectrum = "it follows from the spectrum as estimated";

/** A number of the station that has no interval, with the reason. */
function column(
  key: string,
  why: string,
  of: (station: StationResult) => number | null | undefined,
): RouteColumn {
  return {
    key,
    of: (station) => {
      const value = of(station);
      return value == null ? undefined : bare(value, why);
    },
  };
}

type NumberFact = {
  [K in keyof StationFacts]-?: NonNullable<StationFacts[K]> extends number ? K : never;
}[keyof StationFacts];
const fact = (key: NumberFact, why: string) => column(key, why, ({ facts }) => facts[key]);

type NumberOfLines = {
  [K in keyof LineFacts]-?: NonNullable<LineFacts[K]> extends number ? K : never;
}[keyof LineFacts];
const ofLines = (key: string, name: NumberOfLines, why: string) =>
  column(key, why, ({ facts }) => facts.lines?.[name]);

/** How long a record is, and in how many pieces it was taken. */
export const recordColumns: readonly RouteColumn[] = [
  column("samples", counted, ({ samples }) => (samples > 0 ? samples : null)),
  column("duration", counted, ({ duration }) => duration),
  fact("step", chosen),
  fact("integralTimes", ofTheRecord),
  fact("groups", counted),
  fact("segment", chosen),
  fact("segments", counted),
  fact("recoveredVariance", ofTheSpectrum),
];

/** Up to where correlations and gradients were formed, and what was corrected. */
export const limitColumns: readonly RouteColumn[] = [
  fact("tauStar", ofTheRecord),
  fact("lagLimit", chosen),
  fact("cutoff", ofTheSpectrum),
  fact("noiseFloor", ofTheSpectrum),
  fact("shareBeyondCutoff", ofTheSpectrum),
  fact("cutoffSensitivity", ofTheSpectrum),
  fact("taylorFactor", "its errors are those of the variances"),
  fact("k1max_eta", ofTheSpectrum),
];

/** How lines were sampled. */
export const lineColumns: readonly RouteColumn[] = [
  ofLines("points", "points", counted),
  ofLines("spacing", "spacing", chosen),
  ofLines("lineLength", "length", chosen),
  ofLines("parallel", "parallel", counted),
  ofLines("snapshots", "snapshots", counted),
  ofLines("independentSnapshots", "independentSnapshots", "it rests on the integral time of the snapshots"),
  ofLines("independentSamples", "independentSamples", ofTheRecord),
];

/** Largest over smallest integral time of the routes. */
export const spreadColumn: RouteColumn = fact("integralScaleSpread", "each route carries its own interval");
