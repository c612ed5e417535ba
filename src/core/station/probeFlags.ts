import type { Flag } from "../flag.ts";
import type { StationMaterial } from "./stationQuantities.ts";

/** Probability below which probes at one x are said to differ. */
const disagreement = 0.01;

/** What is doubtful about putting the records of one x together. */
export function probeFlags({ record, compared }: StationMaterial): Flag[] {
  const flags: Flag[] = [];
  if (record.spectral.length > 0 && record.spectral.length < record.parts.length) {
    const others = record.parts.length - record.spectral.length;
    const text = `${others} of ${record.parts.length} records ${others === 1 ? "has" : "have"} another time step: they count for the moments only.`;
    flags.push({ code: "probes-joined", text, value: record.spectral.length });
  }
  if (compared === null || compared.p === null || compared.p >= disagreement) return flags;
  const { p, probes } = compared;
  const range = (values: readonly (number | null)[]) => {
    const known = values.filter((value) => value !== null);
    return `${Math.min(...known).toPrecision(4)} to ${Math.max(...known).toPrecision(4)}`;
  };
  const U = range(probes.map((probe) => probe.U.value));
  const rms = range(probes.map((probe) => probe.u_rms.value));
  const places = new Set(probes.map(({ y, z }) => `${y},${z}`)).size;
  const what =
    places === 1
      ? "the flow or the probe changes from record to record"
      : "the flow is not homogeneous across the stream";
  const text = `The records at this x differ by more than their sampling errors (U from ${U}, u' from ${rms}; p = ${p.toPrecision(2)}): ${what}. The station's values are averages over unlike records; each stands by itself beside them.`;
  flags.push({ code: "inhomogeneous", text, value: p });
  return flags;
}
