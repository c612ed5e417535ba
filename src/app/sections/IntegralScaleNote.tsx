import { labelOf } from "../../core/catalogue.ts";
import { isEstimate, scaled } from "../../core/quantity.ts";
import type { IntegralScaleRoute, StationResult } from "../../core/stationResult.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { ChangeInPlace } from "./ChangeInPlace.tsx";
import { CommonChoice } from "./CommonChoice.tsx";
import { spreadColumn } from "./factColumns.ts";
import { middleStation } from "./middleStation.ts";
import { NumberButton } from "./NumberButton.tsx";
import { formatted, valueText } from "./QuantityText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { integralRoutes } from "./stationSettings.ts";

const routes = Object.keys(integralRoutes) as IntegralScaleRoute[]; // the record's own keys, which TypeScript widens

/** The integral length by every route at one station of each case, which one is adopted, and how far they spread. */
export function IntegralScaleNote({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const shown = cases.flatMap((view) => {
    const station = middleStation(view);
    return station && routes.some((route) => station.routes[`T_int_${route}`] !== undefined)
      ? [{ view, station }]
      : [];
  });
  if (shown.length === 0) return null;
  return (
    <ChangeInPlace
      list={shown.map(({ view, station }) => <RouteList view={view} station={station} key={view.id} />)}
      controls={
        <div className="choices-form">
          <CommonChoice
            label={<SymbolText runs={labelOf("T_int").symbol} />}
            choices={integralRoutes}
            of={({ reduce }) => reduce.integralScale}
            sheets={shown.map(({ view }) => view.of.sheet)}
            onChange={(integralScale) =>
              onChange({ kind: "set-reduction", caseId: null, edit: { reduce: { integralScale } } })
            }
          />
        </div>
      }
    />
  );
}

function RouteList({ view, station }: { view: CaseView; station: StationResult }) {
  const adopted = view.of.sheet.reduce.integralScale;
  const spread = spreadColumn.of(station);
  return (
    <>
      <p>
        <CaseMark mark={view.mark} /> {view.name},{" "}
        {withUnit(formatPosition(station.x), unitOf(view.along === "t" ? "T" : "L", view.units))}
      </p>
      <dl className="choice-list">
        {routes.map((route) => (
          <div key={route}>
            <dt>{labelOf(`T_int_${route}`).name}</dt>
            <dd>
              <RouteLength view={view} station={station} route={route} />
              {route === adopted && " adopted"}
            </dd>
          </div>
        ))}
      </dl>
      {spread !== undefined && spread.value !== null && (
        <p>
          Largest over smallest:{" "}
          <NumberButton of="integralScaleSpread" quantity={spread} at={{ kind: "station", view, station }}>
            {formatDigits(spread.value, 3)}
          </NumberButton>
        </p>
      )}
    </>
  );
}

function RouteLength({
  view,
  station,
  route,
}: {
  view: CaseView;
  station: StationResult;
  route: IntegralScaleRoute;
}) {
  const time = station.routes[`T_int_${route}`];
  if (time === undefined || time.value === null || !isEstimate(station.U)) return "–";
  const text = formatted(scaled(time, station.U.value), { label: "L11", units: view.units });
  return (
    <NumberButton of={`T_int_${route}`} quantity={time} at={{ kind: "station", view, station }}>
      {withUnit(valueText(text), text.unit)}
    </NumberButton>
  );
}
