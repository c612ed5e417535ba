import { argueCases } from "../core/compare/argueCases.ts";
import { assertNever } from "../core/failure.ts";
import { reduceLines } from "../core/station/lines/reduceLines.ts";
import { reduceStation } from "../core/station/reduceStation.ts";
import { transferables } from "../core/station/stationPart.ts";
import type { ByteSource } from "../read/byteSource.ts";
import { previewFile } from "../read/previewFile.ts";
import type { ColumnStore } from "./columnStore.ts";
import type { Ask, FileReduction, ReduceAsk, SourceFile, TaskName, Tasks } from "./protocol.ts";
import { reduceFile } from "./reduceFile.ts";
import { reduceLineFile } from "./reduceLineFile.ts";
import { reduceProfile } from "./reduceProfile.ts";

/** What a worker has at hand: how a file is opened differs between a browser and Node. */
export interface Tools {
  open(file: SourceFile): ByteSource;
  readonly columns: ColumnStore;
  /** Bytes read since the last call. */
  progress(bytes: number): void;
}

/** An answer with the buffers that are given away with it. */
export interface Answered {
  readonly answer: Tasks[TaskName]["answer"];
  readonly transfer: ArrayBuffer[];
}

/** Bytes of columns that one worker keeps. */
export const columnBudget = 1 << 26;

/**
 * Everything a worker can be asked, answered.
 * @throws the failures of what it calls
 */
export async function answerAsk(ask: Ask, tools: Tools): Promise<Answered> {
  switch (ask.task) {
    case "preview":
      return { answer: await previewFile(tools.open(ask.ask.file), ask.ask.settings), transfer: [] };
    case "reduce": {
      const source = tools.open(ask.ask.file);
      const answer = await reduceSource(source, ask.ask, tools);
      const given = [...answer.parts, ...(answer.lineParts ?? []), ...answer.stations];
      return { answer, transfer: given.flatMap(transferables) };
    }
    case "finish": {
      const { parts, lineParts = [], reduce } = ask.ask;
      const answer = lineParts.length > 0 ? reduceLines(lineParts, reduce) : reduceStation(parts, reduce);
      return { answer, transfer: transferables(answer) };
    }
    case "argue": {
      const answer = argueCases(ask.ask.cases, ask.ask.compare);
      const stations = answer.cases.flatMap((each) => each.stations);
      return { answer, transfer: [...new Set(stations.flatMap(transferables))] };
    }
    default:
      return assertNever(ask);
  }
}

/** A file of one layout, reduced. */
function reduceSource(source: ByteSource, ask: ReduceAsk, tools: Tools): Promise<FileReduction> {
  const { layout } = ask.read;
  if (layout === "profile") return reduceProfile(source, ask, tools.progress);
  if (layout === "lines") return reduceLineFile(source, ask, tools.progress);
  return reduceFile(source, ask, tools.columns, tools.progress);
}
