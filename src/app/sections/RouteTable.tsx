import { labelOf } from "../../core/catalogue.ts";
import type { Quantity } from "../../core/quantity.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Definition } from "./Definition.tsx";
import { middleStation } from "./middleStation.ts";
import { QuantityCells } from "./QuantityText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";
import { UnitText } from "./UnitText.tsx";

const routes: readonly {
  readonly name: string;
  readonly of: (station: StationResult) => Quantity | undefined;
}[] = [
  { name: "adopted", of: (station) => station.epsilon },
  { name: "gradients", of: (station) => station.epsilon_gradient },
  { name: "decay", of: (station) => station.epsilon_decay },
  { name: "inertial range", of: (station) => station.epsilon_inertial },
  { name: "second order, bound", of: (station) => station.routes["epsilon_second-order"] },
  { name: "third order, bound", of: (station) => station.routes["epsilon_third-order"] },
];

/** The dissipation at one station of each case by every route, or the reason why a route has none. */
export function RouteTable({ cases }: { cases: readonly CaseView[] }) {
  const shown = cases.flatMap((view) => {
    const station = middleStation(view);
    return station ? [{ view, station }] : [];
  });
  if (shown.length === 0) return null;
  const { units } = shown[0].view;
  return (
    <TableScroll label="Dissipation by route">
      <table className="data dense">
        <thead>
          <tr>
            <th scope="col">
              <Definition of="epsilon">
                <SymbolText runs={labelOf("epsilon").symbol} />
                {units === "SI" && (
                  <>
                    {" "}
                    (<UnitText unit={unitOf("L²/T³", units)} />)
                  </>
                )}
              </Definition>
            </th>
            {shown.map(({ view, station }) => (
              <th scope="colgroup" colSpan={2} key={view.id}>
                <CaseMark mark={view.mark} /> {view.name}, {placeOf(view, station)}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {routes
            .filter(({ of }) => shown.some(({ station }) => of(station) !== undefined))
            .map(({ name, of }) => (
              <tr key={name}>
                <th scope="row">{name}</th>
                {shown.map(({ view, station }) => (
                  <QuantityCells
                    key={view.id}
                    quantity={of(station) ?? notTried}
                    label="epsilon"
                    units={units}
                  />
                ))}
              </tr>
            ))}
        </tbody>
      </table>
    </TableScroll>
  );
}

const notTried: Quantity = { value: null, why: "needs a record" };

function placeOf({ along, units }: CaseView, { x }: StationResult): string {
  return withUnit(formatPosition(x), unitOf(along === "t" ? "T" : "L", units));
}
