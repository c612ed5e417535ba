import { useState } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { unitOf } from "../../core/unitText.ts";
import { windowSentence } from "../../export/sentences/decaySentences.ts";
import { formatDigits, withUnit } from "../../figures/formatNumber.ts";
import type { SheetFit } from "../../sheet/caseSheet.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { CaseView } from "../session/caseView.ts";
import { ChoiceField } from "./ChoiceField.tsx";
import { NumberField } from "./NumberField.tsx";
import { SentenceText } from "./SentenceText.tsx";
import { SymbolText } from "./SymbolText.tsx";

const quantities = { auto: "automatic", k: "k", uu: "⟨u²⟩", q: "q as given" } as const;
const residuals = { log: "logarithmic", linear: "linear" } as const;
const coordinates = {
  auto: "as U asks",
  x: "x",
  flight: "time of flight",
} as const;
const weights = { sampling: "sampling errors", equal: "equal" } as const;

/** The choices behind the fits, as a small list; Change opens the controls in its place. */
export function DecayChoices({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const [open, setOpen] = useState(false);
  return (
    <>
      {open ? <ChoicesForm cases={cases} onChange={onChange} /> : <ChoiceList cases={cases} />}
      {cases.map(
        (view) =>
          view.decay && (
            <p key={view.id}>
              <SentenceText sentence={windowSentence(view)} />
            </p>
          ),
      )}
      <p>
        <button type="button" className="action" onClick={() => setOpen(!open)}>
          {open ? "Close" : "Change"}
        </button>
      </p>
    </>
  );
}

function ChoiceList({ cases }: { cases: readonly CaseView[] }) {
  /** One word where the cases agree, else one for each. */
  const said = (of: (fit: SheetFit, view: CaseView) => string) =>
    [...new Set(cases.map((view) => of(view.of.sheet.fit, view)))].join(", ");
  return (
    <dl className="choice-list">
      <dt>quantity</dt>
      <dd>
        <FittedQuantities cases={cases} />
      </dd>
      <dt>residuals</dt>
      <dd>{said((fit) => residuals[fit.residuals])}</dd>
      {cases.some(({ along }) => along !== "t") && (
        <>
          <dt>runs along</dt>
          <dd>{said((_, view) => coordinateText(view))}</dd>
        </>
      )}
      <dt>weights</dt>
      <dd>{said((fit, view) => weights[view.decay?.weights ?? fit.weights])}</dd>
      <dt>
        <Origin along={cases[0].along} />
      </dt>
      <dd>
        {said((fit, view) => held(fit.x0, unitOf(view.along === "t" ? "T" : "L", view.of.sheet.units)))}
      </dd>
      <dt>
        <i className="sym">n</i>
      </dt>
      <dd>{said((fit) => held(fit.n, ""))}</dd>
      <dt>window</dt>
      <dd>{said((fit) => (fit.window === "auto" ? "automatic" : "set by hand"))}</dd>
    </dl>
  );
}

function ChoicesForm({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const { fit } = cases[0].of.sheet;
  const all = (edit: Partial<SheetFit>) => {
    for (const { id, of } of cases)
      onChange({ kind: "edit-sheet", caseId: id, edit: { fit: { ...of.sheet.fit, ...edit } } });
  };
  return (
    <div className="choices-form">
      <ChoiceField
        label="quantity"
        value={fit.quantity}
        choices={quantities}
        onChange={(quantity) => all({ quantity })}
      />
      <ChoiceField
        label="residuals"
        value={fit.residuals}
        choices={residuals}
        onChange={(residuals) => all({ residuals })}
      />
      <ChoiceField
        label="weights"
        value={fit.weights}
        choices={weights}
        onChange={(weights) => all({ weights })}
      />
      {cases.some(({ along }) => along !== "t") && (
        <ChoiceField
          label="runs along"
          value={fit.coordinate}
          choices={coordinates}
          onChange={(coordinate) => all({ coordinate })}
        />
      )}
      {cases.map(({ id, name, of, along }) => (
        <fieldset key={id} className="case-choices">
          <legend>{name}</legend>
          <NumberField
            label={
              <>
                hold <Origin along={along} /> at
              </>
            }
            unit={unitOf(along === "t" ? "T" : "L", of.sheet.units)}
            placeholder="free"
            value={of.sheet.fit.x0}
            onChange={(x0) => onChange({ kind: "hold-origin", caseId: id, x0 })}
          />
          <NumberField
            label={
              <>
                hold <i className="sym">n</i> at
              </>
            }
            above={0}
            placeholder="free"
            value={of.sheet.fit.n}
            onChange={(n) => onChange({ kind: "hold-exponent", caseId: id, n })}
          />
          <button
            type="button"
            className="action"
            disabled={of.sheet.fit.window === "auto"}
            onClick={() => onChange({ kind: "set-window", caseId: id, window: "auto" })}
          >
            Window automatic
          </button>
        </fieldset>
      ))}
    </div>
  );
}

function Origin({ along }: { along: "x" | "t" | undefined }) {
  return (
    <span className="sym">
      {along ?? "x"}
      <sub className="up">0</sub>
    </span>
  );
}

const assumed = { none: "", axisymmetric: "axisymmetry assumed", isotropic: "isotropy assumed" } as const;

/** What is fitted, once where the cases agree: k/U², or u alone, and what was taken for granted. */
function FittedQuantities({ cases }: { cases: readonly CaseView[] }) {
  const kinds = new Map(
    cases.flatMap(({ decay }) => (decay ? [[`${decay.quantity} ${decay.assumption}`, decay] as const] : [])),
  );
  return [...kinds].map(([key, { quantity, assumption }], i) => (
    <span key={key}>
      {i > 0 && "; "}
      <SymbolText runs={labelOf(quantity === "q" ? "q" : `${quantity}/U2`).symbol} />
      {assumption !== "none" && `, ${assumed[assumption]}`}
    </span>
  ));
}

/** What the law of a case runs along, as it worked out. */
function coordinateText({ decay, along, of }: CaseView): string {
  if (along === "t" || decay?.coordinate === "t") return "time";
  const taken = decay?.coordinate === "flight" ? "time of flight" : "x";
  return of.sheet.fit.coordinate === "auto" ? `${taken}, as U asks` : taken;
}

const held = (value: number | null, unit: string) =>
  value === null ? "free" : `held at ${withUnit(formatDigits(value, 3), unit)}`;
