import { open } from "node:fs/promises";
import { ReductionFailure } from "../core/failure.ts";
import type { ByteSource } from "../read/byteSource.ts";

/** Large enough that the system call does not count, small enough to stay in the processor's cache. */
const chunkBytes = 1 << 18;

/**
 * A file on disk as a source of bytes.
 * @throws missing-file, unreadable-file when its bytes are asked for and the system refuses them
 */
export function fileSource(name: string, path: string, bytes: number): ByteSource {
  return { name, bytes, stream: () => chunksOf(name, path) };
}

async function* chunksOf(name: string, path: string): AsyncGenerator<Uint8Array> {
  // touching fresh memory for every chunk would cost more than parsing what is in it
  const buffer = new Uint8Array(chunkBytes);
  const file = await open(path).catch((error) => {
    throw refused(name, error);
  });
  try {
    for (;;) {
      const { bytesRead } = await file.read(buffer, 0, chunkBytes).catch((error) => {
        throw refused(name, error);
      });
      if (bytesRead === 0) return;
      yield buffer.subarray(0, bytesRead);
    }
  } finally {
    await file.close();
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
