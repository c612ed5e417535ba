import type { Quantity } from "../../core/quantity.ts";
import { quantityText } from "../../figures/formatQuantity.ts";
import type { CaseView } from "../session/caseView.ts";
import type { SettingRow } from "./definitionRows.ts";
import { originManner, sameReason } from "./fitNumber.ts";
import { formatted, QuantityCells } from "./QuantityText.tsx";
import { RichText } from "./RichText.tsx";

/** n and x0 with their intervals as four cells; one reason for both spans all four. */
export function PairCells({
  view,
  n,
  x0,
  rows,
}: {
  view: CaseView;
  n: Quantity;
  x0: Quantity;
  /** What the two rest on. */
  rows: readonly SettingRow[];
}) {
  const why = sameReason(n, x0);
  if (why !== null)
    return (
      <td className="why" colSpan={4}>
        <RichText text={why} />
      </td>
    );
  return [
    { quantity: n, manner: { label: "n", units: view.units } },
    { quantity: x0, manner: originManner(view) },
  ].map(({ quantity, manner }) => (
    <QuantityCells
      key={manner.label}
      cell
      quantity={quantity}
      at={{
        kind: "page",
        view,
        shown: quantityText(formatted(quantity, manner)),
        rows: [...rows, ...openSides(quantity)],
      }}
      {...manner}
    />
  ));
}

/** Why an interval has no end on a side. */
function openSides(quantity: Quantity): SettingRow[] {
  if (quantity.value === null) return [];
  const { why_low, why_high } = quantity;
  if (why_low !== undefined && why_low === why_high) return [["no interval", why_low]];
  return [
    ...(why_low === undefined ? [] : [["open below", why_low] as const]),
    ...(why_high === undefined ? [] : [["open above", why_high] as const]),
  ];
}
