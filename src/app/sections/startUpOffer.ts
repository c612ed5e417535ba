import { type StartUpTime, startUpTime } from "../../core/decay/startUpTime.ts";
import type { CaseView } from "../session/caseView.ts";

/**
 * What the checks propose to leave out of a case's records; null where every record begins as it goes on, and while
 * they are reduced anew.
 */
export function startUpOffer({ stations, of, work }: CaseView): StartUpTime | null {
  if (work !== null) return null;
  const found = startUpTime(stations);
  // told from the first sample kept: what is left out already comes before it
  return found && { ...found, time: roundUp(of.sheet.startup + found.time) };
}

/** Three digits are enough for a time to leave out; never less than what was found. */
function roundUp(time: number): number {
  const unit = 10 ** (Math.floor(Math.log10(time)) - 2);
  return Number((Math.ceil(time / unit - 1e-9) * unit).toPrecision(12));
}
