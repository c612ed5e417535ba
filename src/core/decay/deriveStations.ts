import type { DecayResult, DecaySettings } from "../decayResult.ts";
import { isEstimate, missing, type Quantity, scaled } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { lawAt, lawVariance } from "./lawBand.ts";
import { lawDistance } from "./lawDistance.ts";
import { logEstimate, powerProduct } from "./powerProduct.ts";
import { relativeError } from "./relativeError.ts";
import { scalesFromDissipation } from "./scalesFromDissipation.ts";

/**
 * What follows from the fitted law at each station: the dissipation of the decay, its balance against the measured one,
 * and where the decay is the adopted route, the scales that rest on it.
 *     epsilon_decay = -U dk/dx = n U k/(x - x0), k from the law;   balance = epsilon_decay/epsilon_gradient
 * and along the time of flight epsilon_decay = -dk/dt = n Us k/(s - s0).
 * The law says nothing outside its window: there these are missing.
 * @param stations as reduction left them, never derived ones; returned in their order
 * @param decay    of the same stations and settings
 * @returns        new stations; epsilon in m²/s³
 * @see            Comte-Bellot & Corrsin (1971), J. Fluid Mech. 48, 273, eq. (50)
 */
export function deriveStations(
  stations: readonly StationResult[],
  decay: DecayResult,
  settings: DecaySettings,
): StationResult[] {
  return stations.map((station) => {
    const epsilon_decay = dissipationOfDecay(station, decay, settings);
    const balance = powerProduct(1, [
      [epsilon_decay, 1],
      [station.epsilon_gradient, -1],
    ]);
    const derived = { ...station, epsilon_decay, balance };
    return adoptsDecay(station, settings) ? withScales(derived, settings) : derived;
  });
}

/**
 * Whether a station's dissipation is that of the decay: chosen, or by default for an LES, whose gradients are
 * resolved only, and for a profile that brings none.
 */
export function adoptsDecay(station: StationResult, { dissipation, kind }: DecaySettings): boolean {
  if (dissipation !== "auto" && dissipation !== "decay") return false;
  if (station.duration === null) return !isEstimate(station.epsilon);
  return dissipation === "decay" || kind === "les";
}

function dissipationOfDecay(station: StationResult, decay: DecayResult, settings: DecaySettings): Quantity {
  const { law, quantity, n } = decay;
  if (quantity === "q") return missing("the profile's own quantity is not known to be an energy");
  if (law === null) return missing(isEstimate(n) ? "there is no law" : n.why);
  const { x } = station;
  const slack = 1e-9 * Math.max(...decay.window.map(Math.abs));
  if (x < decay.window[0] - slack || x > decay.window[1] + slack)
    return missing("the station lies outside the fit window, where the law was not fitted");
  const q = lawAt(law, x);
  if (q === null) return missing("the station lies before the virtual origin");
  if (settings.along === "x" && !law.flight && !isEstimate(station.U))
    return missing("no mean velocity at this station");
  const energy = q * (decay.speed ?? 1) ** 2 * (quantity === "uu" ? 3 / 2 : 1);
  const slope = (law.n * energy) / lawDistance(law, x);
  const ofLaw = logEstimate(slope, Math.sqrt(lawVariance(law, x, 1)), law.freedom ?? null);
  if (law.flight) return scaled(ofLaw, law.flight.speed);
  if (settings.along === "t" || !isEstimate(station.U)) return ofLaw;
  // a U without an interval (a short record, a profile) is far better known than the law
  return relativeError(station.U) === null
    ? scaled(ofLaw, station.U.value)
    : powerProduct(1, [
        [ofLaw, 1],
        [station.U, 1],
      ]);
}

/** The adopted dissipation and the scales it fixes; what a profile brought itself is kept. */
function withScales(station: StationResult, { kinematicViscosity }: DecaySettings): StationResult {
  const epsilon = station.epsilon_decay;
  const scales = scalesFromDissipation(longitudinal(station), epsilon, station.L11, kinematicViscosity);
  if (station.duration !== null) return { ...station, epsilon, ...scales };
  const own = isEstimate(station.lambda) ? { lambda: station.lambda } : {};
  return { ...station, epsilon, ...scales, ...own };
}

/** Variance of the component along the line that distances are taken on: that of u, but on lines across the stream. */
function longitudinal({ facts, uu, vv, ww }: StationResult): Quantity {
  const along = facts.lines?.along;
  return along === "y" ? vv : along === "z" ? ww : uu;
}
