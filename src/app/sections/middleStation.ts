import type { StationResult } from "../../core/stationResult.ts";
import type { CaseView } from "../session/caseView.ts";

/** The middle station of the window: away from the near field and from the noise at the end. */
export function middleStation({ stations, decay }: CaseView): StationResult | undefined {
  const used = stations.filter(
    ({ x }) => decay?.points.some((point) => point.used && point.x === x) ?? false,
  );
  return used[Math.floor(used.length / 2)];
}
