import type { NearFieldSigns } from "../decayResult.ts";
import type { ChosenWindow } from "./chooseWindow.ts";
import type { CommonBlocks } from "./commonBlocks.ts";
import type { RawPoint } from "./decayPoints.ts";
import type { WindowFit } from "./fitWindow.ts";
import { placeAlong } from "./flightCourse.ts";
import { nearField } from "./nearField.ts";

/**
 * What speaks for a near field in or before a window: stations upstream of an automatic one that its chi-square left out,
 * since what made them leave the law dies out gradually and its rest passes the test; and a dying term inside.
 * @param points all stations of the fit, in order of x
 * @param window the one that was chosen or set
 */
export function nearFieldSigns(
  fitted: WindowFit,
  blocks: CommonBlocks | null,
  points: readonly RawPoint[],
  { first, leftOut }: ChosenWindow,
): NearFieldSigns {
  const { A, x0, n, length } = fitted.fit;
  const term = nearField(fitted, blocks);
  const before = leftOut > 0 ? points[first - 1] : null;
  const distance = before === null ? 0 : placeAlong(fitted.flight, before.x) - x0;
  return {
    left_out: leftOut,
    // a station upstream of the origin has no law to depart from
    departure: before !== null && distance > 0 ? before.q / (A * (distance / length) ** -n) - 1 : null,
    term: term?.excess ?? null,
    term_size: term?.size ?? null,
    p: term?.p ?? null,
  };
}
