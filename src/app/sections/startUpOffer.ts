import type { StationResult } from "../../core/stationResult.ts";
import type { CaseView } from "../session/caseView.ts";

/** The time after which a case's records are steady, from their beginning, and the station that takes longest. */
export interface StartUpOffer {
  readonly time: number;
  readonly station: StationResult;
}

/**
 * What the checks propose to leave out of a case's records; null where every record begins as it goes on, and while
 * they are reduced anew.
 */
export function startUpOffer({ stations, of, work }: CaseView): StartUpOffer | null {
  if (work !== null) return null;
  const found = stations.flatMap((station) => {
    const flag = station.flags.find(({ code }) => code === "start-up");
    // told from the first sample kept: what is left out already comes before it
    return flag?.value === undefined ? [] : [{ time: roundUp(of.sheet.startup + flag.value), station }];
  });
  return found.length === 0 ? null : found.reduce((a, b) => (b.time > a.time ? b : a));
}

/** Three digits are enough for a time to leave out; never less than what was found. */
function roundUp(time: number): number {
  const unit = 10 ** (Math.floor(Math.log10(time)) - 2);
  return Number((Math.ceil(time / unit - 1e-9) * unit).toPrecision(12));
}
