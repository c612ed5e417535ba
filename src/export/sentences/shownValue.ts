import { labelOf } from "../../core/catalogue.ts";
import type { Quantity } from "../../core/quantity.ts";
import { withReference } from "../../core/symbolRuns.ts";
import type { Units } from "../../core/unitText.ts";
import { formatPosition, raisedDigits, thinSpace, withUnit } from "../../figures/formatNumber.ts";
import { type FormattedQuantity, formatQuantity, formatScaled } from "../../figures/formatQuantity.ts";
import { type Piece, type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";

/** A symbol of the catalogue, set in its place. */
export function symbolOf(key: string): Piece {
  return { kind: "symbol", runs: labelOf(key).symbol };
}

/** A case by its marker and name. */
export function caseOf({ mark, name }: SentenceCase): Piece {
  return { kind: "case", mark, name };
}

/** A value in weight 600 and its interval in grey: "13.2 mm (12.5 to 13.9)". */
export function valueWithInterval(quantity: Quantity, key: string, units: Units): Sentence {
  return shown(formatQuantity(quantity, labelOf(key), units), { key, quantity });
}

/** The same, opened by the symbol: "n = 1.25 (1.20 to 1.31)". */
export function equation(quantity: Quantity, key: string, units: Units): Sentence {
  return equated(symbolOf(key), valueWithInterval(quantity, key, units));
}

/** A length in multiples of the reference length, or in its own unit where the case has none. */
export function lengthValue(quantity: Quantity, of: SentenceCase): Sentence {
  const key = of.along === "t" ? "t0" : "x0";
  if (of.length === null) return valueWithInterval(quantity, key, of.units);
  const { unit, ...plain } = formatScaled(quantity, { factor: 1 / of.length, unit: of.symbol });
  return shown({ ...plain, unit: "" }, { key, quantity }, [
    { kind: "text", text: thinSpace },
    { kind: "symbol", runs: withReference([{ text: "ℓ" }], unit) },
  ]);
}

/** "symbol = value" never breaks; its interval may stand on the next line. */
export function equated(symbol: Piece, [value, ...rest]: Sentence): Sentence {
  return [{ kind: "together", pieces: [symbol, { kind: "text", text: " = " }, value] }, ...rest];
}

/** A position with its unit: "0.30 m". */
export function position(x: number, { units, along }: Pick<SentenceCase, "units" | "along">): string {
  return withUnit(formatPosition(x), units === "SI" ? (along === "t" ? "s" : "m") : "");
}

/** "0.30 to 1.80 m". */
export function stretch(window: readonly [number, number], of: SentenceCase): Piece {
  return { kind: "text", text: `${formatPosition(window[0])} to ${position(window[1], of)}` };
}

/** The symbol of the coordinate. */
export function coordinate({ along }: Pick<SentenceCase, "along">): Piece {
  return symbolOf(along ?? "x");
}

/** A tolerance or a share: "10 %". */
export function percent(share: number): string {
  return withUnit(String(Number((100 * share).toPrecision(2))), "%");
}

function shown(
  formatted: FormattedQuantity,
  about: { key: string; quantity: Quantity },
  after: Sentence = [],
): Sentence {
  const { value, interval, unit, power } = formatted;
  const times = power === null ? "" : `${thinSpace}×${thinSpace}10${raisedDigits(power)}`;
  const strong: Piece = { kind: "strong", text: withUnit(value + times, unit), about };
  const whole: Piece = after.length === 0 ? strong : { kind: "together", pieces: [strong, ...after] };
  return interval === null ? [whole] : say`${whole} ${{ kind: "interval", text: `(${interval})` }}`;
}
