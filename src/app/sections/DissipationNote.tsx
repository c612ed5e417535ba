import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { CaseView } from "../session/caseView.ts";
import { AdoptedRoutes } from "./AdoptedRoutes.tsx";
import { ChangeInPlace } from "./ChangeInPlace.tsx";
import { CommonChoice } from "./CommonChoice.tsx";
import { dissipations, kinds } from "./reductionRows.ts";

/** Which route of the dissipation is adopted in each case, and why; another can be adopted for all. */
export function DissipationNote({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const sheets = cases.map((view) => view.of.sheet);
  return (
    <ChangeInPlace
      list={<AdoptedRoutes cases={cases} />}
      controls={
        <div className="choices-form">
          <CommonChoice
            label="route in every case"
            choices={dissipations}
            of={({ reduce }) => reduce.dissipation}
            sheets={sheets}
            onChange={(dissipation) =>
              onChange({ kind: "set-reduction", caseId: null, edit: { reduce: { dissipation } } })
            }
          />
          {cases.map(({ id, name, of }) => (
            <CommonChoice
              key={id}
              label={`${name}, kind of data`}
              choices={kinds}
              of={({ kind }) => kind ?? "none"}
              sheets={[of.sheet]}
              onChange={(kind) =>
                onChange({
                  kind: "set-reduction",
                  caseId: id,
                  edit: { kind: kind === "none" ? null : kind },
                })
              }
            />
          ))}
        </div>
      }
    />
  );
}
