import type { Quantity } from "../core/quantity.ts";
import { linearRange, present } from "./axisRange.ts";
import { endsOf } from "./stationPoints.ts";

/** Beyond a value so many widths of its interval are still shown. */
const shownWidths = 3;

/**
 * A range for numbers of which a few lie far off: all that lies within some widths of the adopted intervals; what is
 * farther runs out of the frame.
 * @param values  all that is drawn, in the unit of the axis
 * @param adopted what must be seen whole, times `factor` in the unit of the axis
 */
export function clippedRange(
  values: readonly (number | null)[],
  adopted: readonly Quantity[],
  factor = 1,
): [number, number] {
  const kept = adopted
    .map((quantity) => present(Object.values(endsOf(quantity))))
    .filter((of) => of.length > 0);
  if (kept.length === 0) return linearRange(values);
  const bounds = kept.map((ends): [number, number] => {
    const [low, high] = [Math.min(...ends) * factor, Math.max(...ends) * factor];
    const room = shownWidths * Math.max(high - low, 0.02 * Math.abs(high));
    return [low - room, high + room];
  });
  const least = Math.min(...bounds.map(([low]) => low));
  const most = Math.max(...bounds.map(([, high]) => high));
  const inside = present(values).map((value) => Math.min(Math.max(value, least), most));
  return linearRange(inside, { include: kept.flat().map((end) => end * factor) });
}
