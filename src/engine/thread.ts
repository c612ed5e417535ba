import { parentPort } from "node:worker_threads";
import { assert } from "../core/failure.ts";
import { memoryColumnStore } from "./columnStore.ts";
import type { Ask, SourceFile } from "./protocol.ts";
import { serveAsk } from "./serveAsk.ts";
import { answerAsk, columnBudget } from "./tasks.ts";
import { fileSource } from "./threadFile.ts";

/** The entry of a worker thread: hears an ask, answers it. */
const columns = memoryColumnStore(columnBudget);

parentPort?.on("message", (received: Ask) => {
  void serveAsk(
    received,
    (ask, progress) => answerAsk(ask, { open, columns, progress }),
    (reply, transfer) => parentPort?.postMessage(reply, transfer),
  );
});

function open({ name, bytes, content }: SourceFile) {
  assert("path" in content, "a thread was given a file without a path");
  return fileSource(name, content.path, bytes);
}
