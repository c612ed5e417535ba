import type { Quantity } from "../../core/quantity.ts";
import { type FormattedQuantity, quantityText } from "../../figures/formatQuantity.ts";
import { bodyNumber, type PlacedBody } from "./bodyRows.ts";
import type { SettingRow } from "./definitionRows.ts";
import { NumberButton } from "./NumberButton.tsx";
import { valueText } from "./QuantityText.tsx";
import { RichText } from "./RichText.tsx";

/** A number at the body and its interval, with its definition behind it; or the reason of the gap over both cells. */
export function BodyCells({
  one,
  of,
  quantity,
  shown,
  rows,
}: {
  one: PlacedBody;
  /** Key of its label. */
  of: string;
  quantity: Quantity;
  shown: FormattedQuantity;
  rows: readonly SettingRow[];
}) {
  if (quantity.value === null)
    return (
      <td className="why" colSpan={2}>
        <RichText text={quantity.why} />
      </td>
    );
  const bare = shown.interval === null && shown.why !== undefined ? shown.why : null;
  const all: readonly SettingRow[] = bare === null ? rows : [...rows, ["no interval", bare]];
  return (
    <>
      <td title={String(quantity.value)}>
        <NumberButton of={of} quantity={quantity} at={bodyNumber(one, quantityText(shown), all)}>
          {valueText(shown)}
        </NumberButton>
      </td>
      <td className="pm" title={bare ?? undefined}>
        {shown.interval ?? "–"}
      </td>
    </>
  );
}
