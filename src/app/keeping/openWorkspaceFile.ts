import { failureText, ReductionFailure } from "../../core/failure.ts";
import { freshToken } from "../session/freshToken.ts";
import { heldOf } from "../session/nextSession.ts";
import type { DroppedFile } from "../session/openDrop.ts";
import type { PageStore } from "../session/pageStore.ts";
import { withOpened } from "./keptPage.ts";
import { readWorkspaceText } from "./workspaceFile.ts";

/** Puts the cases of a workspace file on the page; what stood there comes back with Undo. */
export async function openWorkspaceFile(store: PageStore, { path, file }: DroppedFile): Promise<void> {
  const { dispatch, setNotice, session } = store.getState();
  try {
    const page = readWorkspaceText(await file.text(), path, freshToken());
    const before = heldOf(session);
    dispatch({ kind: "restored", held: withOpened(before, page) });
    const shown = `${path} stands here now, with its results; its records come with a drop of the same files.`;
    setNotice(before === null ? shown : `${shown} Undo brings back what stood here before.`);
  } catch (error) {
    if (!(error instanceof ReductionFailure)) throw error;
    setNotice(failureText(error.plain()));
  }
}
