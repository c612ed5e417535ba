import { memo, use, useState } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { bare, type Quantity } from "../../core/quantity.ts";
import { type PlannedName, plannedNames, requiredDuration } from "../../core/station/requiredDuration.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatDigits, formatNumber, withUnit } from "../../figures/formatNumber.ts";
import { quantityText } from "../../figures/formatQuantity.ts";
import { positionDecimals } from "../../figures/positionDecimals.ts";
import { RestedCases } from "../page/restedCases.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { cellKeys } from "./cellKeys.ts";
import { Definition } from "./Definition.tsx";
import { Fold } from "./Fold.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { NumberField } from "./NumberField.tsx";
import { formatted } from "./QuantityText.tsx";
import { RichText } from "./RichText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** Record lengths that would bring Tu, L11 and lambda to an interval of the width that is asked for. */
export function DurationFold() {
  const cases = use(RestedCases);
  const [percent, setPercent] = useState(2);
  const recorded = cases.filter((view) => view.stations.some(({ duration }) => duration !== null));
  if (recorded.length === 0) return null;
  const unit = unitOf("T", recorded[0].units);
  return (
    <Fold name="How long must be sampled" fact={withUnit(`±\u202f${formatNumber(percent, 1)}`, "%")}>
      <NumberField
        label="95 % interval wanted, ± per cent of the value"
        value={percent}
        above={0}
        onChange={(value) => value !== null && value > 0 && setPercent(value)}
      />
      <TableScroll label="Record lengths">
        <table className="data dense stations-table" {...cellKeys}>
          <thead>
            <tr>
              <th scope="col">
                <SymbolText runs={labelOf("x").symbol} />
                {unitOf("L", recorded[0].units) !== "" && ` (${unitOf("L", recorded[0].units)})`}
              </th>
              <th scope="col">
                <Definition of="duration">recorded{unit !== "" && ` (${unit})`}</Definition>
              </th>
              {plannedNames.map((key) => (
                <th scope="col" key={key}>
                  <Definition of="requiredDuration">
                    for <SymbolText runs={labelOf(key).symbol} />
                    {unit !== "" && ` (${unit})`}
                  </Definition>
                </th>
              ))}
            </tr>
          </thead>
          {recorded.map((view) => (
            <DurationRows view={view} width={percent / 100} key={view.id} />
          ))}
        </table>
      </TableScroll>
    </Fold>
  );
}

/** Each length is a search of its own: they follow a bracket only once it rests. */
const DurationRows = memo(function DurationRows({ view, width }: { view: CaseView; width: number }) {
  const decimals = positionDecimals(view.stations.map(({ x }) => x));
  return (
    <tbody>
      <tr>
        <th scope="rowgroup" className="text" colSpan={plannedNames.length + 2}>
          <CaseMark mark={view.mark} /> {view.name}
        </th>
      </tr>
      {view.stations.map((station) => {
        const needed = requiredDuration(station, width);
        return (
          <tr key={station.x}>
            <td>{formatNumber(station.x, decimals)}</td>
            <td>
              <Recorded view={view} station={station} />
            </td>
            {plannedNames.map((key) => (
              <td key={key} className={needed[key].value === null ? "why" : undefined}>
                <Needed quantity={needed[key]} of={key} width={width} view={view} station={station} />
              </td>
            ))}
          </tr>
        );
      })}
    </tbody>
  );
});

interface OfStation {
  readonly view: CaseView;
  readonly station: StationResult;
}

function Recorded({ view, station }: OfStation) {
  if (station.duration === null) return "–";
  return (
    <NumberButton
      of="duration"
      quantity={bare(station.duration, "counted, not estimated")}
      at={{ kind: "station", view, station }}
      cell
    >
      {formatDigits(station.duration, 3)}
    </NumberButton>
  );
}

/** A record length to plan with; its definition says for which number, and what that has now. */
function Needed({
  quantity,
  of,
  width,
  view,
  station,
}: OfStation & { quantity: Quantity; of: PlannedName; width: number }) {
  if (quantity.value === null) return <RichText text={quantity.why} />;
  const shown = formatDigits(quantity.value, 2);
  const { facts } = station;
  const unit = unitOf("T", view.units);
  const rows = [
    ["for", labelOf(of).name],
    ["half-width asked for", withUnit(`±\u202f${formatNumber(100 * width, 1)}`, "%")],
    ["now", quantityText(formatted(station[of], { label: of, units: view.units }))],
    ["recorded", withUnit(formatDigits(station.duration ?? 0, 3), unit)],
    ["integral times", facts.integralTimes === null ? "not known" : formatDigits(facts.integralTimes, 2)],
  ] as const;
  return (
    <NumberButton
      of="requiredDuration"
      quantity={quantity}
      at={{ kind: "page", view, shown: withUnit(shown, unit), rows }}
      cell
    >
      {shown}
    </NumberButton>
  );
}
