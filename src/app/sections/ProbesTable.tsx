import { labelOf } from "../../core/catalogue.ts";
import type { ProbeReading } from "../../core/probeReading.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { Definition } from "./Definition.tsx";
import { QuantityCells } from "./QuantityText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";
import { UnitText } from "./UnitText.tsx";

/** A probe with the station and the case it belongs to. */
export interface FoundProbe {
  readonly view: CaseView;
  readonly station: StationResult;
  readonly probe: ProbeReading;
}

/** Every probe of stations that have several. */
export function probesOf(cases: readonly CaseView[]): FoundProbe[] {
  return cases.flatMap((view) =>
    view.stations.flatMap((station) => (station.probes ?? []).map((probe) => ({ view, station, probe }))),
  );
}

/** Probes at one x, each about its own mean: those that agree are averaged, the others stand apart. */
export function ProbesTable({ probes }: { probes: readonly FoundProbe[] }) {
  if (probes.length === 0) return null;
  const { units } = probes[0].view;
  const speed = unitOf("L/T", units);
  return (
    <TableScroll label="Probes at one position">
      <table className="data dense">
        <thead>
          <tr>
            <th scope="col">Probe</th>
            <th scope="col">
              <i className="sym">y</i>, <i className="sym">z</i>
              {units === "SI" && ` (${unitOf("L", units)})`}
            </th>
            {["U", "u_rms"].map((key) => (
              <th scope="colgroup" colSpan={2} key={key}>
                <Definition of={key}>
                  <SymbolText runs={labelOf(key).symbol} />
                  {speed !== "" && (
                    <>
                      {" "}
                      (<UnitText unit={speed} />)
                    </>
                  )}
                </Definition>
              </th>
            ))}
            <th scope="col">Against the others</th>
          </tr>
        </thead>
        <tbody>
          {probes.map((found, i) => (
            // biome-ignore lint/suspicious/noArrayIndexKey: probes of one file at one x have no name of their own
            <ProbeRow found={found} key={i} />
          ))}
        </tbody>
      </table>
    </TableScroll>
  );
}

function ProbeRow({ found: { view, station, probe } }: { found: FoundProbe }) {
  const at = { kind: "station", view, station } as const;
  const x = withUnit(formatPosition(station.x), unitOf(view.along === "t" ? "T" : "L", view.units));
  return (
    <tr>
      <td>
        <CaseMark mark={view.mark} /> {x}, <span className="well">{probe.file}</span>
      </td>
      <td>{[probe.y, probe.z].map((one) => (one === null ? "–" : formatPosition(one))).join(", ")}</td>
      <QuantityCells quantity={probe.U} label="U" units={view.units} at={at} />
      <QuantityCells quantity={probe.u_rms} label="u_rms" units={view.units} at={at} />
      <td>{verdictOf(probe)}</td>
    </tr>
  );
}

function verdictOf({ agrees, departs }: ProbeReading) {
  if (agrees === null) return "not tested: no errors";
  if (agrees) return "agrees";
  return (
    <>
      differs in{" "}
      {departs.map((name, i) => (
        <span key={name}>
          {i > 0 && " and "}
          <SymbolText runs={labelOf(name).symbol} />
        </span>
      ))}
    </>
  );
}
