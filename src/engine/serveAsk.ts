import type { PlainFailure } from "../core/failure.ts";
import { ReductionFailure } from "../core/failure.ts";
import type { Ask, Reply, TaskName, Tasks } from "./protocol.ts";

/** An answer with the buffers that are given away with it. */
export interface Answered {
  readonly answer: Tasks[TaskName]["answer"];
  readonly transfer: Transferable[];
}

/** Does the work of one ask; `progress` takes the bytes read since the last call. */
export type Answer = (ask: Ask, progress: (bytes: number) => void) => Promise<Answered>;

/**
 * One ask from its arrival to its one end, for a worker and a thread alike.
 * A failure crosses as plain data; whatever else was thrown is our own bug and is told without its stack.
 */
export async function serveAsk(
  ask: Ask,
  answer: Answer,
  post: (reply: Reply, transfer: Transferable[]) => void,
): Promise<void> {
  const { id } = ask;
  try {
    const answered = await answer(ask, (bytes) => post({ id, kind: "progress", bytes }, []));
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
