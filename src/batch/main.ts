import process from "node:process";
import { createThreadEngine } from "../engine/threadEngine.ts";
import type { BatchArguments, MergeArguments } from "./readArguments.ts";
import { readArguments, usage, WrongArguments } from "./readArguments.ts";
import { runBatch } from "./runBatch.ts";
import { runMerge } from "./runMerge.ts";
import { runShard } from "./runShard.ts";

// whoever reads our lines may close the pipe before the last one
process.stderr.on("error", () => {});
// every file that is done has been kept by then
process.once("SIGTERM", () => {
  tell("Stopped. What is done is kept in the folder of the results; the same command goes on from there.");
  process.exit(128 + 15); // as shells tell of this signal
});
process.exitCode = await run(process.argv.slice(2));

function tell(line: string): void {
  process.stderr.write(`${line}\n`);
}

async function run(argv: readonly string[]): Promise<0 | 1 | 2> {
  try {
    const asked = readArguments(argv);
    if (asked !== "help") return (await batch(asked)) ? 0 : 1;
    process.stdout.write(`${usage}\n`);
    return 0;
  } catch (error) {
    if (error instanceof WrongArguments) {
      tell(`${error.message}\n\n${usage}`);
      return 2;
    }
    tell(`The program stopped: ${error instanceof Error ? error.message : String(error)}`);
    return 1;
  }
}

async function batch(asked: BatchArguments | MergeArguments): Promise<boolean> {
  const engine = createThreadEngine(new URL("./thread.js", import.meta.url), asked.jobs);
  try {
    // npm runs the command in the project's folder and notes where it was called
    const folder = process.env.INIT_CWD ?? process.cwd();
    const around = { folder, engine, tell, now: () => performance.now() };
    if ("folders" in asked) return await runMerge(asked, around);
    return await (asked.share === null ? runBatch(asked, around) : runShard(asked, asked.share, around));
  } finally {
    engine.close();
  }
}
