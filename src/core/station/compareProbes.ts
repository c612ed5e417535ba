import type { ProbedName, ProbeReading } from "../probeReading.ts";
import type { ReduceSettings } from "../stationResult.ts";
import { recordsByProbe } from "./commonMeans.ts";
import type { JoinedRecord } from "./joinParts.ts";
import { leavesError, type ProbeLeaves, probeLeaves, probeQuantity } from "./probeLeaves.ts";
import { type Alikeness, alikeAlone, alikeTogether } from "./probeTests.ts";
import type { StationPart } from "./stationPart.ts";

/** The probes of one station beside each other. */
export interface ProbeComparison {
  /** In the order of the record's parts. */
  readonly probes: readonly ProbeReading[];
  /** Probability that U and u' as different as these come from one flow; null where their errors are not known. */
  readonly p: number | null;
  /** Records that the station's values are made from: all, or the larger part that agrees. */
  readonly kept: readonly StationPart[];
  /** In what no larger part agrees, so that the station has no value of it. */
  readonly divided: readonly ProbedName[];
  /** Records of one probe, taken one after another. */
  readonly oneProbe: boolean;
}

/** Probability below which probes at one x are said to differ. */
const disagreement = 0.01;

/** What is tested of some of the probes: the probabilities of U and u', the least first multiplied (Holm). */
interface Verdict {
  readonly of: Readonly<Record<ProbedName, Alikeness>>;
  readonly p: number;
  readonly differ: readonly ProbedName[];
}

/**
 * Whether the probes at one x may be averaged: U and u' of each about its own mean, their spread held against
 * their sampling errors at a level of 1 % for both together. Where they differ, the probe that stands out most is
 * set aside and the rest held against each other again; the station is that of the probes which agree, if they are
 * more than half, and else has no value of what they differ in. Records of one probe are all kept.
 * @param record  a station of two records or more
 * @param scale   its integral time, s; null where it is not known
 * @param probes  "all": none is set aside
 * @see   Holm (1979), Scand. J. Statist. 6, 65
 */
export function compareProbes(
  record: JoinedRecord,
  scale: number | null,
  { probes: wanted = "agreeing" }: Pick<ReduceSettings, "probes"> = {},
): ProbeComparison {
  const { parts, repeats, untimed } = record;
  const leaves = probeLeaves(record, scale);
  const readings = parts.map(({ origin }, i): ProbeReading => {
    const { U, lnRms } = leaves[i];
    return {
      ...{ file: origin.file, y: origin.y, z: origin.z },
      U: probeQuantity(U.value, leavesError(U, "linear", repeats), untimed),
      u_rms: probeQuantity(Math.exp(lnRms.value), leavesError(lnRms, "log", repeats), untimed),
      agrees: null,
      departs: [],
    };
  });
  const oneProbe = recordsByProbe(parts).length === 1;
  const all = { kept: parts, divided: [], oneProbe };
  if (leaves.some(({ tested }) => !tested)) return { probes: readings, p: null, ...all };
  const first = verdictOn(leaves, record);
  const { apart, divided } = setAside(leaves, record, first);
  const probes = readings.map((reading, i) => {
    const departs = divided.length > 0 ? divided : (apart.get(i) ?? []);
    return { ...reading, agrees: departs.length === 0, departs };
  });
  if (oneProbe || wanted === "all") return { probes, p: first.p, ...all };
  if (divided.length > 0) return { probes, p: first.p, kept: parts, divided, oneProbe };
  return {
    probes: probes.map((probe, i) => (apart.has(i) ? { ...probe, setAside: true } : probe)),
    p: first.p,
    kept: parts.filter((_, i) => !apart.has(i)),
    divided,
    oneProbe,
  };
}

/** The probes that stand out from a larger part, or in what there is no such part. */
function setAside(leaves: readonly ProbeLeaves[], record: JoinedRecord, first: Verdict) {
  const apart = new Map<number, readonly ProbedName[]>();
  let left = leaves.map((one, at) => ({ one, at }));
  let verdict = first;
  while (verdict.differ.length > 0) {
    // a probe that is set aside must leave more than half of all
    if (2 * (left.length - 1) <= leaves.length) return { apart: new Map(), divided: first.differ };
    const { of, differ } = verdict;
    const least = left.map((_, i) => Math.min(...differ.map((name) => of[name].each[i])));
    const out = least.indexOf(Math.min(...least));
    const departs = differ.filter((name) => of[name].each[out] <= Math.max(disagreement, least[out]));
    apart.set(left[out].at, departs);
    left = left.filter((_, i) => i !== out);
    verdict = verdictOn(
      left.map(({ one }) => one),
      record,
    );
  }
  return { apart, divided: [] as readonly ProbedName[] };
}

function verdictOn(leaves: readonly ProbeLeaves[], { together, repeats }: JoinedRecord): Verdict {
  const alike = together ? alikeTogether : alikeAlone;
  const U = alike(
    leaves.map((one) => one.U),
    repeats,
  );
  const u_rms = alike(
    leaves.map((one) => one.lnRms),
    repeats,
  );
  // two tests are made of one question
  const p = Math.min(1, 2 * Math.min(U.p, u_rms.p));
  const level = (own: Alikeness, other: Alikeness) => (own.p <= other.p ? 2 * own.p : own.p) < disagreement;
  const differ: ProbedName[] = [];
  if (p < disagreement && level(U, u_rms)) differ.push("U");
  if (p < disagreement && level(u_rms, U)) differ.push("u_rms");
  return { of: { U, u_rms }, p, differ };
}
