import type { DecayResult, DecaySettings } from "../decayResult.ts";
import type { Flag } from "../flag.ts";
import { isEstimate } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import type { ChosenWindow } from "./chooseWindow.ts";
import { lawDistance } from "./lawDistance.ts";
import { originSensitivity } from "./originSensitivity.ts";
import { speedVariation, steadySpeed } from "./speedVariation.ts";

/** Below this ratio of the last x - x0 to the first, n and x0 are hardly told apart. */
const shortSpan = 4;
const fewStations = 5;
/** A dying term that a pure law would show less often than this is told. */
const suspicious = 0.02;

/** All doubts about one case's decay, each with its figure. */
export function decayFlags(
  decay: DecayResult,
  window: ChosenWindow,
  used: readonly StationResult[],
  settings: DecaySettings,
): Flag[] {
  return [
    ...aboutData(decay, used, settings),
    ...("refused" in window.fitted
      ? [{ code: "law-refused" as const, text: `No law is fitted: ${window.fitted.refused}.` }]
      : aboutLaw(decay, window, settings)),
  ];
}

function aboutData(
  { assumption, weights, windowChosen, coordinate }: DecayResult,
  used: readonly StationResult[],
  settings: DecaySettings,
): Flag[] {
  const flags: Flag[] = [];
  if (assumption === "isotropic")
    flags.push({ code: "isotropy-assumed", text: "Only u was measured: isotropy is assumed, not tested." });
  if (assumption === "axisymmetric")
    flags.push({
      code: "axisymmetry-assumed",
      text: "One lateral component was measured: the other is taken as like it.",
    });
  if (weights === "equal" && (settings.weights === "sampling" || windowChosen === "auto"))
    flags.push({
      code: "equal-weights",
      text:
        settings.weights === "sampling"
          ? "Not all stations carry a sampling error: all weigh alike, and the scatter alone makes the intervals."
          : "All stations weigh alike: nothing tells an automatic window which of them leave the law.",
    });
  return [...flags, ...aboutSpeed(coordinate, used, settings)];
}

function aboutSpeed(
  coordinate: DecayResult["coordinate"],
  used: readonly StationResult[],
  settings: DecaySettings,
): Flag[] {
  if (settings.along === "t") return [];
  if (settings.coordinate === "flight" && coordinate !== "flight")
    return [
      {
        code: "flight-unknown",
        text: "The law was to run along the time of flight, but no station carries a U: it runs along x.",
      },
    ];
  const variation = speedVariation(used);
  if (variation === null || !(variation.beyondErrors > steadySpeed)) return [];
  const what =
    coordinate === "flight" ? "the law runs along the time of flight" : "x and time of flight differ";
  const { range } = variation;
  return [
    {
      code: "u-varies",
      text: `U varies by ${(100 * range).toFixed(1)} % along the window: ${what}.`,
      value: range,
    },
  ];
}

function aboutLaw(decay: DecayResult, window: ChosenWindow, settings: DecaySettings): Flag[] {
  const { law, p, stations, chi2_reduced } = decay;
  if (law === null) return [];
  const flags: Flag[] = [];
  const { along } = settings;
  const later = along === "t" ? "later" : "farther downstream";
  const sensitivity = originSensitivity(law, decay.window);
  const traded =
    settings.n !== null || sensitivity === null
      ? ""
      : ` Were ${along}0 one unit of ${along} ${later}, n would change by ${sensitivity.toPrecision(2)}.`;
  if (stations < fewStations)
    flags.push({
      code: "few-stations",
      text: `The law rests on ${stations} stations: hardly anything is left over to test it with.${traded}`,
      value: stations,
    });
  const [first, last] = decay.window;
  const ratio = lawDistance(law, last) / lawDistance(law, first);
  if (ratio < shortSpan)
    flags.push({
      code: "short-span",
      text: `The last ${along} - ${along}0 is ${ratio.toFixed(1)} times the first: n and x0 trade against each other.${traded}`,
      value: ratio,
    });
  if (settings.x0 !== null) flags.push(heldOrigin(sensitivity, `${later} by one unit of ${along}`));
  if (window.withoutPlateau)
    flags.push({
      code: "window-without-plateau",
      text: "No run of five stations agrees with one law within its sampling errors.",
    });
  flags.push(...aboutNearField(decay));
  if (p !== null && p < 0.05)
    flags.push({
      code: "chi-square-fails",
      text: `The scatter about the law exceeds the sampling errors (reduced chi-square ${(chi2_reduced ?? 0).toFixed(1)}): intervals are widened to it.`,
      value: p,
    });
  if ([decay.n, decay.x0].some((quantity) => isEstimate(quantity) && isHalfOpen(quantity)))
    flags.push({
      code: "half-open",
      text: "The interval of n or x0 has an open side: these stations do not bound it there.",
    });
  return flags;
}

/**
 * A rest of a near field smaller than the scatter passes the chi-square of the window, and the union of its intervals may
 * then not hold the truth.
 */
function aboutNearField({ near_field }: DecayResult): Flag[] {
  if (!near_field) return [];
  const { left_out, departure, term_size, p } = near_field;
  const code = "near-field" as const;
  if (left_out > 0) {
    const many =
      left_out === 1
        ? "One station before the window leaves"
        : `${left_out} stations before the window leave`;
    const last = departure === null ? "" : `, the last of them by ${percent(departure)}`;
    return [
      {
        code,
        text: `${many} the law${last}. What makes them leave dies out gradually: a rest below the scatter may remain in the window and turn n and x0.`,
        value: left_out,
      },
    ];
  }
  if (p === null || term_size === null || p >= suspicious) return [];
  return [
    {
      code,
      text: `A term that dies out along the window would fit better by ${Math.abs(term_size).toFixed(1)} standard errors (p = ${p.toPrecision(1)}): n drifts as the window begins later.`,
      value: term_size,
    },
  ];
}

const percent = (share: number) => `${(100 * share).toPrecision(2)} %`;

function isHalfOpen({ why_low, why_high }: { why_low?: string; why_high?: string }): boolean {
  return (why_low !== undefined) !== (why_high !== undefined);
}

/** Had the origin been held elsewhere. */
function heldOrigin(slope: number | null, step: string): Flag {
  if (slope === null) return { code: "held-origin", text: "The origin is held at the first station." };
  return {
    code: "held-origin",
    text: `The origin is held: were it held ${step}, n would change by ${slope.toPrecision(2)}.`,
    value: slope,
  };
}
