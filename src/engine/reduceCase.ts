import type { Place, PlainFailure } from "../core/failure.ts";
import { assert, ReductionFailure, revivedFailure } from "../core/failure.ts";
import type { Flag } from "../core/flag.ts";
import type { SourceNote } from "../core/records.ts";
import type { LinePart } from "../core/station/lines/linePart.ts";
import type { StationPart } from "../core/station/stationPart.ts";
import { transferables } from "../core/station/stationPart.ts";
import type { ReduceSettings, StationResult } from "../core/stationResult.ts";
import type { CaseSheet } from "../sheet/caseSheet.ts";
import { readSettings } from "../sheet/readSettings.ts";
import { reduceSettings } from "../sheet/reduceSettings.ts";
import { resultKey } from "../sheet/resultKey.ts";
import { groupByPosition } from "./groupByPosition.ts";
import type { Engine, FileReduction, SourceFile } from "./protocol.ts";

export interface CaseFiles {
  readonly sheet: CaseSheet;
  /** One for each entry of sheet.files, in its order. */
  readonly files: readonly SourceFile[];
}

export interface ReduceCaseOptions {
  /** Bytes read since the last call, over all files; a file found in the cache counts at once. */
  readonly onProgress?: ((bytes: number) => void) | undefined;
  /** A file, a probe or a station had to be left out; heard as it happens. */
  readonly onFailure?: (failure: PlainFailure) => void;
  /** A file is done with, used or not. */
  readonly onFile?: (file: SourceFile) => void;
  readonly signal?: AbortSignal | undefined;
  /** Kept from call to call by whoever asks, so that what has not changed is not done again. */
  readonly cache?: ReductionCache;
  /** What files are known to fail with, by the same keys. */
  readonly failed?: ReadonlyMap<string, PlainFailure>;
}

/** Results by a key that changes with the file and with every setting that they depend on. */
export interface ReductionCache {
  readonly files: Kept<FileReduction>;
  readonly stations: Kept<StationResult>;
}
/** As much of a Map as is asked for. */
interface Kept<T> {
  get(key: string): T | undefined;
  set(key: string, value: T): unknown;
}

export interface CaseReduction {
  /** In order of x. */
  readonly stations: StationResult[];
  readonly sources: SourceNote[];
  /** In the order of the files. */
  readonly failures: PlainFailure[];
  readonly flags: Flag[];
}

/**
 * One case, from its files to its stations: every file is read and reduced by itself, then the parts that stand at
 * one x are made into a station. Numbers depend on the order of files in the sheet alone, never on the number of
 * workers or on which of them was first. A file that cannot be used is told and left out.
 * @throws cancelled when the signal says so
 */
export async function reduceCase(
  engine: Engine,
  { sheet, files }: CaseFiles,
  options: ReduceCaseOptions = {},
): Promise<CaseReduction> {
  assert(files.length === sheet.files.length, "every entry of a sheet needs its file");
  const tried = await Promise.all(files.map((_, i) => reduceOne(engine, { sheet, files }, i, options)));
  const read = tried.flatMap((end) => ("value" in end ? [end.value] : []));
  const finished = await finishStations(engine, read, reduceSettings(sheet), options);
  const made = finished.flatMap((end) => ("value" in end ? [end.value] : []));
  const reductions = read.map(({ reduction }) => reduction);
  return {
    stations: [...made, ...reductions.flatMap(({ stations }) => stations)].sort((a, b) => a.x - b.x),
    sources: reductions.flatMap(({ sources }) => sources),
    failures: [
      ...tried.flatMap((end) => ("failure" in end ? [end.failure] : (end.value.reduction.failures ?? []))),
      ...finished.flatMap((end) => ("failure" in end ? [end.failure] : [])),
    ],
    flags: reductions.flatMap(({ flags }) => flags),
  };
}

/** A file's reduction with the key that it is kept under. */
interface KeyedReduction {
  readonly key: string;
  readonly reduction: FileReduction;
}

/** The key that the reduction of entry `i` of a case is kept under. */
export function reductionKey({ sheet, files }: CaseFiles, i: number): string {
  const { name, fingerprint } = files[i];
  return `${name} ${resultKey(fingerprint, readSettings(sheet, sheet.files[i]), reduceSettings(sheet))}`;
}

/**
 * One file of a case, read and reduced.
 * @param i its place among the sheet's entries
 * @throws cancelled when the signal says so
 */
export async function reduceOne(
  engine: Engine,
  of: CaseFiles,
  i: number,
  options: ReduceCaseOptions,
): Promise<Attempt<KeyedReduction>> {
  const { cache, onProgress, onFailure, onFile, signal } = options;
  const file = of.files[i];
  const key = reductionKey(of, i);
  const known = cache?.files.get(key);
  if (known) onProgress?.(file.bytes);
  const work = () => {
    const failure = options.failed?.get(key);
    if (failure) throw revivedFailure(failure);
    const read = readSettings(of.sheet, of.sheet.files[i]);
    const reduce = reduceSettings(of.sheet);
    return engine.run("reduce", { file, read, reduce }, { onProgress, signal });
  };
  const end = known ? { value: known } : await attempt(work, options, { file: file.name });
  onFile?.(file);
  if ("failure" in end) return end;
  for (const failure of end.value.failures ?? []) onFailure?.(failure);
  cache?.files.set(key, end.value);
  return { value: { key, reduction: end.value } };
}

function finishStations(
  engine: Engine,
  read: readonly KeyedReduction[],
  reduce: ReduceSettings,
  options: ReduceCaseOptions,
): Promise<Attempt<StationResult>[]> {
  const { cache, signal } = options;
  const keys = new Map(
    read.flatMap(({ key, reduction }) =>
      [...reduction.parts, ...(reduction.lineParts ?? [])].map((part, i) => [part, `${key} ${i}`] as const),
    ),
  );
  const groups = groupByPosition([...keys.keys()]);
  const finish = async (all: (StationPart | LinePart)[]) => {
    const key = all.map((part) => keys.get(part)).join("\n"); // holds the settings: each file's key does
    const known = cache?.stations.get(key);
    if (known) return known;
    // parts that are kept are copied to the worker, others given away
    const transfer = cache ? [] : all.flatMap(transferables);
    const lineParts = all.flatMap((part) => ("along" in part ? [part] : []));
    const parts = all.flatMap((part) => ("along" in part ? [] : [part]));
    const made = await engine.run("finish", { parts, lineParts, reduce }, { signal, transfer });
    cache?.stations.set(key, made);
    return made;
  };
  return Promise.all(
    groups.map((parts) => attempt(() => finish(parts), options, { file: parts[0].origin.file })),
  );
}

type Attempt<T> = { readonly value: T } | { readonly failure: PlainFailure };

/** What one file or station fails with is told; that the whole was cancelled ends everything. */
async function attempt<T>(
  work: () => T | Promise<T>,
  { onFailure, signal }: ReduceCaseOptions,
  where: Place,
): Promise<Attempt<T>> {
  try {
    return { value: await work() };
  } catch (error) {
    if (!(error instanceof ReductionFailure) || error.code === "cancelled" || signal?.aborted) throw error;
    const failure = error.at(where).plain();
    onFailure?.(failure);
    return { failure };
  }
}
