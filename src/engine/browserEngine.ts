import type { Channel, Listener } from "./pool.ts";
import { createPool } from "./pool.ts";
import type { Engine, Reply } from "./protocol.ts";

/** One core stays with the page; above four the disk, not the parsing, is what is waited for. */
function defaultSize(): number {
  return Math.min(4, Math.max(1, (navigator.hardwareConcurrency || 2) - 1));
}

/** The engine in a browser: module workers. */
export function createBrowserEngine(size: number = defaultSize()): Engine {
  return createPool(spawn, size);
}

function spawn(listener: Listener): Channel {
  const worker = new Worker(new URL("./worker.ts", import.meta.url), { type: "module" });
  worker.onmessage = ({ data }: MessageEvent<Reply>) => listener.reply(data);
  worker.onmessageerror = () => listener.crashed("an answer that cannot be read");
  worker.onerror = (event) => {
    event.preventDefault(); // it is told where the work was asked for
    listener.crashed(event.message || "the worker could not be started");
  };
  return {
    post: (ask, transfer) => worker.postMessage(ask, [...transfer]),
    end: () => worker.terminate(),
  };
}
