import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { RichText } from "./RichText.tsx";

/** Which route of the dissipation is adopted in each case, and why. */
export function AdoptedRoutes({ cases }: { cases: readonly CaseView[] }) {
  return cases.map((view) => {
    const reasons = new Set(view.stations.flatMap(({ facts }) => facts.dissipationReason ?? []));
    return [...reasons].map((reason) => (
      <p key={view.id + reason}>
        <CaseMark mark={view.mark} /> {view.name}: <RichText text={reason} />.
      </p>
    ));
  });
}
