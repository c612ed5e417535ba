import { bare, isEstimate, missing, type Quantity } from "../quantity.ts";
import { studentQuantile } from "../signal/distributions/studentQuantile.ts";
import type { StationResult } from "../stationResult.ts";
import { groupsFor } from "./groupBlocks.ts";
import { shortestRecord } from "./sampling.ts";

/** What a record length is asked for. */
export const plannedNames = ["Tu", "L11", "lambda"] as const;
export type PlannedName = (typeof plannedNames)[number];

/** Rounds of a fixed point: the quantile of Student's t follows from the groups that the new length has. */
const rounds = 20;

/**
 * How long a record must be for an interval of a wanted width. Errors go with T^(-1/2),
 *     t(B(T) - 1) se √(T_now/T) = ln(1 + width),   B = T/(20 T_int) between 10 and 50,
 * and that of the integral length by its own law, se(ln L11) = √(4 τ* / T). No shorter than what is given any interval.
 * @param station  a station with intervals
 * @param width    relative half-width wanted, as 0.02; > 0
 * @returns        for each quantity the record length, s; missing where there is nothing to begin from, with the reason
 * @see   Lenschow, Mann & Kristensen (1994), J. Atmos. Ocean. Technol. 11, 661
 */
export function requiredDuration(
  station: StationResult,
  width: number,
): Readonly<Record<PlannedName, Quantity>> {
  return {
    Tu: durationFor(station, "Tu", width),
    L11: durationFor(station, "L11", width),
    lambda: durationFor(station, "lambda", width),
  };
}

function durationFor(station: StationResult, name: PlannedName, width: number): Quantity {
  if (!(width > 0)) return missing("the wanted half-width is not above zero");
  const { facts } = station;
  const quantity = station[name];
  if (!isEstimate(quantity)) return missing(`${name} itself is missing: ${quantity.why}`);
  const time = station.T_int.value;
  if (facts.integralTimes === null || time === null) {
    return missing("the integral time is not known, and with it not how errors shrink");
  }
  const now = facts.integralTimes * time;
  const least = shortestRecord * time;
  const reach = Math.log1p(width);
  if (name === "L11") {
    if (facts.tauStar === null) return missing("the correlation does not fall to zero");
    return planned(Math.max(least, 4 * facts.tauStar * (studentQuantile(0.975, null) / reach) ** 2));
  }
  if (quantity.error === undefined) {
    return missing(`${name} has no interval yet to scale from: ${quantity.why_low ?? "no error is known"}`);
  }
  const { standard, scale } = quantity.error;
  const relative = scale === "log" ? standard : standard / Math.abs(quantity.value);
  let length = now;
  for (let round = 0; round < rounds; round++) {
    const freedom = groupsFor(length / time) - 1;
    length = Math.max(least, now * ((studentQuantile(0.975, freedom) * relative) / reach) ** 2);
  }
  return planned(length);
}

function planned(length: number): Quantity {
  return bare(length, "a length to plan with: the error it is scaled from is itself an estimate");
}
