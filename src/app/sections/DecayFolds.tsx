import { type ReactNode, use, useMemo } from "react";
import type { Comparison } from "../../core/comparison.ts";
import { counted } from "../../export/sentences/words.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import { RestedCases } from "../page/restedCases.ts";
import { useStable } from "../ruler/useStable.ts";
import type { CaseView } from "../session/caseView.ts";
import { ArguedBlock } from "./ArguedBlock.tsx";
import { DrawnFold } from "./DrawnFold.tsx";
import { FitsBody } from "./FitsBody.tsx";
import { LocalBody } from "./LocalBody.tsx";
import { RegionBody } from "./RegionBody.tsx";
import { RoutesBody } from "./RoutesBody.tsx";
import { ScanBody } from "./ScanBody.tsx";

/** All that is argued about the laws, a fold each: it follows a bracket once it rests, and is made while it is open. */
export function DecayFolds({
  comparisons,
  late,
  onChange,
}: {
  comparisons: readonly Comparison[];
  late: boolean;
  onChange: (change: WorkspaceChange) => void;
}) {
  const cases = useArgued();
  const lawful = useMemo(() => cases.filter((view) => arguedOf(view)?.decay.law), [cases]);
  const change = useStable(onChange);
  if (cases.length === 0) return null;
  const fold = (name: string, fact: string, body: () => ReactNode) => (
    <DrawnFold name={name} fact={fact}>
      {() => (
        <ArguedBlock cases={cases} late={late}>
          {body()}
        </ArguedBlock>
      )}
    </DrawnFold>
  );
  return (
    <>
      {fold("Window", "exponent and origin against its ends", () => (
        <ScanBody cases={cases} />
      ))}
      {fold("Routes", factOf(cases), () => (
        <RoutesBody cases={cases} onChange={change} />
      ))}
      {lawful.length > 0 &&
        fold("Joint region", "profile, covariance, refits", () => <RegionBody cases={lawful} />)}
      {lawful.length > 0 &&
        fold("Local exponent", "and the energy with its law divided out", () => <LocalBody cases={lawful} />)}
      {fold("Fits", "hypotheses, one exponent or one each, growth of the scales", () => (
        <FitsBody cases={cases} comparisons={comparisons} />
      ))}
    </>
  );
}

/** Cases at rest with an argument; the same list while they are the same, so that open folds stand still. */
function useArgued(): readonly CaseView[] {
  const rested = use(RestedCases);
  return useMemo(() => rested.filter((view) => arguedOf(view) !== null), [rested]);
}

function factOf(cases: readonly CaseView[]): string {
  const parted = cases.reduce((sum, view) => sum + (arguedOf(view)?.argument.disagreements.length ?? 0), 0);
  return parted === 0
    ? "no two part beyond their intervals"
    : `${counted(parted, "pair")} apart beyond their intervals`;
}
