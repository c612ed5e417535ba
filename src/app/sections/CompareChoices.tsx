import { useState } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { type ComparedQuantity, comparedQuantities } from "../../core/comparison.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { SheetCompare } from "../../sheet/caseSheet.ts";
import type { CaseView } from "../session/caseView.ts";
import { ChoiceField } from "./ChoiceField.tsx";
import { NumberField } from "./NumberField.tsx";
import { SymbolText } from "./SymbolText.tsx";

const alignments = {
  x0: "distance from the origins",
  x: "position",
  Tu: "intensity",
} as const;
const exponents = {
  auto: "one unless rejected at 5\u202f%",
  common: "one for all",
  own: "each its own",
} as const;

/** How the cases are laid over one another and what has to agree, as a small list; Change opens the controls. */
export function CompareChoices({
  cases,
  settings,
  onChange,
}: {
  cases: readonly CaseView[];
  settings: SheetCompare;
  onChange: (edit: Partial<SheetCompare>) => void;
}) {
  const [open, setOpen] = useState(false);
  return (
    <>
      {open ? (
        <ChoicesForm cases={cases} settings={settings} onChange={onChange} />
      ) : (
        <ChoiceList cases={cases} settings={settings} />
      )}
      <p>
        <button type="button" className="action" onClick={() => setOpen(!open)}>
          {open ? "Close" : "Change"}
        </button>
      </p>
    </>
  );
}

/** The case that the others are held against: the one named, else the first. */
function baseOf(cases: readonly CaseView[], { against }: SheetCompare): CaseView {
  return cases.find(({ name }) => name === against) ?? cases[0];
}

function placeUnit({ along, units }: CaseView): string {
  return unitOf(along === "t" ? "T" : "L", units);
}

function ChoiceList({ cases, settings }: { cases: readonly CaseView[]; settings: SheetCompare }) {
  const base = baseOf(cases, settings);
  return (
    <dl className="choice-list">
      <dt>held against</dt>
      <dd>{base.name}</dd>
      <dt>at equal</dt>
      <dd>{alignments[settings.align]}</dd>
      <dt>exponent</dt>
      <dd>{exponents[settings.exponent]}</dd>
      <dt>
        equal <i>Tu</i> at
      </dt>
      <dd>
        {settings.at === null
          ? "the body, else the middle"
          : withUnit(formatPosition(settings.at), placeUnit(base))}
      </dd>
      <dt>have to agree</dt>
      <dd>
        {settings.quantities.map((key, i) => (
          <span key={key}>
            {i > 0 && ", "}
            <SymbolText runs={labelOf(key).symbol} />
          </span>
        ))}
      </dd>
    </dl>
  );
}

function ChoicesForm({
  cases,
  settings,
  onChange,
}: {
  cases: readonly CaseView[];
  settings: SheetCompare;
  onChange: (edit: Partial<SheetCompare>) => void;
}) {
  const base = baseOf(cases, settings);
  const names = Object.fromEntries(cases.map(({ id, name }) => [id, name]));
  return (
    <div className="choices-form">
      <ChoiceField
        label="held against"
        value={base.id}
        choices={names}
        onChange={(id) => onChange({ against: names[id] ?? null })}
      />
      <ChoiceField
        label="at equal"
        value={settings.align}
        choices={alignments}
        onChange={(align) => onChange({ align })}
      />
      <ChoiceField
        label="exponent"
        value={settings.exponent}
        choices={exponents}
        onChange={(exponent) => onChange({ exponent })}
      />
      <NumberField
        label={
          <>
            equal <i>Tu</i> at
          </>
        }
        value={settings.at}
        unit={placeUnit(base)}
        placeholder="body, else middle"
        onChange={(at) => onChange({ at })}
      />
      <AgreeingQuantities chosen={settings.quantities} onChange={(quantities) => onChange({ quantities })} />
    </div>
  );
}

/** One of them has to stay: a claim about nothing is none. */
function AgreeingQuantities({
  chosen,
  onChange,
}: {
  chosen: readonly ComparedQuantity[];
  onChange: (quantities: readonly ComparedQuantity[]) => void;
}) {
  return (
    <fieldset className="checks">
      <legend>have to agree</legend>
      {comparedQuantities.map((key) => {
        const on = chosen.includes(key);
        return (
          <label key={key}>
            <input
              type="checkbox"
              checked={on}
              disabled={on && chosen.length === 1}
              onChange={() =>
                onChange(comparedQuantities.filter((each) => chosen.includes(each) !== (each === key)))
              }
            />{" "}
            <SymbolText runs={labelOf(key).symbol} /> <span className="ci">{labelOf(key).name}</span>
          </label>
        );
      })}
    </fieldset>
  );
}
