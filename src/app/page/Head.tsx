import { type ReactNode, type Ref, useState } from "react";
import { withVariables } from "../ruler/withVariables.ts";
import type { SectionName } from "./sectionList.ts";
import { WordMark } from "./WordMark.tsx";

/** One thing that can be done from the head: an underlined verb. */
export interface HeadAction {
  readonly name: string;
  readonly run: () => void;
  readonly disabled?: boolean;
  readonly title?: string;
}

/** The fixed head: word mark, index of the sections that hold something, actions; under them the ruler. */
export function Head({
  sections,
  actions,
  more,
  lanes,
  ref,
  children,
}: {
  sections: readonly (SectionName & { readonly there: boolean })[];
  actions: readonly HeadAction[];
  /** What a wide head shows elsewhere: only in the narrow head's menu. */
  more: readonly HeadAction[];
  /** Lanes of the ruler: a narrow head scrolls its bar and their readings away. */
  lanes: number;
  ref: Ref<HTMLElement>;
  children: ReactNode;
}) {
  const [menu, setMenu] = useState<"none" | "sections" | "more">("none");
  const toggle = (name: "sections" | "more") => setMenu(menu === name ? "none" : name);
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: Escape from anywhere in the head closes its menu
    <header
      className="head"
      ref={ref}
      style={withVariables({ "--lanes": lanes })}
      onKeyDown={(event) => event.key === "Escape" && setMenu("none")}
    >
      <div className="bar">
        <WordMark />
        <SectionIndex sections={sections} />
        <div className="actions">
          <Actions actions={actions} />
        </div>
        <div className="narrow-menus">
          <button
            type="button"
            className="action"
            aria-expanded={menu === "sections"}
            onClick={() => toggle("sections")}
          >
            Sections
          </button>
          <button
            type="button"
            className="action"
            aria-expanded={menu === "more"}
            onClick={() => toggle("more")}
          >
            More
          </button>
        </div>
      </div>
      {menu !== "none" && (
        // biome-ignore lint/a11y/useKeyWithClickEvents lint/a11y/noStaticElementInteractions: closes behind the link or button that was used, by pointer or by key
        <div className="narrow-panel" onClick={() => setMenu("none")}>
          {menu === "sections" ? (
            <SectionIndex sections={sections} />
          ) : (
            <Actions actions={[...more, ...actions]} />
          )}
        </div>
      )}
      {children}
    </header>
  );
}

function SectionIndex({ sections }: { sections: readonly (SectionName & { readonly there: boolean })[] }) {
  return (
    <nav className="index" aria-label="Sections">
      {sections.map(({ id, number, short, there }) => {
        const name = (
          <>
            <i>{number}</i> {short}
          </>
        );
        return there ? (
          <a key={id} href={`#${id}`}>
            {name}
          </a>
        ) : (
          <span key={id}>{name}</span>
        );
      })}
    </nav>
  );
}

/** What can do nothing just now stays in the order of the keys: the last Undo must not lose the focus. */
function Actions({ actions }: { actions: readonly HeadAction[] }) {
  return actions.map(({ name, run, disabled = false, title }) => (
    <button
      type="button"
      className="action"
      key={name}
      onClick={() => !disabled && run()}
      aria-disabled={disabled}
      title={title}
    >
      {name}
    </button>
  ));
}
