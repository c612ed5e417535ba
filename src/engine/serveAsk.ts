import type { PlainFailure } from "../core/failure.ts";
import { ReductionFailure } from "../core/failure.ts";
import type { Ask, Reply } from "./protocol.ts";
import type { Answered } from "./tasks.ts";

/** Does the work of one ask; `progress` takes the bytes read since the last call. */
export type Answer = (ask: Ask, progress: (bytes: number) => void) => Promise<Answered>;

/** Enough to move a bar, seldom enough not to be felt. */
const progressBytes = 1 << 18;

/**
 * One ask from its arrival to its one end, for a worker and a thread alike.
 * A failure crosses as plain data; whatever else was thrown is our own bug and is told without its stack.
 */
export async function serveAsk(
  ask: Ask,
  answer: Answer,
  post: (reply: Reply, transfer: ArrayBuffer[]) => void,
): Promise<void> {
  const { id } = ask;
  let untold = 0;
  const tell = (least: number) => {
    if (untold < least) return;
    post({ id, kind: "progress", bytes: untold }, []);
    untold = 0;
  };
  try {
    const answered = await answer(ask, (bytes) => {
      untold += bytes;
      tell(progressBytes);
    });
    tell(1);
    post({ id, kind: "answer", answer: answered.answer }, answered.transfer);
  } catch (error) {
    post({ id, kind: "failed", failure: plainFailure(error, ask) }, []);
  }
}

function plainFailure(error: unknown, ask: Ask): PlainFailure {
  if (error instanceof ReductionFailure) return error.plain();
  return {
    code: "crashed",
    message: "the work on this stopped because of a fault in the program",
    found: error instanceof Error ? error.message : String(error),
    remedy: "Please report it with the file, if it may be shown",
    where: "file" in ask.ask ? { file: ask.ask.file.name } : {},
  };
}
