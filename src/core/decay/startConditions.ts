import { isEstimate, missing, type Quantity, scaled } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import type { Condition } from "./criterion.ts";

/** What a window's start is asked for by physics, and how closely. */
export const startTolerances = {
  /** Share by which U may depart from its last value. */
  speed: 0.01,
  /** Largest skewness of u, either sign; a normal distribution has none. */
  skewness: 0.1,
  /** Share by which u'/v' and u'/w' may depart from their last values. */
  isotropy: 0.1,
  /** Largest correlation coefficient of u and v, either sign. */
  shear: 0.05,
  /** The skewness of du/dx of developed turbulence lies below. */
  derivativeSkewness: -0.3,
};

/** The last stations whose mean is taken as the settled value. */
const lastStations = 3;

/**
 * What physics asks of a decay law's stations before any fit: U and the skewness of u as in a homogeneous stream,
 * u'/v' and u'/w' settled, no shear stress, and a cascade that has developed.
 * @param stations in order of x
 * @see   Mohamed & LaRue (1990), J. Fluid Mech. 219, 195
 */
export function startConditions(stations: readonly StationResult[]): Condition[] {
  const { speed, skewness, isotropy, shear, derivativeSkewness } = startTolerances;
  const all = Number.POSITIVE_INFINITY;
  const of = (key: "U" | "isotropy_uv" | "isotropy_uw") => stations.map((station) => station[key]);
  return [
    settled("U", `U within ${100 * speed} % of its last value`, of("U"), speed),
    {
      key: "skewness_u",
      words: `skewness of u within ±${skewness}`,
      values: stations.map(({ routes }) => routes.skewness_u ?? missing("no record to take a skewness from")),
      low: -skewness,
      high: skewness,
    },
    settled("isotropy_uv", `u'/v' within ${100 * isotropy} % of its last value`, of("isotropy_uv"), isotropy),
    settled("isotropy_uw", `u'/w' within ${100 * isotropy} % of its last value`, of("isotropy_uw"), isotropy),
    {
      key: "uv",
      words: `correlation coefficient of u and v within ±${shear}`,
      values: stations.map(shearCoefficient),
      low: -shear,
      high: shear,
    },
    developed(stations, derivativeSkewness, all),
  ];
}

/** The derivative skewness below its bound. */
export function developed(
  stations: readonly StationResult[],
  bound = startTolerances.derivativeSkewness,
  all = Number.POSITIVE_INFINITY,
): Condition {
  const values = stations.map(({ S_dudx }) => S_dudx);
  const words = `skewness of du/dx below ${String(bound).replace("-", "\u2212")}`;
  return { key: "S_dudx", words, values, low: -all, high: bound };
}

/** A quantity within a share of its last value, the mean of the last three; unknown with fewer than four. */
export function settled(
  key: string,
  words: string,
  values: readonly Quantity[],
  tolerance: number,
): Condition {
  const known = values.filter(isEstimate);
  if (known.length <= lastStations) {
    const few = missing("fewer than four stations carry it: there is no last value to settle on");
    return { key, words, values: values.map(() => few), low: 0, high: 0 };
  }
  const last = known.slice(-lastStations).reduce((sum, { value }) => sum + value / lastStations, 0);
  const ends = [last * (1 - tolerance), last * (1 + tolerance)].sort((a, b) => a - b);
  return { key, words, values, low: ends[0], high: ends[1] };
}

function shearCoefficient({ uu, vv, uv }: StationResult): Quantity {
  if (!isEstimate(uu) || !isEstimate(vv) || !(uu.value > 0 && vv.value > 0))
    return missing("u and v were not both measured");
  return scaled(uv, 1 / Math.sqrt(uu.value * vv.value));
}
