import { type ReactNode, useContext } from "react";
import type { Quantity } from "../../core/quantity.ts";
import { DefinitionContext } from "./definitionContext.ts";

/**
 * A number that opens its definition: formula, settings, alternatives, source. It looks like the text it stands in
 * until it is pointed at.
 * @param cell in a table of many numbers: one stop for all, arrow keys between them
 */
export function NumberButton({
  of,
  quantity,
  title,
  cell = false,
  children,
}: {
  of: string;
  quantity: Quantity;
  title?: string | undefined;
  cell?: boolean;
  children: ReactNode;
}) {
  const open = useContext(DefinitionContext);
  if (open === null) return children;
  return (
    <button
      type="button"
      className="number"
      aria-haspopup="dialog"
      title={title}
      tabIndex={cell ? -1 : undefined}
      data-cell={cell ? "" : undefined}
      onClick={(event) => open({ key: of, quantity }, event.currentTarget)}
    >
      {children}
    </button>
  );
}
