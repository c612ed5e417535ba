import type { ReactNode, Ref } from "react";
import type { SectionName } from "../page/sectionList.ts";
import { useMediaQuery } from "../page/useTheme.ts";
import { Fold } from "./Fold.tsx";

/** A heading and what stands under it on the right of a section, or in a fold where there is no right. */
export interface Note {
  readonly name: string;
  /** What the closed fold says beside its name. */
  readonly fact?: string;
  readonly body: ReactNode;
}

/** One section of the page: number and name at the left, the argument in the middle, notes at the right. */
export function SectionFrame({
  section,
  notes = [],
  ref,
  children,
}: {
  section: SectionName;
  notes?: readonly Note[];
  ref?: Ref<HTMLElement>;
  children: ReactNode;
}) {
  const wide = useMediaQuery("print, (min-width: 1400px)");
  return (
    <section className="section row" id={section.id} aria-labelledby={`${section.id}-name`} ref={ref}>
      <h2 className="section-name" id={`${section.id}-name`}>
        <span className="section-number">{section.number}</span>
        {section.name}
      </h2>
      <div className="section-body">{children}</div>
      <div className="notes">
        {notes.map(({ name, fact, body }) =>
          wide ? (
            <div className="note" key={name}>
              <h3>{name}</h3>
              {body}
            </div>
          ) : (
            <Fold key={name} name={name} fact={fact} className="note-fold">
              {body}
            </Fold>
          ),
        )}
      </div>
    </section>
  );
}
