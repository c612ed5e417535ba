import { useCallback, useMemo } from "react";
import { useStore } from "zustand";
import { unitOf } from "../../core/unitText.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import { Ruler } from "../ruler/Ruler.tsx";
import type { RulerProps } from "../ruler/rulerProps.ts";
import type { CaseView } from "../session/caseView.ts";
import { heldOf } from "../session/nextSession.ts";
import type { PageStore } from "../session/pageStore.ts";
import type { PageWork } from "../session/pageWork.ts";
import { pickLetters } from "./pickLetters.ts";
import { createRulerCases } from "./rulerCases.ts";
import { useRulerBody } from "./useRulerBody.ts";

/** The ruler over the page's state: what is in the hand is a draft, what rests is a change of the workspace. */
export function PageRuler({
  store,
  cases,
  work,
}: {
  store: PageStore;
  cases: readonly CaseView[];
  work: PageWork;
}) {
  const { session, late, hover, plans, dispatch, setDraft, dropDraft, setHover } = useStore(store);
  const lanes = useMemo(createRulerCases, []);
  const workspace = heldOf(session)?.history.present;
  const picked = useMemo(() => pickLetters(workspace?.picked ?? []), [workspace?.picked]);
  const onWindow: RulerProps["onWindow"] = useCallback(
    (caseId, window, phase) => {
      if (phase === "drag") setDraft({ caseId, window });
      else dropDraft(caseId);
      if (phase === "rest") dispatch({ kind: "changed", change: { kind: "set-window", caseId, window } });
    },
    [dispatch, setDraft, dropDraft],
  );
  const onHoldOrigin: RulerProps["onHoldOrigin"] = useCallback(
    (caseId, x0, phase) => {
      if (phase === "drag") setDraft({ caseId, origin: x0 });
      else dropDraft(caseId);
      if (phase === "rest") dispatch({ kind: "changed", change: { kind: "hold-origin", caseId, x0 } });
    },
    [dispatch, setDraft, dropDraft],
  );
  const onChange = useCallback(
    (change: WorkspaceChange) => dispatch({ kind: "changed", change }),
    [dispatch],
  );
  const { body, onBody } = useRulerBody(cases, onChange);
  const sheet = workspace?.cases[0]?.sheet;
  return (
    <Ruler
      cases={lanes(cases, late !== null, heldOf(session)?.previews ?? noPreviews, plans)}
      axis={workspace?.axis ?? "x"}
      units={sheet ? unitOf(sheet.along === "t" ? "T" : "L", sheet.units) : "m"}
      along={sheet?.along ?? "x"}
      body={body}
      picked={picked}
      hovered={hover}
      onWindow={onWindow}
      onAxis={(axis) => dispatch({ kind: "changed", change: { kind: "set-axis", axis } })}
      onPick={(caseId, x, isPicked) =>
        dispatch({
          kind: "changed",
          change: { kind: isPicked ? "pick" : "unpick", station: { caseId, x } },
        })
      }
      onHoldOrigin={onHoldOrigin}
      onBody={onBody}
      onHover={(caseId, x) => setHover(x === null ? null : { caseId, x })}
      onShowStation={showStation}
      onCancelReading={() => work.cancel()}
    />
  );
}

const noPreviews = [] as const;

function showStation(caseId: string, x: number): void {
  const row = document.querySelector<HTMLElement>(`[data-station="${CSS.escape(`${caseId} ${x}`)}"]`);
  row?.scrollIntoView({ block: "center" });
  row?.focus();
}
