import type { Flag } from "../flag.ts";
import type { ProbedName, ProbeReading } from "../probeReading.ts";
import type { ProbeComparison } from "./compareProbes.ts";
import { probesText } from "./dividedStation.ts";
import type { StationMaterial } from "./stationQuantities.ts";

/** What is doubtful about putting the records of one x together. */
export function probeFlags({ record, compared }: StationMaterial): Flag[] {
  const flags: Flag[] = [];
  if (record.spectral.length > 0 && record.spectral.length < record.parts.length) {
    const others = record.parts.length - record.spectral.length;
    const text = `${others} of ${record.parts.length} records ${others === 1 ? "has" : "have"} another time step: they count for the moments only.`;
    flags.push({ code: "probes-joined", text, value: record.spectral.length });
  }
  return compared === null ? flags : [...flags, ...unlikeFlags(compared)];
}

/** Probes that differ by more than their sampling errors, and what was made of it. */
function unlikeFlags({ p, probes, kept, divided, oneProbe }: ProbeComparison): Flag[] {
  if (p === null || probes.every(({ agrees }) => agrees !== false)) return [];
  const range = (values: readonly (number | null)[]) => {
    const known = values.filter((value) => value !== null);
    return `${Math.min(...known).toPrecision(4)} to ${Math.max(...known).toPrecision(4)}`;
  };
  const U = range(probes.map((probe) => probe.U.value));
  const rms = range(probes.map((probe) => probe.u_rms.value));
  const differ = `differ by more than their sampling errors (U from ${U}, u' from ${rms}; p = ${p.toPrecision(2)})`;
  const text = oneProbe
    ? `The records of this probe ${differ}: the flow or the probe changes from record to record. They are averaged; each stands by itself beside the station.`
    : `The probes at this x ${differ}: the flow is not homogeneous across the stream, or a probe is wrong. ${outcome(probes, kept.length, divided)}`;
  return [{ code: "inhomogeneous", text, value: p }];
}

function outcome(probes: readonly ProbeReading[], kept: number, divided: readonly ProbedName[]): string {
  if (divided.length > 0)
    return `No larger part of them agrees, so nothing that rests on ${divided.map((name) => (name === "U" ? name : "u'")).join(" or ")} is given for the station; reduce.probes "all" averages them all the same.`;
  if (kept === probes.length)
    return "All of them are averaged, as chosen; each stands by itself beside the station.";
  const apart = probes.filter(({ agrees }) => agrees === false);
  return `The station is that of the ${kept} of ${probes.length} which agree. Set aside: ${probesText(apart)}.`;
}
