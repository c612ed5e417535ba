import { type ReactNode, useCallback, useContext, useEffect, useRef, useState } from "react";
import { labelOf } from "../../core/catalogue.ts";
import type { Comparison } from "../../core/comparison.ts";
import type { CaseView } from "../session/caseView.ts";
import { DefinitionText } from "./DefinitionText.tsx";
import { type Asked, DefinitionContext, DefinitionDoor, type OpenDefinition } from "./definitionContext.ts";
import { foundNumber } from "./foundNumber.ts";
import { placeBeside } from "./placeBeside.ts";

/** Gives every number below it its definition: one panel, opened beside the number that was pressed. */
export function DefinitionPanel({
  cases,
  comparisons = none,
  children,
}: {
  cases: readonly CaseView[];
  comparisons?: readonly Comparison[];
  children: ReactNode;
}) {
  const [asked, ask] = useState<Asked | null>(null);
  const panel = useRef<HTMLDivElement>(null);
  const open: OpenDefinition = useCallback((wanted, beside) => {
    const element = panel.current;
    if (!element) return;
    ask(wanted);
    placeBeside(element, beside);
    element.showPopover?.();
    element.focus({ preventScroll: true });
  }, []);
  useDoor(open);
  return (
    <DefinitionContext value={open}>
      {children}
      <div
        ref={panel}
        popover="auto"
        role="dialog"
        tabIndex={-1}
        aria-label={asked === null ? "Definition" : labelOf(asked.key).name}
        className="definition-text definition-panel"
      >
        {asked !== null && (
          <DefinitionText asked={asked} found={asked.at ?? foundNumber(cases, comparisons, asked.quantity)} />
        )}
      </div>
    </DefinitionContext>
  );
}

const none = [] as const;

/** Numbers of the head open the same panel. */
function useDoor(open: OpenDefinition): void {
  const door = useContext(DefinitionDoor);
  useEffect(() => {
    if (door === null) return;
    door.current = open;
    return () => {
      door.current = null;
    };
  }, [door, open]);
}
