import { type BodyArgument, type BodyKey, bodyKeys } from "../decayArgument.ts";
import type { BodySettings, DecayResult, DecaySettings, PowerLaw } from "../decayResult.ts";
import { bare, missing, type Quantity, scaled } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { type BodyCurve, bodyCurves } from "./bodyCurves.ts";
import { type GrowthCurve, growthCurve } from "./growthCurve.ts";
import { lawAt, lawChangeVariance } from "./lawBand.ts";
import { lawDistance, lawPlace, lawRate } from "./lawDistance.ts";
import { logEstimate } from "./powerProduct.ts";
import { targetPlace } from "./targetPlace.ts";

/** Places tried for the smallest miss of two targets. */
const places = 2000;

/**
 * What a body at a place of the empty stream would meet: intensity, lengths, Re_lambda and isotropy there, their change
 * over its chord, the places that meet its targets, and the intensity at the inflow that would.
 * @param stations derived, in order of x
 * @param decay    of the same stations
 * @param body     x and chord in the unit of x; Tu; L11 over the chord
 */
export function atBody(
  stations: readonly StationResult[],
  decay: DecayResult,
  settings: DecaySettings,
  body: BodySettings,
): BodyArgument {
  const { x, chord, Tu, L11 } = body;
  const curves = bodyCurves(stations, decay, settings);
  const used = new Set(decay.points.filter((point) => point.used).map((point) => point.x));
  const inWindow = stations.filter((station) => used.has(station.x));
  const growth = decay.law === null ? null : growthCurve(inWindow, decay.law);
  const noChord = missing("no chord is given");
  const at = each((key) => curves[key].at(x));
  const length = chord === null || L11 === null ? null : L11 * chord;
  return {
    x,
    chord,
    at,
    L11_chord: chord === null ? noChord : scaled(at.L11, 1 / chord),
    change: each((key) => (chord === null ? noChord : curves[key].change(x, x + chord))),
    targets: {
      Tu: Tu === null ? null : { target: Tu, x: targetPlace(curves.Tu, stations, Math.log(Tu)) },
      L11_chord:
        L11 === null
          ? null
          : {
              target: L11,
              x: length === null ? noChord : placeOfLength(growth, decay.law, Math.log(length)),
            },
    },
    both: Tu === null || length === null ? null : smallestMiss(curves.Tu, growth, Tu, length),
    inflow: Tu === null ? null : inflowIntensity(stations, decay, x, Tu),
  };
}

function each(of: (key: BodyKey) => Quantity): Record<BodyKey, Quantity> {
  return Object.fromEntries(bodyKeys.map((key) => [key, of(key)])) as Record<BodyKey, Quantity>;
}

/** Where the growing L11 reaches a length, within the stations that carry it. */
function placeOfLength(growth: GrowthCurve | null, law: PowerLaw | null, logarithm: number): Quantity {
  if (growth === null || law === null)
    return missing("no law, or fewer than three stations of its window carry an L11");
  const { slope, ends } = growth;
  if (!(slope > 0)) return missing("L11 does not grow along the window");
  const [first, last] = ends;
  const shortfall = (end: number) => Math.exp(growth.logarithm(end) - logarithm).toPrecision(3);
  if (growth.logarithm(first) > logarithm)
    return missing(`L11 is ${shortfall(first)} times the target at the first station of the window already`);
  if (growth.logarithm(last) < logarithm)
    return missing(`L11 is ${shortfall(last)} times the target at the last station of the window still`);
  // ln L11 is linear in ln(x - x0)
  const distance = lawDistance(law, first) * Math.exp((logarithm - growth.logarithm(first)) / slope);
  const at = lawPlace(law, distance);
  const reach = (1.959963984540054 * growth.error(at) * distance) / slope / lawRate(law, at);
  return { value: at, low: at - reach, high: at + reach };
}

/** The place at which the larger of both misses, as factors, is least. */
function smallestMiss(
  intensity: BodyCurve,
  growth: GrowthCurve | null,
  Tu: number,
  length: number,
): BodyArgument["both"] {
  if (growth === null) return null;
  const [first, last] = growth.ends;
  let best: { x: number; Tu: number; L11: number; miss: number } | null = null;
  for (let i = 0; i <= places; i++) {
    const x = first + ((last - first) * i) / places;
    const logarithm = intensity.logarithm(x);
    if (logarithm === null) continue;
    const ofTu = logarithm - Math.log(Tu);
    const ofL11 = growth.logarithm(x) - Math.log(length);
    const miss = Math.max(Math.abs(ofTu), Math.abs(ofL11));
    if (best === null || miss < best.miss) best = { x, Tu: ofTu, L11: ofL11, miss };
  }
  if (best === null) return null;
  const why = "the place of the smallest miss, no estimate";
  return { x: bare(best.x, why), Tu: Math.exp(best.Tu), L11_chord: Math.exp(best.L11) };
}

/** Tu at the first station of a law of the same n and x0 but another A, such that the body meets its target. */
function inflowIntensity(
  stations: readonly StationResult[],
  { law, quantity }: Pick<DecayResult, "law" | "quantity">,
  x: number,
  Tu: number,
): BodyArgument["inflow"] {
  if (stations.length === 0) return null;
  const from = stations[0].x;
  const none = (why: string) => ({ x: from, Tu: missing(why), extrapolated: true as const });
  if (law === null) return none("there is no law");
  if (quantity === "q") return none("the profile's own quantity is not known to be an energy");
  const [there, here] = [lawAt(law, from), lawAt(law, x)];
  if (there === null || here === null)
    return none("the first station, or the body, lies before the virtual origin");
  const standard = Math.sqrt(lawChangeVariance(law, from, x)) / 2;
  const value = Tu * Math.sqrt(there / here);
  return { x: from, Tu: logEstimate(value, standard, law.freedom ?? null), extrapolated: true };
}
