import { assert } from "../core/failure.ts";
import { blobSource } from "../read/byteSource.ts";
import { memoryColumnStore } from "./columnStore.ts";
import type { Ask, Reply, SourceFile } from "./protocol.ts";
import { serveAsk } from "./serveAsk.ts";
import { answerAsk, columnBudget } from "./tasks.ts";

/** The entry of a browser's worker: hears an ask, answers it. */
const columns = memoryColumnStore(columnBudget);

self.onmessage = ({ data }: MessageEvent<Ask>) => {
  void serveAsk(data, (ask, progress) => answerAsk(ask, { open, columns, progress }), post);
};

/** The project's types know the page's `self`, whose postMessage takes an origin second; options suit both. */
function post(reply: Reply, transfer: ArrayBuffer[]) {
  self.postMessage(reply, { transfer });
}

function open({ name, content }: SourceFile) {
  assert(content instanceof Blob, "a worker was given a file that is no Blob");
  return blobSource(name, content);
}
