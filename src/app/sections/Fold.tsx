import type { ReactNode } from "react";

/** A native fold: a triangle, a name, and on its right one fact about what lies inside. */
export function Fold({
  name,
  fact,
  open,
  className = "",
  children,
}: {
  name: ReactNode;
  fact?: ReactNode;
  open?: boolean;
  className?: string;
  children: ReactNode;
}) {
  return (
    <details className={`fold ${className}`} open={open}>
      <summary>
        <span>{name}</span>
        {fact !== undefined && <span className="fold-fact">{fact}</span>}
      </summary>
      <div className="fold-body">{children}</div>
    </details>
  );
}
