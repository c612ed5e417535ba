import type { RefObject } from "react";
import type { PageState } from "../session/pageStore.ts";
import type { Held } from "../session/session.ts";
import type { Picker } from "./FilePicker.tsx";
import type { HeadAction } from "./Head.tsx";
import type { Mode } from "./useTheme.ts";

/** The verbs at the right of the head. */
export function headActions({
  held,
  mode,
  picker,
  dispatch,
  toggleMode,
}: {
  held: Held | null;
  mode: Mode;
  picker: RefObject<Picker | null>;
  dispatch: PageState["dispatch"];
  toggleMode: () => void;
}): HeadAction[] {
  const look = { name: mode === "dark" ? "Light" : "Dark", run: toggleMode };
  const add = { name: "Add files", run: () => picker.current?.files() };
  if (held === null) return [look];
  const { past, future } = held.history;
  const save = async () => {
    const { saveWorkspace } = await import("../keeping/saveWorkspace.ts");
    saveWorkspace(held);
  };
  return [
    add,
    {
      name: "Undo",
      run: () => dispatch({ kind: "undone" }),
      disabled: past.length === 0,
      title: "Control Z",
    },
    {
      name: "Redo",
      run: () => dispatch({ kind: "redone" }),
      disabled: future.length === 0,
      title: "Control Shift Z",
    },
    { name: "Save workspace", run: () => void save() },
    look,
  ];
}
