import { labelOf } from "../../core/catalogue.ts";
import { type ComparedQuantity, type Comparison, comparedQuantities } from "../../core/comparison.ts";
import { formatProbability } from "../../figures/formatNumber.ts";
import { formatScaled } from "../../figures/formatQuantity.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { ComparedNumber } from "./ComparedNumber.tsx";
import { comparedPlaceText } from "./comparedPlaceText.ts";
import { Definition } from "./Definition.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { RichText } from "./RichText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** Every ratio of every pair over its common range, with what it comes to at the chosen tolerance. */
export function CompareTable({
  cases,
  comparisons,
}: {
  cases: readonly CaseView[];
  comparisons: readonly Comparison[];
}) {
  return (
    <TableScroll label="Ratios">
      <table className="data dense">
        <thead>
          <tr>
            <th scope="colgroup" colSpan={2} className="text">
              Quantity
            </th>
            <th scope="col" className="text">
              Case
            </th>
            <th scope="colgroup" colSpan={2}>
              <Definition of="ratio">Ratio, 95{"\u202f"}%</Definition>
            </th>
            <th scope="col">
              <Definition of="largest">Largest</Definition>
            </th>
            <th scope="col">Verdict</th>
            <th scope="col">
              <Definition of="p_equivalent">
                <i>p</i>
              </Definition>
            </th>
            <th scope="col">
              <Definition of="equivalent_from">Equivalent from</Definition>
            </th>
          </tr>
        </thead>
        <tbody>
          {comparedQuantities.flatMap((key) =>
            comparisons.map((comparison, i) => (
              <RatioRow
                cases={cases}
                comparison={comparison}
                of={key}
                named={i === 0}
                key={key + comparison.cases[1]}
              />
            )),
          )}
        </tbody>
      </table>
    </TableScroll>
  );
}

function RatioRow({
  cases,
  comparison,
  of,
  named,
}: {
  cases: readonly CaseView[];
  comparison: Comparison;
  of: ComparedQuantity;
  named: boolean;
}) {
  const found = comparison.quantities[of];
  const { ratio, largest, verdict } = found;
  const label = labelOf(of);
  const second = cases.find(({ name }) => name === comparison.cases[1]);
  return (
    <tr>
      <th scope="row" className="text">
        {named ? label.name : <span className="visually-hidden">{label.name}</span>}
      </th>
      <td className="text">
        {named && (
          <Definition of={of}>
            <SymbolText runs={label.symbol} />
          </Definition>
        )}
      </td>
      <td className="text">
        {second && <CaseMark mark={second.mark} />} {comparison.cases[1]}
      </td>
      {ratio.value === null ? (
        <td className="why" colSpan={6}>
          <RichText text={ratio.why} />
        </td>
      ) : (
        <>
          <td title={String(ratio.value)}>
            <NumberButton of="ratio" quantity={ratio}>
              {formatScaled(ratio, asRatio).value}
            </NumberButton>
          </td>
          <td className="pm">{formatScaled(ratio, asRatio).interval ?? "–"}</td>
          <td>
            <NumberButton of="largest" quantity={largest}>
              {formatScaled(largest, asRatio).value}
            </NumberButton>
          </td>
          <td className={`verdict ${verdict ?? ""}`}>{verdict ?? "–"}</td>
          <VerdictProbability cases={cases} comparison={comparison} of={of} />
          <td>
            {found.equivalent_from === null ? (
              "nowhere"
            ) : (
              <ComparedNumber
                of="equivalent_from"
                value={found.equivalent_from}
                text={comparedPlaceText(found.equivalent_from, comparison, cases)}
                cases={cases}
                comparison={comparison}
              />
            )}
          </td>
        </>
      )}
    </tr>
  );
}

/** The p of the claim that came nearer to being made. */
function VerdictProbability({
  cases,
  comparison,
  of,
}: {
  cases: readonly CaseView[];
  comparison: Comparison;
  of: ComparedQuantity;
}) {
  const { p_equivalent, p_different } = comparison.quantities[of];
  if (p_equivalent === null || p_different === null) return <td>–</td>;
  const key = p_different < p_equivalent ? "p_different" : "p_equivalent";
  const p = Math.min(p_equivalent, p_different);
  return (
    <td>
      <ComparedNumber of={key} value={p} text={formatProbability(p)} cases={cases} comparison={comparison} />
    </td>
  );
}

/** A ratio has neither unit nor per cent, whatever its quantity has. */
const asRatio = { factor: 1, unit: "", digits: 3 };
