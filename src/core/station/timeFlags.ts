import type { Flag } from "../flag.ts";
import { welchDensity } from "../signal/welchDensity.ts";
import type { BranchCut } from "./branchCuts.ts";
import type { ClosedRecord } from "./recordChunks.ts";
import type { RecordPlan } from "./recordPlan.ts";
import type { StationPart } from "./stationPart.ts";

export interface TimeFacts {
  readonly plan: RecordPlan;
  readonly closed: ClosedRecord;
  readonly cuts: readonly BranchCut[];
  readonly part: StationPart;
  /** Samples sent once more under the same time. */
  readonly repeated: number;
}

/** All that is wrong with a record's times, and what was made of it. */
export function timeFlags({ plan, closed, cuts, part, repeated }: TimeFacts): Flag[] {
  const flags: Flag[] = [];
  if (cuts.length > 0 || repeated > 0) {
    flags.push({ code: "backward-time", text: cutText(cuts, repeated), value: cuts.length });
  }
  if (closed.gaps > 0) {
    const lost = closed.lost.toPrecision(3);
    const text = `${closed.gaps} ${closed.gaps === 1 ? "gap" : "gaps"} of more than ten steps, ${lost} of time in all: no correlation, segment or gradient reaches across.`;
    flags.push({ code: "gap", text, value: closed.gaps });
  }
  if (plan.weighted) {
    const loss = resamplingLoss(closed, part);
    const text = `${closed.unequal} time steps differ from the record's: moments are weighted with the steps; correlation, spectra and gradients come from cubic splines at the median step, which take ${(100 * loss).toPrecision(2)} % of the mean-square gradient at most.`;
    flags.push({ code: "unequal-steps", text, value: loss });
  }
  if (plan.rounded) {
    const found = `The time stamps have too few digits and agree with a constant step of ${plan.step.toPrecision(7)} within half a digit`;
    const text = plan.unconfirmed
      ? `${found}. Until read.times says "even" or "written", what needs the time between samples is missing.`
      : `${found}: it stands in their place.`;
    flags.push({ code: "rounded-times", text, value: plan.step });
  }
  return flags;
}

/** Restarts that the flag tells by themselves; all stand in the list of cuts. */
const mostTold = 3;

/** The first restarts: which time each went back to, and how much of the older run it cost. */
function cutText(cuts: readonly BranchCut[], repeated: number): string {
  const list = cuts
    .slice(0, mostTold)
    .map(
      ({ sample, time, dropped }) =>
        `at sample ${sample + 1} back to ${time} (${dropped} older samples left out)`,
    );
  const times = cuts.length === 1 ? "once" : `${cuts.length} times`;
  const back =
    cuts.length > 0
      ? `Time runs backward ${times}, and the newer run is kept: ${list.join("; ")}${cuts.length > mostTold ? "; and so on" : ""}.`
      : "";
  const twice =
    repeated > 0
      ? `${repeated} ${repeated === 1 ? "sample was" : "samples were"} sent once more under the same time: the newer one is kept.`
      : "";
  return [back, twice].filter((text) => text !== "").join(" ");
}

function resamplingLoss({ response }: ClosedRecord, { spectrum, step }: StationPart): number {
  if (spectrum === null || spectrum.segments === 0) return 0;
  const { size, segments } = spectrum;
  const totals = { size, segments, power: spectrum.power[0], edges: spectrum.edges[0] };
  return response.loss(welchDensity(totals, step, 0));
}
