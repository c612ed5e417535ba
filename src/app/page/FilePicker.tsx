import { type Ref, useImperativeHandle, useRef } from "react";
import { type DroppedFile, openChoice } from "../session/openDrop.ts";

/** What opens the system's choice of files, or of a folder. */
export interface Picker {
  files(): void;
  folder(): void;
}

/** The two hidden inputs behind every button that asks for files. */
export function FilePicker({
  onChoice,
  ref,
}: {
  onChoice: (files: DroppedFile[]) => void;
  ref: Ref<Picker>;
}) {
  const files = useRef<HTMLInputElement>(null);
  const folder = useRef<HTMLInputElement>(null);
  useImperativeHandle(ref, () => ({
    files: () => files.current?.click(),
    folder: () => folder.current?.click(),
  }));
  const choose = (input: HTMLInputElement) => {
    const chosen = openChoice(input.files ?? []);
    input.value = ""; // the same choice again must be heard again
    if (chosen.length > 0) onChoice(chosen);
  };
  return (
    <div hidden>
      <input
        type="file"
        multiple
        aria-label="Choose files"
        ref={files}
        onChange={(event) => choose(event.target)}
      />
      <input
        type="file"
        multiple
        aria-label="Choose a folder"
        ref={(input) => {
          folder.current = input;
          input?.setAttribute("webkitdirectory", "");
        }}
        onChange={(event) => choose(event.target)}
      />
    </div>
  );
}
