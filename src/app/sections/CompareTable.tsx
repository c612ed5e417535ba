import { labelOf } from "../../core/catalogue.ts";
import { type ComparedQuantity, type Comparison, comparedQuantities } from "../../core/comparison.ts";
import { formatScaled } from "../../figures/formatQuantity.ts";
import { Definition } from "./Definition.tsx";
import { RichText } from "./RichText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableScroll } from "./TableScroll.tsx";

/** Ratios of two cases over their common range, with what they come to at the chosen tolerance. */
export function CompareTable({ comparison }: { comparison: Comparison }) {
  return (
    <TableScroll label="Ratios">
      <table className="data">
        <thead>
          <tr>
            <th scope="colgroup" colSpan={2} className="text">
              Quantity
            </th>
            <th scope="colgroup" colSpan={2}>
              Ratio, 95{"\u202f"}%
            </th>
            <th scope="col">Largest</th>
            <th scope="col">Verdict</th>
          </tr>
        </thead>
        <tbody>
          {comparedQuantities.map((key) => (
            <RatioRow comparison={comparison} of={key} key={key} />
          ))}
        </tbody>
      </table>
    </TableScroll>
  );
}

function RatioRow({ comparison, of }: { comparison: Comparison; of: ComparedQuantity }) {
  const { ratio, largest, verdict } = comparison.quantities[of];
  const label = labelOf(of);
  const shown = formatScaled(ratio, asRatio);
  return (
    <tr>
      <th scope="row" className="text">
        {label.name}
      </th>
      <td className="text">
        <Definition of={of}>
          <SymbolText runs={label.symbol} />
        </Definition>
      </td>
      {ratio.value === null ? (
        <td className="why" colSpan={4}>
          <RichText text={ratio.why} />
        </td>
      ) : (
        <>
          <td title={String(ratio.value)}>{shown.value}</td>
          <td className="pm">{shown.interval ?? "–"}</td>
          <td>{formatScaled(largest, asRatio).value}</td>
          <td className={`verdict ${verdict ?? ""}`}>{verdict ?? "–"}</td>
        </>
      )}
    </tr>
  );
}

/** A ratio has neither unit nor per cent, whatever its quantity has. */
const asRatio = { factor: 1, unit: "", digits: 3 };
