import type { Run } from "../../core/catalogue.ts";
import type { Quantity } from "../../core/quantity.ts";
import { raisedDigits } from "../../figures/formatNumber.ts";

/** A piece of a sentence, so that the page can set values, intervals, symbols and cases each in its way. */
export type Piece =
  | { readonly kind: "text"; readonly text: string }
  /** A value or a verdict, set in weight 600. */
  | {
      readonly kind: "strong";
      readonly text: string;
      /** The number it prints: its label's key and the very quantity, for the definition behind it. */
      readonly about?: { readonly key: string; readonly quantity: Quantity };
    }
  /** A 95 % interval with its brackets, set in grey. */
  | { readonly kind: "interval"; readonly text: string }
  | { readonly kind: "symbol"; readonly runs: readonly Run[] }
  /** A case by its marker and name. */
  | { readonly kind: "case"; readonly mark: number; readonly name: string }
  /** A part of a file as it stands there. */
  | { readonly kind: "verbatim"; readonly text: string }
  /** Never broken across lines. */
  | { readonly kind: "together"; readonly pieces: readonly Piece[] };

export type Sentence = readonly Piece[];

/** A sentence from a template: strings become text, pieces and sentences are set in place. */
export function say(
  strings: TemplateStringsArray,
  ...values: readonly (string | Piece | Sentence)[]
): Sentence {
  const pieces: Piece[] = [];
  strings.forEach((text, i) => {
    if (text !== "") pieces.push({ kind: "text", text });
    const value = values[i];
    if (value === undefined || value === "") return;
    if (typeof value === "string") pieces.push({ kind: "text", text: value });
    else if (isPiece(value)) pieces.push(value);
    else pieces.push(...value);
  });
  return pieces;
}

const isPiece = (value: Piece | Sentence): value is Piece => "kind" in value;

/** The sentence as one string: for screen readers, files and tests. */
export function plainText(sentence: Sentence): string {
  return sentence.map(pieceText).join("");
}

function pieceText(piece: Piece): string {
  if (piece.kind === "symbol") return runsText(piece.runs);
  if (piece.kind === "case") return piece.name;
  return piece.kind === "together" ? plainText(piece.pieces) : piece.text;
}

/** A symbol in one string: raised and lowered digits where Unicode has them, else plain: "m²", "Re_λ". */
export function runsText(runs: readonly Run[]): string {
  return runs
    .map(({ text, place }) => {
      if (place === "sup" && /^[−-]?\d+$/.test(text)) return raisedDigits(Number(text.replace("−", "-")));
      if (place === "sup") return `^${text}`;
      if (place === "sub" && !/^\d+$/.test(text)) return `_${text}`;
      return text;
    })
    .join("");
}
