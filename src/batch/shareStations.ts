import type { Engine } from "../engine/protocol.ts";
import { readSettings } from "../sheet/readSettings.ts";
import type { LoadedCase } from "./loadCase.ts";

/** One entry of a case's sheet. */
export interface Entry {
  readonly inCase: number;
  readonly file: number;
}

/** A share of the work: number `part` of `of`, from 1. */
export interface Share {
  readonly part: number;
  readonly of: number;
}

/**
 * The entries that one share of the work is about: the stations of all cases in order of x are dealt out in turn, a
 * station with all its files to one share. Every share finds the same order by itself. What has no place of its own
 * (a file of many stations, one without a position) is dealt out by itself, last.
 */
export async function shareStations(
  cases: readonly LoadedCase[],
  engine: Engine,
  { part, of }: Share,
): Promise<Entry[]> {
  const stations = (await Promise.all(cases.map((each, i) => stationsOf(each, i, engine)))).flat();
  return stations.filter((_, i) => i % of === part - 1).flat();
}

async function stationsOf(of: LoadedCase, inCase: number, engine: Engine): Promise<Entry[][]> {
  const places = await Promise.all(of.files.map((_, file) => placeOf(of, file, engine)));
  const stations = new Map<number | string, Entry[]>();
  const inOrder = places
    .map((x, file) => ({ x, file }))
    .sort((a, b) => (a.x ?? last) - (b.x ?? last) || a.file - b.file);
  for (const { x, file } of inOrder) {
    const key = x ?? `entry ${file}`;
    stations.set(key, [...(stations.get(key) ?? []), { inCase, file }]);
  }
  return [...stations.values()];
}

const last = Number.MAX_VALUE;

/** Where a file's one station is; null where that is not to be known from its head. */
async function placeOf({ sheet, files }: LoadedCase, file: number, engine: Engine): Promise<number | null> {
  const { x } = sheet.files[file];
  if (x !== null) return x;
  try {
    const preview = await engine.run("preview", {
      file: files[file],
      settings: readSettings(sheet, sheet.files[file]),
    });
    return preview.position.source === "column" ? null : preview.position.x;
  } catch {
    return null; // the file's own share will say what is wrong with it
  }
}
