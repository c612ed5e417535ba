import { mkdtempSync, rmSync, statSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { Engine, SourceFile } from "../../src/engine/protocol.ts";
import { createThreadEngine } from "../../src/engine/threadEngine.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";
import { readSettings } from "../../src/sheet/readSettings.ts";
import { reduceSettings } from "../../src/sheet/reduceSettings.ts";
import type { BuiltBatch } from "../batch/builtBatch.ts";
import { buildBatch } from "../batch/builtBatch.ts";

let built: BuiltBatch;
let engine: Engine;
let folder = "";
beforeAll(async () => {
  built = await buildBatch();
  folder = mkdtempSync(join(tmpdir(), "waneline-threads-"));
  engine = createThreadEngine(built.thread, 2);
}, 60_000);
afterAll(() => {
  engine.close();
  built.remove();
  rmSync(folder, { recursive: true });
});

function fileOf(name: string, text: string): SourceFile {
  const path = join(folder, name);
  writeFileSync(path, text);
  return { name, bytes: statSync(path).size, fingerprint: name, content: { path } };
}

function reduce(file: SourceFile, options: Parameters<Engine["run"]>[2] = {}) {
  const read = readSettings(defaultCaseSheet, { path: file.name, x: 1 });
  return engine.run("reduce", { file, read, reduce: reduceSettings(defaultCaseSheet) }, options);
}

const rows = (count: number) =>
  Array.from({ length: count }, (_, i) => `${(i * 1e-3).toFixed(3)},${(5 + Math.sin(i * i)).toFixed(6)}`);

describe("an engine on threads", () => {
  it("reads a file from disk and tells every byte of it", async () => {
    const file = fileOf("a.csv", `t,u\n${rows(20_000).join("\n")}\n`);
    let bytes = 0;
    const onProgress = (more: number) => {
      bytes += more;
    };
    const { parts } = await reduce(file, { onProgress });
    expect(parts).toMatchObject([{ samples: 20_000, components: ["u"] }]);
    expect(bytes).toBe(file.bytes);
    const preview = await engine.run("preview", { file, settings: {} });
    expect(preview).toMatchObject({ file: "a.csv", separator: ",", layout: "series" });
  });

  it("says of a file that is gone, or is none, that it is so", async () => {
    const gone = {
      name: "gone.csv",
      bytes: 1,
      fingerprint: "g",
      content: { path: join(folder, "gone.csv") },
    };
    await expect(reduce(gone)).rejects.toMatchObject({ code: "missing-file", where: { file: "gone.csv" } });
    const none = { name: "none", bytes: 1, fingerprint: "n", content: { path: folder } };
    await expect(reduce(none)).rejects.toMatchObject({
      code: "unreadable-file",
      facts: { found: "EISDIR" },
      where: { file: "none" },
    });
  });

  it("stops in the middle of a file when it is told to, and works on", async () => {
    const stop = new AbortController();
    const file = fileOf("long.csv", `t,u\n${rows(400_000).join("\n")}\n`);
    const heard: number[] = [];
    const asked = reduce(file, {
      signal: stop.signal,
      onProgress: (bytes) => {
        heard.push(bytes);
        stop.abort();
      },
    });
    await expect(asked).rejects.toMatchObject({ code: "cancelled" });
    expect(heard).toHaveLength(1);
    expect(heard[0]).toBeLessThan(file.bytes);
    const small = fileOf("small.csv", `t,u\n${rows(2000).join("\n")}\n`);
    expect((await reduce(small)).parts).toHaveLength(1);
  });

  it("says what happened where its thread cannot be started", async () => {
    const broken = createThreadEngine(new URL("nothing.js", built.thread), 1);
    const file = fileOf("b.csv", "t,u\n0,1\n");
    await expect(broken.run("preview", { file, settings: {} })).rejects.toMatchObject({ code: "crashed" });
    broken.close();
  });
});
