import type { CaseInput, ComparedSpectra, SpectrumPair } from "../comparison.ts";
import { placeAlong } from "../decay/flightCourse.ts";
import { bare } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { type Alignment, usedOrigins } from "./alignment.ts";
import { kolmogorovSpectrum } from "./kolmogorovSpectrum.ts";
import { commonLengths } from "./overlay.ts";
import type { LaidPair } from "./resampleCases.ts";
import { spectralDistance } from "./spectralDistance.ts";

/** Largest ratio of (x - x0)/ell of two stations whose spectra are held against each other, less one. */
const within = 0.1;

/** A station of a fit window and its (x - x0)/ell. */
interface Place {
  readonly station: StationResult;
  readonly xi: number;
}

/**
 * Spectra of two cases at equal distance from their origins, in Kolmogorov form: of each two stations that are the
 * nearest to one another, where their (x - x0)/ell agree within 10 %. Nothing is interpolated along the stream.
 * @param inputs  of the pair
 * @param aligned origins; with "x" as the alignment those of each case's own law
 */
export function compareSpectra(
  inputs: readonly [CaseInput, CaseInput],
  { of }: LaidPair,
  aligned: Alignment,
): ComparedSpectra {
  const origins = usedOrigins(aligned, aligned.origins);
  const lengths = commonLengths(inputs);
  const places = inputs.map((input, i): Place[] => {
    const origin = origins[of[i]];
    if (origin === null) return [];
    const { flight = null } = input.decay;
    const used = new Set(input.decay.points.filter((point) => point.used).map(({ x }) => x));
    return input.stations
      .map((station) => ({ station, xi: (placeAlong(flight, station.x) - origin) / lengths[i] }))
      .filter(({ station, xi }) => used.has(station.x) && xi > 0);
  });
  const without = inputs.filter((_, i) => origins[of[i]] === null).map(({ name }) => name);
  if (without.length > 0) return none(`${without.join(" and ")}: no law was fitted`);
  const near = nearestPairs(places[0], places[1]);
  if (near.length === 0)
    return none("no two stations stand within 10 % of equal distance from their origins");
  const whys: string[] = [];
  const pairs = near.flatMap((two): SpectrumPair[] => {
    const found = pairAt(two, inputs);
    if (typeof found !== "string") return [found];
    whys.push(found);
    return [];
  });
  return pairs.length === 0 ? none(whys[0] ?? "there are no spectra") : { within, pairs, why: null };
}

function none(why: string): ComparedSpectra {
  return { within, pairs: [], why };
}

/** Stations that are the nearest to each other, either way, and near enough. */
function nearestPairs(first: readonly Place[], second: readonly Place[]): (readonly [Place, Place])[] {
  return first.flatMap((a) => {
    const b = nearest(a, second);
    if (b === null || nearest(b, first) !== a) return [];
    return Math.max(a.xi / b.xi, b.xi / a.xi) <= 1 + within ? [[a, b] as const] : [];
  });
}

function nearest({ xi }: Place, among: readonly Place[]): Place | null {
  const apart = (other: Place) => Math.abs(Math.log(other.xi / xi));
  return among.reduce<Place | null>(
    (best, other) => (best === null || apart(other) < apart(best) ? other : best),
    null,
  );
}

function pairAt(
  [a, b]: readonly [Place, Place],
  [first, second]: readonly CaseInput[],
): SpectrumPair | string {
  const [of, other] = [a, b].map(({ station }) => kolmogorovSpectrum(station));
  if (typeof of === "string") return `${first.name}: ${of}`;
  if (typeof other === "string") return `${second.name}: ${other}`;
  const found = spectralDistance(of, other);
  if (typeof found === "string") return found;
  const { distance, ...rest } = found;
  return {
    x: [a.station.x, b.station.x],
    xi: [a.xi, b.xi],
    distance: bare(distance, "held against what chance makes of it"),
    ...rest,
  };
}
