import { labelOf } from "../../core/catalogue.ts";
import type { Quantity } from "../../core/quantity.ts";
import { unitOf } from "../../core/unitText.ts";
import { concernsKey } from "../../figures/flagConcern.ts";
import { formatPosition, withUnit } from "../../figures/formatNumber.ts";
import { formatScaled, quantityText } from "../../figures/formatQuantity.ts";
import { CaseMark } from "./CaseMark.tsx";
import { comparisonSettings } from "./comparisonSettings.ts";
import type { Asked } from "./definitionContext.ts";
import { fitAlternatives, fitSettings, type SettingRow, stationAlternatives } from "./definitionRows.ts";
import type { FoundNumber } from "./foundNumber.ts";
import { Pennant } from "./Pennant.tsx";
import { formatted } from "./QuantityText.tsx";
import { RichText } from "./RichText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { stationSettings } from "./stationSettings.ts";

/** What a number is, where it stands, what it rests on, what other routes give, what is in doubt, who says so. */
export function DefinitionText({ asked, found }: { asked: Asked; found: FoundNumber | null }) {
  const { key, quantity } = asked;
  const label = labelOf(key);
  return (
    <>
      <p>
        <b>
          <RichText text={label.name} />
        </b>
        , <SymbolText runs={label.symbol} />: <RichText text={label.definition} />.
      </p>
      {found && <Place found={found} />}
      {found && <ValueLine of={key} quantity={quantity} found={found} />}
      {found && <Settings rows={settingsOf(asked, found)} />}
      {found && <Alternatives of={key} found={found} />}
      {found?.kind === "station" && <Doubts of={key} found={found} />}
      <p className="definition-source">{label.source}</p>
    </>
  );
}

function Place({ found }: { found: FoundNumber }) {
  const views = found.kind === "comparison" ? found.views : [found.view];
  return (
    <p>
      {views.map((view, i) => (
        <span key={view.id}>
          {i > 0 && ", "}
          <CaseMark mark={view.mark} /> {view.name}
          {found.kind === "station" &&
            `, ${withUnit(formatPosition(found.station.x), unitOf(view.along === "t" ? "T" : "L", view.units))}`}
        </span>
      ))}
    </p>
  );
}

function ValueLine({ of, quantity, found }: { of: string; quantity: Quantity; found: FoundNumber }) {
  const symbol = <SymbolText runs={labelOf(of).symbol} />;
  if (found.kind === "page")
    return (
      <p className="strong">
        {symbol} = {found.shown}
      </p>
    );
  const units = found.kind === "comparison" ? (found.views[0]?.units ?? "SI") : found.view.units;
  const shown = isRatio(of)
    ? formatScaled(quantity, { factor: 1, unit: "", digits: 3 })
    : formatted(quantity, { label: of, units });
  return (
    <p>
      <span className="strong">
        {symbol} = {quantityText(shown)}
      </span>
      {shown.interval === null && shown.why !== undefined && (
        <>
          ; no interval: <RichText text={shown.why} />
        </>
      )}
    </p>
  );
}

/** A ratio has neither unit nor per cent, whatever its quantity has. */
const isRatio = (key: string) => key === "ratio" || key === "largest";

function settingsOf({ key, quantity }: Asked, found: FoundNumber): readonly SettingRow[] {
  switch (found.kind) {
    case "station":
      return stationSettings(key, found.station, found.view.of.sheet, quantity);
    case "decay":
      return fitSettings(found.decay, found.view.of.sheet);
    case "comparison":
      return comparisonSettings(found.comparison, found.views, quantity);
    case "page":
      return found.rows;
  }
}

function Settings({ rows }: { rows: readonly SettingRow[] }) {
  return (
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
  );
}

interface Line {
  readonly name: string;
  readonly shownAs: string;
  readonly quantity: Quantity;
}

function Alternatives({ of, found }: { of: string; found: FoundNumber }) {
  if (found.kind === "comparison" || found.kind === "page") return null;
  const { units } = found.view;
  const lines: readonly Line[] =
    found.kind === "station"
      ? stationAlternatives(of, found.station).map(({ key, ...rest }) => ({
          name: labelOf(key).name,
          ...rest,
        }))
      : fitAlternatives(of, found.decay).map(([name, quantity]) => ({ name, shownAs: of, quantity }));
  if (lines.length === 0) return null;
  return (
    <table className="definition-routes">
      <caption>By other routes</caption>
      <tbody>
        {lines.map(({ name, shownAs, quantity }) => (
          <tr key={name}>
            <th scope="row" className="definition-route">
              <RichText text={name} />
            </th>
            <td className="definition-value">
              {quantity.value === null ? (
                <RichText text={quantity.why} />
              ) : (
                quantityText(formatted(quantity, { label: shownAs, units }))
              )}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Doubts({ of, found }: { of: string; found: FoundNumber & { kind: "station" } }) {
  return found.station.flags
    .filter((flag) => concernsKey(flag, of))
    .map((flag) => (
      <p className="flag-note" key={flag.code + flag.text}>
        <Pennant />
        <span>
          <RichText text={flag.text} />
        </span>
      </p>
    ));
}
