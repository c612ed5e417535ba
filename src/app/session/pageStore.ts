import { createStore } from "zustand/vanilla";
import { nextSession } from "./nextSession.ts";
import type { Session } from "./session.ts";
import type { SessionEvent } from "./sessionEvent.ts";

/** A bracket or a flag on its way: drawn and fitted at once, written into the workspace when it rests. */
export interface Draft {
  readonly caseId: string;
  readonly window?: readonly [number, number] | "auto";
  /** x0 held there; null: free. */
  readonly origin?: number | null;
}

/** A station pointed at, in the table or on the ruler. */
export interface Hover {
  readonly caseId: string;
  readonly x: number;
}

export interface PageState {
  readonly session: Session;
  readonly drafts: readonly Draft[];
  readonly hover: Hover | null;
  /** Whether the ruler marks where one more measurement would narrow the intervals most. */
  readonly plans: boolean;
  /** Key of the argument the worker has been at for more than a moment; null while nothing is late. */
  readonly late: string | null;
  /** A sentence about what just could not be done; null when there is none. */
  readonly notice: string | null;
  dispatch(event: SessionEvent): void;
  setDraft(draft: Draft): void;
  dropDraft(caseId: string): void;
  setHover(hover: Hover | null): void;
  setPlans(plans: boolean): void;
  setLate(key: string | null): void;
  setNotice(notice: string | null): void;
}

export type PageStore = ReturnType<typeof createPageStore>;

/** The page's state: the session, moved by nextSession alone, and what is in the hand just now. */
export function createPageStore() {
  return createStore<PageState>()((set) => ({
    session: { kind: "empty" },
    drafts: [],
    hover: null,
    plans: false,
    late: null,
    notice: null,
    dispatch: (event) => set((state) => ({ session: nextSession(state.session, event) })),
    setDraft: (draft) =>
      set((state) => ({ drafts: [...state.drafts.filter((each) => each.caseId !== draft.caseId), draft] })),
    dropDraft: (caseId) =>
      set((state) => ({ drafts: state.drafts.filter((each) => each.caseId !== caseId) })),
    setHover: (hover) => set({ hover }),
    setPlans: (plans) => set({ plans }),
    setLate: (late) => set({ late }),
    setNotice: (notice) => set({ notice }),
  }));
}
