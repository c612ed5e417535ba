import {
  type ComparedQuantity,
  type ComparedRatio,
  type Comparison,
  comparedQuantities,
} from "../comparison.ts";
import { bare, estimate, missing, type Quantity } from "../quantity.ts";
import { equivalentFrom } from "./equivalentBeyond.ts";
import type { Overlay, RatioCurve } from "./overlay.ts";
import type { PairSpreads, RatioSpread } from "./pairSamples.ts";
import { type Judgement, verdicts } from "./verdicts.ts";

/** 97.5 % point of the normal distribution. */
const normal = 1.959963984540054;
const notTested = "the largest departure is shown, not tested";
export const noErrors = "the stations of a case carry no errors and are too few to show their scatter";

/** The ratio of every quantity, second case to first: along the common range, on average, and what it comes to. */
export function pairRatios(laid: Overlay, spreads: PairSpreads, tolerance: number): Comparison["quantities"] {
  const formed = comparedQuantities.flatMap((quantity) => {
    const curve = laid.curves[quantity];
    const spread = spreads.ratios[quantity];
    return typeof curve === "string" || spread === null
      ? []
      : [{ quantity, logarithm: curve.mean, standard: spread.mean }];
  });
  const judged = verdicts(formed, tolerance);
  const entries = comparedQuantities.map((quantity): [ComparedQuantity, ComparedRatio] => {
    const at = formed.findIndex((ratio) => ratio.quantity === quantity);
    const judgement = at < 0 ? null : judged[at];
    const from = equivalentFrom(laid, spreads, quantity, tolerance);
    return [quantity, ratioOf(laid.curves[quantity], spreads.ratios[quantity], judgement, from, laid)];
  });
  return Object.fromEntries(entries) as Comparison["quantities"];
}

function ratioOf(
  curve: RatioCurve | string,
  spread: RatioSpread | null,
  judgement: Judgement | null,
  equivalent_from: number | null,
  laid: Overlay,
): ComparedRatio {
  const unjudged = { verdict: null, p_equivalent: null, p_different: null };
  if (typeof curve === "string") {
    const none = missing(curve);
    return {
      ratio: none,
      largest: none,
      ...unjudged,
      equivalent_from,
      curve: { xi: [], ratio: [], low: [], high: [] },
    };
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
    equivalent_from,
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
