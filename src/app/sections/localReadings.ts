import type { PickedCurve } from "../../figures/figureSpec.ts";

/** Wavenumbers times L11 at which the local spectrum is read off. */
export const readAt = [1, 3, 10, 30] as const;

export interface LocalReading {
  /** k1 L11 asked for. */
  readonly at: number;
  readonly slope: number;
  /** E22, E33 over what they are in isotropic flow; null where not measured. */
  readonly E22: number | null;
  readonly E33: number | null;
}

/** The nearest band, if it lies within a tenth of a decade. */
const near = Math.LN10 / 10;

/** Local slope and isotropy of one station at some scales; those that its spectrum does not reach are left out. */
export function localReadings({ station }: PickedCurve): LocalReading[] {
  const local = station.curves?.local;
  const length = station.L11.value;
  if (local === undefined || length === null || local.k1.length === 0) return [];
  return readAt.flatMap((at) => {
    const distances = Array.from(local.k1, (k) => Math.abs(Math.log((k * length) / at)));
    const i = distances.indexOf(Math.min(...distances));
    if (distances[i] > near) return [];
    const over = (E: Float64Array | null) =>
      E === null || !(local.E22_isotropic[i] > 0) ? null : E[i] / local.E22_isotropic[i];
    return [{ at, slope: local.slope[i], E22: over(local.E22), E33: over(local.E33) }];
  });
}
