import { type PlainFailure, ReductionFailure } from "../../src/core/failure.ts";
import type { ReadSettings, RecordOrigin } from "../../src/core/records.ts";
import type { ByteSource } from "../../src/read/byteSource.ts";
import { type ReadSummary, readRecords } from "../../src/read/readRecords.ts";

export const plainSettings: ReadSettings = {
  layout: "series",
  units: "SI",
  columns: null,
  separator: null,
  decimal: null,
  heading: null,
  step: null,
  missing: [],
  x: null,
  zero: 0,
  startup: 0,
};

/** A text (or bytes) as a source, cut into chunks of the given sizes, the last size for all the rest. */
export function sourceOf(
  name: string,
  content: string | Uint8Array,
  sizes: readonly number[] = [65536],
): ByteSource {
  const bytes = typeof content === "string" ? new TextEncoder().encode(content) : content;
  return {
    name,
    bytes: bytes.length,
    stream: async function* () {
      let at = 0;
      for (let i = 0; at < bytes.length; i++) {
        const size = sizes[Math.min(i, sizes.length - 1)];
        yield bytes.slice(at, at + size);
        at += size;
      }
    },
  };
}

export interface Collected {
  readonly origin: RecordOrigin;
  readonly t: number[];
  readonly u: number[];
  readonly v: number[];
  readonly w: number[];
}

/** Every record of a file with all its samples. */
export async function collect(
  source: ByteSource,
  settings: Partial<ReadSettings> = {},
): Promise<{ records: Collected[]; summary: ReadSummary }> {
  const records: Collected[] = [];
  const summary = await readRecords(
    source,
    { ...plainSettings, ...settings },
    {
      record: (origin) => {
        const record: Collected = { origin, t: [], u: [], v: [], w: [] };
        records.push(record);
        return {
          add: (block) => {
            for (const role of ["t", "u", "v", "w"] as const) {
              const column = block[role];
              if (column) record[role].push(...column.subarray(0, block.count));
            }
          },
        };
      },
    },
  );
  return { records, summary };
}

/** The failure that something ends in. Anything but a ReductionFailure, or none, fails the test. */
export async function failureOf(work: Promise<unknown> | (() => unknown)): Promise<PlainFailure> {
  try {
    await (typeof work === "function" ? work() : work);
  } catch (error) {
    if (error instanceof ReductionFailure) return error.plain();
    throw error;
  }
  throw new Error("no failure where one was expected");
}
