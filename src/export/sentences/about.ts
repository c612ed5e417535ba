import type { Quantity } from "../../core/quantity.ts";
import type { Piece, Sentence } from "./piece.ts";

/** The same words about another quantity: a size that is printed without its sign is still the signed one's. */
export function about(sentence: Sentence, key: string, quantity: Quantity): Sentence {
  return sentence.map((piece): Piece => {
    if (piece.kind === "strong") return { ...piece, about: { key, quantity } };
    return piece.kind === "together" ? { ...piece, pieces: about(piece.pieces, key, quantity) } : piece;
  });
}
