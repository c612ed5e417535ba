import { ReductionFailure, revivedFailure } from "../core/failure.ts";
import type { Ask, Engine, Reply, RunOptions, TaskName, Tasks } from "./protocol.ts";

/** One worker as the pool sees it: asked by messages, ended without being asked. */
export interface Channel {
  post(ask: Ask, transfer: readonly Transferable[]): void;
  end(): void;
}

/** What a channel tells the pool. */
export interface Listener {
  reply(reply: Reply): void;
  /** The worker is gone and will answer nothing more. */
  crashed(reason: string): void;
}

/** Starts one worker. */
export type Spawn = (listener: Listener) => Channel;

/** An ask from the moment it is made to its one end. */
interface Job {
  readonly ask: Ask;
  readonly options: RunOptions;
  readonly answer: (answer: Tasks[TaskName]["answer"]) => void;
  readonly fail: (failure: ReductionFailure) => void;
}

interface Seat {
  channel: Channel;
  /** Null while the worker waits for work. */
  job: Job | null;
}

/**
 * Workers behind one queue: first asked, first served, one ask at a time in each worker.
 * Workers start when there is work for them. Cancelling ends the worker, as a numeric loop hears no message;
 * a worker that crashed is replaced, and its ask fails with the code "crashed".
 * @param spawn starts one worker
 * @param size  workers at most, 1 or more
 */
export function createPool(spawn: Spawn, size: number): Engine {
  const pool = new Pool(spawn, Math.max(1, Math.floor(size)));
  return { run: (task, ask, options) => pool.run(task, ask, options ?? {}), close: () => pool.close() };
}

class Pool {
  readonly #spawn: Spawn;
  readonly #size: number;
  readonly #seats = new Set<Seat>();
  #queue: Job[] = [];
  #nextId = 1;
  #closed = false;

  constructor(spawn: Spawn, size: number) {
    this.#spawn = spawn;
    this.#size = size;
  }

  run<N extends TaskName>(task: N, ask: Tasks[N]["ask"], options: RunOptions): Promise<Tasks[N]["answer"]> {
    return new Promise<Tasks[N]["answer"]>((resolve, reject) => {
      const { signal } = options;
      if (this.#closed || signal?.aborted) return reject(cancelled());
      const cancel = () => this.#cancel(job);
      const ended = () => signal?.removeEventListener("abort", cancel);
      const job: Job = {
        ask: { id: this.#nextId++, task, ask } as Ask, // a union member is not inferred from a type parameter
        options,
        answer: (answer) => {
          ended();
          resolve(answer as Tasks[N]["answer"]); // the worker answers the task it was asked
        },
        fail: (failure) => {
          ended();
          reject(failure);
        },
      };
      signal?.addEventListener("abort", cancel, { once: true });
      this.#queue.push(job);
      this.#serve();
    });
  }

  close(): void {
    this.#closed = true;
    const waiting = this.#queue;
    this.#queue = [];
    for (const seat of [...this.#seats]) {
      if (seat.job) waiting.push(seat.job);
      this.#leave(seat);
    }
    for (const job of waiting) job.fail(cancelled());
  }

  /** Gives the first of the queue to a worker that waits, or to a new one. */
  #serve(): void {
    while (this.#queue.length > 0) {
      const seat = [...this.#seats].find((each) => each.job === null) ?? this.#seat();
      if (!seat) return;
      const job = this.#queue.shift();
      if (!job) return;
      seat.job = job;
      this.#post(seat, job);
    }
  }

  #post(seat: Seat, job: Job): void {
    try {
      seat.channel.post(job.ask, job.options.transfer ?? []);
    } catch (error) {
      // a message that cannot be cloned fails by itself; the worker is sound
      seat.job = null;
      job.fail(crashed(error instanceof Error ? error.message : String(error)));
    }
  }

  /** A new worker, or null where there are as many as there may be. */
  #seat(): Seat | null {
    if (this.#seats.size >= this.#size) return null;
    const heard: Listener = {
      reply: (reply) => this.#hear(seat, reply),
      crashed: (reason) => this.#bury(seat, reason),
    };
    const seat: Seat = { channel: this.#spawn(heard), job: null };
    this.#seats.add(seat);
    return seat;
  }

  #hear(seat: Seat, reply: Reply): void {
    const job = seat.job;
    if (!job || reply.id !== job.ask.id) return; // of an ask that was cancelled
    if (reply.kind === "progress") {
      job.options.onProgress?.(reply.bytes);
      return;
    }
    seat.job = null;
    if (reply.kind === "answer") job.answer(reply.answer);
    else job.fail(revivedFailure(reply.failure));
    this.#serve();
  }

  #bury(seat: Seat, reason: string): void {
    if (!this.#seats.has(seat)) return;
    this.#leave(seat);
    seat.job?.fail(crashed(reason));
    this.#serve();
  }

  #cancel(job: Job): void {
    this.#queue = this.#queue.filter((each) => each !== job);
    for (const seat of this.#seats) if (seat.job === job) this.#leave(seat);
    job.fail(cancelled());
    this.#serve();
  }

  #leave(seat: Seat): void {
    this.#seats.delete(seat);
    seat.channel.end();
  }
}

function cancelled(): ReductionFailure {
  return new ReductionFailure("cancelled", {
    message: "the work was cancelled",
    remedy: "Start it again where its result is wanted",
  });
}

function crashed(reason: string): ReductionFailure {
  return new ReductionFailure("crashed", {
    message: "the worker that held this work stopped",
    found: reason,
    remedy: "Run it again; if it stops again, try with fewer jobs or a smaller file",
  });
}
