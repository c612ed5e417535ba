/** The bytes of one file, whatever holds them: a Blob in the browser, a path in Node. Streamed as often as asked. */
export interface ByteSource {
  /** Path inside the drop, or relative to the sheet: what messages call the file. */
  readonly name: string;
  readonly bytes: number;
  /** From the beginning. An array is good until the next one is asked for: it may be filled again. */
  stream(): AsyncIterable<Uint8Array>;
}

/**
 * A Blob (or File) as a source.
 * Its stream's default reader is used: the reader that fills a given buffer is known to hang at times.
 */
export function blobSource(name: string, blob: Blob): ByteSource {
  return { name, bytes: blob.size, stream: () => chunksOf(blob) };
}

/** Not every browser lets `for await` walk a stream, so the reader is driven by hand. */
async function* chunksOf(blob: Blob): AsyncGenerator<Uint8Array> {
  const reader = blob.stream().getReader();
  try {
    for (;;) {
      const { done, value } = await reader.read();
      if (done) return;
      yield value;
    }
  } finally {
    await reader.cancel();
  }
}
