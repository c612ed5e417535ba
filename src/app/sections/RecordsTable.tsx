import type { ReactNode } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { isEstimate } from "../../core/quantity.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatCount, formatDigits, formatNumber, withUnit } from "../../figures/formatNumber.ts";
import { positionDecimals } from "../../figures/positionDecimals.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Definition } from "./Definition.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { overStations, stationCount } from "./overStations.ts";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** What was read, a row for each case; on a narrow screen a list that says the same. */
export function RecordsTable({ cases, narrow }: { cases: readonly CaseView[]; narrow: boolean }) {
  return narrow ? <RecordsList cases={cases} /> : <WideTable cases={cases} />;
}

function WideTable({ cases }: { cases: readonly CaseView[] }) {
  const units = cases[0].of.sheet.units;
  return (
    <TableScroll label="Cases">
      <table className="data">
        <thead>
          <tr>
            <th scope="col">Case</th>
            <th scope="col" className="text">
              Layout
            </th>
            <th scope="col">
              <Definition of="stations">Stations</Definition>
            </th>
            <Head of={placeKey(cases[0])} unit={unitOf(placeDimension(cases[0]), units)} />
            <Head of="U" unit={unitOf("L/T", units)} />
            <Head of="integralTimes" unit="" />
            <Head of="k1max_eta" unit="" />
            <th scope="col" className="text">
              Flags
            </th>
          </tr>
        </thead>
        <tbody>
          {cases.map((view) => (
            <tr key={view.id}>
              <th scope="row">
                <CaseMark mark={view.mark} line /> {view.name}
              </th>
              <td className="text">{layoutOf(view)}</td>
              <td>
                <NumberButton {...stationCount(view)}>{view.stations.length}</NumberButton>
              </td>
              <Cell view={view} of={placeKey(view)} shown={placesOf(view)} value={({ x }) => x} />
              <Cell view={view} of="U" shown={speedOf(view)} value={({ U }) => U.value} />
              <Cell
                view={view}
                of="integralTimes"
                shown={lengthsOf(view)}
                value={({ facts }) => facts.integralTimes}
              />
              <Cell
                view={view}
                of="k1max_eta"
                shown={resolutionOf(view)}
                value={({ facts }) => facts.k1max_eta}
              />
              <td className="text">{flagsOf(view)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </TableScroll>
  );
}

function RecordsList({ cases }: { cases: readonly CaseView[] }) {
  return (
    <ul className="records-list">
      {cases.map((view) => {
        const { units } = view.of.sheet;
        const xs = placesOf(view);
        return (
          <li key={view.id}>
            <CaseMark mark={view.mark} line />
            <span>
              <b>{view.name}</b>, {layoutOf(view)}, {stationsText(view.stations.length)},{" "}
              <span className="nowrap">
                <StationsNumber view={view} of={placeKey(view)} shown={xs} value={({ x }) => x} />
                {withUnit("", unitOf(placeDimension(view), units))}
              </span>
              <br />
              <SymbolText runs={labelOf("U").symbol} /> ={" "}
              <StationsNumber view={view} of="U" shown={speedOf(view)} value={({ U }) => U.value} />
              {withUnit("", unitOf("L/T", units))}
              {lengthsOf(view) !== "–" && (
                <>
                  ; records of{" "}
                  <StationsNumber
                    view={view}
                    of="integralTimes"
                    shown={lengthsOf(view)}
                    value={({ facts }) => facts.integralTimes}
                  />{" "}
                  <SymbolText runs={labelOf("T_int").symbol} />
                </>
              )}
            </span>
          </li>
        );
      })}
    </ul>
  );
}

/** A number for all stations at once; its definition says which gave the least and the greatest. */
function Cell({ view, of, shown, value }: CellProps) {
  return (
    <td>
      <StationsNumber view={view} of={of} shown={shown} value={value} />
    </td>
  );
}

interface CellProps {
  readonly view: CaseView;
  readonly of: string;
  readonly shown: string;
  readonly value: (station: StationResult) => number | null;
}

function StationsNumber({ view, of, shown, value }: CellProps) {
  if (shown === "–") return shown;
  return <NumberButton {...overStations(view, of, shown, value)}>{shown}</NumberButton>;
}

function Head({ of, unit }: { of: string; unit: string }) {
  return (
    <th scope="col">
      <Definition of={of}>
        <SymbolText runs={labelOf(of).symbol} />
        {unit !== "" && ` (${unit})`}
      </Definition>
    </th>
  );
}

/** Stations of a decay in time stand at times. */
const placeKey = ({ along }: CaseView) => (along === "t" ? "t" : "x");
const placeDimension = ({ along }: CaseView) => (along === "t" ? "T" : "L");

const layoutNames = { series: "probe series", lines: "line samples", profile: "profile" } as const;

function layoutOf({ of, stations }: CaseView): ReactNode {
  const components = stations[0]?.facts.components ?? [];
  return (
    <>
      {layoutNames[of.sheet.layout]}
      {components.length > 0 && ", "}
      {components.length > 0 && <span className="sym">{components.join(" ")}</span>}
    </>
  );
}

/** "0.15 to 1.80"; one number where they are all alike. */
function rangeOf(values: readonly number[], decimals: number): string {
  if (values.length === 0) return "–";
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const text = (value: number) =>
    Math.abs(value) >= 1000 ? formatCount(roundTo(value, 2)) : formatNumber(value, decimals);
  return text(low) === text(high) ? text(low) : `${text(low)} to ${text(high)}`;
}

function placesOf({ stations }: CaseView): string {
  const xs = stations.map((station) => station.x);
  return rangeOf(xs, positionDecimals(xs));
}

function roundTo(value: number, digits: number): number {
  return Number(value.toPrecision(digits));
}

function speedOf({ stations }: CaseView): string {
  const speeds = stations.map((station) => station.U).filter(isEstimate);
  if (speeds.length === 0) return "–";
  return formatDigits(speeds.reduce((sum, speed) => sum + speed.value, 0) / speeds.length, 3);
}

const stationsText = (count: number) => `${count} station${count === 1 ? "" : "s"}`;

const facts = (stations: readonly StationResult[], key: "integralTimes" | "k1max_eta") =>
  stations.map((station) => station.facts[key]).filter((value) => value !== null);

const lengthsOf = ({ stations }: CaseView) =>
  rangeOf(
    facts(stations, "integralTimes").map((times) => roundTo(times, 2)),
    0,
  );

/** The least along the case: what limits the gradients. */
function resolutionOf({ stations }: CaseView): string {
  const values = facts(stations, "k1max_eta");
  return values.length === 0 ? "–" : formatDigits(Math.min(...values), 2);
}

function flagsOf({ stations, decay, reduced }: CaseView): string {
  const flagged = stations.filter((station) => station.flags.length > 0).length;
  const others = (decay?.flags.length ?? 0) + (reduced?.flags.length ?? 0);
  const parts = [
    flagged > 0 ? `${flagged} at stations` : null,
    others > 0 ? `${others} of the case` : null,
  ].filter((part) => part !== null);
  return parts.length === 0 ? "none" : parts.join(", ");
}
