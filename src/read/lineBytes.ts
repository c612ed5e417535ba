import { ReductionFailure } from "../core/failure.ts";
import type { ByteSource } from "./byteSource.ts";
import { utf8Bytes } from "./utf8Bytes.ts";

/** Some whole lines of a file in UTF-8, line ends (LF, CR LF or CR) included. */
export interface LineBytes {
  /** The lines are its first `length` bytes. It is used again for the next ones. */
  readonly bytes: Uint8Array;
  readonly length: number;
  /** True for a last line that the file does not end: it may have been cut. */
  readonly unended: boolean;
}

/** A line longer than this is no row of a table, and waiting for its end would fill the memory. */
const longestLine = 2 ** 24;

const lineFeed = 10;
const carriageReturn = 13;

/**
 * A file as whole lines, a chunk at a time; where the bytes were cut on their way makes no difference.
 * @param onBytes hears how many bytes have been read since it was last told
 * @throws not-a-record a line without end
 */
export async function* lineBytes(
  source: ByteSource,
  onBytes?: (bytes: number) => void,
): AsyncGenerator<LineBytes> {
  let buffer = new Uint8Array(2 ** 16);
  let held = 0; // bytes of a line whose end has not come yet
  for await (const chunk of utf8Bytes(source, onBytes)) {
    buffer = withRoom(buffer, held, held + chunk.length);
    buffer.set(chunk, held);
    const filled = held + chunk.length;
    const length = endOfLines(buffer, held, filled);
    if (length > 0) {
      yield { bytes: buffer, length, unended: false };
      buffer.copyWithin(0, length, filled);
    }
    held = filled - length;
    if (held > longestLine) throw endless(source.name);
  }
  // a CR may have waited for an LF that did not come
  const ended = buffer.subarray(0, held).lastIndexOf(carriageReturn) + 1;
  if (ended > 0) yield { bytes: buffer, length: ended, unended: false };
  if (held > ended) yield { bytes: buffer.subarray(ended), length: held - ended, unended: true };
}

/** Behind the last line end; a CR that is the last byte may be the first half of a CR LF. */
function endOfLines(bytes: Uint8Array, from: number, to: number): number {
  const feed = bytes.subarray(from, to).lastIndexOf(lineFeed);
  if (feed >= 0) return from + feed + 1;
  // what was held back holds no line end, but for a CR as its last byte
  const lone = bytes.subarray(Math.max(0, from - 1), to - 1).lastIndexOf(carriageReturn);
  return lone >= 0 ? Math.max(0, from - 1) + lone + 1 : 0;
}

/** The array itself, or a larger one that begins with the same `kept` bytes. */
function withRoom(bytes: Uint8Array<ArrayBuffer>, kept: number, size: number): Uint8Array<ArrayBuffer> {
  if (size <= bytes.length) return bytes;
  const larger = new Uint8Array(2 ** Math.ceil(Math.log2(size)));
  larger.set(bytes.subarray(0, kept));
  return larger;
}

function endless(file: string): ReductionFailure {
  return new ReductionFailure(
    "not-a-record",
    {
      message: "A line has no end within 16 million characters",
      expected: "a text file with one row of numbers in each line",
      remedy: "Leave the file out, or export the record as text.",
    },
    { file },
  );
}
