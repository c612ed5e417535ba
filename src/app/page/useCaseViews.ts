import { useMemo } from "react";
import { useStore } from "zustand";
import type { CaseView } from "../session/caseView.ts";
import { createCaseViews } from "../session/caseViews.ts";
import type { PageStore } from "../session/pageStore.ts";

const noDrafts = [] as const;

/** The cases with what is in the hand just now, and without it; the same where nothing is. */
export function useCaseViews(store: PageStore): {
  readonly live: readonly CaseView[];
  readonly rested: readonly CaseView[];
} {
  const { session, drafts } = useStore(store);
  const [liveViews, restedViews] = useMemo(() => [createCaseViews(), createCaseViews()], []);
  const rested = restedViews(session, noDrafts);
  return { rested, live: drafts.length === 0 ? rested : liveViews(session, drafts) };
}
