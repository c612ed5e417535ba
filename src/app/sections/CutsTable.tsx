import { bare } from "../../core/quantity.ts";
import type { RecordCut } from "../../core/recordCut.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatCount, formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Definition } from "./Definition.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** A cut with the station and the case it belongs to. */
export interface FoundCut {
  readonly view: CaseView;
  readonly station: StationResult;
  readonly cut: RecordCut;
}

/** Every cut of every record. */
export function cutsOf(cases: readonly CaseView[]): FoundCut[] {
  return cases.flatMap((view) =>
    view.stations.flatMap((station) => (station.cuts ?? []).map((cut) => ({ view, station, cut }))),
  );
}

const kinds = {
  backward: "time runs back: the older run is left out",
  gap: "gap: nothing is correlated across",
  missing: "samples without a value",
  repeated: "sent twice: the newer one is kept",
} as const;

/** Every place at which a record is not read on as it stands, and what was made of it. */
export function CutsTable({ cuts }: { cuts: readonly FoundCut[] }) {
  if (cuts.length === 0) return null;
  const time = unitOf("T", cuts[0].view.units);
  const more = [...new Set(cuts.map(({ station }) => station))].reduce(
    (sum, station) => sum + (station.cuts_more ?? 0),
    0,
  );
  return (
    <TableScroll label="Cuts and gaps">
      <table className="data dense">
        <thead>
          <tr>
            <th scope="col">Record</th>
            <th scope="col" className="text">
              Cut
            </th>
            <th scope="col">Sample</th>
            <th scope="col">
              <Definition of="cut">From, to{time !== "" && ` (${time})`}</Definition>
            </th>
            <th scope="col">
              <Definition of="cutSamples">Samples</Definition>
            </th>
          </tr>
        </thead>
        <tbody>
          {cuts.map((found) => (
            <CutRow
              found={found}
              key={`${found.view.id} ${found.station.x} ${found.cut.file} ${found.cut.at}`}
            />
          ))}
        </tbody>
      </table>
      {more > 0 && <p className="reason">{formatCount(more)} more are not listed.</p>}
    </TableScroll>
  );
}

function CutRow({ found: { view, station, cut } }: { found: FoundCut }) {
  const { file, y, z, at, kind, from, to, samples } = cut;
  const place = [y, z].some((one) => one !== null)
    ? `, ${[y, z].map((one) => (one === null ? "–" : formatPosition(one))).join(", ")}`
    : "";
  const x = withUnit(formatPosition(station.x), unitOf(view.along === "t" ? "T" : "L", view.units));
  const number = (of: string, value: number, shown: string) => (
    <NumberButton
      of={of}
      quantity={bare(value, "read off the record")}
      at={{
        kind: "page",
        view,
        shown,
        rows: [
          ["record", `${file}${place}, at ${x}`],
          ["what", kinds[kind]],
        ],
      }}
    >
      {shown}
    </NumberButton>
  );
  return (
    <tr>
      <td>
        <CaseMark mark={view.mark} /> {x}, <span className="well">{file}</span>
        {place}
      </td>
      <td className="text wrap">{kinds[kind]}</td>
      <td>{number("cutSamples", at, formatCount(at))}</td>
      <td>{number("cut", to, `${formatDigits(from, 7)} to ${formatDigits(to, 7)}`)}</td>
      <td>{number("cutSamples", samples, formatCount(samples))}</td>
    </tr>
  );
}
