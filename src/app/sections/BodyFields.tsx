import { useState } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { unitOf } from "../../core/unitText.ts";
import type { SheetBody } from "../../sheet/caseSheet.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { NumberField } from "./NumberField.tsx";
import { SymbolText } from "./SymbolText.tsx";

/** Where the body stands, its chord, and what it should meet: alike in all cases, or each its own. */
export function BodyFields({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const bodies = cases.map(({ of }) => of.sheet.body);
  const differ = bodies.some((body) => JSON.stringify(body) !== JSON.stringify(bodies[0]));
  const [apart, setApart] = useState(false);
  const edit = (caseId: string | null) => (body: Partial<SheetBody> | null) =>
    onChange({ kind: "set-body", caseId, body });
  return (
    <div className="choices-form body-fields">
      {apart || differ ? (
        cases.map((view) => (
          <fieldset className="case-choices" key={view.id}>
            <legend>
              <CaseMark mark={view.mark} /> {view.name}
            </legend>
            <OneBody view={view} onEdit={edit(view.id)} />
          </fieldset>
        ))
      ) : (
        <OneBody view={cases[0]} onEdit={edit(null)} />
      )}
      {cases.length > 1 && !differ && (
        <p>
          <button type="button" className="action" onClick={() => setApart(!apart)}>
            {apart ? "Alike in all cases" : "Each case its own"}
          </button>
        </p>
      )}
    </div>
  );
}

/** Per cent as typed, as the share that sheets hold: no more digits than were typed. */
const share = (percent: number) => Number((percent / 100).toPrecision(12));
const percent = (part: number) => Number((part * 100).toPrecision(12));

function OneBody({ view, onEdit }: { view: CaseView; onEdit: (body: Partial<SheetBody> | null) => void }) {
  const { body } = view.of.sheet;
  const unit = unitOf(view.along === "t" ? "T" : "L", view.units);
  return (
    <>
      <NumberField
        label={view.along === "t" ? "time" : "position"}
        unit={unit}
        placeholder="nowhere"
        value={body?.x ?? null}
        onChange={(x) => onEdit(x === null ? null : { x })}
      />
      {body !== null && (
        <>
          <NumberField
            label={
              <>
                chord <SymbolText runs={labelOf("chord").symbol} />
              </>
            }
            unit={unitOf("L", view.units)}
            above={0}
            placeholder="none"
            value={body.chord}
            onChange={(chord) => onEdit({ chord })}
          />
          <NumberField
            label={
              <>
                target <SymbolText runs={labelOf("Tu").symbol} />
              </>
            }
            unit="%"
            above={0}
            placeholder="none"
            value={body.Tu === null ? null : percent(body.Tu)}
            onChange={(Tu) => onEdit({ Tu: Tu === null ? null : share(Tu) })}
          />
          <NumberField
            label={
              <>
                target <SymbolText runs={labelOf("L11_chord").symbol} />
              </>
            }
            above={0}
            placeholder="none"
            value={body.L11}
            onChange={(L11) => onEdit({ L11 })}
          />
        </>
      )}
    </>
  );
}
