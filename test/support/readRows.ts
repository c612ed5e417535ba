import { readFileSync } from "node:fs";

/** Rows of a small comma-separated reference table with a heading; fields may stand in double quotes. */
export function readRows(file: URL): Record<string, string>[] {
  const [heading, ...lines] = readFileSync(file, "utf8").trim().split(/\r?\n/).map(fields);
  return lines.map((line) => Object.fromEntries(heading.map((name, i) => [name, line[i] ?? ""])));
}

function fields(line: string): string[] {
  return [...line.matchAll(/(?:^|,)(?:"((?:[^"]|"")*)"|([^",]*))/g)].map(
    ([, quoted, plain]) => quoted?.replaceAll('""', '"') ?? plain ?? "",
  );
}
