import type { BodyArgument } from "../core/decayArgument.ts";
import { type Quantity, scaled } from "../core/quantity.ts";
import { arguedOf } from "./arguedOf.ts";
import type { FigureCase } from "./figureSpec.ts";
import { endsOf } from "./stationPoints.ts";
import type { PlottedPoint } from "./stationTrace.ts";
import { isUsed } from "./windowOf.ts";

/** A case in the plane of intensity, per cent, and integral scale, in the numbers of the axis. */
export interface BodyPath {
  /** Stations that carry both numbers. */
  readonly points: readonly PlanePoint[];
  /** Where the body stands, if both numbers are known there: one or none. */
  readonly body: readonly PlanePoint[];
  readonly target: { readonly x: number | null; readonly y: number | null };
}

/** A point whose intensity has ends too. */
export interface PlanePoint extends PlottedPoint {
  readonly left: number | null;
  readonly right: number | null;
}

/**
 * @param perChord integral scales over the chord of the case's own body; else times `factor`
 */
export function bodyPath(of: FigureCase, perChord: boolean, factor: number): BodyPath {
  const body = bodyOf(of);
  const size = perChord ? 1 / (body?.chord ?? 1) : factor;
  const point = (x: number, Tu: Quantity, L11: Quantity): PlanePoint[] => {
    const [across, up] = [endsOf(scaled(Tu, 100)), endsOf(scaled(L11, size))];
    if (across.value === null || up.value === null) return [];
    return [
      {
        ...{ x: across.value, left: across.low, right: across.high },
        ...{ y: up.value, low: up.low, high: up.high },
        ...{ used: isUsed(of, x), station: x },
      },
    ];
  };
  return {
    points: of.stations.flatMap(({ x, Tu, L11 }) => point(x, Tu, L11)),
    body: body === null ? [] : point(body.x, body.at.Tu, body.at.L11),
    target: targetOf(body, perChord, factor),
  };
}

/** What a body meets in a case; null where none stands there. */
export function bodyOf(of: FigureCase): BodyArgument | null {
  return arguedOf(of)?.argument.body ?? null;
}

/** The targets in the numbers of the axes; null: not given, or a share of a chord that is not. */
function targetOf(body: BodyArgument | null, perChord: boolean, factor: number): BodyPath["target"] {
  const Tu = body?.targets.Tu?.target ?? null;
  const length = targetLength(body);
  const y = perChord ? (body?.targets.L11_chord?.target ?? null) : length === null ? null : length * factor;
  return { x: Tu === null ? null : 100 * Tu, y };
}

/** The integral scale that is wanted, in the unit of the chord. */
export function targetLength(body: BodyArgument | null): number | null {
  const inChords = body?.targets.L11_chord?.target ?? null;
  return inChords === null || body === null || body.chord === null ? null : inChords * body.chord;
}
