import { jointLayout, pairIndex } from "../signal/jointMoments.ts";
import { shiftJoint } from "../signal/shiftJoint.ts";
import type { ReduceSettings } from "../stationResult.ts";
import { blockFields, differenceFields } from "./blockFields.ts";
import { withCommonMeans } from "./commonMeans.ts";
import { restOfMean } from "./recordCorrelation.ts";
import type { Component, StationPart } from "./stationPart.ts";

/** All records of one station put together, each probe about its own mean. */
export interface JoinedRecord {
  /** In an order that does not depend on that of arrival. */
  readonly parts: readonly StationPart[];
  /** Why nothing that needs the time between samples can be had; null where it can. */
  readonly untimed: string | null;
  /** Those of the parts that have spectra, all with one step; none where the record is untimed. */
  readonly spectral: readonly StationPart[];
  readonly components: readonly Component[];
  /** Sampled at the same times: blocks are averaged across probes, and left out together. */
  readonly together: boolean;
  readonly samples: number;
  readonly step: number;
  readonly start: number;
  /** Time recorded, all records together. */
  readonly duration: number;
  /** Time that counts for sampling errors: that of one record where all were taken at once, of a replayed one its period. */
  readonly span: number;
  /** How often that time is in the record: above 1 where it repeats itself. */
  readonly repeats: number;
  /** Mean of each component, by length. */
  readonly means: readonly number[];
  /** Mean of each component in each part, and its blocks as sums about it. */
  readonly partMeans: readonly (readonly number[])[];
  readonly perPart: readonly (readonly Float64Array[])[];
  readonly fields: readonly string[];
  /** A row a block: sums about the record's mean; rows and sums add up plainly. */
  readonly rows: readonly Float64Array[];
  /** Block of its own record behind each row, for what a part keeps per block: part and index, by probe. */
  readonly blocks: readonly (readonly BlockPlace[])[];
  readonly blockSamples: number;
}
export interface BlockPlace {
  readonly part: StationPart;
  readonly block: number;
}

export function joinParts(given: readonly StationPart[], settings: ReduceSettings): JoinedRecord {
  const parts = withCommonMeans([...given].sort(byPlace));
  const components = (["u", "v", "w"] as const).filter((name) =>
    parts.every((part) => part.components.includes(name)),
  );
  const fields = blockFields(components);
  const together = areTogether(parts, settings);
  const perPart = parts.map((part) => partRows(part, components, fields.length));
  const places = parts.map((part) => perPart[parts.indexOf(part)].map((_, block) => ({ part, block })));
  const total = parts.reduce((sum, part) => sum + part.samples, 0);
  const partMeans = parts.map((part) => components.map((name) => meanOf(part, name)));
  const step = parts[0].step;
  const untimed = parts.some(({ plan }) => plan.unconfirmed) ? unconfirmed : null;
  const timed = untimed === null ? parts : [];
  return {
    parts,
    untimed,
    spectral: timed.filter((part) => part.lags !== null && Math.abs(part.step / step - 1) < 1e-6),
    components,
    together,
    samples: total,
    step,
    start: parts[0].start,
    duration: parts.reduce((sum, part) => sum + part.duration, 0),
    ...independentTime(together ? [shortestReplay(parts)] : parts),
    means: components.map(
      (_, c) => parts.reduce((sum, part, p) => sum + part.samples * partMeans[p][c], 0) / total,
    ),
    partMeans,
    perPart,
    fields,
    rows: together ? averageRows(perPart) : perPart.flat(),
    blocks: together
      ? perPart[0].map((_, row) => places.map((list) => list[row]))
      : places.flat().map((one) => [one]),
    blockSamples: parts[0].blocks.blockSamples,
  };
}

const unconfirmed =
  'the time stamps have too few digits, and it is not confirmed that the steps are even: set read.times to "even" or "written"';

/** Of records taken at once, the one that comes back first. */
function shortestReplay(parts: readonly StationPart[]): StationPart {
  return parts.reduce((a, b) => ((b.replay?.period ?? Infinity) < (a.replay?.period ?? Infinity) ? b : a));
}

function independentTime(parts: readonly StationPart[]): Pick<JoinedRecord, "span" | "repeats"> {
  const recorded = parts.reduce((sum, part) => sum + part.duration, 0);
  const span = parts.reduce(
    (sum, { replay, duration }) => sum + Math.min(duration, replay?.period ?? duration),
    0,
  );
  return { span, repeats: recorded / span };
}

/** By file, then position, then time: never by arrival. */
function byPlace(a: StationPart, b: StationPart): number {
  if (a.origin.file !== b.origin.file) return a.origin.file < b.origin.file ? -1 : 1;
  return (a.origin.y ?? 0) - (b.origin.y ?? 0) || (a.origin.z ?? 0) - (b.origin.z ?? 0) || a.start - b.start;
}

function hasOnePlaceTwice(parts: readonly StationPart[]): boolean {
  const places = parts.flatMap(({ origin: { y, z } }) => (y === null && z === null ? [] : [`${y},${z}`]));
  return new Set(places).size < places.length;
}

function areTogether(parts: readonly StationPart[], settings: ReduceSettings): boolean {
  if (settings.simultaneous === false || parts.length < 2) return false;
  // at one place only one record can be taken at a time
  if (settings.simultaneous !== true && hasOnePlaceTwice(parts)) return false;
  const [first, ...others] = parts;
  return others.every(
    (part) =>
      part.samples === first.samples &&
      part.blocks.rows === first.blocks.rows &&
      part.blocks.blockSamples === first.blocks.blockSamples &&
      Math.abs(part.step / first.step - 1) < 1e-6 &&
      // told by hand, records may each count time from their own start
      (settings.simultaneous === true || Math.abs(part.start - first.start) < 0.5 * first.step),
  );
}

function meanOf(part: StationPart, name: Component): number {
  const c = part.components.indexOf(name);
  return part.plan.reference[c] + restOfMean(part, c);
}

/** A part's blocks as sums about the part's mean, in the fields of the station. */
function partRows(part: StationPart, components: readonly Component[], width: number): Float64Array[] {
  const own = jointLayout(part.components.length);
  const layout = jointLayout(components.length);
  const at = components.map((name) => part.components.indexOf(name));
  const about = part.components.map((_, c) => restOfMean(part, c));
  const sums = new Float64Array(own.length);
  const stored = part.blocks.fields.length;
  return Array.from({ length: part.blocks.rows }, (_, block) => {
    const data = part.blocks.data.subarray(block * stored, (block + 1) * stored);
    shiftJoint(data, own, about, sums);
    const row = new Float64Array(width);
    row[0] = sums[0];
    at.forEach((a, i) => {
      row[layout.mean + i] = sums[own.mean + a];
      row[layout.third + i] = sums[own.third + a];
      row[layout.fourth + i] = sums[own.fourth + a];
      for (let j = i; j < at.length; j++) {
        row[layout.second + pairIndex(at.length, i, j)] =
          sums[own.second + pairIndex(own.sequences, a, at[j])];
      }
    });
    row.set(data.subarray(own.length, own.length + differenceFields.length), layout.length);
    return row;
  });
}

function averageRows(perPart: readonly Float64Array[][]): Float64Array[] {
  return perPart[0].map((first, block) => {
    const row = new Float64Array(first.length);
    for (const rows of perPart)
      for (let i = 0; i < row.length; i++) row[i] += rows[block][i] / perPart.length;
    return row;
  });
}
