import type { Preview } from "../../core/records.ts";
import type { SourceFile } from "../../engine/protocol.ts";
import { emptyWorkspace } from "../../sheet/changeWorkspace.ts";
import type { Workspace } from "../../sheet/workspace.ts";
import type { History } from "../session/history.ts";
import type { Aside, Held, Reduced } from "../session/session.ts";

/** What of a page outlives it: all that was decided, and what was reduced. Fits follow from these within a second. */
export interface KeptPage {
  readonly schema: 1;
  readonly history: History<Workspace>;
  readonly previews: readonly Preview[];
  readonly aside: Aside;
  readonly reductions: Held["reductions"];
  readonly files: readonly KeptFile[];
}

/** A file whose bytes are kept elsewhere, or nowhere any more. */
export type KeptFile = Omit<SourceFile, "content">;

/** Steps of undo that are kept: those of a long day, without the weight of all of them. */
const keptSteps = 50;

export function keptPage({ history, previews, aside, reductions, files }: Held): KeptPage {
  const { past, present, future } = history;
  return {
    schema: 1,
    history: { past: past.slice(-keptSteps), present, future: future.slice(0, keptSteps) },
    previews,
    aside,
    reductions: ofCases(reductions, { past, present, future }),
    files: files.map(({ name, bytes, fingerprint }) => ({ name, bytes, fingerprint })),
  };
}

/** Results of cases that are there, or that undo can bring back. */
function ofCases(
  reductions: Readonly<Record<string, Reduced>>,
  { past, present, future }: History<Workspace>,
): Record<string, Reduced> {
  const ids = new Set([...past, present, ...future].flatMap(({ cases }) => cases.map(({ id }) => id)));
  return Object.fromEntries(Object.entries(reductions).filter(([id]) => ids.has(id)));
}

/** A page again. Files whose bytes are gone are not among its own: what was reduced from them still stands. */
export function heldFrom(kept: KeptPage, files: readonly SourceFile[]): Held {
  const { history, previews, aside, reductions } = kept;
  return { history, previews, aside, reductions, files, argued: null };
}

/** The cases of a workspace file beside what is here, as one step that can be undone. */
export function withOpened(held: Held | null, opened: KeptPage): Held {
  if (held === null) return heldFrom(opened, []);
  const { present } = opened.history;
  return {
    ...held,
    history: { past: [...held.history.past, held.history.present], present, future: [] },
    previews: [...held.previews, ...opened.previews],
    reductions: { ...held.reductions, ...opened.reductions },
    argued: null,
  };
}

export const nothingKept: KeptPage = {
  schema: 1,
  history: { past: [], present: emptyWorkspace, future: [] },
  previews: [],
  aside: { leftOut: [], failures: [], warnings: [] },
  reductions: {},
  files: [],
};
