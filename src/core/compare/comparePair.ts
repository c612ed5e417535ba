import {
  type CaseInput,
  type ComparedQuantity,
  type ComparedRatio,
  type CompareSettings,
  type Comparison,
  comparedQuantities,
} from "../comparison.ts";
import { bare, estimate, missing, type Quantity } from "../quantity.ts";
import { type Alignment, alignment } from "./alignment.ts";
import { comparedCase } from "./comparedCase.ts";
import { type Overlay, overlay, type RatioCurve } from "./overlay.ts";
import { type Resampled, resamplePair } from "./resamplePair.ts";
import { type Judgement, verdicts } from "./verdicts.ts";

/** 97.5 % point of the normal distribution. */
const normal = 1.959963984540054;
const notTested = "the largest departure is shown, not tested";
const noErrors = "the stations of a case carry no errors and are too few to show their scatter";

/**
 * Two cases side by side, second against first: each shifted by its own virtual origin, ratios on the common range of
 * xi = (x - x0)/ell, intervals by resampling the station values and refitting both origins each time.
 * @param first    the case compared with
 * @param settings alignment and tolerance of the verdicts
 */
export function comparePair(first: CaseInput, second: CaseInput, settings: CompareSettings): Comparison {
  const cases = [comparedCase(first, settings.align), comparedCase(second, settings.align)] as const;
  const aligned = alignment(cases, settings);
  const laid = overlay(cases, aligned, [first, second]);
  const resampled = resamplePair(cases, aligned, laid);
  return {
    cases: [first.name, second.name],
    align: settings.align,
    tolerance: settings.tolerance,
    overlap: laid.overlap,
    why: laid.why,
    quantities: ratios(laid, resampled, settings.tolerance),
    extra_distance: extraDistance(aligned, resampled, cases),
    matched_distance: matchedDistance(laid, resampled),
    common_n: commonN(aligned),
    aligned_with: aligned.with,
  };
}

function ratios(laid: Overlay, resampled: Resampled, tolerance: number): Comparison["quantities"] {
  const formed = comparedQuantities.flatMap((quantity) => {
    const curve = laid.curves[quantity];
    const spread = resampled.ratios[quantity];
    return typeof curve === "string" || spread === null
      ? []
      : [{ quantity, logarithm: curve.mean, standard: spread.mean }];
  });
  const judged = verdicts(formed, tolerance);
  const entries = comparedQuantities.map((quantity): [ComparedQuantity, ComparedRatio] => {
    const at = formed.findIndex((ratio) => ratio.quantity === quantity);
    const judgement = at < 0 ? null : judged[at];
    return [quantity, ratioOf(laid.curves[quantity], resampled.ratios[quantity], judgement, laid)];
  });
  return Object.fromEntries(entries) as Comparison["quantities"];
}

function ratioOf(
  curve: RatioCurve | string,
  spread: Resampled["ratios"][ComparedQuantity],
  judgement: Judgement | null,
  laid: Overlay,
): ComparedRatio {
  const unjudged = { verdict: null, p_equivalent: null, p_different: null };
  if (typeof curve === "string") {
    const none = missing(curve);
    return { ratio: none, largest: none, ...unjudged, curve: { xi: [], ratio: [], low: [], high: [] } };
  }
  const largest = curve.logarithm.reduce(
    (most, value) => (Math.abs(value) > Math.abs(most) ? value : most),
    0,
  );
  const end = (side: 1 | -1) =>
    Array.from(curve.logarithm, (value, i) => {
      const standard = spread?.curve[i] ?? null;
      const at = standard === null ? Number.NaN : Math.exp(value + side * normal * standard);
      return Number.isFinite(at) ? at : null;
    });
  return {
    ratio: spread === null ? bare(Math.exp(curve.mean), noErrors) : logNormal(curve.mean, spread.mean),
    largest: bare(Math.exp(largest), notTested),
    ...(judgement ?? unjudged),
    curve: {
      xi: Array.from(curve.at, laid.shown),
      ratio: Array.from(curve.logarithm, Math.exp),
      low: end(-1),
      high: end(1),
    },
  };
}

function logNormal(logarithm: number, standard: number): Quantity {
  const [low, high] = [logarithm - normal * standard, logarithm + normal * standard].map(Math.exp);
  return estimate(Math.exp(logarithm), low, high, { standard, freedom: null, scale: "log" });
}

function linearNormal(value: number, standard: number): Quantity {
  const reach = normal * standard;
  return estimate(value, value - reach, value + reach, { standard, freedom: null, scale: "linear" });
}

function extraDistance(
  { origins, why }: Alignment,
  { distance }: Resampled,
  cases: Parameters<typeof alignment>[0],
): Quantity {
  if (origins === null) return missing(why ?? "a case has no virtual origin");
  const value = origins[1] - origins[0];
  const bothHeld = cases.every(({ law }) => law !== null && law.fitted.fit.held.x0 !== null);
  if (bothHeld) return bare(value, "both origins are held, not fitted");
  return distance === null
    ? bare(value, "the refits do not settle on an origin")
    : linearNormal(value, distance);
}

function matchedDistance({ matched }: Overlay, resampled: Resampled): Quantity {
  if (typeof matched === "string") return missing(matched);
  if (resampled.matched === null) return bare(matched.distance, noErrors);
  return linearNormal(matched.distance, resampled.matched);
}

function commonN({ common, why }: Alignment): Comparison["common_n"] {
  if (common === null)
    return { value: null, low: null, high: null, p: null, why: why ?? "a case has no exponent" };
  const { n, low, high, p, test, AICc } = common;
  return { value: n, low, high, p, test, AICc };
}
