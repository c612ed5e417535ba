import { useEffect, useState } from "react";
import { type DroppedFile, openDrop } from "../session/openDrop.ts";

/** Takes a drop anywhere in the window; while files are held over it, a frame and one sentence. */
export function DropVeil({
  more,
  onDrop,
}: {
  /** True where cases are loaded already. */
  more: boolean;
  onDrop: (files: Promise<DroppedFile[]>) => void;
}) {
  const [over, setOver] = useState(0);
  useEffect(() => {
    let depth = 0;
    const holdsFiles = (event: DragEvent) => event.dataTransfer?.types.includes("Files") ?? false;
    const enter = (event: DragEvent) => {
      if (!holdsFiles(event)) return;
      event.preventDefault();
      depth++;
      setOver(Math.max(1, event.dataTransfer?.items.length ?? 1));
    };
    const hold = (event: DragEvent) => {
      if (holdsFiles(event)) event.preventDefault();
    };
    const leave = (event: DragEvent) => {
      if (!holdsFiles(event)) return;
      depth = Math.max(0, depth - 1);
      if (depth === 0) setOver(0);
    };
    const drop = (event: DragEvent) => {
      if (!event.dataTransfer || !holdsFiles(event)) return;
      event.preventDefault();
      depth = 0;
      setOver(0);
      onDrop(openDrop(event.dataTransfer));
    };
    addEventListener("dragenter", enter);
    addEventListener("dragover", hold);
    addEventListener("dragleave", leave);
    addEventListener("drop", drop);
    return () => {
      removeEventListener("dragenter", enter);
      removeEventListener("dragover", hold);
      removeEventListener("dragleave", leave);
      removeEventListener("drop", drop);
    };
  }, [onDrop]);
  if (over === 0) return null;
  const things = over === 1 ? "One file or folder" : `${over} files or folders`;
  return (
    <div className="drop-veil">
      <p>
        {things}: {more ? "to be read and added to the cases that are here" : "to be read"}. Each folder is a
        case.
      </p>
    </div>
  );
}
