import { readdirSync, statSync } from "node:fs";
import { resolve } from "node:path";

/**
 * Files on disk that a path of a sheet may mean, for the sheet to choose from.
 * A part of the path without `*` is followed as it stands, also `..`; one with `*` lists the folder it stands in.
 * @param folder the sheet's own
 * @param path   as in the sheet: relative to it, parts divided by `/`
 * @returns      paths of the same form, sorted; empty where there is none
 */
export function candidateFiles(folder: string, path: string): string[] {
  const parts = path.replaceAll("\\", "/").split("/");
  let found = [""];
  for (const [i, part] of parts.entries()) {
    const last = i === parts.length - 1;
    found = found.flatMap((before) => {
      const names = part.includes("*") ? listed(resolve(folder, before), last) : [part];
      return names.map((name) => before + name + (last ? "" : "/"));
    });
  }
  return found.filter((each) => isFile(resolve(folder, each))).sort();
}

function listed(folder: string, files: boolean): string[] {
  try {
    return readdirSync(folder, { withFileTypes: true })
      .filter((entry) => entry.isSymbolicLink() || (files ? entry.isFile() : entry.isDirectory()))
      .map(({ name }) => name);
  } catch {
    return []; // no such folder, or none that may be listed: the path then matches nothing, and that is said
  }
}

function isFile(path: string): boolean {
  try {
    return statSync(path).isFile();
  } catch {
    return false;
  }
}
