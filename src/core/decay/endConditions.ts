import { bare, isEstimate, missing, type Quantity } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import type { Condition } from "./criterion.ts";

/** Up to where a decay can be followed. */
export const endTolerances = {
  /** Share of a domain's lateral extent that L11 may reach before the walls, or the periodic images, are felt. */
  extent: 0.25,
  /** Share of uu that the noise of the record may be. */
  noise: 0.02,
};

/**
 * What ends a decay law: L11 that feels the lateral extent, and a variance that sinks into the background, told by the
 * noise floor of the spectra over all wavenumbers they hold.
 *     noise/uu = floor k1max/uu,   k1max = pi/(U dt)
 * @param stations in order of x
 * @param extent   lateral size of the domain; null: not given, and not asked
 * @returns        each only where it can be asked
 * @see            Skrbek & Stalp (2000), Phys. Fluids 12, 1997, on decay in a bounded domain
 */
export function endConditions(stations: readonly StationResult[], extent: number | null): Condition[] {
  const ofExtent: Condition[] =
    extent === null
      ? []
      : [
          {
            key: "L11",
            words: `L11 below ${100 * endTolerances.extent} % of the lateral extent`,
            values: stations.map(({ L11 }) => L11),
            low: 0,
            high: endTolerances.extent * extent,
          },
        ];
  if (stations.every(({ facts }) => facts.noiseFloor === null)) return ofExtent;
  const background: Condition = {
    key: "background",
    words: `noise below ${100 * endTolerances.noise} % of the variance of u`,
    values: stations.map(noiseShare),
    low: 0,
    high: endTolerances.noise,
  };
  return [...ofExtent, background];
}

function noiseShare({ U, uu, facts, duration }: StationResult): Quantity {
  const { noiseFloor, step } = facts;
  if (duration === null || step === null) return missing("no record to see its noise in");
  if (!isEstimate(U) || !isEstimate(uu) || !(U.value > 0 && uu.value > 0))
    return missing("no mean or no variance of u");
  const share = ((noiseFloor ?? 0) * Math.PI) / (U.value * step) / uu.value;
  return bare(share, "the noise floor carries no interval");
}
