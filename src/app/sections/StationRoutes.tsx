import { memo } from "react";
import { labelOf, type Run } from "../../core/catalogue.ts";
import type { Quantity } from "../../core/quantity.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { displayOf, unitOf } from "../../core/unitText.ts";
import { formatNumber } from "../../figures/formatNumber.ts";
import { quantityText } from "../../figures/formatQuantity.ts";
import { positionDecimals } from "../../figures/positionDecimals.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { cellKeys } from "./cellKeys.ts";
import { Definition } from "./Definition.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { formatted, valueText } from "./QuantityText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";
import { UnitText } from "./UnitText.tsx";

/** One column: a quantity of every station. */
export interface RouteColumn {
  /** Its definition. */
  readonly key: string;
  /** Key of the label whose unit and digits it is shown with; its own where left out. */
  readonly shownAs?: string;
  /** What is shown, where that is not what the station holds: a length for a time. */
  readonly shown?: (station: StationResult) => Quantity | undefined;
  readonly of: (station: StationResult) => Quantity | undefined;
}

/** Some quantities of every station, a block a case; intervals and reasons stand behind the numbers. */
export const StationRoutes = memo(function StationRoutes({
  label,
  cases,
  columns,
}: {
  label: string;
  cases: readonly CaseView[];
  columns: readonly RouteColumn[];
}) {
  const there = columns.filter(({ of }) =>
    cases.some((view) => view.stations.some((station) => of(station)?.value != null)),
  );
  if (there.length === 0) return null;
  const { units, along } = cases[0];
  const unit = unitOf(along === "t" ? "T" : "L", units);
  return (
    <TableScroll label={label}>
      <table className="data dense stations-table" {...cellKeys}>
        <thead>
          <tr>
            <th scope="col">
              <SymbolText runs={labelOf(along === "t" ? "t" : "x").symbol} />
              {unit !== "" && ` (${unit})`}
            </th>
            {there.map(({ key, shownAs = key }) => (
              <th scope="col" key={key}>
                <Definition of={key}>
                  <SymbolText runs={shownAs === key ? labelOf(key).symbol : alongTheStream(key)} />
                  <HeadUnit unit={displayOf(labelOf(shownAs), units).unit} />
                </Definition>
              </th>
            ))}
          </tr>
        </thead>
        {cases
          .filter((view) =>
            view.stations.some((station) => there.some(({ of }) => of(station)?.value != null)),
          )
          .map((view) => (
            <CaseRows view={view} columns={there} key={view.id} />
          ))}
      </table>
    </TableScroll>
  );
});

/** A time shown as a length: U times its symbol. */
const alongTheStream = (key: string): readonly Run[] => [
  ...labelOf("U").symbol,
  { text: "\u202f" },
  ...labelOf(key).symbol,
];

function HeadUnit({ unit }: { unit: string }) {
  return (
    unit !== "" && (
      <>
        {" "}
        (<UnitText unit={unit} />)
      </>
    )
  );
}

function CaseRows({ view, columns }: { view: CaseView; columns: readonly RouteColumn[] }) {
  const decimals = positionDecimals(view.stations.map(({ x }) => x));
  return (
    <tbody>
      <tr>
        <th scope="rowgroup" className="text" colSpan={columns.length + 1}>
          <CaseMark mark={view.mark} /> {view.name}
        </th>
      </tr>
      {view.stations.map((station) => (
        <tr key={station.x}>
          <td>{formatNumber(station.x, decimals)}</td>
          {columns.map((column) => (
            <td key={column.key}>
              <RouteCell column={column} station={station} view={view} />
            </td>
          ))}
        </tr>
      ))}
    </tbody>
  );
}

function RouteCell({
  column: { key, shownAs = key, shown, of },
  station,
  view,
}: {
  column: RouteColumn;
  station: StationResult;
  view: CaseView;
}) {
  const quantity = of(station);
  const printed = (shown ?? of)(station);
  if (quantity === undefined || printed === undefined) return "–";
  const text = formatted(printed, { label: shownAs, units: view.units });
  return (
    <NumberButton
      of={key}
      quantity={quantity}
      at={{ kind: "station", view, station }}
      cell
      title={quantity.value === null ? quantity.why : quantityText(text)}
    >
      {valueText(text)}
    </NumberButton>
  );
}
