import { availableParallelism } from "node:os";
import { parseArgs } from "node:util";

/** What the command was asked to do. Paths are as written: relative to the folder it was called in. */
export interface BatchArguments {
  readonly sheets: readonly string[];
  readonly out: string;
  /** Worker threads. */
  readonly jobs: number;
}

export const usage = `Usage: npm run --silent batch -- SHEET.json [SHEET.json ...] --out DIR [--jobs N]

  SHEET.json   a case sheet; its files are found relative to it
  --out DIR    folder for results.json and one CASE-stations.csv per case; made if it is not there
  --jobs N     worker threads, 1 or more (default: ${availableParallelism()}, one for each core of this machine)
  --help       this text

Ends with 0: done; 1: a file or a sheet could not be used, the rest was written; 2: wrong arguments.`;

/** The arguments were wrong: the sentence says which. */
export class WrongArguments extends Error {}

/**
 * Reads the command line.
 * @param argv what follows the program's name
 * @returns the arguments, or "help" where the usage was asked for
 * @throws WrongArguments an unknown option, no sheet, no --out, a number of jobs that is none
 */
export function readArguments(argv: readonly string[]): BatchArguments | "help" {
  const { values, positionals } = parse(argv);
  if (values.help) return "help";
  for (const option of ["shard", "merge"] as const)
    if (values[option] !== undefined) throw new WrongArguments(`--${option} is not there yet`);
  if (positionals.length === 0) throw new WrongArguments("no case sheet was given");
  if (values.out === undefined || values.out === "") throw new WrongArguments("--out DIR was not given");
  return { sheets: positionals, out: values.out, jobs: readJobs(values.jobs) };
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

function readJobs(text: string | undefined): number {
  if (text === undefined) return availableParallelism();
  if (!/^[1-9]\d{0,3}$/.test(text))
    throw new WrongArguments(`--jobs takes a whole number of 1 or more, found ${text}`);
  return Number(text);
}
