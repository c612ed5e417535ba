import { resolve } from "node:path";
import type { PlainFailure } from "../core/failure.ts";
import { failureText, ReductionFailure } from "../core/failure.ts";
import type { FileReduction } from "../engine/protocol.ts";
import { reduceCase, reductionKey } from "../engine/reduceCase.ts";
import { findShards } from "./findShards.ts";
import { openOutput } from "./openOutput.ts";
import type { MergeArguments } from "./readArguments.ts";
import { type BatchSurroundings, inSheetsFolder } from "./runBatch.ts";
import type { Shard } from "./shardFile.ts";
import { resultNames, writeResults } from "./writeResults.ts";

/**
 * Joins the shards of one run: stations are made of their parts, cases fitted and compared, results written, as a
 * run without shards would have. Nothing is written where a shard is missing or damaged.
 * @returns true where every file of every share could be used
 * @throws WrongArguments before any work, where the output cannot be written
 */
export async function runMerge(asked: MergeArguments, around: BatchSurroundings): Promise<boolean> {
  let sound = true;
  const fail = (failure: PlainFailure) => {
    sound = false;
    around.tell(failureText(failure));
  };
  const shards = readAll(
    asked.folders.map((folder) => resolve(around.folder, folder)),
    fail,
  );
  if (shards === null) return false;
  const { cases } = shards[0];
  for (const each of cases) each.failures.forEach(fail);
  const output = openOutput(resolve(around.folder, asked.out), resultNames(cases), []);
  const { files, failed } = endsOf(shards);
  const reduced = await Promise.all(
    cases.map((each) =>
      reduceCase(around.engine, each, {
        onFailure: (failure) => fail(inSheetsFolder(failure, each)),
        cache: { files, stations: new Map() },
        failed,
      }),
    ),
  );
  await writeResults(cases, reduced, around.engine, output);
  return sound;
}

function readAll(folders: readonly string[], fail: (failure: PlainFailure) => void): Shard[] | null {
  try {
    return findShards(folders);
  } catch (error) {
    if (!(error instanceof ReductionFailure)) throw error;
    fail(error.plain());
    return null;
  }
}

/** What became of every file, under the keys that the reduction of a case asks for. */
function endsOf(shards: readonly Shard[]) {
  const { cases } = shards[0];
  const files = new Map<string, FileReduction>();
  const failed = new Map<string, PlainFailure>();
  for (const each of shards.flatMap(({ done }) => done)) {
    const key = reductionKey(cases[each.inCase], each.file);
    if ("failure" in each) failed.set(key, each.failure);
    else files.set(key, each.reduction);
  }
  return { files, failed };
}
