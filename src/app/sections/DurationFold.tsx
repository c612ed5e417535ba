import { memo, use, useState } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { plannedNames, requiredDuration } from "../../core/station/requiredDuration.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatDigits, formatNumber, withUnit } from "../../figures/formatNumber.ts";
import { positionDecimals } from "../../figures/positionDecimals.ts";
import { RestedCases } from "../page/restedCases.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Fold } from "./Fold.tsx";
import { NumberField } from "./NumberField.tsx";
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
        onChange={(value) => value !== null && value > 0 && setPercent(value)}
      />
      <TableScroll label="Record lengths">
        <table className="data dense stations-table">
          <thead>
            <tr>
              <th scope="col">
                <SymbolText runs={labelOf("x").symbol} />
                {unitOf("L", recorded[0].units) !== "" && ` (${unitOf("L", recorded[0].units)})`}
              </th>
              <th scope="col">recorded{unit !== "" && ` (${unit})`}</th>
              {plannedNames.map((key) => (
                <th scope="col" key={key}>
                  for <SymbolText runs={labelOf(key).symbol} />
                  {unit !== "" && ` (${unit})`}
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
            <td>{station.duration === null ? "–" : formatDigits(station.duration, 3)}</td>
            {plannedNames.map((key) => (
              <td key={key} className={needed[key].value === null ? "why" : undefined}>
                {needed[key].value === null ? (
                  <RichText text={needed[key].why} />
                ) : (
                  formatDigits(needed[key].value, 2)
                )}
              </td>
            ))}
          </tr>
        );
      })}
    </tbody>
  );
});
