import type { StationResult } from "../core/stationResult.ts";
import { plainQuantity } from "./plainQuantity.ts";

/** What a station's records were like: its probes beside each other, and where they were cut; keys only where there is any. */
export function plainRecord({ probes, cuts, cuts_more }: StationResult) {
  return {
    ...(probes
      ? {
          probes: probes.map(({ U, u_rms, ...probe }) => ({
            ...probe,
            U: plainQuantity(U),
            u_rms: plainQuantity(u_rms),
          })),
        }
      : {}),
    ...(cuts ? { cuts: [...cuts] } : {}),
    ...(cuts_more === undefined ? {} : { cuts_more }),
  };
}
