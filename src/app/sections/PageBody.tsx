import { lazy, type RefObject, Suspense } from "react";
import { useStore } from "zustand";
import type { Picker } from "../page/FilePicker.tsx";
import type { CaseView } from "../session/caseView.ts";
import { heldOf } from "../session/nextSession.ts";
import type { PageStore } from "../session/pageStore.ts";
import type { PageWork } from "../session/pageWork.ts";
import { EmptyState } from "./EmptyState.tsx";
import { FailedState } from "./FailedState.tsx";
import { LookingState } from "./ReadingState.tsx";

/** Fetched while the first files are read: an empty page needs none of it. */
const Argument = lazy(async () => ({ default: (await import("./Argument.tsx")).Argument }));

/** What stands under the head in each state of the session. */
export function PageBody({
  store,
  work,
  cases,
  narrow,
  picker,
  onDemo,
}: {
  store: PageStore;
  work: PageWork;
  cases: readonly CaseView[];
  narrow: boolean;
  picker: RefObject<Picker | null>;
  onDemo: () => void;
}) {
  const { session } = useStore(store);
  const held = heldOf(session);
  return (
    <>
      {session.kind === "reading" && (
        <div className="row page-top">
          <div />
          <div>
            <LookingState offer={session.offer} />
          </div>
        </div>
      )}
      {session.kind === "failed" && <FailedState aside={session.aside} />}
      {(session.kind === "empty" || session.kind === "failed" || (held !== null && cases.length === 0)) && (
        <EmptyState
          onFiles={() => picker.current?.files()}
          onFolder={() => picker.current?.folder()}
          onDemo={onDemo}
        />
      )}
      {held !== null && cases.length > 0 && (
        <Suspense>
          <Argument store={store} work={work} held={held} cases={cases} narrow={narrow} />
        </Suspense>
      )}
    </>
  );
}
