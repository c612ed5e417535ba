import type { Place } from "../core/failure.ts";
import { ReductionFailure } from "../core/failure.ts";
import type { RecordOrigin, VelocityBlock } from "../core/records.ts";
import type { RecordPlan } from "../core/station/recordPlan.ts";
import type { RecordReducer } from "../core/station/startRecord.ts";
import { pilotSamples, startRecord } from "../core/station/startRecord.ts";
import type { StationPart } from "../core/station/stationPart.ts";
import type { ByteSource } from "../read/byteSource.ts";
import type { ReadSummary, RecordPlace, RecordSink } from "../read/readRecords.ts";
import { readRecords } from "../read/readRecords.ts";
import type { ColumnStore } from "./columnStore.ts";
import type { FileReduction, ReduceAsk } from "./protocol.ts";

/** One probe of a file on its way: reduced, to be read once more, or given up. */
interface Probe {
  readonly origin: RecordOrigin;
  readonly reducer: RecordReducer;
  end: { part: StationPart } | { again: RecordPlan } | { failed: ReductionFailure } | null;
}

/** Only a record longer than its pilot is ever read twice; a row has hardly fewer bytes than this. */
const leastRowBytes = 8;

/**
 * One file of records, read and reduced in one pass. Probes whose pilot did not stand for the whole, or whose time
 * ran back into what was summed, are read once more with their new plans: from the column store where all columns are there, else from the file.
 * A probe that cannot be reduced is left out and told; the others of its file go on.
 * @param onBytes bytes read since the last call, in the first pass
 * @throws what reading throws, and the failure of the probes where none could be reduced
 */
export async function reduceFile(
  source: ByteSource,
  { file, read, reduce }: ReduceAsk,
  columns: ColumnStore,
  onBytes: (bytes: number) => void,
): Promise<FileReduction> {
  const key = file.fingerprint;
  const kept = source.bytes > pilotSamples * leastRowBytes ? columns.write(key) : null;
  const first: Probe[] = [];
  const start = (origin: RecordOrigin, plan: RecordPlan | null) =>
    ({
      origin,
      reducer: startRecord(origin, reduce, { plan, ...(read.times ? { times: read.times } : {}) }),
      end: null,
    }) satisfies Probe;
  const summary = await readRecords(
    source,
    read,
    sinkOf(first, (origin) => start(origin, null), kept?.add),
    {
      onBytes,
    },
  );
  kept?.close();
  for (const probe of first) close(probe);
  let probes = first;
  while (probes.some(({ end }) => end && "again" in end)) probes = await readOnceMore(probes);
  columns.drop(key);
  return fileReduction(file.name, probes, summary);

  async function readOnceMore(before: readonly Probe[]): Promise<Probe[]> {
    const second: Probe[] = [];
    // a probe that has ended hears nothing more: only those with a new plan are reduced again
    const sink = sinkOf(second, (origin, i) => {
      const known = before.at(i);
      if (!known) throw changed(file.name);
      return known.end && "again" in known.end ? start(origin, known.end.again) : known;
    });
    const stored = columns.read(key);
    if (stored) {
      const takers = before.map(({ origin }) => sink.record(origin));
      for await (const { record, block } of stored) takers[record].add(block);
    } else await readRecords(source, read, sink);
    if (second.length !== before.length) throw changed(file.name);
    for (const probe of second) close(probe);
    return second;
  }
}

/** What is doubtful about a file travels with its one part; where it holds many, with the case. */
function fileReduction(file: string, probes: readonly Probe[], summary: ReadSummary): FileReduction {
  const parts = probes.flatMap(({ end }) => (end && "part" in end ? [end.part] : []));
  const failures = probes.flatMap(({ end, origin }) =>
    end && "failed" in end
      ? [placed(end.failed.at(lineOf(end.failed, origin, summary)), file, probes.length > 1 ? origin : null)]
      : [],
  );
  if (parts.length === 0) throw failures[0] ?? nothingLeft(file);
  const one = probes.length === 1;
  return {
    parts: one ? parts.map((part) => ({ ...part, flags: [...summary.flags, ...part.flags] })) : parts,
    stations: [],
    sources: [...summary.sources],
    flags: one ? [] : summary.flags.map((flag) => ({ ...flag, text: `${file}: ${flag.text}` })),
    failures: failures.map((failure) => failure.plain()),
  };
}

/** Probes in the order in which the file names them, which is the same in every pass. */
function sinkOf(
  probes: Probe[],
  begin: (origin: RecordOrigin, record: number) => Probe,
  keep?: (record: number, block: VelocityBlock) => void,
): RecordSink {
  return {
    record(origin) {
      const record = probes.length;
      const probe = begin(origin, record);
      probes.push(probe);
      return {
        add(block) {
          keep?.(record, block);
          guarded(probe, () => probe.reducer.add(block));
        },
      };
    },
  };
}

function close(probe: Probe): void {
  guarded(probe, () => {
    probe.end = probe.reducer.finish();
  });
}

/** One probe's failure is not that of the others. */
function guarded(probe: Probe, work: () => void): void {
  if (probe.end) return;
  try {
    work();
  } catch (error) {
    if (!(error instanceof ReductionFailure)) throw error;
    probe.end = { failed: error };
  }
}

/** The line and column that a record's failure is about, as far as it has one. */
function lineOf(failure: ReductionFailure, probe: RecordOrigin, { places }: ReadSummary): Place {
  const place = places.find(({ origin }) => origin === probe);
  if (!place) return {};
  const at = (line: number | null, column: RecordPlace["uColumn"]): Place => ({
    ...(line === null ? {} : { line }),
    ...(column === null ? {} : { column }),
  });
  switch (failure.code) {
    case "constant-signal":
      return at(place.firstLine, place.uColumn);
    case "too-few-samples":
      return at(place.lastLine, null);
    case "backward-time":
      return at(place.backwardLine, place.timeColumn);
    case "no-time":
      return at(place.firstLine, place.timeColumn);
    default:
      return {};
  }
}

/** A file of many probes says which one. */
function placed(failure: ReductionFailure, file: string, probe: RecordOrigin | null): ReductionFailure {
  if (!probe) return failure.at({ file });
  const { x, y, z } = probe;
  const place = [`x = ${x}`, ...(y === null ? [] : [`y = ${y}`]), ...(z === null ? [] : [`z = ${z}`])].join(
    ", ",
  );
  const facts = { ...failure.facts, message: `${failure.facts.message}, at ${place}` };
  return new ReductionFailure(failure.code, facts, { file, ...failure.where });
}

function changed(file: string): ReductionFailure {
  return new ReductionFailure(
    "unreadable-file",
    {
      message: "the file held other probes when it was read once more",
      remedy: "Run it again when nothing writes to the file",
    },
    { file },
  );
}

function nothingLeft(file: string): ReductionFailure {
  return new ReductionFailure(
    "too-few-samples",
    {
      message: "the time left out at the start is longer than the record",
      remedy: "Give a shorter startup in the case sheet",
    },
    { file },
  );
}
