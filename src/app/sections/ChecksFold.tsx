import { unitOf } from "../../core/unitText.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import { quantityText } from "../../figures/formatQuantity.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Fold } from "./Fold.tsx";
import { formatted } from "./QuantityText.tsx";
import { RichText } from "./RichText.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** Every check of every record that found something, and probes at one x that were held against each other. */
export function ChecksFold({ cases }: { cases: readonly CaseView[] }) {
  const found = cases.flatMap((view) =>
    view.stations.flatMap((station) => station.flags.map((flag) => ({ view, station, flag }))),
  );
  const probes = cases.flatMap((view) =>
    view.stations.flatMap((station) => (station.probes ?? []).map((probe) => ({ view, station, probe }))),
  );
  if (found.length === 0 && probes.length === 0) return null;
  return (
    <Fold name="Checks of the records" fact={`${found.length} found`}>
      {found.length > 0 && (
        <TableScroll label="Checks">
          <table className="data dense">
            <thead>
              <tr>
                <th scope="col">Station</th>
                <th scope="col" className="text">
                  Found
                </th>
                <th scope="col">Figure</th>
              </tr>
            </thead>
            <tbody>
              {found.map(({ view, station, flag }) => (
                <tr key={`${view.id} ${station.x} ${flag.code} ${flag.text}`}>
                  <td>
                    <CaseMark mark={view.mark} /> {placeOf(view, station.x)}
                  </td>
                  <td className="text wrap">
                    <RichText text={flag.text} />
                  </td>
                  <td>{flag.value === undefined ? "–" : formatDigits(flag.value, 3)}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </TableScroll>
      )}
      {probes.length > 0 && (
        <TableScroll label="Probes at one position">
          <table className="data dense">
            <thead>
              <tr>
                <th scope="col">Probe</th>
                <th scope="col">y, z</th>
                <th scope="col">U</th>
                <th scope="col">u′</th>
              </tr>
            </thead>
            <tbody>
              {probes.map(({ view, station, probe }, i) => (
                // biome-ignore lint/suspicious/noArrayIndexKey: probes of one file at one x have no name of their own
                <tr key={i}>
                  <td>
                    <CaseMark mark={view.mark} /> {placeOf(view, station.x)}, {probe.file}
                  </td>
                  <td>
                    {[probe.y, probe.z].map((at) => (at === null ? "–" : formatPosition(at))).join(", ")}
                  </td>
                  <td>{quantityText(formatted(probe.U, { label: "U", units: view.units }))}</td>
                  <td>{quantityText(formatted(probe.u_rms, { label: "U", units: view.units }))}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </TableScroll>
      )}
    </Fold>
  );
}

const placeOf = ({ along, units }: CaseView, x: number) =>
  withUnit(formatPosition(x), unitOf(along === "t" ? "T" : "L", units));
