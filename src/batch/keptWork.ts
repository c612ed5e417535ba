import { appendFileSync, readFileSync, rmSync } from "node:fs";
import type { FileReduction } from "../engine/protocol.ts";
import { sealed, unsealed } from "./sealed.ts";

/** Reductions of files that outlive a run which was stopped. */
export interface KeptWork {
  get(key: string): FileReduction | undefined;
  /** Keeps it on disk at once. */
  set(key: string, reduction: FileReduction): void;
  /** How many an earlier run left. */
  readonly found: number;
  /** The work is done: nothing need be kept any more. */
  clear(): void;
}

/** For the person who waits. */
export function keptText(found: number): string {
  const files = found === 1 ? "1 file was" : `${found} files were`;
  return `${files} reduced by a run that was stopped: taken from it`;
}

const lengthBytes = 8;

/**
 * One file, appended to as the work goes on: each entry its length, then the sealed reduction with its key. An entry
 * that was cut by the end of the run, and all behind it, are passed over and written again.
 * @param path where; it need not be there
 * @param tell hears, once, that nothing can be kept (a full disk): the work goes on without
 */
export function keptWork(path: string, tell: (line: string) => void): KeptWork {
  const known = new Map(entriesOf(path));
  let keeping = true;
  const work: KeptWork = {
    found: known.size,
    get: (key) => known.get(key),
    set(key, reduction) {
      if (known.has(key)) return;
      known.set(key, reduction);
      if (!keeping) return;
      try {
        appendFileSync(path, entry(key, reduction));
      } catch (error) {
        keeping = false;
        const code = error instanceof Error && "code" in error ? String(error.code) : "unknown";
        tell(`Work that is done cannot be kept for a later run (${code}); it goes on all the same.`);
      }
    },
    clear: () => rmSync(path, { force: true }),
  };
  return work;
}

function entry(key: string, reduction: FileReduction): Buffer {
  const bytes = sealed({ key, reduction });
  const length = Buffer.alloc(lengthBytes);
  length.writeBigUInt64LE(BigInt(bytes.length));
  return Buffer.concat([length, bytes]);
}

function entriesOf(path: string): [string, FileReduction][] {
  const found: [string, FileReduction][] = [];
  const bytes = contentOf(path);
  for (let at = 0; at + lengthBytes < bytes.length; ) {
    const end = at + lengthBytes + Number(bytes.readBigUInt64LE(at));
    const value = end > bytes.length ? null : unsealed(bytes.subarray(at + lengthBytes, end));
    if (value === null) break;
    const { key, reduction } = value as { key: string; reduction: FileReduction }; // sealed above
    found.push([key, reduction]);
    at = end;
  }
  return found;
}

function contentOf(path: string): Buffer {
  try {
    return readFileSync(path);
  } catch {
    return Buffer.alloc(0); // most often it is not there: nothing was stopped
  }
}
