import { argueCases } from "../core/compare/argueCases.ts";
import { assertNever } from "../core/failure.ts";
import { reduceStation } from "../core/station/reduceStation.ts";
import { transferables } from "../core/station/stationPart.ts";
import type { ByteSource } from "../read/byteSource.ts";
import { previewFile } from "../read/previewFile.ts";
import type { ColumnStore } from "./columnStore.ts";
import type { Ask, SourceFile, TaskName, Tasks } from "./protocol.ts";
import { reduceFile } from "./reduceFile.ts";
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
      const answer =
        ask.ask.read.layout === "profile"
          ? await reduceProfile(source, ask.ask, tools.progress)
          : await reduceFile(source, ask.ask, tools.columns, tools.progress);
      return { answer, transfer: [...answer.parts, ...answer.stations].flatMap(transferables) };
    }
    case "finish": {
      const answer = reduceStation(ask.ask.parts, ask.ask.reduce);
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
