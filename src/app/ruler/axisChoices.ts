import type { Axis } from "../../sheet/workspace.ts";
import type { RulerCase } from "./rulerProps.ts";
import { dividesByLength } from "./rulerScale.ts";
import { spokenUnit } from "./spokenText.ts";

export interface AxisChoice {
  readonly axis: Axis;
  /** Symbol of ell where distances are divided by it. */
  readonly over: string | null;
  /** Unit in brackets, where the numbers have one. */
  readonly unit: string | null;
  readonly spoken: string;
}

/** The axes that have a meaning for these cases: x/ell needs a length, x - x0 a virtual origin. */
export function axisChoices(cases: readonly RulerCase[], units: string, along: "x" | "t"): AxisChoice[] {
  const over = dividesByLength(cases) ? commonSymbol(cases) : null;
  const unit = units === "" ? null : units;
  const inUnit = unit === null ? "" : ` in ${spokenUnit(unit)}`;
  const choices: AxisChoice[] = [{ axis: "x", over: null, unit, spoken: `${along}${inUnit}` }];
  if (over !== null) choices.push({ axis: "x/ell", over, unit: null, spoken: `${along} over ${over}` });
  if (cases.some(({ law, x0 }) => law !== null && x0.value !== null)) {
    const spoken = `${along} minus ${along}0`;
    choices.push(
      over === null
        ? { axis: "(x-x0)/ell", over, unit, spoken: `${spoken}${inUnit}` }
        : { axis: "(x-x0)/ell", over, unit: null, spoken: `${spoken}, over ${over}` },
    );
  }
  return choices;
}

/** One letter for all where the cases agree, else the trade's general one. */
function commonSymbol(cases: readonly RulerCase[]): string {
  const symbols = new Set(cases.map(({ symbol }) => symbol));
  return symbols.size === 1 ? cases[0].symbol : "ℓ";
}
