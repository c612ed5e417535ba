import type { DecayPoint } from "../core/decayResult.ts";
import type { FigureCase } from "./figureSpec.ts";
import { type LawAt, lawAt } from "./lawCurve.ts";

/** A fitted quantity at one station with its interval, and its departure from the law. */
export interface DecayEntry {
  readonly x: number;
  readonly used: boolean;
  readonly q: number;
  readonly low: number | null;
  readonly high: number | null;
  /** q over the law, less one, in %; null where there is no law. */
  readonly residual: number | null;
  readonly residualLow: number | null;
  readonly residualHigh: number | null;
}

/** Every station of a case as the fit saw it. */
export function decayEntries(of: FigureCase): DecayEntry[] {
  const { decay } = of;
  if (decay === null) return [];
  return decay.points.map((point) => {
    const [low, high] = pointInterval(of, point);
    const law = decay.law === null ? null : lawAt(decay.law, point.x);
    return {
      x: point.x,
      used: point.used,
      q: point.q,
      low,
      high,
      residual: departure(point.q, law),
      residualLow: departure(low, law),
      residualHigh: departure(high, law),
    };
  });
}

const departure = (value: number | null, law: LawAt | null) =>
  value === null || law === null ? null : 100 * (value / law.value - 1);

/** The station's own 95 % interval, carried over to the ratio that was fitted. */
function pointInterval({ decay, stations }: FigureCase, point: DecayPoint): [number | null, number | null] {
  const station = stations.find(({ x }) => x === point.x);
  if (decay === null || station === undefined) return [null, null];
  const quantity = station[decay.quantity];
  if (quantity.value === null || quantity.value === 0) return [null, null];
  const ratio = point.q / quantity.value;
  return [quantity.low, quantity.high].map((end) => (end === null ? null : end * ratio)) as [
    number | null,
    number | null,
  ];
}
