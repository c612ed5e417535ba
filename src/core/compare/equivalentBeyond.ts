import type { ComparedQuantity, EquivalentBeyond } from "../comparison.ts";
import { bare, estimate, type Quantity } from "../quantity.ts";
import { meanBetween } from "./interpolate.ts";
import type { Overlay } from "./overlay.ts";
import type { PairSpreads } from "./pairSamples.ts";

/** 95 % and 97.5 % points of the normal distribution. */
const oneSided = 1.6448536269514722;
const twoSided = 1.959963984540054;

/** A quantity on one stretch: mean ln ratio, its error, and what the tolerance leaves over of it. */
interface Tested {
  readonly quantity: ComparedQuantity;
  readonly logarithm: number;
  /** Null where nothing tells it. */
  readonly standard: number | null;
  /** Standard errors by which the mean ratio lies within the tolerance; below 1.64 it is not shown to. */
  readonly room: number;
}

/**
 * From where on two cases are equivalent in all chosen quantities. Every stretch of three stations is tested by itself
 * (two one-sided tests at 5 %), from the last one upstream, and the first that fails ends the run: tests in an order
 * that was fixed beforehand need no correction for their number, and a claim that asks for all quantities at once needs
 * none for theirs. So the claim, that no stretch from there on departs by more than the tolerance, is wrong at most 5
 * times in 100, however many stretches were looked at.
 * @param chosen    quantities that all have to agree
 * @param tolerance d, > 0
 * @see   Maurer, Hothorn & Lehmacher (1995), in Biometrie in der chemisch-pharmazeutischen Industrie 6 (fixed order);
 *        Berger (1982), Technometrics 24, 295 (all at once)
 */
export function equivalentBeyond(
  laid: Overlay,
  spreads: PairSpreads,
  chosen: readonly ComparedQuantity[],
  tolerance: number,
): EquivalentBeyond {
  const tested = laid.stretches.map((_, i) => testedOn(laid, spreads, chosen, tolerance, i));
  const holds = tested.map(
    (all) => all.length === chosen.length && all.every(({ room }) => room >= oneSided),
  );
  const first = holds.lastIndexOf(false) + 1;
  const stretches = laid.stretches.map(([from, to], i) => {
    const narrowest = tested[i].reduce<Tested | null>(
      (least, one) => (least === null || one.room < least.room ? one : least),
      null,
    );
    return {
      from: laid.shown(from),
      to: laid.shown(to),
      equivalent: holds[i],
      narrowest:
        narrowest === null || tested[i].length < chosen.length
          ? null
          : { quantity: narrowest.quantity, ratio: ratioOf(narrowest) },
    };
  });
  const none = laid.stretches.length === 0 || first === laid.stretches.length;
  return {
    quantities: chosen,
    from: none ? null : stretches[first].from,
    why: why(laid, chosen, first === 0 ? null : (tested[first - 1] ?? null), none),
    stretches,
  };
}

/** Where a single quantity is equivalent from; null: nowhere. */
export function equivalentFrom(
  laid: Overlay,
  spreads: PairSpreads,
  quantity: ComparedQuantity,
  tolerance: number,
): number | null {
  return equivalentBeyond(laid, spreads, [quantity], tolerance).from;
}

/** The chosen quantities that can be told on one stretch: their curves cover it, and their errors are known. */
function testedOn(
  laid: Overlay,
  spreads: PairSpreads,
  chosen: readonly ComparedQuantity[],
  tolerance: number,
  stretch: number,
): Tested[] {
  const [from, to] = laid.stretches[stretch];
  const margin = Math.log1p(tolerance);
  return chosen.flatMap((quantity) => {
    const curve = laid.curves[quantity];
    const standard = spreads.ratios[quantity]?.stretches[stretch] ?? null;
    if (typeof curve === "string" || standard === null) return [];
    const { at } = curve;
    const reach = 1e-9 * Math.abs(at[at.length - 1] - at[0]);
    if (from < at[0] - reach || to > at[at.length - 1] + reach) return [];
    const logarithm = meanBetween(at, curve.logarithm, from, to);
    const left = margin - Math.abs(logarithm);
    const room = standard > 0 ? left / standard : left >= 0 ? 40 : -40;
    return [{ quantity, logarithm, standard, room }];
  });
}

function ratioOf({ logarithm, standard }: Tested): Quantity {
  if (standard === null) return bare(Math.exp(logarithm), "the errors are not known");
  const [low, high] = [-1, 1].map((side) => Math.exp(logarithm + side * twoSided * standard));
  return estimate(Math.exp(logarithm), low, high, { standard, freedom: null, scale: "log" });
}

/** Why the run begins no earlier; null where it covers all. */
function why(
  laid: Overlay,
  chosen: readonly ComparedQuantity[],
  stopped: readonly Tested[] | null,
  none: boolean,
): string | null {
  if (laid.why !== null) return laid.why;
  const absent = chosen.find((quantity) => typeof laid.curves[quantity] === "string");
  if (absent !== undefined) return String(laid.curves[absent]);
  if (laid.stretches.length === 0) return "the common range holds fewer than three stations of a case";
  if (stopped === null) return null;
  const which = none ? "the last stretch" : "the stretch before";
  if (stopped.length < chosen.length)
    return `a chosen quantity is not carried by the stations of ${which}, or has no errors there`;
  const beyond = stopped.some(({ room }) => room <= -oneSided);
  return beyond
    ? `${which} departs by more than the tolerance`
    : `the interval of ${which} reaches beyond the tolerance`;
}
