import { describe, expect, it } from "vitest";
import { ReductionFailure } from "../../src/core/failure.ts";
import type { Preview } from "../../src/core/records.ts";
import type { Channel, Listener } from "../../src/engine/pool.ts";
import { createPool } from "../../src/engine/pool.ts";
import type { Ask, Engine, Reply } from "../../src/engine/protocol.ts";

/** A worker that does nothing by itself: the test says what it replies and when. */
class FakeWorker implements Channel {
  readonly asks: Ask[] = [];
  readonly given: Transferable[][] = [];
  ended = false;
  readonly listener: Listener;

  constructor(listener: Listener) {
    this.listener = listener;
  }
  post(ask: Ask, transfer: readonly Transferable[]) {
    this.asks.push(ask);
    this.given.push([...transfer]);
  }
  end() {
    this.ended = true;
  }
  last(): Ask {
    const ask = this.asks.at(-1);
    if (!ask) throw new Error("this worker was asked nothing");
    return ask;
  }
  reply(reply: Omit<Reply, "id"> & Record<string, unknown>) {
    this.listener.reply({ id: this.last().id, ...reply } as Reply);
  }
  answer(file: string) {
    this.reply({ kind: "answer", answer: { file } as Preview });
  }
}

function house(size: number) {
  const workers: FakeWorker[] = [];
  const pool = createPool((listener) => {
    const worker = new FakeWorker(listener);
    workers.push(worker);
    return worker;
  }, size);
  return { pool, workers };
}

const look = (pool: Engine, name: string, options: Parameters<Engine["run"]>[2] = {}) =>
  pool.run(
    "preview",
    { file: { name, bytes: 1, fingerprint: name, content: { path: name } }, settings: {} },
    options,
  );

async function failureOf(promise: Promise<unknown>): Promise<ReductionFailure> {
  const end = await promise.then(
    () => null,
    (error: unknown) => error,
  );
  if (!(end instanceof ReductionFailure)) throw new Error("this should have failed with a failure");
  return end;
}

describe("a pool of workers", () => {
  it("gives every ask its own answer, in whatever order they come", async () => {
    const { pool, workers } = house(2);
    const [first, second] = [look(pool, "a"), look(pool, "b")];
    workers[1].answer("b");
    workers[0].answer("a");
    expect((await first).file).toBe("a");
    expect((await second).file).toBe("b");
  });

  it("starts no more workers than it may and serves the rest in order", async () => {
    const { pool, workers } = house(2);
    const all = ["a", "b", "c", "d"].map((name) => look(pool, name));
    expect(workers.map((worker) => worker.asks.length)).toEqual([1, 1]);
    workers[1].answer("b");
    workers[1].answer("c");
    workers[0].answer("a");
    workers[1].answer("d");
    expect((await Promise.all(all)).map(({ file }) => file)).toEqual(["a", "b", "c", "d"]);
    expect(workers).toHaveLength(2);
  });

  it("starts no worker without work", () => {
    expect(house(4).workers).toHaveLength(0);
  });

  it("passes progress on to the one who asked, and to nobody else", async () => {
    const { pool, workers } = house(2);
    const heard: string[] = [];
    const first = look(pool, "a", { onProgress: (bytes) => heard.push(`a ${bytes}`) });
    const second = look(pool, "b", { onProgress: (bytes) => heard.push(`b ${bytes}`) });
    workers[0].reply({ kind: "progress", bytes: 10 });
    workers[1].reply({ kind: "progress", bytes: 7 });
    workers[0].reply({ kind: "progress", bytes: 5 });
    workers[0].answer("a");
    workers[1].answer("b");
    await Promise.all([first, second]);
    expect(heard).toEqual(["a 10", "b 7", "a 5"]);
  });

  it("brings a failure back with its class, code and place", async () => {
    const { pool, workers } = house(1);
    const asked = look(pool, "a.csv");
    const failure = new ReductionFailure("not-a-number", { message: "no", remedy: "Mend it" }, { line: 7 });
    workers[0].reply({ kind: "failed", failure: failure.plain() });
    const found = await failureOf(asked);
    expect(found.plain()).toEqual(failure.plain());
    const next = look(pool, "b"); // the worker is sound and serves on
    workers[0].answer("b");
    expect((await next).file).toBe("b");
  });

  it("ends a worker whose ask is cancelled, replaces it and serves on", async () => {
    const { pool, workers } = house(1);
    const stop = new AbortController();
    const first = look(pool, "a", { signal: stop.signal });
    const second = look(pool, "b");
    stop.abort();
    expect((await failureOf(first)).code).toBe("cancelled");
    expect(workers[0].ended).toBe(true);
    workers[1].answer("b");
    expect((await second).file).toBe("b");
  });

  it("does not hear a worker that was ended", async () => {
    const { pool, workers } = house(1);
    const stop = new AbortController();
    const first = look(pool, "a", { signal: stop.signal });
    stop.abort();
    await failureOf(first);
    const second = look(pool, "b");
    workers[0].answer("a");
    workers[0].listener.crashed("ended");
    workers[1].answer("b");
    expect((await second).file).toBe("b");
    expect(workers).toHaveLength(2);
  });

  it("takes a cancelled ask out of the queue without troubling a worker", async () => {
    const { pool, workers } = house(1);
    const stop = new AbortController();
    const first = look(pool, "a");
    const waiting = look(pool, "b", { signal: stop.signal });
    stop.abort();
    expect((await failureOf(waiting)).code).toBe("cancelled");
    expect(workers[0].ended).toBe(false);
    workers[0].answer("a");
    await first;
    expect(workers[0].asks).toHaveLength(1);
  });

  it("refuses at once what was cancelled before it was asked", async () => {
    const { pool, workers } = house(1);
    expect((await failureOf(look(pool, "a", { signal: AbortSignal.abort() }))).code).toBe("cancelled");
    expect(workers).toHaveLength(0);
  });

  it("fails the ask of a worker that crashed, and only that one", async () => {
    const { pool, workers } = house(2);
    const [first, second, third] = [look(pool, "a"), look(pool, "b"), look(pool, "c")];
    workers[0].listener.crashed("out of memory");
    const failure = await failureOf(first);
    expect(failure.code).toBe("crashed");
    expect(failure.facts.found).toBe("out of memory");
    workers[1].answer("b");
    workers[2].answer("c");
    expect((await second).file).toBe("b");
    expect((await third).file).toBe("c");
  });

  it("gives each ask one end only, however often its worker speaks", async () => {
    const { pool, workers } = house(1);
    const first = look(pool, "a");
    workers[0].answer("a");
    workers[0].answer("twice");
    workers[0].listener.crashed("later");
    expect((await first).file).toBe("a");
  });

  it("fails an ask that cannot be sent and keeps the worker", async () => {
    const { pool, workers } = house(1);
    const first = look(pool, "a");
    workers[0].answer("a");
    await first;
    const post = workers[0].post.bind(workers[0]);
    workers[0].post = () => {
      throw new DOMException("could not be cloned", "DataCloneError");
    };
    expect((await failureOf(look(pool, "b"))).code).toBe("crashed");
    workers[0].post = post;
    const third = look(pool, "c");
    workers[0].answer("c");
    expect((await third).file).toBe("c");
  });

  it("gives away the buffers it was handed", async () => {
    const { pool, workers } = house(1);
    const buffer = new ArrayBuffer(8);
    void look(pool, "a", { transfer: [buffer] });
    expect(workers[0].given).toEqual([[buffer]]);
  });

  it("ends everything when it is closed", async () => {
    const { pool, workers } = house(1);
    const both = [look(pool, "a"), look(pool, "b")].map(failureOf);
    pool.close();
    expect((await Promise.all(both)).map(({ code }) => code)).toEqual(["cancelled", "cancelled"]);
    expect(workers[0].ended).toBe(true);
    expect((await failureOf(look(pool, "c"))).code).toBe("cancelled");
  });
});
