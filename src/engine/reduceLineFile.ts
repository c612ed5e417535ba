import { ReductionFailure } from "../core/failure.ts";
import type { LineReducer } from "../core/station/lines/startLines.ts";
import { withoutRepeatedEnd } from "../core/station/lines/withoutRepeatedEnd.ts";
import type { ByteSource } from "../read/byteSource.ts";
import { readLines } from "../read/readLines.ts";
import type { FileReduction, ReduceAsk } from "./protocol.ts";

/**
 * One file of lines, read and reduced in one pass: a part for each x.
 * @throws what reading throws; too-few-samples where the time left out at the start leaves nothing
 */
export async function reduceLineFile(
  source: ByteSource,
  { read, reduce }: ReduceAsk,
  onBytes: (bytes: number) => void,
): Promise<FileReduction> {
  let reducer: LineReducer | null = null;
  const summary = await readLines(
    source,
    read,
    {
      grid(grid) {
        reducer = withoutRepeatedEnd(grid, reduce.periodic);
        return reducer;
      },
    },
    { onBytes },
  );
  const parts = finished(reducer);
  if (parts.length === 0 || parts[0].snapshots === 0) throw nothingLeft(source.name);
  const one = parts.length === 1;
  const [note] = summary.sources;
  return {
    parts: [],
    lineParts: one ? parts.map((part) => ({ ...part, flags: [...summary.flags] })) : parts,
    stations: [],
    sources: parts.map(({ origin }) => ({ ...note, x: origin.x })),
    flags: one ? [] : summary.flags.map((flag) => ({ ...flag, text: `${source.name}: ${flag.text}` })),
  };
}

/** A variable that a callback sets is null for the compiler. */
function finished(reducer: LineReducer | null) {
  return reducer === null ? [] : reducer.finish();
}

function nothingLeft(file: string): ReductionFailure {
  return new ReductionFailure(
    "too-few-samples",
    {
      message: "the time left out at the start is longer than the time spanned by the snapshots",
      remedy: "Give a shorter startup in the case sheet",
    },
    { file },
  );
}
