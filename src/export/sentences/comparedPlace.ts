import { labelOf } from "../../core/catalogue.ts";
import type { Comparison } from "../../core/comparison.ts";
import { bare } from "../../core/quantity.ts";
import { withReference } from "../../core/symbolRuns.ts";
import { formatDigits } from "../../figures/formatNumber.ts";
import { type Piece, type Sentence, say } from "./piece.ts";
import type { SentenceCase } from "./sentenceCase.ts";
import { coordinate, equated, position, symbolOf, valueWithInterval } from "./shownValue.ts";

type Compared = readonly [SentenceCase, SentenceCase];

/** A place on what two cases are laid over one another by: "(x − x0)/M = 20", "x = 0.50 m", "Tu = 3.2 %". */
export function comparedPlace(at: number, { align }: Pick<Comparison, "align">, cases: Compared): Sentence {
  const [first] = cases;
  if (align === "Tu") return equated(symbolOf("Tu"), valueWithInterval(bare(at, ""), "Tu", first.units));
  if (align === "x") return equated(coordinate(first), [{ kind: "text", text: position(at, first) }]);
  return equated(distanceSymbol(cases), [{ kind: "text", text: distanceText(at, cases) }]);
}

/** Lengths that are compared are multiples of the reference length where both cases have one. */
export function comparedInLengths([first, second]: Compared): boolean {
  return first.length !== null && second.length !== null;
}

function distanceSymbol(cases: Compared): Piece {
  const [first] = cases;
  const key = comparedInLengths(cases) ? "(x-x0)/ell" : "x-x0";
  const label = labelOf(first.along === "t" ? key.replaceAll("x", "t") : key);
  return { kind: "symbol", runs: withReference(label.symbol, first.symbol) };
}

function distanceText(at: number, cases: Compared): string {
  return comparedInLengths(cases)
    ? formatDigits(at, at >= 100 ? 3 : 2)
    : position(Number(at.toPrecision(3)), cases[0]);
}

/** "0.18 to 0.60 m", "8.0 to 67". */
export function comparedRange(
  [from, to]: readonly [number, number],
  comparison: Comparison,
  cases: Compared,
): Sentence {
  const [start, ...rest] = comparedPlace(from, comparison, cases);
  const end = comparedPlace(to, comparison, cases);
  const last = end.flatMap((piece) => (piece.kind === "together" ? piece.pieces.slice(2) : []));
  return say`${[start, ...rest]} to ${last}`;
}
