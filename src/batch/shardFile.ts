import { readFileSync } from "node:fs";
import type { PlainFailure } from "../core/failure.ts";
import { ReductionFailure } from "../core/failure.ts";
import { program } from "../core/program.ts";
import type { FileReduction } from "../engine/protocol.ts";
import type { LoadedCase } from "./loadCase.ts";
import { sealed, unsealed } from "./sealed.ts";
import type { Entry, Share } from "./shareStations.ts";

/** What one share of the work came to, with all that is needed to join it to the others. */
export interface Shard extends Share {
  readonly program: string;
  readonly version: string;
  /** All cases of the run, not only those that this share has files of. */
  readonly cases: readonly LoadedCase[];
  readonly done: readonly (Entry & ShardEnd)[];
}
export type ShardEnd = { readonly reduction: FileReduction } | { readonly failure: PlainFailure };

export const shardName = ({ part, of }: Share) => `shard-${part}-of-${of}.bin`;
export const shardPattern = /^shard-(\d+)-of-(\d+)\.bin$/;

export function shardBytes(shard: Omit<Shard, "program" | "version">): Buffer {
  return sealed({ program: program.name, version: program.version, ...shard });
}

/**
 * Reads one share.
 * @throws bad-shard it is damaged, or another version of the program wrote it
 */
export function readShard(path: string): Shard {
  const shard = unsealed(contentOf(path)) as Shard | null; // whole as it was sealed, or null
  if (shard === null) throw badShard(path, "The shard is damaged or is none", "Run this share again.");
  if (shard.program !== program.name || shard.version !== program.version)
    throw badShard(
      path,
      `Version ${shard.version} wrote the shard, and this is ${program.version}`,
      "Run all shares with one version.",
    );
  return shard;
}

function contentOf(path: string): Uint8Array {
  try {
    return readFileSync(path);
  } catch {
    throw badShard(path, "The system would not let the shard be read", "See that you may read it.");
  }
}

export function badShard(file: string, message: string, remedy: string): ReductionFailure {
  return new ReductionFailure("bad-shard", { message, remedy }, { file });
}
