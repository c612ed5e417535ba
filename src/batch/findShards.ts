import { readdirSync } from "node:fs";
import { join } from "node:path";
import { ReductionFailure } from "../core/failure.ts";
import { badShard, readShard, type Shard, shardName, shardPattern } from "./shardFile.ts";

/**
 * All shares of one run, from the folders they were written to, in their order.
 * @param folders absolute
 * @throws missing-shard names those that are not there; bad-shard: damaged, or not all of one run
 */
export function findShards(folders: readonly string[]): Shard[] {
  const paths = folders.flatMap(shardPaths);
  if (paths.length === 0)
    throw new ReductionFailure(
      "missing-shard",
      {
        message: "No shard is there",
        expected: shardName({ part: 1, of: 2 }),
        remedy: "Name the folders that --shard wrote to.",
      },
      { file: folders.join(", ") },
    );
  const of = countOf(paths);
  const byPart = new Map<number, { path: string; shard: Shard }>();
  for (const path of paths) {
    const shard = readShard(path);
    if (!byPart.has(shard.part)) byPart.set(shard.part, { path, shard });
  }
  const missing = Array.from({ length: of }, (_, i) => i + 1).filter((part) => !byPart.has(part));
  if (missing.length > 0) throw missingShards(folders, missing, of);
  const found = [...byPart.values()].sort((a, b) => a.shard.part - b.shard.part);
  const run = identity(found[0].shard);
  const other = found.find(({ shard }) => identity(shard) !== run);
  if (other)
    throw badShard(
      other.path,
      "The shard is of another run: its sheets or files are not those of the first",
      "Run all shares on the same sheets and files.",
    );
  return found.map(({ shard }) => shard);
}

function shardPaths(folder: string): string[] {
  try {
    return readdirSync(folder)
      .filter((name) => shardPattern.test(name))
      .sort()
      .map((name) => join(folder, name));
  } catch {
    throw new ReductionFailure(
      "missing-file",
      {
        message: "The folder is not there or cannot be read",
        remedy: "Name the folders that --shard wrote to.",
      },
      { file: folder },
    );
  }
}

/** Into how many shares the work was cut: all shards must say the same. */
function countOf(paths: readonly string[]): number {
  const counts = new Set(
    paths.map((path) => Number(shardPattern.exec(path.split(/[\\/]/).at(-1) ?? "")?.[2])),
  );
  if (counts.size === 1) return [...counts][0];
  const found = [...counts].sort((a, b) => a - b).join(" and ");
  throw badShard(paths[0], `Shards of several runs are there, cut into ${found}`, "Leave those of one run.");
}

function missingShards(folders: readonly string[], missing: readonly number[], of: number): ReductionFailure {
  const names = missing.slice(0, 20).map((part) => shardName({ part, of }));
  const more = missing.length > names.length ? ` and ${missing.length - names.length} more` : "";
  return new ReductionFailure(
    "missing-shard",
    {
      message: `${missing.length} of ${of} shards ${missing.length === 1 ? "is" : "are"} missing`,
      found: `no ${names.join(", ")}${more}`,
      remedy: "Run these shares, or name the folders they were written to.",
    },
    { file: folders.join(", ") },
  );
}

/** Sheets and files, as far as results depend on them: where they lie on a machine is none of it. */
function identity({ cases, of }: Shard): string {
  return JSON.stringify([
    of,
    cases.map(({ sheet, files }) => [sheet, files.map(({ name, bytes }) => [name, bytes])]),
  ]);
}
