import { labelOf } from "../../core/catalogue.ts";
import type { Criterion } from "../../core/decayArgument.ts";
import type { Quantity } from "../../core/quantity.ts";
import { unitOf } from "../../core/unitText.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import type { FigureTable } from "../../figures/figureSpec.ts";
import { formatPosition, formatRange, withUnit } from "../../figures/formatNumber.ts";
import { positionDecimals } from "../../figures/positionDecimals.ts";
import { endsOf } from "../../figures/stationPoints.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { cellKeys } from "./cellKeys.ts";
import { Definition } from "./Definition.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { RichText } from "./RichText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableSave } from "./TableSave.tsx";
import { TableScroll } from "./TableScroll.tsx";

const sides = { start: "the start", end: "the end" } as const;
type Side = keyof typeof sides;

/** Conditions that physics puts on the ends of a window, each in both readings, before any fit. */
export function ConditionsTable({ cases }: { cases: readonly CaseView[] }) {
  const { along, units } = cases[0];
  const unit = unitOf(along === "t" ? "T" : "L", units);
  return (
    <>
      <TableScroll label="Conditions on the ends of the window">
        <table className="data dense" {...cellKeys}>
          <thead>
            <tr>
              <th scope="col" className="text">
                Asked by physics of the window’s ends
              </th>
              {["no interval contradicts it", "every interval lies inside"].map((words) => (
                <th scope="colgroup" colSpan={2} key={words}>
                  <Definition of="condition_place">
                    {words}, <SymbolText runs={labelOf(along === "t" ? "t" : "x").symbol} />
                    {unit !== "" && ` (${unit})`}
                  </Definition>
                </th>
              ))}
            </tr>
          </thead>
          {cases.map((view) => (
            <CaseRows view={view} key={view.id} />
          ))}
        </table>
      </TableScroll>
      <TableSave name="window-conditions" table={() => conditionsTable(cases)} />
    </>
  );
}

function CaseRows({ view }: { view: CaseView }) {
  const scan = arguedOf(view)?.argument.scan;
  if (scan === undefined) return null;
  return (
    <tbody>
      <tr>
        <th scope="rowgroup" colSpan={5}>
          <CaseMark mark={view.mark} /> {view.name}
        </th>
      </tr>
      {(["start", "end"] as const).flatMap((side) =>
        scan[side].map((criterion) => (
          <tr key={side + criterion.key}>
            <th scope="row" className="text">
              {sides[side]}: <RichText text={criterion.words} />
            </th>
            <PlaceCells view={view} side={side} criterion={criterion} place={criterion.notContradicted} />
            <PlaceCells view={view} side={side} criterion={criterion} place={criterion.inside} />
          </tr>
        )),
      )}
    </tbody>
  );
}

function PlaceCells({
  view,
  side,
  criterion,
  place,
}: {
  view: CaseView;
  side: Side;
  criterion: Criterion;
  place: Quantity;
}) {
  if (place.value === null)
    return (
      <td className="why" colSpan={2}>
        <RichText text={place.why} />
      </td>
    );
  const decimals = positionDecimals(view.stations.map(({ x }) => x));
  const unit = unitOf(view.along === "t" ? "T" : "L", view.units);
  const { low, high, why_low } = place;
  const interval = low === null || high === null || low === high ? null : formatRange(low, high, decimals);
  const none =
    low !== null && low === high ? "all stations drawn anew by their errors gave this place" : why_low;
  const text = `${side === "start" ? "from" : "up to"} ${formatPosition(place.value)}`;
  return (
    <>
      <td title={String(place.value)}>
        <NumberButton
          cell
          of="condition_place"
          quantity={place}
          at={{
            kind: "page",
            view,
            shown: `${withUnit(formatPosition(place.value), unit)}${interval === null ? "" : ` (${interval})`}`,
            rows: [
              ["asked", criterion.words],
              ...(interval === null && none !== undefined ? [["interval", none] as const] : []),
            ],
          }}
        >
          {text}
        </NumberButton>
      </td>
      <td className="pm">{interval ?? "–"}</td>
    </>
  );
}

function conditionsTable(cases: readonly CaseView[]): FigureTable {
  const numbers = (place: Quantity) => {
    const { value, low, high } = endsOf(place);
    return [value, low, high, place.value === null ? place.why : null];
  };
  const heads = (name: string) => [name, `${name}_low`, `${name}_high`, `${name}_why`];
  return {
    heading: ["case", "end", "condition", ...heads("not_contradicted"), ...heads("inside")],
    rows: cases.flatMap((view) => {
      const scan = arguedOf(view)?.argument.scan;
      return (["start", "end"] as const).flatMap((side) =>
        (scan?.[side] ?? []).map(({ words, notContradicted, inside }) => [
          ...[view.name, side, words, ...numbers(notContradicted), ...numbers(inside)],
        ]),
      );
    }),
  };
}
