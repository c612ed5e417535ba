import { describe, expect, it } from "vitest";
import { openDrop } from "../../../src/app/session/openDrop.ts";

/** A folder as the browser hands it out: two entries a call, then none. */
function folder(path: string, entries: readonly unknown[]) {
  return {
    isFile: false,
    fullPath: path,
    createReader: () => {
      const left = [...entries];
      return { readEntries: (done: (part: unknown[]) => void) => done(left.splice(0, 2)) };
    },
  };
}
function leaf(path: string) {
  const file = new File(["t,u\n"], path.split("/").at(-1) ?? path);
  return { isFile: true, fullPath: path, file: (done: (file: File) => void) => done(file) };
}
const drop = (entries: readonly unknown[]) =>
  ({
    items: entries.map((entry) => ({ kind: "file", webkitGetAsEntry: () => entry, getAsFile: () => null })),
  }) as unknown as DataTransfer; // happy-dom has no DataTransfer with entries

describe("a drop", () => {
  it("is opened to the bottom of its folders, however many parts a folder is read in", async () => {
    const names = ["a.csv", "b.csv", "c.csv", "d.csv", "e.csv"];
    const files = await openDrop(
      drop([
        folder("/screen", [
          ...names.map((name) => leaf(`/screen/${name}`)),
          folder("/screen/more", [leaf("/screen/more/f.csv")]),
        ]),
      ]),
    );
    expect(files.map((file) => file.path)).toEqual([
      ...names.map((name) => `screen/${name}`),
      "screen/more/f.csv",
    ]);
  });

  it("leaves out what a system strews into folders", async () => {
    const files = await openDrop(
      drop([folder("/s", [leaf("/s/.DS_Store"), leaf("/s/a.csv")]), leaf("/b.csv")]),
    );
    expect(files.map((file) => file.path)).toEqual(["s/a.csv", "b.csv"]);
  });
});
