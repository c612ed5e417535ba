import { availableParallelism } from "node:os";
import { parseArgs } from "node:util";
import type { Share } from "./shareStations.ts";

/** What the command was asked to do. Paths are as written: relative to the folder it was called in. */
export interface BatchArguments {
  readonly sheets: readonly string[];
  readonly out: string;
  /** Worker threads. */
  readonly jobs: number;
  /** Null: all of the work. */
  readonly share: Share | null;
}

/** To join what shares of the work have written. */
export interface MergeArguments {
  readonly folders: readonly string[];
  readonly out: string;
  readonly jobs: number;
}

export const usage = `Usage: npm run --silent batch -- SHEET.json [SHEET.json ...] --out DIR [--jobs N] [--shard I/N]
       npm run --silent batch -- --merge DIR [DIR ...] --out DIR [--jobs N]

  SHEET.json   a case sheet; its files are found relative to it
  --out DIR    folder for results.json and one CASE-stations.csv per case; made if it is not there
  --shard I/N  share I, from 1, of N: its stations alone, written to DIR/shard-I-of-N.bin
  --merge      joins the shards in the folders named: the same results as without shards
  --jobs N     worker threads, 1 or more (default: ${availableParallelism()}, one for each core of this machine)
  --help       this text

Ends with 0: done; 1: a file or a sheet could not be used, the rest was written; 2: wrong arguments.`;

/** The arguments were wrong: the sentence says which. */
export class WrongArguments extends Error {}

/**
 * Reads the command line.
 * @param argv what follows the program's name
 * @returns the arguments, or "help" where the usage was asked for
 * @throws WrongArguments an unknown option, no sheet or folder, no --out, a number of jobs or a share that is none
 */
export function readArguments(argv: readonly string[]): BatchArguments | MergeArguments | "help" {
  const { values, positionals } = parse(argv);
  if (values.help) return "help";
  const { out, merge = false } = values;
  if (merge && values.shard !== undefined) throw new WrongArguments("--shard and --merge do not go together");
  if (positionals.length === 0)
    throw new WrongArguments(merge ? "no folder of shards was given" : "no case sheet was given");
  if (out === undefined || out === "") throw new WrongArguments("--out DIR was not given");
  const jobs = readJobs(values.jobs);
  return merge
    ? { folders: positionals, out, jobs }
    : { sheets: positionals, out, jobs, share: readShare(values.shard) };
}

function parse(argv: readonly string[]) {
  try {
    return parseArgs({
      args: [...argv],
      allowPositionals: true,
      options: {
        out: { type: "string" },
        jobs: { type: "string" },
        shard: { type: "string" },
        merge: { type: "boolean" },
        help: { type: "boolean" },
      },
    });
  } catch (error) {
    // parseArgs throws a TypeError whose first sentence names the option
    throw new WrongArguments(error instanceof Error ? error.message.split(". ")[0] : "unreadable arguments");
  }
}

function readShare(text: string | undefined): Share | null {
  if (text === undefined) return null;
  const [, part, of] = /^([1-9]\d{0,4})\/([1-9]\d{0,4})$/.exec(text)?.map(Number) ?? [];
  if (!(part <= of)) throw new WrongArguments(`--shard takes I/N with I from 1 to N, found ${text}`);
  return { part, of };
}

function readJobs(text: string | undefined): number {
  if (text === undefined) return availableParallelism();
  if (!/^[1-9]\d{0,3}$/.test(text))
    throw new WrongArguments(`--jobs takes a whole number of 1 or more, found ${text}`);
  return Number(text);
}
