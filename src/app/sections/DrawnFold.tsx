import { type ReactNode, useState } from "react";

/** A fold whose content is made only while it is open: figures and long tables cost nothing behind a closed one. */
export function DrawnFold({
  name,
  fact,
  children,
}: {
  name: ReactNode;
  fact?: ReactNode;
  children: () => ReactNode;
}) {
  const [open, setOpen] = useState(false);
  return (
    <details className="fold" open={open} onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary>
        <span>{name}</span>
        {fact !== undefined && <span className="fold-fact">{fact}</span>}
      </summary>
      {open && <div className="fold-body">{children()}</div>}
    </details>
  );
}
