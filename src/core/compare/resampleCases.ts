import { type Alignment, type Origins, originsBack, usedOrigins } from "./alignment.ts";
import type { ComparedCase } from "./comparedCase.ts";
import { movedLine, moveLaw, moveSeries, movingCase } from "./movingCase.ts";
import type { Overlay } from "./overlay.ts";
import { type PairSpreads, pairSamples } from "./pairSamples.ts";
import { spreadOf } from "./spreadOf.ts";

/** Two cases laid over one another, by their places among all. */
export interface LaidPair {
  readonly of: readonly [number, number];
  readonly laid: Overlay;
}

/** Standard errors told by resampling: of every case's origin, and of all that each pair gives. */
export interface Resampled {
  readonly origins: OriginSpreads;
  readonly pairs: readonly (PairSpreads & { readonly distance: PairDistances })[];
}
export interface OriginSpreads {
  readonly own: readonly (number | null)[];
  readonly common: readonly (number | null)[] | null;
}
/** Of x0_B - x0_A by both ways of fitting. */
export interface PairDistances {
  readonly own: number | null;
  readonly common: number | null;
}

const resamples = 500;

/**
 * Standard errors of all that a comparison gives, from station values drawn anew about the measured ones: each draw
 * moves ln q at every fitted station of every case, refits all laws, moves all other values by their own errors, and
 * forms the ratios of each pair again at the same places. What is drawn for a case follows from its name alone.
 */
export function resampleCases(
  cases: readonly ComparedCase[],
  aligned: Alignment,
  pairs: readonly LaidPair[],
): Resampled {
  const moving = cases.map((one, i) => movingCase(one, seedOf(one.name, cases.slice(0, i))));
  const samples = pairs.map(({ of: [a, b], laid }) => pairSamples([moving[a], moving[b]], laid, resamples));
  const drawn: Origins[] = [];
  for (let draw = 0; draw < resamples; draw++) {
    for (const one of moving) moveLaw(one);
    const { origins, own } = aligned.refit();
    drawn.push(originsBack(cases, origins));
    moving.forEach((one, i) => {
      moveSeries(one, own[i]);
    });
    const used = usedOrigins(aligned, origins);
    const lines = moving.map((one, i) => movedLine(one, used[i]));
    pairs.forEach(({ of: [a, b] }, i) => {
      samples[i].add(draw, [used[a], used[b]], [lines[a], lines[b]]);
    });
  }
  const of = (way: keyof Origins) => (value: (origins: readonly (number | null)[]) => number) =>
    spreadOf(Float64Array.from(drawn, (origins) => value(origins[way] ?? [])));
  const [own, common] = [of("own"), of("common")];
  const each = (spread: typeof own) => cases.map((_, i) => spread((at) => at[i] ?? Number.NaN));
  const apart = (spread: typeof own, [a, b]: readonly [number, number]) =>
    spread((at) => (at[b] ?? Number.NaN) - (at[a] ?? Number.NaN));
  return {
    origins: { own: each(own), common: aligned.origins.common === null ? null : each(common) },
    pairs: pairs.map(({ of: pair }, i) => ({
      ...samples[i].spreads(),
      distance: { own: apart(own, pair), common: apart(common, pair) },
    })),
  };
}

/** Hash of a name (FNV-1a), so that a seed follows from it; cases of one name each have their own. */
function seedOf(name: string, before: readonly ComparedCase[]): number {
  const text = `${name}\n${before.filter((other) => other.name === name).length}`;
  let hash = 0x811c9dc5;
  for (let i = 0; i < text.length; i++) hash = Math.imul(hash ^ text.charCodeAt(i), 0x01000193);
  return hash >>> 0;
}
