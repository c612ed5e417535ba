import { hashBytes } from "../../core/hashBytes.ts";
import type { SourceFile } from "../../engine/protocol.ts";
import type { KeptFile } from "./keptPage.ts";

/** Where the bytes of records are kept in this browser, so that they can be read again without a drop. */
export interface RecordFolder {
  /** The files whose bytes are there. */
  find(files: readonly KeptFile[]): Promise<SourceFile[]>;
  /** Copies those that are not there yet. */
  keep(files: readonly SourceFile[]): Promise<void>;
  /** Removes all others. */
  keepOnly(files: readonly KeptFile[]): Promise<void>;
}

/**
 * A folder of the origin's private file system.
 * @returns null where the browser has none (a page from disk, a private window) or cannot write to it
 */
export async function openRecordFolder(name: string): Promise<RecordFolder | null> {
  try {
    const root = await navigator.storage.getDirectory();
    const folder = await root.getDirectoryHandle(name, { create: true });
    return "createWritable" in FileSystemFileHandle.prototype ? folderOf(folder) : null;
  } catch {
    return null;
  }
}

function folderOf(folder: FileSystemDirectoryHandle): RecordFolder {
  return {
    async find(files) {
      const found = await Promise.all(files.map((file) => fileOf(folder, file)));
      return files.flatMap((file, i) => {
        const content = found[i];
        return content === null ? [] : [{ ...file, content }];
      });
    },
    async keep(files) {
      // one after the other: a disk that is full is noticed at the first
      for (const file of files) if ((await fileOf(folder, file)) === null) await copy(folder, file);
    },
    async keepOnly(files) {
      const wanted = new Set(files.map(keyOf));
      const there: string[] = [];
      for await (const key of folder.keys()) there.push(key);
      await Promise.all(there.filter((key) => !wanted.has(key)).map((key) => folder.removeEntry(key)));
    },
  };
}

/** Null where it is not there, or not whole. */
async function fileOf(folder: FileSystemDirectoryHandle, file: KeptFile): Promise<File | null> {
  try {
    const content = await (await folder.getFileHandle(keyOf(file))).getFile();
    return content.size === file.bytes ? content : null;
  } catch {
    return null;
  }
}

async function copy(folder: FileSystemDirectoryHandle, file: SourceFile): Promise<void> {
  if (!(file.content instanceof Blob)) return;
  const handle = await folder.getFileHandle(keyOf(file), { create: true });
  await file.content.stream().pipeTo(await handle.createWritable());
}

/** Two files may have one content, and two contents one name. */
function keyOf({ name, fingerprint }: KeptFile): string {
  return `${fingerprint}-${hashBytes(new TextEncoder().encode(name))}`;
}
