import { labelOf } from "../../core/catalogue.ts";
import type { Comparison } from "../../core/comparison.ts";
import { formatScaled } from "../../figures/formatQuantity.ts";
import type { CaseView } from "../session/caseView.ts";
import { comparedPlaceText } from "./comparedPlaceText.ts";
import { Definition } from "./Definition.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** The stretches of one pair's common range, and which of them are equivalent in all quantities that have to agree. */
export function StretchTable({ cases, comparison }: { cases: readonly CaseView[]; comparison: Comparison }) {
  const { equivalent_beyond: beyond } = comparison;
  if (beyond.stretches.length === 0) return beyond.why === null ? null : <p>{beyond.why}.</p>;
  return (
    <TableScroll label={`Stretches of ${comparison.cases[1]}`}>
      <table className="data dense">
        <thead>
          <tr>
            <th scope="col">
              <Definition of={placeKey[comparison.align]}>From</Definition>
            </th>
            <th scope="col">To</th>
            <th scope="col" className="text">
              <Definition of="equivalent_from">Equivalent</Definition>
            </th>
            <th scope="col" className="text">
              Least room
            </th>
            <th scope="colgroup" colSpan={2}>
              <Definition of="ratio">Ratio, 95{"\u202f"}%</Definition>
            </th>
          </tr>
        </thead>
        <tbody>
          {beyond.stretches.map(({ from, to, equivalent, narrowest }) => (
            <tr key={from}>
              <td>{comparedPlaceText(from, comparison, cases)}</td>
              <td>{comparedPlaceText(to, comparison, cases)}</td>
              <td className="text">{equivalent ? "yes" : "not shown"}</td>
              {narrowest === null ? (
                <td className="why" colSpan={3}>
                  a quantity is not carried here, or has no errors
                </td>
              ) : (
                <>
                  <td className="text">
                    <SymbolText runs={labelOf(narrowest.quantity).symbol} />
                  </td>
                  <td>
                    <NumberButton of="ratio" quantity={narrowest.ratio}>
                      {formatScaled(narrowest.ratio, asRatio).value}
                    </NumberButton>
                  </td>
                  <td className="pm">{formatScaled(narrowest.ratio, asRatio).interval ?? "–"}</td>
                </>
              )}
            </tr>
          ))}
        </tbody>
      </table>
    </TableScroll>
  );
}

/** Label of what the stretches lie on. */
const placeKey = { x0: "(x-x0)/ell", x: "x", Tu: "Tu" } as const;

const asRatio = { factor: 1, unit: "", digits: 3 };
