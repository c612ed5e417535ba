import { formatNumber } from "../../figures/formatNumber.ts";
import { type FormattedQuantity, formatScaled } from "../../figures/formatQuantity.ts";
import type { RulerCase } from "./rulerProps.ts";

/** n as it is shown beside the lane. */
export function exponentReading({ n }: Pick<RulerCase, "n">): FormattedQuantity {
  return formatScaled(n, { factor: 1, unit: "", digits: 3 });
}

/** x0 as it is shown: in multiples of ell where the case has one, else in the unit of x. */
export function originReading(
  { x0, length, symbol, originHeld }: Pick<RulerCase, "x0" | "length" | "symbol" | "originHeld">,
  units: string,
): FormattedQuantity {
  if (length === null) return formatScaled(x0, { factor: 1, unit: units, digits: 3 });
  const shown = formatScaled(x0, { factor: 1 / length, unit: symbol, digits: 2 });
  // A held origin moves by tenths of ell and has no interval to take its decimals from.
  return originHeld && x0.value !== null && shown.power === null
    ? { ...shown, value: formatNumber(x0.value / length, 1) }
    : shown;
}
