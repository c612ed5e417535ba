import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { CaseView } from "../session/caseView.ts";
import { ChangeInPlace } from "./ChangeInPlace.tsx";
import { ReductionForm } from "./ReductionForm.tsx";
import { RichText } from "./RichText.tsx";
import { reductionRows } from "./reductionRows.ts";

/** How records are reduced, as a small list; Change opens the controls in its place. */
export function ReductionChoices({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const rows = reductionRows(cases.map((view) => view.of.sheet));
  return (
    <ChangeInPlace
      list={
        <dl className="choice-list">
          {rows.map(([name, text]) => (
            <div key={name}>
              <dt>
                <RichText text={name} />
              </dt>
              <dd>
                <RichText text={text} />
              </dd>
            </div>
          ))}
        </dl>
      }
      controls={<ReductionForm cases={cases} onChange={onChange} />}
    />
  );
}
