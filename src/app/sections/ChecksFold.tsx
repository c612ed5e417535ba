import { bare } from "../../core/quantity.ts";
import { unitOf } from "../../core/unitText.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { CutsTable, cutsOf } from "./CutsTable.tsx";
import { Fold } from "./Fold.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { ProbesTable, probesOf } from "./ProbesTable.tsx";
import { RichText } from "./RichText.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** Every check of every record that found something, every cut of one, and probes at one x held against each other. */
export function ChecksFold({ cases }: { cases: readonly CaseView[] }) {
  const found = cases.flatMap((view) =>
    view.stations.flatMap((station) => station.flags.map((flag) => ({ view, station, flag }))),
  );
  const cuts = cutsOf(cases);
  const probes = probesOf(cases);
  if (found.length === 0 && probes.length === 0 && cuts.length === 0) return null;
  const facts = [
    `${found.length} found`,
    ...(cuts.length === 0 ? [] : [cuts.length === 1 ? "1 cut" : `${cuts.length} cuts`]),
  ];
  return (
    <Fold name="Checks of the records" fact={facts.join(", ")}>
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
                  <td>
                    {flag.value === undefined ? (
                      "–"
                    ) : (
                      <FlagFigure view={view} text={flag.text} value={flag.value} />
                    )}
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </TableScroll>
      )}
      <CutsTable cuts={cuts} />
      <ProbesTable probes={probes} />
    </Fold>
  );
}

function FlagFigure({ view, text, value }: { view: CaseView; text: string; value: number }) {
  const shown = formatDigits(value, 3);
  return (
    <NumberButton
      of="flagFigure"
      quantity={bare(value, "a check is decided by the number itself")}
      at={{ kind: "page", view, shown, rows: [["check", text]] }}
    >
      {shown}
    </NumberButton>
  );
}

const placeOf = ({ along, units }: CaseView, x: number) =>
  withUnit(formatPosition(x), unitOf(along === "t" ? "T" : "L", units));
