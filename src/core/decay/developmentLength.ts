import type { Criterion, Development } from "../decayArgument.ts";
import type { DecayResult, DecaySettings } from "../decayResult.ts";
import { bare, isEstimate, missing, type Quantity } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { type Condition, criterion } from "./criterion.ts";
import { developed, settled } from "./startConditions.ts";

export const developmentDefaults = {
  /** Share by which u'/v', u'/w' and the balance may depart from 1, or from their last value. */
  tolerance: 0.1,
};

/**
 * Development length, each criterion by itself: the first x from which u'/v' and u'/w' lie within a tolerance of 1, or
 * of their last value; from which the skewness of du/dx is below -0.3; from which the balance of the decay's dissipation
 * against the gradients' closes; and where the window of the law begins. Each in both readings: from where no interval
 * contradicts it, and from where every interval lies inside.
 * @param stations derived, in order of x
 * @param settings developmentTolerance; reference length
 * @see            Wu (2017), Annu. Rev. Fluid Mech. 49, 23
 */
export function developmentLength(
  stations: readonly StationResult[],
  decay: DecayResult,
  { referenceLength, developmentTolerance: tolerance = developmentDefaults.tolerance }: DecaySettings,
): Development {
  const xs = stations.map(({ x }) => x);
  const share = `${Number((100 * tolerance).toPrecision(3))} %`;
  const ratios = (["isotropy_uv", "isotropy_uw"] as const).flatMap((key): Condition[] => {
    const values = stations.map((station) => station[key]);
    const name = key === "isotropy_uv" ? "u'/v'" : "u'/w'";
    return [
      near(key, `${name} within ${share} of 1`, values, tolerance),
      settled(`${key}_settled`, `${name} within ${share} of its last value`, values, tolerance),
    ];
  });
  const balance = stations.map((station) => station.balance);
  const conditions = [
    ...ratios,
    developed(stations),
    near("balance", `balance of the dissipations within ${share} of 1`, balance, tolerance),
  ];
  return {
    tolerance,
    criteria: [...conditions.map((condition) => criterion(xs, condition)), windowStart(decay)],
    length: referenceLength,
    inflowL11:
      stations.map(({ L11 }) => L11).find(isEstimate) ?? missing("no station carries an integral scale"),
  };
}

/** A ratio within a share of 1, either way alike: 1/(1 + d) to 1 + d. */
function near(key: string, words: string, values: readonly Quantity[], tolerance: number): Condition {
  return { key, words, values, low: 1 / (1 + tolerance), high: 1 + tolerance };
}

function windowStart(decay: DecayResult): Criterion {
  const at =
    decay.law === null
      ? missing("there is no law")
      : bare(
          decay.window[0],
          decay.windowChosen === "auto"
            ? "chosen by a test on these very stations: drawing them anew would fail it"
            : "set by hand",
        );
  return { key: "window", words: "the window of the law begins", notContradicted: at, inside: at };
}
