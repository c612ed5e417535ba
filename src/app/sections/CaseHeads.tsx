import type { ReactNode } from "react";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";

/** The head of a table with two columns a case. */
export function CaseHeads({ cases, first }: { cases: readonly CaseView[]; first: ReactNode }) {
  return (
    <thead>
      <tr>
        <th scope="col" className="text">
          {first}
        </th>
        {cases.map((view) => (
          <th scope="colgroup" colSpan={2} key={view.id}>
            <CaseMark mark={view.mark} /> {view.name}
          </th>
        ))}
      </tr>
    </thead>
  );
}
