import { createReadStream } from "node:fs";
import { ReductionFailure } from "../core/failure.ts";
import type { ByteSource } from "../read/byteSource.ts";

/** Large enough that the system call does not count, small enough that a few of them are nothing. */
const chunkBytes = 1 << 20;

/**
 * A file on disk as a source of bytes.
 * @throws missing-file, unreadable-file when its bytes are asked for and the system refuses them
 */
export function fileSource(name: string, path: string, bytes: number): ByteSource {
  return { name, bytes, stream: () => chunksOf(name, path) };
}

async function* chunksOf(name: string, path: string): AsyncGenerator<Uint8Array> {
  try {
    yield* createReadStream(path, { highWaterMark: chunkBytes });
  } catch (error) {
    throw refused(name, error);
  }
}

function refused(name: string, error: unknown): ReductionFailure {
  const code = error instanceof Error && "code" in error ? String(error.code) : "unknown";
  if (code === "ENOENT")
    return new ReductionFailure(
      "missing-file",
      { message: "the file is not there", remedy: "Put it back, or mend its path in the case sheet" },
      { file: name },
    );
  return new ReductionFailure(
    "unreadable-file",
    {
      message: "the system would not let the file be read",
      found: code,
      remedy: "See that it is a file and that you may read it",
    },
    { file: name },
  );
}
