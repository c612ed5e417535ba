import type { CaseInput, CompareSettings, Comparison } from "../core/comparison.ts";
import type { DecaySettings } from "../core/decayResult.ts";
import type { PlainFailure } from "../core/failure.ts";
import type { Flag } from "../core/flag.ts";
import type { Preview, ReadSettings, SourceNote } from "../core/records.ts";
import type { LinePart } from "../core/station/lines/linePart.ts";
import type { StationPart } from "../core/station/stationPart.ts";
import type { ReduceSettings, StationResult } from "../core/stationResult.ts";

/** A file as it crosses to a worker: a Blob in the browser, a path in Node. */
export interface SourceFile {
  /** Path inside the drop, or relative to the sheet; what messages and results call the file. */
  readonly name: string;
  readonly bytes: number;
  /** Tells two contents of one name apart: part of the key results are kept under. */
  readonly fingerprint: string;
  readonly content: Blob | { readonly path: string };
}

/** Everything a worker can be asked, and what each question is answered with. */
export interface Tasks {
  /** A first look: dialect, columns, position. `settings` overrides what would be recognised. */
  preview: { ask: { file: SourceFile; settings: Partial<ReadSettings> }; answer: Preview };
  /** One file, read and reduced. A file may hold many stations, and a station many parts. */
  reduce: { ask: ReduceAsk; answer: FileReduction };
  /** All parts of one station, made into its result. */
  finish: {
    ask: { parts: StationPart[]; lineParts?: LinePart[]; reduce: ReduceSettings };
    answer: StationResult;
  };
  /** All that may take longer than a frame: automatic windows, comparison with resampling. */
  argue: { ask: ArgueAsk; answer: Argument };
}

export interface ReduceAsk {
  readonly file: SourceFile;
  readonly read: ReadSettings;
  readonly reduce: ReduceSettings;
}

export interface FileReduction {
  readonly parts: StationPart[];
  /** Layout "lines": these in place of the parts. */
  readonly lineParts?: LinePart[];
  /** Stations of a file that is already reduced (layout "profile"). */
  readonly stations: StationResult[];
  readonly sources: SourceNote[];
  readonly flags: Flag[];
  /** Probes of the file that had to be left out. */
  readonly failures?: PlainFailure[];
}

export interface ArgueAsk {
  readonly cases: readonly { name: string; stations: StationResult[]; settings: DecaySettings }[];
  readonly compare: CompareSettings;
}

export interface Argument {
  /** In the order of the ask: fitted, stations derived. */
  readonly cases: readonly CaseInput[];
  readonly comparisons: readonly Comparison[];
}

export type TaskName = keyof Tasks;
/** One member per task, so that a switch on `task` narrows `ask`. */
export type Ask = { [N in TaskName]: { id: number; task: N; ask: Tasks[N]["ask"] } }[TaskName];
/** A failure crosses as plain data: a cloned Error loses its class and its code. */
export type Reply =
  | { id: number; kind: "progress"; bytes: number }
  | { id: number; kind: "answer"; answer: Tasks[TaskName]["answer"] }
  | { id: number; kind: "failed"; failure: PlainFailure };

export interface RunOptions {
  /** Bytes read since the last call. */
  readonly onProgress?: ((bytes: number) => void) | undefined;
  readonly signal?: AbortSignal | undefined;
  /** Buffers of the ask that are given away with it instead of being copied. */
  readonly transfer?: readonly Transferable[] | undefined;
}

/** What the shells hold: ask a task, hear of progress, get one end. Rejects with a ReductionFailure. */
export interface Engine {
  run<N extends TaskName>(task: N, ask: Tasks[N]["ask"], options?: RunOptions): Promise<Tasks[N]["answer"]>;
  close(): void;
}
