import { Gunzip } from "fflate";
import { ReductionFailure } from "../core/failure.ts";
import type { ByteSource } from "./byteSource.ts";

/** A table of numbers shrinks to a tenth at best; what grows more than this, and by this much, is no record. */
const mostExpansion = 200;
const freeBytes = 2 ** 26;

/**
 * A file's bytes, expanded where it is gzip (told by its first two bytes, whatever its name; several members in a
 * row are one file).
 * @param onBytes hears how many bytes of the file itself have been read since it was last told
 * @throws unreadable-file compressed data that are damaged, end too early, or expand beyond all measure
 */
export async function* expandedBytes(
  source: ByteSource,
  onBytes?: (bytes: number) => void,
): AsyncGenerator<Uint8Array> {
  let expander: Expander | null = null;
  let begun = false;
  for await (const chunk of source.stream()) {
    onBytes?.(chunk.length);
    if (!begun && chunk.length > 0) {
      begun = true;
      if (chunk[0] === 0x1f && (chunk.length === 1 || chunk[1] === 0x8b))
        expander = new Expander(source.name);
    }
    if (expander === null) yield chunk;
    else yield* expander.push(chunk);
  }
  if (expander !== null) yield* expander.end();
}

class Expander {
  private readonly stream: Gunzip;
  private expanded: Uint8Array[] = [];
  private read = 0;
  private written = 0;

  constructor(private readonly file: string) {
    this.stream = new Gunzip((bytes) => this.expanded.push(bytes));
  }

  push(chunk: Uint8Array): Uint8Array[] {
    this.read += chunk.length;
    // the decoder keeps what it has not used yet, and the chunk may be filled again
    return this.taken(() => this.stream.push(chunk.slice()));
  }

  end(): Uint8Array[] {
    return this.taken(() => this.stream.push(new Uint8Array(0), true));
  }

  private taken(work: () => void): Uint8Array[] {
    try {
      work();
    } catch (error) {
      throw this.refused(error instanceof Error ? error.message : String(error));
    }
    const pieces = this.expanded;
    this.expanded = [];
    this.written += pieces.reduce((sum, { length }) => sum + length, 0);
    if (this.written > freeBytes && this.written > mostExpansion * this.read)
      throw this.refused(`${this.read} bytes expand to more than ${this.written}`, "a record of numbers");
    return pieces;
  }

  private refused(found: string, expected = "gzip data that are whole"): ReductionFailure {
    return new ReductionFailure(
      "unreadable-file",
      {
        message: `The compressed file cannot be expanded, ${(this.written / 1e6).toFixed(1)} MB into its text`,
        found,
        expected,
        remedy: "Compress the record again, or expand it and give the plain file.",
      },
      { file: this.file },
    );
  }
}
