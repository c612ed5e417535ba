import { useEffect } from "react";
import type { PageState } from "../session/pageStore.ts";

/** Control (or Command) with Z takes a change back, with Shift it is made again; a text field keeps its own. */
export function useUndoKeys(dispatch: PageState["dispatch"]): void {
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || event.key.toLowerCase() !== "z") return;
      if (event.target instanceof HTMLInputElement && event.target.type === "text") return;
      event.preventDefault();
      dispatch({ kind: event.shiftKey ? "redone" : "undone" });
    };
    addEventListener("keydown", press);
    return () => removeEventListener("keydown", press);
  }, [dispatch]);
}
