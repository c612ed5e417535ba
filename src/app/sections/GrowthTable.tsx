import { labelOf } from "../../core/catalogue.ts";
import type { Growth } from "../../core/decayArgument.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import type { FigureTable } from "../../figures/figureSpec.ts";
import { quantityText } from "../../figures/formatQuantity.ts";
import { endsOf } from "../../figures/stationPoints.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { cellKeys } from "./cellKeys.ts";
import { Definition } from "./Definition.tsx";
import { formatted, QuantityCells } from "./QuantityText.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TableSave } from "./TableSave.tsx";
import { TableScroll } from "./TableScroll.tsx";

const labels = { L11: "m", lambda: "m_lambda", Re_lambda: "m_Re_lambda" } as const;
const implications = { L11: "1 − n/2", lambda: "1/2", Re_lambda: "(1 − n)/2" } as const;

/** Exponents with which the scales grow from the origin, beside what the exponent of the energy implies. */
export function GrowthTable({ cases }: { cases: readonly CaseView[] }) {
  return (
    <>
      <TableScroll label="Growth of the scales">
        <table className="data dense" {...cellKeys}>
          <thead>
            <tr>
              <th scope="col" className="text">
                Growth from the origin
              </th>
              <th scope="colgroup" colSpan={2}>
                exponent
              </th>
              <th scope="colgroup" colSpan={2}>
                implied by <SymbolText runs={labelOf("n").symbol} />
              </th>
              <th scope="col">the two</th>
            </tr>
          </thead>
          {cases.map((view) => (
            <tbody key={view.id}>
              <tr>
                <th scope="rowgroup" colSpan={6}>
                  <CaseMark mark={view.mark} /> {view.name}
                </th>
              </tr>
              {(arguedOf(view)?.argument.growths ?? []).map((growth) => (
                <GrowthRow view={view} growth={growth} key={growth.key} />
              ))}
            </tbody>
          ))}
        </table>
      </TableScroll>
      <TableSave name="growth" table={() => growthTable(cases)} />
    </>
  );
}

function GrowthRow({ view, growth: { key, exponent, implied, agrees } }: { view: CaseView; growth: Growth }) {
  const manner = { label: labels[key], units: view.units };
  const at = (quantity: typeof exponent, text: string) => ({
    kind: "page" as const,
    view,
    shown: quantityText(formatted(quantity, manner)),
    rows: [["made from", text] as const],
  });
  return (
    <tr>
      <th scope="row" className="text">
        <Definition of={labels[key]}>
          <SymbolText runs={labelOf(key).symbol} />
        </Definition>
      </th>
      <QuantityCells
        cell
        quantity={exponent}
        at={at(exponent, "the stations of the window, from the adopted origin")}
        {...manner}
      />
      <QuantityCells
        cell
        quantity={implied}
        at={at(implied, `${implications[key]} with the adopted n, C_epsilon constant`)}
        {...manner}
      />
      <td>{agrees === null ? "–" : agrees ? "agree" : "part beyond their intervals"}</td>
    </tr>
  );
}

function growthTable(cases: readonly CaseView[]): FigureTable {
  const ends = (quantity: Growth["exponent"]) => {
    const { value, low, high } = endsOf(quantity);
    return [value, low, high];
  };
  return {
    heading: [
      "case",
      "scale",
      "exponent",
      "exponent_low",
      "exponent_high",
      "implied",
      "implied_low",
      "implied_high",
    ],
    rows: cases.flatMap((view) =>
      (arguedOf(view)?.argument.growths ?? []).map(({ key, exponent, implied }) => [
        ...[view.name, key, ...ends(exponent), ...ends(implied)],
      ]),
    ),
  };
}
