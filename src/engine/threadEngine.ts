import { Worker } from "node:worker_threads";
import type { Channel, Listener } from "./pool.ts";
import { createPool } from "./pool.ts";
import type { Engine, Reply } from "./protocol.ts";

/**
 * The engine on Node: worker threads.
 * @param script the built thread.js, beside the program that asks
 * @param jobs   threads at most, 1 or more
 */
export function createThreadEngine(script: URL, jobs: number): Engine {
  return createPool((listener) => spawn(script, listener), jobs);
}

function spawn(script: URL, listener: Listener): Channel {
  const worker = new Worker(script);
  worker.on("message", (reply: Reply) => listener.reply(reply));
  worker.on("messageerror", () => listener.crashed("an answer that cannot be read"));
  worker.on("error", (error) => listener.crashed(error instanceof Error ? error.message : String(error)));
  worker.on("exit", (code) => listener.crashed(`exit code ${code}`));
  return {
    post: (ask, transfer) => worker.postMessage(ask, transfer as ArrayBuffer[]),
    end: () => void worker.terminate(),
  };
}
