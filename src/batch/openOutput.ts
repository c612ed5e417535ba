import { mkdirSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { join, resolve } from "node:path";
import { WrongArguments } from "./readArguments.ts";

/** The folder that results go to. */
export interface Output {
  /** Writes a file whole or not at all. */
  write(name: string, text: string): void;
}

/**
 * Makes the folder and makes sure, before any work is done, that it can be written to and that nothing that is
 * read would be written over.
 * @param folder absolute
 * @param names  all that will be written, plain file names
 * @param inputs absolute paths of all that is read
 * @throws WrongArguments it is no folder, cannot be written to, or holds an input under one of the names
 */
export function openOutput(folder: string, names: readonly string[], inputs: readonly string[]): Output {
  const read = new Set(inputs.map((path) => resolve(path)));
  const clash = names.find((name) => read.has(join(folder, name)));
  if (clash !== undefined)
    throw new WrongArguments(`--out ${folder}: ${clash} there is an input and would be written over`);
  try {
    mkdirSync(folder, { recursive: true });
    const trial = join(folder, `.waneline-${process.pid}`);
    writeFileSync(trial, "");
    rmSync(trial);
  } catch (error) {
    const code = error instanceof Error && "code" in error ? String(error.code) : "unknown";
    throw new WrongArguments(`--out ${folder}: the folder cannot be made or written to (${code})`);
  }
  return {
    write(name, text) {
      const path = join(folder, name);
      writeFileSync(`${path}.part`, text);
      renameSync(`${path}.part`, path);
    },
  };
}
