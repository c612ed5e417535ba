import { type ReactNode, useId, useRef } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { placeBeside } from "./placeBeside.ts";
import { RichText } from "./RichText.tsx";

/**
 * What stands in a table's head, opening what it means and who says so. A native popover: it needs no place
 * in the table, closes by Esc or a click elsewhere, and is announced as one.
 */
export function Definition({ of, children }: { of: string; children: ReactNode }) {
  const id = useId();
  const text = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const label = labelOf(of);
  const place = () => {
    if (text.current && button.current) placeBeside(text.current, button.current, 340);
  };
  return (
    <span className="definition">
      <button type="button" ref={button} popoverTarget={id} onClick={place}>
        {children}
      </button>
      <div id={id} ref={text} popover="auto" className="definition-text">
        <p>
          <b>
            <RichText text={label.name} />
          </b>
          : <RichText text={label.definition} />.
        </p>
        <p>{label.source}</p>
      </div>
    </span>
  );
}
