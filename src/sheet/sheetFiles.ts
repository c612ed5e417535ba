import type { PlainFailure } from "../core/failure.ts";
import type { CaseSheet, SheetFile } from "./caseSheet.ts";
import { expandPaths, folderOf, pathFrom } from "./matchFiles.ts";

/** The files of a drop that a sheet names: one entry and one name each, in the order of the sheet. */
export interface SheetFiles {
  readonly files: readonly SheetFile[];
  /** Paths in the drop. */
  readonly names: readonly string[];
  readonly failures: readonly PlainFailure[];
}

/**
 * Finds a sheet's files in a drop: by path relative to the sheet; failing that by the file's own name, since a
 * drop may have lost the folders. A name that several files have is taken from the sheet's own top folder only.
 * @param sheet as read, its paths may hold `*` and `../`
 * @param name  path of the sheet in the drop
 * @param there paths of the other files
 */
export function sheetFiles(sheet: CaseSheet, name: string, there: readonly string[]): SheetFiles {
  const folder = folderOf(name);
  const patterns = sheet.files.map(({ path }) => pathFrom(folder, path));
  const byPath = expandPaths(patterns, there);
  const taken = new Set(byPath.flatMap(({ paths }) => paths));
  const files: SheetFile[] = [];
  const names: string[] = [];
  const failures: PlainFailure[] = [];
  sheet.files.forEach(({ path, x }, i) => {
    const found = byPath[i].paths.length > 0 ? byPath[i].paths : byName(path, name, there, taken);
    for (const each of found) {
      taken.add(each);
      names.push(each);
      files.push({ path: relativePath(folder, each), x });
    }
    if (found.length === 0) failures.push(notThere(name, i, path));
  });
  return { files, names, failures };
}

function byName(path: string, sheet: string, there: readonly string[], taken: ReadonlySet<string>): string[] {
  const free = there.filter((each) => !taken.has(each));
  const pattern = path.slice(path.lastIndexOf("/") + 1);
  const own = (each: string) => each.slice(each.lastIndexOf("/") + 1);
  const found = free.filter((each) => expandPaths([pattern], [own(each)])[0].paths.length > 0);
  const top = sheet.includes("/") ? sheet.slice(0, sheet.indexOf("/") + 1) : "";
  const near = found.filter((each) => (top === "" ? !each.includes("/") : each.startsWith(top)));
  const clear = (names: readonly string[]) => new Set(names.map(own)).size === names.length;
  if (near.length > 0 && clear(near)) return near;
  return clear(found) ? found : [];
}

/** A path in the drop as the sheet would write it. */
function relativePath(folder: string, name: string): string {
  const from = folder === "" ? [] : folder.split("/");
  const to = name.split("/");
  let shared = 0;
  while (shared < from.length && shared < to.length - 1 && from[shared] === to[shared]) shared++;
  return [...from.slice(shared).map(() => ".."), ...to.slice(shared)].join("/");
}

function notThere(file: string, index: number, path: string): PlainFailure {
  return {
    code: "missing-file",
    message: `The drop holds no file ${path}, or several of that name`,
    found: "none that is meant",
    remedy: "Drop it together with its sheet, in the same folders.",
    where: { file, key: `files[${index}].path` },
  };
}
