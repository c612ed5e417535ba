import type { DecaySettings, Flight } from "../decayResult.ts";
import type { RawPoint } from "./decayPoints.ts";
import { fitWindow, type Refusal, type WindowFit } from "./fitWindow.ts";
import { settledFrom } from "./settledFrom.ts";

/** The stations a law is fitted to, and why these. */
export interface ChosenWindow {
  /** Indices of the first and the last station used. */
  readonly first: number;
  readonly last: number;
  /** The law fitted there, or why there is none. */
  readonly fitted: WindowFit | Refusal;
  /** One sentence. */
  readonly reason: string;
  /** No window of five stations agrees with its sampling errors. */
  readonly withoutPlateau: boolean;
  /** Stations before the first that chi-square alone left out; 0 where the window was set by hand. */
  readonly leftOut: number;
}

/** An automatic window leaves at least this many stations. */
export const leastStations = 5;
/** What a settled ratio u'/v', and a settled derivative skewness, may still change. */
const settledTolerance = { isotropy: 0.1, skewness: 0.05 };

/**
 * The automatic window: the longest run of at least five stations whose chi-square about its own law has p > 0.05,
 * not before derivative skewness and isotropy have settled, if they do. Of two runs with as many stations the later is
 * taken, as a near field stands at the start. With equal weights there is no chi-square: all stations.
 * @param points in order of x
 * @param flight the course the law runs along; null: x
 */
export function chooseWindow(
  points: readonly RawPoint[],
  settings: DecaySettings,
  flight: Flight | null = null,
): ChosenWindow {
  const last = points.length - 1;
  const lawOf = (from: number, to: number) => fitWindow(points.slice(from, to + 1), settings, flight);
  const settled = settledStart(points);
  if (points.length < leastStations)
    return chosen(0, last, lawOf(0, last), "all stations: there are fewer than five to choose from");
  if (points.some((point) => point.smoothedError === null)) {
    const why = "without sampling errors nothing tells which stations leave the law";
    return chosen(0, last, lawOf(0, last), `all stations: ${why}`);
  }
  for (let count = last - settled.at + 1; count >= leastStations; count--) {
    for (let to = last; to - count + 1 >= settled.at; to--) {
      const fitted = lawOf(to - count + 1, to);
      if ("refused" in fitted || (fitted.p ?? 0) <= 0.05) continue;
      const agrees = `whose scatter about one law agrees with its sampling errors (p = ${shown(fitted.p ?? 0)})`;
      const first = to - count + 1;
      return {
        ...chosen(first, to, fitted, `the longest run of stations ${agrees}${settled.words}`),
        leftOut: first - settled.at,
      };
    }
  }
  const none = "no run of five stations agrees with one law within its sampling errors";
  return {
    ...chosen(settled.at, last, lawOf(settled.at, last), `all stations${settled.words}: ${none}`),
    withoutPlateau: true,
  };
}

function chosen(first: number, last: number, fitted: WindowFit | Refusal, reason: string): ChosenWindow {
  return { first, last, fitted, reason, withoutPlateau: false, leftOut: 0 };
}

const shown = (p: number) => (p < 0.01 ? p.toExponential(0) : p.toFixed(2));

/** From which station on u'/v', u'/w' and the derivative skewness stay; the first where they do not or are not known. */
function settledStart(points: readonly RawPoint[]): { at: number; words: string } {
  const { isotropy, skewness } = settledTolerance;
  const criteria = [
    {
      name: "u'/v'",
      at: settledFrom(
        points.map(({ station }) => station.isotropy_uv),
        isotropy,
      ),
    },
    {
      name: "u'/w'",
      at: settledFrom(
        points.map(({ station }) => station.isotropy_uw),
        isotropy,
      ),
    },
    {
      name: "the skewness of du/dx",
      at: settledFrom(
        points.map(({ station }) => station.S_dudx),
        skewness,
      ),
    },
  ];
  // a quantity that settles only at the last stations has not been seen to settle
  const latest = Math.min(points.length - leastStations, Math.floor(points.length / 2));
  const settle = criteria.filter(({ at }) => at !== null && at > 0 && at <= latest);
  if (settle.length === 0) return { at: 0, words: "" };
  const at = Math.max(...settle.map((criterion) => criterion.at ?? 0));
  const deciding = settle.filter((criterion) => criterion.at === at).map(({ name }) => name);
  return { at, words: `, after ${deciding.join(" and ")} ${deciding.length > 1 ? "have" : "has"} settled` };
}
