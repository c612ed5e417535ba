import { type ReactNode, useCallback, useRef, useState } from "react";
import { labelOf } from "../../core/catalogue.ts";
import type { Quantity } from "../../core/quantity.ts";
import { unitOf } from "../../core/unitText.ts";
import { concernsKey } from "../../figures/flagConcern.ts";
import { formatPosition, withUnit } from "../../figures/formatNumber.ts";
import { quantityText } from "../../figures/formatQuantity.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { type Asked, DefinitionContext } from "./definitionContext.ts";
import {
  fitAlternatives,
  fitSettings,
  type SettingRow,
  stationAlternatives,
  stationSettings,
} from "./definitionRows.ts";
import { type FoundNumber, foundNumber } from "./foundNumber.ts";
import { Pennant } from "./Pennant.tsx";
import { formatted } from "./QuantityText.tsx";
import { RichText } from "./RichText.tsx";
import { SymbolText } from "./SymbolText.tsx";

const widthPx = 420;

/** Gives every number below it its definition: one panel, opened beside the number that was pressed. */
export function DefinitionPanel({ cases, children }: { cases: readonly CaseView[]; children: ReactNode }) {
  const [asked, ask] = useState<Asked | null>(null);
  const panel = useRef<HTMLDivElement>(null);
  const open = useCallback((wanted: Asked, beside: HTMLElement) => {
    const element = panel.current;
    if (!element) return;
    ask(wanted);
    const box = beside.getBoundingClientRect();
    element.style.left = `${Math.max(8, Math.min(box.left, window.innerWidth - widthPx - 16))}px`;
    const above = box.top > window.innerHeight * 0.6;
    element.style.top = above ? "auto" : `${box.bottom + 6}px`;
    element.style.bottom = above ? `${window.innerHeight - box.top + 6}px` : "auto";
    element.showPopover?.();
    element.focus({ preventScroll: true });
  }, []);
  return (
    <DefinitionContext value={open}>
      {children}
      <div
        ref={panel}
        popover="auto"
        role="dialog"
        tabIndex={-1}
        aria-label={asked === null ? "Definition" : labelOf(asked.key).name}
        className="definition-text definition-panel"
      >
        {asked !== null && <DefinitionText asked={asked} found={foundNumber(cases, asked.quantity)} />}
      </div>
    </DefinitionContext>
  );
}

function DefinitionText({ asked: { key, quantity }, found }: { asked: Asked; found: FoundNumber | null }) {
  const label = labelOf(key);
  return (
    <>
      <p>
        <b>{label.name}</b>, <SymbolText runs={label.symbol} />: <RichText text={label.definition} />.
      </p>
      {found && <Place found={found} />}
      {found && <ValueLine of={key} quantity={quantity} view={found.view} />}
      {found && <Settings rows={settingsOf(key, found)} />}
      {found && <Alternatives of={key} found={found} />}
      {found?.kind === "station" &&
        found.station.flags
          .filter((flag) => concernsKey(flag, key))
          .map((flag) => (
            <p className="flag-note" key={flag.code + flag.text}>
              <Pennant />
              <span>
                <RichText text={flag.text} />
              </span>
            </p>
          ))}
      <p className="definition-source">{label.source}</p>
    </>
  );
}

function Place({ found }: { found: FoundNumber }) {
  const { view } = found;
  const unit = unitOf(view.along === "t" ? "T" : "L", view.units);
  return (
    <p>
      <CaseMark mark={view.mark} /> {view.name}
      {found.kind === "station" && `, ${withUnit(formatPosition(found.station.x), unit)}`}
    </p>
  );
}

function ValueLine({ of, quantity, view }: { of: string; quantity: Quantity; view: CaseView }) {
  const shown = formatted(quantity, { label: of, units: view.units });
  return (
    <p>
      <span className="strong">
        <SymbolText runs={labelOf(of).symbol} /> = {quantityText(shown)}
      </span>
      {shown.interval === null && shown.why !== undefined && (
        <>
          ; no interval: <RichText text={shown.why} />
        </>
      )}
    </p>
  );
}

function settingsOf(key: string, found: FoundNumber): readonly SettingRow[] {
  const { sheet } = found.view.of;
  return found.kind === "station"
    ? stationSettings(key, found.station, sheet)
    : fitSettings(found.decay, sheet);
}

function Settings({ rows }: { rows: readonly SettingRow[] }) {
  return (
    <dl className="choice-list">
      {rows.map(([name, text]) => (
        <div key={name}>
          <dt>{name}</dt>
          <dd>
            <RichText text={text} />
          </dd>
        </div>
      ))}
    </dl>
  );
}

function Alternatives({ of, found }: { of: string; found: FoundNumber }) {
  const { units } = found.view;
  const lines =
    found.kind === "station"
      ? stationAlternatives(of, found.station).map(({ key, shownAs, quantity }) => ({
          name: labelOf(key).name,
          quantity,
          shown: formatted(quantity, { label: shownAs, units }),
        }))
      : fitAlternatives(of, found.decay).map(([name, quantity]) => ({
          name,
          quantity,
          shown: formatted(quantity, { label: of, units }),
        }));
  if (lines.length === 0) return null;
  return (
    <table className="definition-routes">
      <caption>By other routes</caption>
      <tbody>
        {lines.map(({ name, quantity, shown }) => (
          <tr key={name}>
            <th scope="row" className="definition-route">
              {name}
            </th>
            <td className="definition-value">
              {quantity.value === null ? <RichText text={quantity.why} /> : quantityText(shown)}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
