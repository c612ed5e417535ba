import {
  type CaseInput,
  type ComparedQuantity,
  type CompareSettings,
  comparedQuantities,
} from "../comparison.ts";
import { type CommonBlocks, commonBlocks } from "../decay/commonBlocks.ts";
import { fitWindow, type WindowFit } from "../decay/fitWindow.ts";
import { placeAlong } from "../decay/flightCourse.ts";
import { type CentredLaw, type LawProblem, lawProblem, powerLawDefaults } from "../decay/lawProblem.ts";
import { withCommonBlocks } from "../decay/withCommonBlocks.ts";
import type { DecayPoint, Flight } from "../decayResult.ts";
import { type ComparedSeries, comparedSeries } from "./comparedSeries.ts";

/** One case made ready: its law fitted anew from the points of its fit, and its quantities along the stations. */
export interface ComparedCase {
  readonly name: string;
  /** Null where the case has no law. */
  readonly law: ComparedLaw | null;
  readonly series: Readonly<Record<ComparedQuantity, ComparedSeries | string>>;
  /** Stations compared, in order of x. */
  readonly x: readonly number[];
  /** Their places along what the law runs along: x, or the time of flight as a length. */
  readonly along: readonly number[];
  /** Null where the law runs along x. */
  readonly flight: Flight | null;
}

export interface ComparedLaw {
  readonly fitted: WindowFit;
  /** A copy whose station values a resampling overwrites. */
  readonly problem: LawProblem;
  /** Station values as they were measured. */
  readonly measured: Float64Array;
  /** Standard deviation of each station's ln q: sampling, or scatter where that is larger or alone. */
  readonly error: Float64Array;
  /** Stations fitted. */
  readonly count: number;
  /** Where the stations were sampled together: what moves them at once. */
  readonly blocks: CommonBlocks | null;
}

/**
 * @param input  fitted and derived
 * @param align  by x all stations are compared, else those of the fit window
 */
export function comparedCase(input: CaseInput, align: CompareSettings["align"]): ComparedCase {
  const used = input.decay.points.filter((point) => point.used);
  const inWindow = new Set(used.map((point) => point.x));
  const stations = [...input.stations]
    .sort((a, b) => a.x - b.x)
    .filter(({ x }) => align === "x" || inWindow.has(x));
  const series = Object.fromEntries(
    comparedQuantities.map((quantity) => [quantity, comparedSeries(input, stations, quantity)]),
  ) as Record<ComparedQuantity, ComparedSeries | string>;
  const { flight = null, law } = input.decay;
  return {
    name: input.name,
    law: law === null ? null : comparedLaw(input, used, flight),
    series,
    x: stations.map(({ x }) => x),
    along: stations.map(({ x }) => placeAlong(flight, x)),
    flight,
  };
}

function comparedLaw(
  { stations, decay, decaySettings }: CaseInput,
  used: readonly DecayPoint[],
  flight: Flight | null,
): ComparedLaw | null {
  const places = new Set(used.map(({ x }) => x));
  const inWindow = [...stations].filter(({ x }) => places.has(x)).sort((a, b) => a.x - b.x);
  const blocks = inWindow.length === used.length ? commonBlocks(inWindow, decay, decaySettings) : null;
  const fitted = withCommonBlocks(fitWindow(used, decaySettings, flight), blocks, 0);
  if ("refused" in fitted) return null;
  const errors = used.map((point) => point.smoothedError).filter((error) => error !== null);
  const known = errors.length === used.length ? errors : null;
  const x = used.map((point) => placeAlong(flight, point.x));
  const problem = lawProblem(
    { x, q: used.map((point) => point.q), error: known },
    { ...powerLawDefaults, residuals: decaySettings.residuals, length: fitted.fit.length },
  );
  const root = Math.sqrt(fitted.variance);
  const error = used.map((point, i) => {
    if (known !== null) return known[i] * root;
    return problem.linear ? root / point.q : root;
  });
  return {
    fitted,
    problem,
    measured: problem.y.slice(),
    error: Float64Array.from(error),
    count: x.length,
    blocks,
  };
}

/** Overwrites the station values of a law's copy with measured ones moved by `shift` in ln q. */
export function moveStations(law: ComparedLaw, shift: Float64Array): void {
  const { problem, measured } = law;
  for (let i = 0; i < problem.count; i++)
    problem.y[i] = problem.linear ? measured[i] * Math.exp(shift[i]) : measured[i] + shift[i];
}

/**
 * ln of the energy's slope -dq/dx at each station of a law about its centre:
 *     ln q + ln(b/(1 + kappa d))
 */
export function logSlopes({ d }: LawProblem, { c, b, kappa }: CentredLaw, out: Float64Array): void {
  for (let i = 0; i < d.length; i++) {
    const t = kappa * d[i];
    const g = Math.abs(t) < 1e-6 ? d[i] : Math.log1p(t) / kappa;
    out[i] = c - b * g + Math.log(b) - Math.log1p(t);
  }
}
