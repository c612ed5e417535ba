import { type ReactNode, useState } from "react";

/** A small list of choices that ends in Change, which opens the controls in its place. */
export function ChangeInPlace({ list, controls }: { list: ReactNode; controls: ReactNode }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      {open ? controls : list}
      <p>
        <button type="button" className="action" aria-expanded={open} onClick={() => setOpen(!open)}>
          {open ? "Close" : "Change"}
        </button>
      </p>
    </>
  );
}
