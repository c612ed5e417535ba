import { ReductionFailure } from "../core/failure.ts";
import type { ByteSource } from "./byteSource.ts";
import { expandedBytes } from "./expandedBytes.ts";
import { wholeLines } from "./wholeLines.ts";

/** The first lines of a file: enough to recognise what it is. */
export interface Head {
  readonly file: string;
  readonly bytes: number;
  /** Bytes of its text: more than those of a compressed file; estimated where only its beginning was read. */
  readonly textBytes: number;
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
  const start = await startOf(source);
  for await (const chunk of wholeLines(start)) {
    if (!chunk.unended || start.whole) for (const line of chunk.text.split("\n")) lines.push(line);
  }
  const characters = lines.reduce((sum, line) => sum + line.length + 1, 0);
  if (lines.every((line) => line.trim() === "") && start.whole) throw empty(source.name);
  if (lines.some((line) => line.includes("\0"))) throw binary(source.name);
  const { whole, textBytes } = start;
  return { file: source.name, bytes: source.bytes, textBytes, lines, characters, whole };
}

/** The first bytes of a source's text as a source of its own, and how many there would be in all. */
async function startOf(
  source: ByteSource,
): Promise<ByteSource & { readonly whole: boolean; readonly textBytes: number }> {
  const pieces: Uint8Array[] = [];
  let [read, length, whole] = [0, 0, true];
  const count = (bytes: number) => {
    read += bytes;
  };
  for await (const chunk of expandedBytes(source, count)) {
    pieces.push(chunk.slice(0, headBytes - length));
    length += chunk.length;
    // a file of just this size is whole, and its last line is too
    whole = length < headBytes || (length === headBytes && read === source.bytes);
    if (length >= headBytes) break;
  }
  return {
    name: source.name,
    bytes: Math.min(length, headBytes),
    whole,
    textBytes: whole ? length : Math.round((source.bytes * length) / read),
    stream: async function* () {
      yield* pieces;
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
