import { readArguments, usage, WrongArguments } from "./readArguments.ts";

process.exitCode = run(process.argv.slice(2));

function run(argv: readonly string[]): 0 | 1 | 2 {
  try {
    const asked = readArguments(argv);
    if (asked === "help") {
      process.stdout.write(`${usage}\n`);
      return 0;
    }
    process.stderr.write("This version reads its arguments, but no case sheet yet.\n");
    return 1;
  } catch (error) {
    if (!(error instanceof WrongArguments)) throw error;
    process.stderr.write(`${error.message}\n\n${usage}\n`);
    return 2;
  }
}
