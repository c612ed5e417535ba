import { ReductionFailure } from "../core/failure.ts";
import type { ByteSource } from "./byteSource.ts";
import { expandedBytes } from "./expandedBytes.ts";

/** Some whole lines of a file. */
export interface LineChunk {
  /** Parted by "\n" whatever the file has, without the last line end. */
  readonly text: string;
  /** 1-based number of the first of them. */
  readonly firstLine: number;
  /** True for a last line that the file does not end: it may have been cut. */
  readonly unended: boolean;
}

/** A line longer than this is no row of a table, and waiting for its end would fill the memory. */
const longestLine = 2 ** 24;

/**
 * A file's text as whole lines, a chunk at a time; where the bytes were cut on their way makes no difference.
 * UTF-8, or UTF-16 with a byte-order mark; line ends LF, CR LF or CR.
 * @param onBytes hears how many bytes have been read since it was last told
 * @throws not-a-record a line without end
 */
export async function* wholeLines(
  source: ByteSource,
  onBytes?: (bytes: number) => void,
): AsyncGenerator<LineChunk> {
  let firstLine = 1;
  let rest = "";
  for await (const piece of decoded(source, onBytes)) {
    // a CR at the very end may be the first half of a CR LF
    const held = piece.ended || !piece.text.endsWith("\r") ? piece.text.length : piece.text.length - 1;
    const text = evenLines(rest + piece.text.slice(0, held));
    const end = text.lastIndexOf("\n");
    rest = text.slice(end + 1) + piece.text.slice(held);
    if (end >= 0) {
      const lines = text.slice(0, end);
      yield { text: lines, firstLine, unended: false };
      firstLine += countLines(lines);
    }
    if (rest.length > longestLine) throw endless(source.name, firstLine);
  }
  if (rest !== "") yield { text: rest, firstLine, unended: true };
}

async function* decoded(
  source: ByteSource,
  onBytes?: (bytes: number) => void,
): AsyncGenerator<{ text: string; ended: boolean }> {
  let decoder: TextDecoder | null = null;
  let start = new Uint8Array(0);
  for await (const chunk of expandedBytes(source, onBytes)) {
    if (decoder === null) {
      start = joined(start, chunk);
      if (start.length < 2) continue;
      decoder = decoderFor(start);
      yield { text: decoder.decode(start, { stream: true }), ended: false };
    } else {
      yield { text: decoder.decode(chunk, { stream: true }), ended: false };
    }
  }
  yield { text: decoder === null ? new TextDecoder().decode(start) : decoder.decode(), ended: true };
}

/** By the byte-order mark; the mark itself is dropped by the decoder. */
export function decoderFor(start: Uint8Array): TextDecoder {
  if (start[0] === 0xff && start[1] === 0xfe) return new TextDecoder("utf-16le");
  if (start[0] === 0xfe && start[1] === 0xff) return new TextDecoder("utf-16be");
  return new TextDecoder();
}

/** All line ends as "\n". */
export function evenLines(text: string): string {
  return text.includes("\r") ? text.replace(/\r\n?/g, "\n") : text;
}

function countLines(text: string): number {
  let lines = 1;
  for (let at = text.indexOf("\n"); at >= 0; at = text.indexOf("\n", at + 1)) lines++;
  return lines;
}

function joined(a: Uint8Array, b: Uint8Array): Uint8Array<ArrayBuffer> {
  const both = new Uint8Array(a.length + b.length);
  both.set(a);
  both.set(b, a.length);
  return both;
}

function endless(file: string, line: number): ReductionFailure {
  return new ReductionFailure(
    "not-a-record",
    {
      message: "A line has no end within 16 million characters",
      expected: "a text file with one row of numbers in each line",
      remedy: "Leave the file out, or export the record as text.",
    },
    { file, line },
  );
}
