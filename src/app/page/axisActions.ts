import type { Axis } from "../../sheet/workspace.ts";
import type { CaseView } from "../session/caseView.ts";
import type { PageState } from "../session/pageStore.ts";
import type { HeadAction } from "./Head.tsx";

/** The ruler's switch as verbs, for a head that has no room for it. */
export function axisActions(
  cases: readonly CaseView[],
  axis: Axis,
  dispatch: PageState["dispatch"],
): HeadAction[] {
  if (cases.length === 0) return [];
  const ell = cases.every(({ length }) => length !== null) ? cases[0].symbol : null;
  const from = cases.every(({ decay }) => decay?.law) ? (ell === null ? "x − x0" : `(x − x0)/${ell}`) : null;
  const choices: readonly (readonly [Axis, string | null])[] = [
    ["x", "x"],
    ["x/ell", ell === null ? null : `x/${ell}`],
    ["(x-x0)/ell", from],
  ];
  return choices.flatMap(([choice, name]) =>
    name === null || choice === axis
      ? []
      : [
          {
            name: `Draw against ${name}`,
            run: () => dispatch({ kind: "changed", change: { kind: "set-axis", axis: choice } }),
          },
        ],
  );
}
