import { mkdirSync, renameSync, rmSync, statSync, writeFileSync } from "node:fs";
import { dirname, join, resolve } from "node:path";
import { WrongArguments } from "./readArguments.ts";

/** The folder that results go to. */
export interface Output {
  /** Writes a file whole or not at all. */
  write(name: string, content: string | Uint8Array): void;
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
    makeFolder(folder);
    const trial = join(folder, `.waneline-${process.pid}`);
    writeFileSync(trial, "");
    rmSync(trial);
  } catch (error) {
    const code = error instanceof Error && "code" in error ? String(error.code) : "unknown";
    throw new WrongArguments(`--out ${folder}: the folder cannot be made or written to (${code})`);
  }
  const folderThere = names.find((name) => isFolder(join(folder, name)));
  if (folderThere !== undefined)
    throw new WrongArguments(
      `--out ${folder}: ${folderThere} there is a folder, and a file of that name is to be written`,
    );
  return {
    write(name, content) {
      const path = join(folder, name);
      writeFileSync(`${path}.part`, content);
      renameSync(`${path}.part`, path);
    },
  };
}

/** One folder after the other: Node's own recursion does not end where a file system denies that a folder exists. */
function makeFolder(folder: string): void {
  if (isFolder(folder)) return;
  if (dirname(folder) !== folder) makeFolder(dirname(folder));
  try {
    mkdirSync(folder);
  } catch (error) {
    if (!isFolder(folder)) throw error; // another run may have made it in the meantime
  }
}

function isFolder(path: string): boolean {
  return statSync(path, { throwIfNoEntry: false })?.isDirectory() ?? false;
}
