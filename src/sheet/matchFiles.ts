/** What a pattern of a sheet stands for among the files that are there. */
export interface MatchedPattern {
  readonly pattern: string;
  /** In natural order: `x2` before `x10`. A file named by two patterns belongs to the first. */
  readonly paths: readonly string[];
}

/**
 * The files that each path of a sheet stands for. `*` is any run of characters within one folder or file name,
 * `../` the folder above; both sides are relative to the sheet's folder.
 * @param patterns  paths of the sheet
 * @param available paths of the files that are there
 */
export function expandPaths(patterns: readonly string[], available: readonly string[]): MatchedPattern[] {
  const free = new Map(available.map((path) => [tidyPath(path), path]));
  return patterns.map((pattern) => {
    const test = patternTest(tidyPath(pattern));
    const paths = [...free].filter(([tidy]) => test(tidy)).map(([, path]) => path);
    for (const path of paths) free.delete(tidyPath(path));
    return { pattern, paths: paths.sort(naturalOrder) };
  });
}

/** A path relative to a folder, as a path from where the folder is named: ("a/b", "../x.csv") -> "a/x.csv". */
export function pathFrom(folder: string, relative: string): string {
  return tidyPath(folder === "" ? relative : `${folder}/${relative}`);
}

/** Folder of a path; "" for a file at the top. */
export function folderOf(path: string): string {
  return path.includes("/") ? path.slice(0, path.lastIndexOf("/")) : "";
}

/** Without `./`, `a/../` and backslashes; a `../` that leads above the beginning stays. */
function tidyPath(path: string): string {
  const parts: string[] = [];
  for (const part of path.replace(/\\/g, "/").split("/")) {
    if (part === "" && parts.length > 0) continue;
    if (part === ".") continue;
    if (part === ".." && parts.length > 0 && parts.at(-1) !== "..") parts.pop();
    else parts.push(part);
  }
  return parts.join("/");
}

function patternTest(pattern: string): (path: string) => boolean {
  const parts = pattern.split("/");
  return (path) => {
    const names = path.split("/");
    return names.length === parts.length && parts.every((part, i) => matchesName(part, names[i]));
  };
}

/** Piece by piece, so that many stars cost no more than one: a regular expression could be made to run for hours. */
function matchesName(pattern: string, name: string): boolean {
  const pieces = pattern.split("*");
  if (pieces.length === 1) return pattern === name;
  const first = pieces[0];
  const last = pieces[pieces.length - 1];
  if (name.length < first.length + last.length || !name.startsWith(first) || !name.endsWith(last))
    return false;
  let from = first.length;
  for (const piece of pieces.slice(1, -1)) {
    const at = name.indexOf(piece, from);
    if (at < 0) return false;
    from = at + piece.length;
  }
  return from <= name.length - last.length;
}

/** Runs of digits by their value, all else by its code units: the same on every machine. */
export function naturalOrder(a: string, b: string): number {
  const [left, right] = [a, b].map((text) => text.split(/(\d+)/));
  for (let i = 0; i < Math.min(left.length, right.length); i++) {
    if (left[i] === right[i]) continue;
    const difference = i % 2 === 1 ? Number(left[i]) - Number(right[i]) : 0;
    return difference || (left[i] < right[i] ? -1 : 1);
  }
  return left.length - right.length;
}
