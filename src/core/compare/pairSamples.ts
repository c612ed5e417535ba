import { type ComparedQuantity, comparedQuantities } from "../comparison.ts";
import { placeAlong, placeBack } from "../decay/flightCourse.ts";
import { type IntensityLine, intensityAt, placeOfIntensity } from "./intensityLine.ts";
import { interpolate, meanBetween } from "./interpolate.ts";
import type { MovingCase, MovingSeries } from "./movingCase.ts";
import type { Overlay, RatioCurve } from "./overlay.ts";
import { spreadOf } from "./spreadOf.ts";

/** Standard errors of one mean ln ratio, of ln ratio along its curve, and of its means over the stretches. */
export interface RatioSpread {
  readonly mean: number;
  readonly curve: readonly (number | null)[];
  readonly stretches: readonly (number | null)[];
}

/** Standard errors that resampling tells of one pair. */
export interface PairSpreads {
  /** Null where a case carries no errors. */
  readonly ratios: Readonly<Record<ComparedQuantity, RatioSpread | null>>;
  /** Of x_B - x_A at equal Tu. */
  readonly matched: number | null;
  /** Of ln Tu at the chosen place. */
  readonly intensity: number | null;
}

interface RatioSamples {
  readonly curve: RatioCurve;
  readonly sides: readonly Side[];
  readonly means: Float64Array;
  readonly along: readonly Float64Array[];
  readonly stretches: readonly Float64Array[];
}

interface Side {
  readonly moving: MovingSeries;
  readonly places: Float64Array;
  readonly out: Float64Array;
}

/** Gathers what one pair of cases comes to in each draw. */
export interface PairSamples {
  /** Takes the draw that now stands in both cases. */
  readonly add: (
    draw: number,
    origins: readonly [number | null, number | null],
    lines: readonly [IntensityLine | null, IntensityLine | null],
  ) => void;
  readonly spreads: () => PairSpreads;
}

/** @param resamples draws that will come */
export function pairSamples(
  sides: readonly [MovingCase, MovingCase],
  laid: Overlay,
  resamples: number,
): PairSamples {
  const ratios = comparedQuantities.map((quantity) => ratioSamples(quantity, sides, laid, resamples));
  const s = sides.map(({ source }) => new Float64Array(source.x.length));
  const matched = new Float64Array(typeof laid.matched === "string" ? 0 : resamples);
  const intensity = new Float64Array(matched.length);
  const chosen = typeof laid.matched === "string" ? 0 : placeAlong(sides[0].source.flight, laid.matched.x);
  return {
    add(draw, origins, lines) {
      const [a, b] = lines;
      if (typeof laid.matched !== "string" && a && b) {
        const level = intensityAt(a, chosen);
        intensity[draw] = level;
        matched[draw] = placeBack(sides[1].source.flight, placeOfIntensity(b, level)) - laid.matched.x;
      }
      laid.coordinates(0, origins[0] ?? 0, a, s[0]);
      laid.coordinates(1, origins[1] ?? 0, b, s[1]);
      for (const ratio of ratios) if (ratio !== null) drawRatio(ratio, s, laid.stretches, draw);
    },
    spreads: () => ({
      ratios: Object.fromEntries(
        comparedQuantities.map((quantity, i) => [quantity, ratioSpread(ratios[i])]),
      ) as PairSpreads["ratios"],
      matched: matched.length > 0 ? spreadOf(matched) : null,
      intensity: intensity.length > 0 ? spreadOf(intensity) : null,
    }),
  };
}

function ratioSamples(
  quantity: ComparedQuantity,
  cases: readonly MovingCase[],
  { curves, stretches }: Overlay,
  resamples: number,
): RatioSamples | null {
  const curve = curves[quantity];
  if (typeof curve === "string") return null;
  const sides = cases.flatMap(({ series }): Side[] => {
    const moving = series[quantity];
    if (moving === null) return [];
    return [
      {
        moving,
        places: new Float64Array(moving.values.length),
        out: new Float64Array(curve.at.length),
      },
    ];
  });
  if (sides.length < 2) return null;
  const samples = () => new Float64Array(resamples);
  return {
    sides,
    curve,
    means: samples(),
    along: Array.from(curve.at, samples),
    stretches: stretches.map(samples),
  };
}

function drawRatio(
  { sides, curve: { at }, means, along, stretches }: RatioSamples,
  s: readonly Float64Array[],
  ranges: Overlay["stretches"],
  draw: number,
): void {
  sides.forEach(({ moving: { stations, values }, places, out }, side) => {
    for (let i = 0; i < places.length; i++) places[i] = s[side][stations[i]];
    interpolate(places, values, at, out);
  });
  const [a, b] = [sides[0].out, sides[1].out];
  for (let i = 0; i < b.length; i++) {
    b[i] -= a[i];
    along[i][draw] = b[i];
  }
  means[draw] = meanBetween(at, b, at[0], at[at.length - 1]);
  ranges.forEach(([from, to], i) => {
    stretches[i][draw] = meanBetween(at, b, from, to);
  });
}

function ratioSpread(ratio: RatioSamples | null): RatioSpread | null {
  const mean = ratio === null ? null : spreadOf(ratio.means);
  if (ratio === null || mean === null) return null;
  return { mean, curve: ratio.along.map(spreadOf), stretches: ratio.stretches.map(spreadOf) };
}
