import type { DecayArgument } from "../decayArgument.ts";
import type { DecayResult, DecaySettings } from "../decayResult.ts";
import type { StationResult } from "../stationResult.ts";
import { atBody } from "./atBody.ts";
import { bootstrapLaw } from "./bootstrapLaw.ts";
import { type CommonBlocks, commonBlocks } from "./commonBlocks.ts";
import { decayRoutes, routeDisagreements } from "./decayRoutes.ts";
import { developmentLength } from "./developmentLength.ts";
import { dissipationConstant } from "./dissipationConstant.ts";
import { everyStart } from "./everyStart.ts";
import { fitWindow, type WindowFit } from "./fitWindow.ts";
import { flightFit } from "./flightFit.ts";
import { growths } from "./growths.ts";
import { jointRegion } from "./jointRegion.ts";
import { localDecay } from "./localDecay.ts";
import { narrowing } from "./narrowing.ts";
import { originScan } from "./originScan.ts";
import { windowScan } from "./windowScan.ts";
import { withCommonBlocks } from "./withCommonBlocks.ts";

/**
 * All that is argued about a fitted decay beyond the fit: other windows, the joint region, other routes to n and x0, the
 * growth of the scales, where the flow has developed, what a body meets, and what would narrow the intervals.
 * It takes some tenths of a second, and is asked for once a change has come to rest.
 * @param stations derived, in order of x
 * @param decay    of the same stations and settings
 */
export function argueDecay(
  stations: readonly StationResult[],
  decay: DecayResult,
  settings: DecaySettings,
): DecayArgument {
  const points = decay.points.filter((point) => point.used);
  const used = new Set(points.map(({ x }) => x));
  const inWindow = stations.filter(({ x }) => used.has(x));
  const blocks = inWindow.length === points.length ? commonBlocks(inWindow, decay, settings) : null;
  const window = decay.law === null ? null : windowOf(decay, settings, blocks);
  const flight = flightFit(stations, decay, settings);
  const routes = decayRoutes(decay, settings, flight);
  const { body } = settings;
  return {
    scan: windowScan(stations, decay, settings),
    region: window === null ? null : jointRegion(window),
    everyStart: everyStart(points, settings, decay.flight, blocks),
    bootstrap: window === null ? null : bootstrapLaw(window, blocks),
    routes,
    disagreements: routeDisagreements(routes),
    originScan:
      points.length < 4
        ? null
        : originScan(
            points.map(({ x }) => x),
            points.map(({ q }) => q),
            decay.flight,
          ),
    local: decay.law === null ? null : localDecay(decay.points, decay.law),
    growths: growths(inWindow, decay),
    dissipationConstant: dissipationConstant(inWindow, decay.law),
    development: developmentLength(stations, decay, settings),
    body: body ? atBody(stations, decay, settings, body) : null,
    narrowing: window === null ? [] : narrowing(points, window),
    flight,
  };
}

/** The adopted law with all that a profile starts from. */
function windowOf(
  decay: DecayResult,
  settings: DecaySettings,
  blocks: CommonBlocks | null,
): WindowFit | null {
  const points = decay.points.filter((point) => point.used);
  const fitted = withCommonBlocks(fitWindow(points, settings, decay.flight), blocks, 0);
  return "refused" in fitted ? null : fitted;
}
