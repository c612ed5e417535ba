import type { SourceFile } from "../../engine/protocol.ts";
import { fingerprint } from "./fingerprint.ts";

/** A file with its path inside the drop. */
export interface DroppedFile {
  readonly path: string;
  readonly file: File;
}

/**
 * Every file of a drop, folders opened to the bottom. Entries must be taken before the first await:
 * the browser empties a DataTransfer as soon as its event is over.
 */
export async function openDrop(transfer: DataTransfer): Promise<DroppedFile[]> {
  const entries = [...transfer.items]
    .filter((item) => item.kind === "file")
    .map((item) => ({ entry: item.webkitGetAsEntry?.() ?? null, file: item.getAsFile() }));
  const opened = await Promise.all(
    entries.map(({ entry, file }) => (entry ? openEntry(entry) : file ? [{ path: file.name, file }] : [])),
  );
  return opened.flat().filter(isVisible);
}

/** The files of an input; a folder's files carry their path in it. */
export function openChoice(files: Iterable<File>): DroppedFile[] {
  return [...files].map((file) => ({ path: file.webkitRelativePath || file.name, file })).filter(isVisible);
}

/** Files as the engine takes them: named by their path in the drop, told apart by their content. */
export function asSources(files: readonly DroppedFile[]): Promise<SourceFile[]> {
  return Promise.all(
    files.map(async ({ path, file }) => ({
      name: path,
      bytes: file.size,
      fingerprint: await fingerprint(file),
      content: file,
    })),
  );
}

/** Systems strew hidden files into folders; nobody means to drop them. */
function isVisible({ path }: DroppedFile): boolean {
  return !path.split("/").some((part) => part.startsWith(".") || part === "__MACOSX" || part === "Thumbs.db");
}

async function openEntry(entry: FileSystemEntry): Promise<DroppedFile[]> {
  if (entry.isFile) {
    const file = await new Promise<File>((resolve, reject) =>
      (entry as FileSystemFileEntry).file(resolve, reject),
    );
    return [{ path: entry.fullPath.replace(/^\//, ""), file }];
  }
  const reader = (entry as FileSystemDirectoryEntry).createReader();
  const found: DroppedFile[] = [];
  // a reader hands out a folder in parts, a hundred entries at a time, and ends with none
  for (;;) {
    const part = await new Promise<FileSystemEntry[]>((resolve, reject) =>
      reader.readEntries(resolve, reject),
    );
    if (part.length === 0) return found;
    for (const files of await Promise.all(part.map(openEntry))) found.push(...files);
  }
}
