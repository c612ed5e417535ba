import type { Contour } from "../core/decayArgument.ts";
import { arguedOf } from "./arguedOf.ts";
import type { FigureCase } from "./figureSpec.ts";

/** A closed curve in the plane of n and x0/ℓ; where it is cut off, it runs upstream without end. */
export interface Region {
  readonly n: readonly number[];
  readonly x0: readonly number[];
  readonly closed: boolean;
}

/** The joint regions of one case, with what stands beside them. */
export interface Regions {
  readonly inner: Region;
  readonly outer: Region;
  /** The ellipses of the covariance, at the same two levels. */
  readonly ellipses: readonly Region[];
  /** Some of the refits. */
  readonly cloud: Omit<Region, "closed">;
  /** True where the case has been fitted anew since. */
  readonly stale: boolean;
}

/** The profile's own contours at 68 % and 95 %; null where x0 or n was held, or nothing was argued yet. */
export function jointRegionsOf(of: FigureCase): Regions | null {
  const argued = arguedOf(of);
  if (argued === null || argued.decay.law === null || argued.argument.region === null) return null;
  const { contours } = argued.argument.region;
  const { length } = argued.decay.law;
  const [inner, outer] = [
    contours.find(({ level }) => level < 0.9),
    contours.find(({ level }) => level > 0.9),
  ];
  if (inner === undefined || outer === undefined) return null;
  const over = (x0: readonly number[]) => x0.map((place) => place / length);
  const { cloud } = argued.argument.bootstrap ?? { cloud: { n: [], x0: [] } };
  return {
    inner: regionOf(inner, length),
    outer: regionOf(outer, length),
    ellipses: [inner, outer].map(({ ellipse }) => regionOf({ ...ellipse, closed: true }, length)),
    cloud: { n: cloud.n, x0: over(cloud.x0) },
    stale: argued.stale,
  };
}

function regionOf({ n, x0, closed }: Pick<Contour, "n" | "x0" | "closed">, length: number): Region {
  return { n: [...n, n[0]], x0: [...x0, x0[0]].map((place) => place / length), closed };
}

/** Upstream of the best origin a cut-off region is drawn so many times as far as it reaches downstream of it. */
const shownShare = 5;

/** The part of a region about its best fit that an axis has to hold. */
export function shownPart({ n, x0, closed }: Region, best: number): Omit<Region, "closed"> {
  if (closed) return { n, x0 };
  const reach = shownShare * Math.max(Math.max(...x0) - best, 0);
  const inside = x0.map((place) => best - place <= reach);
  return { n: n.filter((_, i) => inside[i]), x0: x0.filter((_, i) => inside[i]) };
}
