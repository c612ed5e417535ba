import { parentPort } from "node:worker_threads";
import { ReductionFailure } from "../core/failure.ts";
import type { Ask } from "./protocol.ts";
import { serveAsk } from "./serveAsk.ts";

/** The entry of a worker thread: hears an ask, answers it. */
parentPort?.on("message", (ask: Ask) => {
  void serveAsk(ask, notYet, (reply, transfer) => parentPort?.postMessage(reply, transfer as never));
});

async function notYet(ask: Ask): Promise<never> {
  throw new ReductionFailure("crashed", {
    message: `this version cannot do the task ${ask.task}`,
    remedy: "Use a later version",
  });
}
