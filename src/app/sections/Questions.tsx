import { useId, useState } from "react";
import { unitOf } from "../../core/unitText.ts";
import type { CaseSheet } from "../../sheet/caseSheet.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { NumberField } from "./NumberField.tsx";
import { roundedTimes } from "./roundedTimes.ts";
import { TimesQuestion } from "./TimesQuestion.tsx";

interface Ask {
  readonly view: CaseView;
  readonly onChange: (change: WorkspaceChange) => void;
}

/** What one case has not told, asked in one place: its name, viscosity, reference, and missing positions. */
export function Questions({
  view,
  onChange,
  onSave,
  onClose,
}: Ask & { onSave: () => void; onClose: () => void }) {
  const missing = missingPositions(view);
  return (
    <div className="questions">
      <h3>
        <span>
          <CaseMark mark={view.mark} /> {view.name}
        </span>
        <span className="figure-actions">
          <button type="button" className="action" onClick={onSave}>
            Save case sheet
          </button>
          <button type="button" className="action" onClick={onClose}>
            Close
          </button>
        </span>
      </h3>
      <p className="ask">{askText(view, missing.length)}</p>
      <SheetFields view={view} onChange={onChange} />
      <TimesQuestion view={view} onChange={onChange} />
      {view.reduced?.failures.some(({ code }) => code === "no-time") && (
        <div className="fields positions">
          <NumberField
            label="time between samples"
            unit={unitOf("T", view.of.sheet.units)}
            above={0}
            open
            value={view.of.sheet.read.step}
            onChange={(step) =>
              onChange({
                kind: "edit-sheet",
                caseId: view.id,
                edit: { read: { ...view.of.sheet.read, step } },
              })
            }
          />
        </div>
      )}
      {missing.length > 0 && (
        <div className="fields positions">
          {missing.map((name) => (
            <NumberField
              key={name}
              label={
                <>
                  <i className="sym">x</i> of <span className="well">{name}</span>
                </>
              }
              unit={unitOf("L", view.of.sheet.units)}
              value={null}
              open
              onChange={(x) => onChange({ kind: "place-file", caseId: view.id, name, x })}
            />
          ))}
        </div>
      )}
    </div>
  );
}

function SheetFields({ view, onChange }: Ask) {
  const { sheet } = view.of;
  const edit = (change: Partial<CaseSheet>) =>
    onChange({ kind: "edit-sheet", caseId: view.id, edit: change });
  const reference = (change: Partial<CaseSheet["reference"]>) =>
    edit({ reference: { ...sheet.reference, ...change } });
  return (
    <div className="fields">
      <TextField label="name" value={sheet.case} onChange={(name) => edit({ case: name })} />
      <NumberField
        label={
          <>
            kinematic viscosity <i className="sym">ν</i>
          </>
        }
        unit={unitOf("L²/T", sheet.units)}
        above={0}
        open
        placeholder="1.5e-5"
        value={sheet.kinematicViscosity}
        onChange={(kinematicViscosity) => edit({ kinematicViscosity })}
      />
      <NumberField
        label="reference length"
        unit={unitOf("L", sheet.units)}
        above={0}
        open
        placeholder="mesh, diameter"
        value={sheet.reference.length}
        onChange={(length) => reference({ length })}
      />
      <TextField
        label="its symbol"
        short
        value={sheet.reference.symbol}
        onChange={(symbol) => reference({ symbol })}
      />
      <NumberField
        label="reference speed"
        unit={unitOf("L/T", sheet.units)}
        above={0}
        placeholder="local mean"
        value={sheet.reference.speed}
        onChange={(speed) => reference({ speed })}
      />
    </div>
  );
}

function TextField({
  label,
  value,
  short = false,
  onChange,
}: {
  label: string;
  value: string;
  short?: boolean;
  onChange: (value: string) => void;
}) {
  const id = useId();
  const [text, setText] = useState<string | null>(null);
  const settle = () => {
    const trimmed = text?.trim() ?? "";
    setText(null);
    if (trimmed !== "" && trimmed !== value) onChange(trimmed);
  };
  return (
    <div className="field">
      <label htmlFor={id}>{label}</label>
      <input
        id={id}
        className={short ? "short" : undefined}
        value={text ?? value}
        autoComplete="off"
        onChange={(event) => setText(event.target.value)}
        onBlur={settle}
        onKeyDown={(event) => event.key === "Enter" && settle()}
      />
    </div>
  );
}

/** Files that failed for want of a position. */
function missingPositions({ reduced }: CaseView): string[] {
  return (reduced?.failures ?? [])
    .filter((failure) => failure.code === "no-position" && failure.where.file !== undefined)
    .map((failure) => failure.where.file ?? "");
}

function askText(view: CaseView, positions: number): string {
  const { of, reduced } = view;
  const open = [
    of.sheet.kinematicViscosity === null ? "scales and dissipation need a viscosity" : null,
    of.sheet.reference.length === null
      ? "distances are given in metres until a reference length is typed"
      : null,
    reduced?.failures.some(({ code }) => code === "no-time") ? "records without times need the step" : null,
    roundedTimes(view) === null ? null : "rounded time stamps need a word",
    positions > 0 ? `${positions === 1 ? "one file names" : `${positions} files name`} no position` : null,
  ].filter((each) => each !== null);
  if (open.length === 0)
    return "Nothing is open. What is changed here is used at once; the files are never written.";
  const text = open.join("; ");
  return `${text[0].toUpperCase()}${text.slice(1)}. The answers can be saved as a case sheet, which the batch command takes too.`;
}
