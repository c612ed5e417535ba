import { ReductionFailure } from "../core/failure.ts";
import { profileStation } from "../core/station/profileStation.ts";
import type { StationResult } from "../core/stationResult.ts";
import type { ByteSource } from "../read/byteSource.ts";
import { readProfile } from "../read/readProfile.ts";
import type { FileReduction, ReduceAsk } from "./protocol.ts";

/**
 * One file of statistics that were reduced elsewhere: a station for each row.
 * A row that cannot be used is left out and told; the others go on.
 * @throws what reading throws, and the first row's failure where no row could be used
 */
export async function reduceProfile(
  source: ByteSource,
  { read, reduce }: ReduceAsk,
  onBytes: (bytes: number) => void,
): Promise<FileReduction> {
  const { rows, source: note, flags } = await readProfile(source, read, { onBytes });
  const stations: StationResult[] = [];
  const failures: ReductionFailure[] = [];
  for (const row of rows) {
    try {
      stations.push(profileStation(row, reduce, { ...note, x: row.x }));
    } catch (error) {
      if (!(error instanceof ReductionFailure)) throw error;
      failures.push(error.at({ file: row.file, line: row.line }));
    }
  }
  if (stations.length === 0 && failures.length > 0) throw failures[0];
  return {
    parts: [],
    stations,
    sources: [note],
    flags: flags.map((flag) => ({ ...flag, text: `${source.name}: ${flag.text}` })),
    failures: failures.map((failure) => failure.plain()),
  };
}
