import { type ReactNode, useContext } from "react";
import type { Quantity } from "../../core/quantity.ts";
import { DefinitionContext } from "./definitionContext.ts";
import type { FoundNumber } from "./foundNumber.ts";

/**
 * A number that opens its definition: formula, settings, alternatives, source. It looks like the text it stands in
 * until it is pointed at.
 * @param at   where it comes from, for a number that no result holds as it is shown
 * @param cell in a table of many numbers: one stop for all, arrow keys between them
 */
export function NumberButton({
  of,
  quantity,
  at,
  title,
  cell = false,
  children,
}: {
  of: string;
  quantity: Quantity;
  at?: FoundNumber | undefined;
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
      onClick={(event) => open({ key: of, quantity, at }, event.currentTarget)}
    >
      {children}
    </button>
  );
}
