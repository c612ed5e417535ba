import type { ReactNode } from "react";
import { arguedOf } from "../../figures/arguedOf.ts";
import type { CaseView } from "../session/caseView.ts";

/** What was argued about some cases; grey while newer fits wait for their argument and it is late. */
export function ArguedBlock({
  cases,
  late,
  children,
}: {
  cases: readonly CaseView[];
  late: boolean;
  children: ReactNode;
}) {
  const stale = late && cases.some((view) => view.stale || arguedOf(view)?.stale);
  return (
    <div className="argued" aria-busy={stale}>
      {children}
    </div>
  );
}
