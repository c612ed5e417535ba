import { type FormattedQuantity, formatScaled } from "../../figures/formatQuantity.ts";
import type { RulerCase } from "./rulerProps.ts";

/** n as it is shown beside the lane. */
export function exponentReading({ n }: Pick<RulerCase, "n">): FormattedQuantity {
  return formatScaled(n, { factor: 1, unit: "", digits: 3 });
}

/** x0 as it is shown: in multiples of ell where the case has one, else in the unit of x. */
export function originReading(
  { x0, length, symbol }: Pick<RulerCase, "x0" | "length" | "symbol">,
  units: string,
): FormattedQuantity {
  return length === null
    ? formatScaled(x0, { factor: 1, unit: units, digits: 3 })
    : formatScaled(x0, { factor: 1 / length, unit: symbol, digits: 2 });
}
