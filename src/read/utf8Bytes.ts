import type { ByteSource } from "./byteSource.ts";
import { expandedBytes } from "./expandedBytes.ts";
import { decoderFor } from "./wholeLines.ts";

/**
 * A file's text as UTF-8 without a byte-order mark. UTF-16, told by its mark, is written anew; all else passes as it
 * stands, also what is no valid UTF-8: numbers are ASCII in either.
 * @param onBytes hears how many bytes of the file have been read since it was last told
 */
export async function* utf8Bytes(
  source: ByteSource,
  onBytes?: (bytes: number) => void,
): AsyncGenerator<Uint8Array> {
  let start: Uint8Array | null = new Uint8Array(0);
  let wide: TextDecoder | null = null;
  const encoder = new TextEncoder();
  for await (const chunk of expandedBytes(source, onBytes)) {
    if (start === null) {
      yield wide === null ? chunk : encoder.encode(wide.decode(chunk, { stream: true }));
      continue;
    }
    start = joined(start, chunk);
    if (start.length < 3) continue;
    const decoder = decoderFor(start);
    if (decoder.encoding !== "utf-8") wide = decoder;
    yield wide === null ? unmarked(start) : encoder.encode(wide.decode(start, { stream: true }));
    start = null;
  }
  if (start !== null)
    yield encoder.encode(decoderFor(start).decode(start)); // a file of two bytes or less
  else if (wide !== null) yield encoder.encode(wide.decode());
}

function unmarked(start: Uint8Array): Uint8Array {
  return start[0] === 0xef && start[1] === 0xbb && start[2] === 0xbf ? start.subarray(3) : start;
}

/** A copy: the chunk may be filled again. */
function joined(a: Uint8Array, b: Uint8Array): Uint8Array {
  const both = new Uint8Array(a.length + b.length);
  both.set(a);
  both.set(b, a.length);
  return both;
}
