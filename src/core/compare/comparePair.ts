import {
  type AlignedOrigins,
  type CaseInput,
  type CompareSettings,
  type Comparison,
  compareDefaults,
} from "../comparison.ts";
import { bare, estimate, missing, type Quantity } from "../quantity.ts";
import { type Alignment, originsBack } from "./alignment.ts";
import { type CommonExponent, commonExponent } from "./commonExponent.ts";
import type { ComparedCase } from "./comparedCase.ts";
import { compareSpectra } from "./compareSpectra.ts";
import { equivalentBeyond } from "./equivalentBeyond.ts";
import { noDistance, type Overlay } from "./overlay.ts";
import { noErrors, pairRatios } from "./pairRatios.ts";
import type { LaidPair, Resampled } from "./resampleCases.ts";

/** 97.5 % point of the normal distribution. */
const normal = 1.959963984540054;

/** Everything the comparison of one pair is put together from. */
export interface PairFindings {
  readonly inputs: readonly CaseInput[];
  readonly cases: readonly ComparedCase[];
  readonly aligned: Alignment;
  readonly resampled: Resampled;
  readonly pair: LaidPair;
  /** Its place among the pairs resampled. */
  readonly at: number;
}

/**
 * Two cases side by side, second against first: each shifted by its own virtual origin, ratios on the common range of
 * xi = (x - x0)/ell, intervals by resampling the station values and refitting both origins each time.
 * @param settings alignment and tolerance of the verdicts
 */
export function comparePair(found: PairFindings, settings: CompareSettings): Comparison {
  const { inputs, aligned, resampled, at } = found;
  const { of, laid } = found.pair;
  const [first, second] = [inputs[of[0]], inputs[of[1]]];
  const spreads = resampled.pairs[at];
  const { tolerance, quantities = compareDefaults.quantities } = settings;
  const own = originsBy(found, "own");
  const common = originsBy(found, "common");
  const distance = (aligned.with === "common n" ? common : own)?.extra_distance;
  return {
    cases: [first.name, second.name],
    align: settings.align,
    tolerance,
    overlap: laid.overlap,
    why: laid.why,
    quantities: pairRatios(laid, spreads, tolerance),
    equivalent_beyond: equivalentBeyond(laid, spreads, quantities, tolerance),
    extra_distance: distance ?? missing(withoutLaw(found)),
    ...matchedPlaces(laid, spreads.matched, spreads.intensity),
    common_n: commonN(found),
    origins: { own, common },
    aligned_with: aligned.with,
    spectra: compareSpectra([first, second], found.pair, aligned),
  };
}

function linearNormal(value: number, standard: number): Quantity {
  const reach = normal * standard;
  return estimate(value, value - reach, value + reach, { standard, freedom: null, scale: "linear" });
}

/** Exponents and origins of the pair by one way of fitting; null where a case has no law, or the way was not tried. */
function originsBy(found: PairFindings, way: "own" | "common"): AlignedOrigins | null {
  const { aligned, resampled, inputs, cases, at } = found;
  const { of } = found.pair;
  const origins = originsBack(cases, aligned.origins)[way];
  const [a, b] = of.map((one) => origins?.[one] ?? null);
  if (a === null || b === null) return null;
  const held = of.map((one) => cases[one].law?.fitted.fit.held.x0 !== null);
  const spreads = resampled.origins[way];
  const origin = (one: 0 | 1, value: number): Quantity => {
    const spread = spreads?.[of[one]] ?? null;
    if (held[one]) return bare(value, "held, not fitted");
    return spread === null ? bare(value, unsettled) : linearNormal(value, spread);
  };
  const spread = resampled.pairs[at].distance[way];
  const unlike = noDistance(of.map((one) => inputs[one]));
  const apart =
    unlike !== null
      ? missing(unlike)
      : held.every(Boolean)
        ? bare(b - a, "both origins are held, not fitted")
        : spread === null
          ? bare(b - a, unsettled)
          : linearNormal(b - a, spread);
  const exponent = (one: 0 | 1): Quantity =>
    way === "common" && aligned.common !== null
      ? sharedExponent(aligned.common)
      : inputs[of[one]].decay.given_window.n;
  return { n: [exponent(0), exponent(1)], x0: [origin(0, a), origin(1, b)], extra_distance: apart };
}

const unsettled = "the refits do not settle on an origin";

function sharedExponent({ n, low, high }: CommonExponent): Quantity {
  return estimate(n, low ?? Number.NEGATIVE_INFINITY, high ?? Number.POSITIVE_INFINITY);
}

/** x_B - x_A at equal Tu, and both places. */
function matchedPlaces(
  { matched }: Overlay,
  spread: number | null,
  ofIntensity: number | null,
): Pick<Comparison, "matched_distance" | "matched"> {
  if (typeof matched === "string") {
    const none = missing(matched);
    return { matched_distance: none, matched: { x: [none, none], Tu: none } };
  }
  const { x, logarithm, distance } = matched;
  const told = (value: number) => (spread === null ? bare(value, noErrors) : linearNormal(value, spread));
  const [low, high] = [-1, 1].map((side) =>
    Math.exp(logarithm + side * normal * (ofIntensity ?? Number.NaN)),
  );
  return {
    matched_distance: told(distance),
    matched: {
      x: [bare(x, "chosen, not measured"), told(x + distance)],
      Tu:
        ofIntensity === null ? bare(Math.exp(logarithm), noErrors) : estimate(Math.exp(logarithm), low, high),
    },
  };
}

/** One exponent for this pair. */
function commonN(found: PairFindings): Comparison["common_n"] {
  const laws = found.pair.of.map((one) => found.cases[one].law);
  const fits = laws.flatMap((law) => (law === null ? [] : [law.fitted]));
  const none = { value: null, low: null, high: null, p: null };
  if (fits.length < 2) return { ...none, why: withoutLaw(found) };
  if (fits.some(({ fit }) => fit.held.n !== null)) return { ...none, why: "the exponent of a case is held" };
  // with two cases it has been found already
  const two = found.cases.filter(({ law }) => law !== null).length === 2;
  const { n, low, high, p, test, AICc } = (two ? found.aligned.common : null) ?? commonExponent(fits);
  return { value: n, low, high, p, test, AICc };
}

function withoutLaw({ cases, pair }: PairFindings): string {
  const names = pair.of.filter((one) => cases[one].law === null).map((one) => cases[one].name);
  return `${names.join(" and ")}: no law was fitted`;
}
