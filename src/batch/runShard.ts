import { join, resolve } from "node:path";
import type { PlainFailure } from "../core/failure.ts";
import { failureText } from "../core/failure.ts";
import { reduceOne } from "../engine/reduceCase.ts";
import { keptText, keptWork } from "./keptWork.ts";
import { loadCases } from "./loadCases.ts";
import { openOutput } from "./openOutput.ts";
import { progressLine } from "./progressLine.ts";
import type { BatchArguments } from "./readArguments.ts";
import { type BatchSurroundings, inputsOf, inSheetsFolder } from "./runBatch.ts";
import { type ShardEnd, shardBytes, shardName } from "./shardFile.ts";
import { type Entry, type Share, shareStations } from "./shareStations.ts";

/**
 * One share of the work of some sheets: its files read and reduced, and written as one shard. A share that was
 * stopped goes on where it was when it is run again into the same folder.
 * @returns true where all files of the share could be used
 * @throws WrongArguments before any work, where the output cannot be written
 */
export async function runShard(
  asked: BatchArguments,
  share: Share,
  around: BatchSurroundings,
): Promise<boolean> {
  let sound = true;
  const fail = (failure: PlainFailure) => {
    sound = false;
    around.tell(failureText(failure));
  };
  const cases = loadCases(asked.sheets, around, fail);
  const folder = resolve(around.folder, asked.out);
  const output = openOutput(folder, [shardName(share)], inputsOf(asked.sheets, cases, around.folder));
  const kept = keptWork(join(folder, `unfinished-${share.part}-of-${share.of}.bin`), around.tell);
  if (kept.found > 0) around.tell(keptText(kept.found));
  const entries = await shareStations(cases, around.engine, share);
  const progress = progressLine(around.tell, around.now);
  progress.expect(
    entries.length,
    entries.reduce((sum, { inCase, file }) => sum + cases[inCase].files[file].bytes, 0),
  );
  const reduce = async (entry: Entry): Promise<Entry & ShardEnd> => {
    const of = cases[entry.inCase];
    const end = await reduceOne(around.engine, of, entry.file, {
      onProgress: progress.read,
      onFile: progress.fileDone,
      onFailure: (failure) => fail(inSheetsFolder(failure, of)),
      cache: { files: kept, stations: new Map() },
    });
    return "failure" in end
      ? { ...entry, failure: end.failure }
      : { ...entry, reduction: end.value.reduction };
  };
  const done = await Promise.all(entries.map(reduce));
  output.write(shardName(share), shardBytes({ ...share, cases, done }));
  kept.clear();
  return sound;
}
