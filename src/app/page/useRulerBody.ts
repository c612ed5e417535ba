import { useCallback, useMemo, useState } from "react";
import { arguedOf } from "../../figures/arguedOf.ts";
import { formatDigits } from "../../figures/formatNumber.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { RulerBody, RulerProps } from "../ruler/rulerProps.ts";
import type { CaseView } from "../session/caseView.ts";

/**
 * The body's marker over the cases' sheets. In the hand it is a place of the marker alone: nothing else is told, so
 * nothing else is worked out before it rests.
 */
export function useRulerBody(
  cases: readonly CaseView[],
  onChange: (change: WorkspaceChange) => void,
): { readonly body: RulerBody | null; readonly onBody: NonNullable<RulerProps["onBody"]> } {
  const [inHand, take] = useState<number | null>(null);
  const standing = cases.find(({ of }) => of.sheet.body !== null)?.of.sheet.body ?? null;
  const from = standing?.x ?? null;
  const body = useMemo(
    () => (standing === null ? null : bodyOf(cases, standing, inHand)),
    [cases, standing, inHand],
  );
  const onBody = useCallback<NonNullable<RulerProps["onBody"]>>(
    (x, phase) => {
      take(phase === "drag" ? x : null);
      if (phase === "rest" && from !== null) onChange({ kind: "move-body", from, to: x });
    },
    [from, onChange],
  );
  return { body, onBody };
}

function bodyOf(
  cases: readonly CaseView[],
  { x, chord }: { readonly x: number; readonly chord: number | null },
  inHand: number | null,
): RulerBody {
  const moved = inHand === null ? 0 : inHand - x;
  return {
    x: inHand ?? x,
    name: "body",
    chord,
    places: cases.map(({ of }) => (of.sheet.body === null ? null : of.sheet.body.x + moved)),
    readings: readingsOf(cases),
  };
}

/** "Tu 3.34 percent in screen, 2.89 percent in simulation". */
function readingsOf(cases: readonly CaseView[]): string {
  const parts = cases.flatMap((view) => {
    const Tu = arguedOf(view)?.argument.body?.at.Tu;
    return Tu === undefined || Tu.value === null
      ? []
      : [`${formatDigits(100 * Tu.value, 3)} percent in ${view.name}`];
  });
  return parts.length === 0 ? "" : `Tu ${parts.join(", ")}`;
}
