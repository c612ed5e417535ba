import type { ReactNode } from "react";
import { labelOf } from "../../core/catalogue.ts";
import type { Quantity } from "../../core/quantity.ts";
import type { Units } from "../../core/unitText.ts";
import { raisedDigits, thinSpace, withUnit } from "../../figures/formatNumber.ts";
import { type FormattedQuantity, formatQuantity, formatScaled } from "../../figures/formatQuantity.ts";
import type { FoundNumber } from "./foundNumber.ts";
import { NumberButton } from "./NumberButton.tsx";
import { RichText } from "./RichText.tsx";

/** How a quantity is to be shown: by its label, or in multiples of a length. */
export interface Manner {
  readonly label: string;
  readonly units: Units;
  /** A length is divided by this and followed by its letter. */
  readonly per?: { readonly length: number; readonly symbol: string };
}

/** The same, and where the number comes from if no result holds it as it is shown. */
interface Cells extends Manner {
  readonly quantity: Quantity;
  readonly at?: FoundNumber;
  /** What stands behind the value: the sign of a doubt. */
  readonly beside?: ReactNode;
  /** In a table of many numbers, which is one stop of the Tab key. */
  readonly cell?: boolean;
}

export function formatted(quantity: Quantity, { label, units, per }: Manner): FormattedQuantity {
  const entry = labelOf(label);
  return per
    ? formatScaled(quantity, { factor: 1 / per.length, unit: per.symbol, digits: entry.digits })
    : formatQuantity(quantity, entry, units);
}

/** "× 10⁻³" behind the value, where it is written in powers of ten. */
export function valueText({ value, power }: FormattedQuantity): string {
  return power === null ? value : `${value}${thinSpace}×${thinSpace}10${raisedDigits(power)}`;
}

/** A value and its interval as two cells of a table; the reason of a gap spans both. */
export function QuantityCells({ quantity, at, beside, cell = false, ...manner }: Cells) {
  const shown = formatted(quantity, manner);
  if (quantity.value === null)
    return (
      <td className="why" colSpan={2}>
        <RichText text={quantity.why} />
      </td>
    );
  return (
    <>
      <td title={String(quantity.value)}>
        <NumberButton of={manner.label} quantity={quantity} at={at} cell={cell}>
          {withUnit(valueText(shown), manner.per ? shown.unit : "")}
        </NumberButton>
        {beside}
      </td>
      <td className="pm">{shown.interval ?? "–"}</td>
    </>
  );
}
