import { strToU8, type Zippable, zipSync } from "fflate";

/** One file of an archive: a plain name, folders parted by "/", and what is in it. */
export interface ArchiveFile {
  readonly path: string;
  readonly content: string | Uint8Array;
}

/** All files in one archive; what is compressed already is stored as it is. */
export function zipFiles(files: readonly ArchiveFile[]): Uint8Array {
  const entries: Zippable = {};
  for (const { path, content } of files) {
    const bytes = typeof content === "string" ? strToU8(content) : content;
    entries[path] = [bytes, { level: path.endsWith(".png") ? 0 : 6 }];
  }
  return zipSync(entries);
}
