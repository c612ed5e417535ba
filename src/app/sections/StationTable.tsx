import { labelOf } from "../../core/catalogue.ts";
import { lawDistance } from "../../core/decay/lawDistance.ts";
import type { Flag } from "../../core/flag.ts";
import { bare } from "../../core/quantity.ts";
import { withReference } from "../../core/symbolRuns.ts";
import { unitOf } from "../../core/unitText.ts";
import { type StationColumn, stationColumn, tableKeys } from "../../export/stationColumns.ts";
import { concernOf } from "../../figures/flagConcern.ts";
import { formatNumber } from "../../figures/formatNumber.ts";
import { positionDecimals } from "../../figures/positionDecimals.ts";
import type { CaseView } from "../session/caseView.ts";
import { cellKeys } from "./cellKeys.ts";
import { Definition } from "./Definition.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { Pennant } from "./Pennant.tsx";
import { RichText } from "./RichText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";
import { UnitText } from "./UnitText.tsx";

/** Every station of one case with its intervals; a row points at its tick on the ruler. */
export function StationTable({ view, onHover }: { view: CaseView; onHover: (x: number | null) => void }) {
  const { units, along } = view.of.sheet;
  const columns = tableKeys.map((key) => stationColumn(view.stations, key, units));
  const shown = columns.filter((column) => column.why === null);
  const decimals = positionDecimals(view.stations.map((station) => station.x));
  const distances = distancesOf(view);
  const place = along === "t" ? "t" : "x";
  const runsAlong = along === "t" ? "t" : view.decay?.law?.flight ? "s" : "x";
  const distanceKey = `(${runsAlong}-${runsAlong}0)/ell`;
  return (
    <>
      <TableScroll label="Stations">
        <table className="data stations-table" {...cellKeys}>
          <thead>
            <tr>
              <th scope="col">
                <Definition of={place}>
                  <SymbolText runs={labelOf(place).symbol} />
                  {units === "SI" && ` (${unitOf(along === "t" ? "T" : "L", units)})`}
                </Definition>
              </th>
              {distances && (
                <th scope="col">
                  <Definition of={distanceKey}>
                    <SymbolText runs={withReference(labelOf(distanceKey).symbol, view.symbol)} />
                  </Definition>
                </th>
              )}
              {shown.map((column) => (
                <ColumnHead column={column} key={column.key} />
              ))}
            </tr>
          </thead>
          <tbody>
            {view.stations.map((station, row) => (
              <tr
                key={station.x}
                data-station={`${view.id} ${station.x}`}
                tabIndex={-1}
                className={isUsed(view, station.x) ? undefined : "outside"}
                onPointerEnter={() => onHover(station.x)}
                onPointerLeave={() => onHover(null)}
              >
                <td>
                  <NumberButton
                    of={place}
                    quantity={bare(station.x, "a position is told, not estimated")}
                    at={{ kind: "station", view, station }}
                    cell
                  >
                    {formatNumber(station.x, decimals)}
                  </NumberButton>
                  <CellFlags flags={station.flags.filter((flag) => concernOf(flag) === null)} />
                </td>
                {distances && view.decay && (
                  <td>
                    <NumberButton
                      of={distanceKey}
                      quantity={bare(distances[row], "it carries the interval of the origin")}
                      at={{ kind: "decay", view, decay: view.decay }}
                      cell
                    >
                      {formatNumber(distances[row], 1)}
                    </NumberButton>
                  </td>
                )}
                {shown.map((column) => (
                  <Cells column={column} row={row} flags={station.flags} key={column.key} />
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </TableScroll>
      <Gaps columns={columns} />
    </>
  );
}

function ColumnHead({ column }: { column: StationColumn }) {
  return (
    <th scope="colgroup" colSpan={2}>
      <Definition of={column.key}>
        <SymbolText runs={labelOf(column.key).symbol} />
        {column.unit !== "" && (
          <>
            {" "}
            (<UnitText unit={column.unit} />)
          </>
        )}
      </Definition>
    </th>
  );
}

function Cells({ column, row, flags }: { column: StationColumn; row: number; flags: readonly Flag[] }) {
  const { value, error, title, quantity } = column.cells[row];
  const own = flags.filter((flag) => concernOf(flag)?.includes(column.key) ?? false);
  return (
    <>
      <td title={title}>
        <NumberButton of={column.key} quantity={quantity} cell>
          {value}
        </NumberButton>
      </td>
      <td className="pm">
        {error}
        <CellFlags flags={quantity.value === null ? [] : own} />
      </td>
    </>
  );
}

/** A pennant beside a number in doubt; its text for the pointer and for screen readers. */
function CellFlags({ flags }: { flags: readonly Flag[] }) {
  if (flags.length === 0) return null;
  const text = flags.map((flag) => flag.text).join(" ");
  return (
    <span className="cell-flag" title={text}>
      <Pennant />
      <span className="spoken">{text}</span>
    </span>
  );
}

/** Columns left out because every cell has the same gap: their names and the reason. */
function Gaps({ columns }: { columns: readonly StationColumn[] }) {
  const gaps = new Map<string, StationColumn[]>();
  for (const column of columns)
    if (column.why !== null) gaps.set(column.why, [...(gaps.get(column.why) ?? []), column]);
  return [...gaps].map(([why, missing]) => (
    <p className="reason" key={why}>
      No{" "}
      {missing.map((column, i) => (
        <span key={column.key}>
          {i > 0 && (i === missing.length - 1 ? " or " : ", ")}
          <SymbolText runs={labelOf(column.key).symbol} />
        </span>
      ))}
      : <RichText text={why} />.
    </p>
  ));
}

function isUsed({ decay }: CaseView, x: number): boolean {
  return decay?.points.some((point) => point.x === x && point.used) ?? true;
}

function distancesOf({ stations, decay, length }: CaseView): number[] | null {
  const law = decay?.law;
  if (!law || length === null) return null;
  return stations.map((station) => lawDistance(law, station.x) / length);
}
