import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { RichText } from "./RichText.tsx";
import { dissipations } from "./reductionRows.ts";

/** Which route of the dissipation is adopted in each case, and why. */
export function AdoptedRoutes({ cases }: { cases: readonly CaseView[] }) {
  return cases.map((view) => {
    const given = view.stations.flatMap(({ facts }) => facts.dissipationReason ?? []);
    const reasons = new Set(
      given.length > 0 ? given : [`${dissipations[view.of.sheet.reduce.dissipation]}, as chosen`],
    );
    return [...reasons].map((reason) => (
      <p key={view.id + reason}>
        <CaseMark mark={view.mark} /> {view.name}: <RichText text={reason} />.
      </p>
    ));
  });
}
