import { ReductionFailure } from "../core/failure.ts";
import type { ByteSource } from "./byteSource.ts";
import { wholeLines } from "./wholeLines.ts";

/** The first lines of a file: enough to recognise what it is. */
export interface Head {
  readonly file: string;
  readonly bytes: number;
  readonly lines: readonly string[];
  /** Characters in `lines`, line ends included. */
  readonly characters: number;
  /** True where `lines` is the whole file. */
  readonly whole: boolean;
}

const headBytes = 2 ** 18;

/**
 * Reads the first 256 kB (or all) of a file as lines; a line cut at the end of the head is dropped.
 * @throws empty-file   no character but blanks
 * @throws not-a-record bytes that are no text
 */
export async function readHead(source: ByteSource): Promise<Head> {
  const lines: string[] = [];
  let whole = true;
  for await (const chunk of wholeLines(start(source, headBytes))) {
    if (chunk.unended && source.bytes > headBytes) whole = false;
    else for (const line of chunk.text.split("\n")) lines.push(line);
  }
  if (source.bytes > headBytes) whole = false;
  const characters = lines.reduce((sum, line) => sum + line.length + 1, 0);
  if (lines.every((line) => line.trim() === "") && whole) throw empty(source.name);
  if (lines.some((line) => line.includes("\0"))) throw binary(source.name);
  return { file: source.name, bytes: source.bytes, lines, characters, whole };
}

/** The first bytes of a source as a source of its own. */
function start(source: ByteSource, bytes: number): ByteSource {
  return {
    name: source.name,
    bytes: Math.min(bytes, source.bytes),
    stream: async function* () {
      let left = bytes;
      for await (const chunk of source.stream()) {
        yield chunk.length > left ? chunk.subarray(0, left) : chunk;
        left -= chunk.length;
        if (left <= 0) return;
      }
    },
  };
}

function empty(file: string): ReductionFailure {
  return new ReductionFailure(
    "empty-file",
    {
      message: "The file is empty",
      expected: "one row of numbers in each line",
      remedy: "Export the record again, or leave the file out.",
    },
    { file },
  );
}

function binary(file: string): ReductionFailure {
  return new ReductionFailure(
    "not-a-record",
    {
      message: "The file is no text",
      found: "zero bytes",
      expected: "one row of numbers in each line",
      remedy: "Export the record as text (CSV), or leave the file out.",
    },
    { file },
  );
}
