import type { Page } from "playwright-core";

export interface TextFile {
  /** Path inside the drop: "screen/x0200.csv". */
  readonly path: string;
  readonly text: string;
}

/** Drops files on the page as the system would: each with its path, through a real drop event. */
export async function dropFiles(page: Page, files: readonly TextFile[]): Promise<void> {
  await page.evaluate((given) => {
    interface Entry {
      isFile: boolean;
      isDirectory: boolean;
      name: string;
      fullPath: string;
    }
    const asFile = (path: string, text: string) =>
      new File([text], path.split("/").at(-1) ?? path, { lastModified: 1 });
    // What a dropped folder looks like to the page; a scripted DataTransfer cannot hold folders.
    const fileEntry = (path: string, text: string): Entry & { file(done: (file: File) => void): void } => ({
      isFile: true,
      isDirectory: false,
      name: path.split("/").at(-1) ?? path,
      fullPath: `/${path}`,
      file: (done) => done(asFile(path, text)),
    });
    const folderEntry = (
      path: string,
      inside: { path: string; text: string }[],
    ): Entry & { createReader(): unknown } => ({
      isFile: false,
      isDirectory: true,
      name: path.split("/").at(-1) ?? path,
      fullPath: `/${path}`,
      createReader: () => {
        let read = false;
        return {
          readEntries: (done: (entries: Entry[]) => void) => {
            done(read ? [] : children(path, inside));
            read = true;
          },
        };
      },
    });
    const children = (folder: string, inside: { path: string; text: string }[]): Entry[] => {
      const start = folder === "" ? 0 : folder.length + 1;
      const byName = new Map<string, { path: string; text: string }[]>();
      for (const each of inside) {
        const name = each.path.slice(start).split("/")[0];
        byName.set(name, [...(byName.get(name) ?? []), each]);
      }
      return [...byName].map(([name, members]) => {
        const path = folder === "" ? name : `${folder}/${name}`;
        return members.length === 1 && members[0].path === path
          ? fileEntry(path, members[0].text)
          : folderEntry(path, members);
      });
    };
    const entries = children("", given as { path: string; text: string }[]);
    const items = entries.map((entry) => ({
      kind: "file",
      webkitGetAsEntry: () => entry,
      getAsFile: () => null,
    }));
    const transfer = { types: ["Files"], items, files: [], dropEffect: "copy" };
    for (const kind of ["dragenter", "dragover", "drop"]) {
      const event = new DragEvent(kind, { bubbles: true, cancelable: true });
      Object.defineProperty(event, "dataTransfer", { value: transfer });
      document.body.dispatchEvent(event);
    }
  }, files as TextFile[]);
}
