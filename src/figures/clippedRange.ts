import type { Quantity } from "../core/quantity.ts";
import { linearRange, present } from "./axisRange.ts";
import { endsOf } from "./stationPoints.ts";

/** Beyond an adopted interval so many widths of that given the window are still shown. */
const shownWidths = 4;

/** What must be seen whole, and the width that counts about it. */
export interface Kept {
  readonly adopted: Quantity;
  readonly given: Quantity;
  /** The unit of the axis, in the quantities' own. */
  readonly unit: number;
}

/**
 * A range for numbers of which a few lie far off: all that lies within some widths of the adopted intervals; what is
 * farther runs out of the frame.
 * @param values all that is drawn, in the unit of the axis
 */
export function clippedRange(values: readonly (number | null)[], kept: readonly Kept[]): [number, number] {
  const whole = kept.flatMap(({ adopted, given, unit }) => {
    const ends = present(Object.values(endsOf(adopted))).map((end) => end / unit);
    if (ends.length === 0) return [];
    const own = present(Object.values(endsOf(given))).map((end) => end / unit);
    const [low, high] = [Math.min(...ends), Math.max(...ends)];
    const width = own.length > 1 ? Math.max(...own) - Math.min(...own) : high - low;
    const room = shownWidths * Math.max(width, 0.02 * Math.abs(high));
    return [{ low, high, least: low - room, most: high + room }];
  });
  if (whole.length === 0) return linearRange(values);
  const least = Math.min(...whole.map((one) => one.least));
  const most = Math.max(...whole.map((one) => one.most));
  return linearRange(
    present(values).map((value) => Math.min(Math.max(value, least), most)),
    { include: whole.flatMap(({ low, high }) => [low, high]) },
  );
}
