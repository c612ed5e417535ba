import { describe, expect, it } from "vitest";
import { ReductionFailure } from "../../src/core/failure.ts";
import type { Preview } from "../../src/core/records.ts";
import type { Ask, Reply } from "../../src/engine/protocol.ts";
import type { Answer } from "../../src/engine/serveAsk.ts";
import { serveAsk } from "../../src/engine/serveAsk.ts";

const file = { name: "a.csv", bytes: 1, fingerprint: "a", content: { path: "a.csv" } };
const ask: Ask = { id: 7, task: "preview", ask: { file, settings: {} } };

async function replies(answer: Answer): Promise<Reply[]> {
  const heard: Reply[] = [];
  await serveAsk(ask, answer, (reply) => heard.push(structuredClone(reply)));
  return heard;
}
const preview = { file: "a.csv" } as Preview;

describe("an ask in a worker", () => {
  it("tells all bytes that were read, in few messages, then its answer", async () => {
    const heard = await replies(async (_, progress) => {
      for (let i = 0; i < 1000; i++) progress(1000);
      return { answer: preview, transfer: [] };
    });
    const told = heard.flatMap((reply) => (reply.kind === "progress" ? [reply.bytes] : []));
    expect(told.reduce((sum, bytes) => sum + bytes, 0)).toBe(1e6);
    expect(told.length).toBeLessThan(10);
    expect(heard.at(-1)).toEqual({ id: 7, kind: "answer", answer: preview });
  });

  it("ends with a failure as plain data", async () => {
    const failure = new ReductionFailure("no-time", { message: "no", remedy: "Mend it" }, { file: "a.csv" });
    expect(await replies(() => Promise.reject(failure))).toEqual([
      { id: 7, kind: "failed", failure: failure.plain() },
    ]);
  });

  it("tells a fault of the program with the file's name and without a stack", async () => {
    const [reply] = await replies(() => Promise.reject(new TypeError("x is undefined")));
    expect(reply).toMatchObject({
      kind: "failed",
      failure: { code: "crashed", found: "x is undefined", where: { file: "a.csv" } },
    });
    expect(JSON.stringify(reply)).not.toMatch(/\.ts:\d+|at /);
  });
});
