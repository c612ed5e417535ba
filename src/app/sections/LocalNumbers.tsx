import { labelOf } from "../../core/catalogue.ts";
import { bare } from "../../core/quantity.ts";
import { unitOf } from "../../core/unitText.ts";
import type { PickedCurve } from "../../figures/figureSpec.ts";
import { formatNumber, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { cellKeys } from "./cellKeys.ts";
import { Definition } from "./Definition.tsx";
import { type LocalReading, localReadings } from "./localReadings.ts";
import { NumberButton } from "./NumberButton.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** A picked station of a case of the page. */
export interface PickedOfCase extends PickedCurve {
  readonly of: CaseView;
}

const columns = [
  ["local_slope", "slope"],
  ["E22_over_isotropic", "E22"],
  ["E33_over_isotropic", "E33"],
] as const;
const noInterval = "a band of the spectrum, whose neighbours make its slope: no interval is formed";

/** Local slope and isotropy of the picked spectra at some scales, in numbers. */
export function LocalNumbers({ curves }: { curves: readonly PickedOfCase[] }) {
  const shown = curves
    .map((one) => ({ one, readings: localReadings(one) }))
    .filter(({ readings }) => readings.length > 0);
  if (shown.length === 0) return null;
  return (
    <TableScroll label="Local slope and isotropy in numbers">
      <table className="data dense stations-table" {...cellKeys}>
        <thead>
          <tr>
            <th scope="col">
              <Definition of="k1_L11">
                <SymbolText runs={labelOf("k1_L11").symbol} />
              </Definition>
            </th>
            {columns.map(([key]) => (
              <th scope="col" key={key}>
                <Definition of={key}>
                  <SymbolText runs={labelOf(key).symbol} />
                </Definition>
              </th>
            ))}
          </tr>
        </thead>
        {shown.map(({ one, readings }) => (
          <StationRows one={one} readings={readings} key={one.letter} />
        ))}
      </table>
    </TableScroll>
  );
}

function StationRows({ one, readings }: { one: PickedOfCase; readings: readonly LocalReading[] }) {
  const { of: view, station, letter } = one;
  const place = withUnit(formatPosition(station.x), unitOf(view.along === "t" ? "T" : "L", view.units));
  return (
    <tbody>
      <tr>
        <th scope="rowgroup" className="text" colSpan={columns.length + 1}>
          <i className="sym">{letter}</i> <CaseMark mark={view.mark} /> {view.name}, {place}
        </th>
      </tr>
      {readings.map((reading) => (
        <tr key={reading.at}>
          <td>{reading.at}</td>
          {columns.map(([key, name]) => {
            const value = reading[name];
            return (
              <td key={key}>
                {value === null ? (
                  "–"
                ) : (
                  <NumberButton
                    of={key}
                    quantity={bare(value, noInterval)}
                    at={{ kind: "station", view, station }}
                    cell
                  >
                    {formatNumber(value, 2)}
                  </NumberButton>
                )}
              </td>
            );
          })}
        </tr>
      ))}
    </tbody>
  );
}
