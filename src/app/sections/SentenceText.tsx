import type { Piece, Sentence } from "../../export/sentences/piece.ts";
import { CaseMark } from "./CaseMark.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { RichText } from "./RichText.tsx";
import { SymbolText } from "./SymbolText.tsx";

/** A sentence as the page sets it: values in weight 600, intervals in grey, each case behind its marker. */
export function SentenceText({ sentence }: { sentence: Sentence }) {
  return sentence.map((piece, i) => (
    // biome-ignore lint/suspicious/noArrayIndexKey: pieces have no identity but their place
    <PieceText piece={piece} key={i} />
  ));
}

function PieceText({ piece }: { piece: Piece }) {
  switch (piece.kind) {
    case "text":
      return <RichText text={piece.text} />;
    case "strong":
      return piece.about === undefined ? (
        <strong>{piece.text}</strong>
      ) : (
        <NumberButton of={piece.about.key} quantity={piece.about.quantity}>
          <strong>{piece.text}</strong>
        </NumberButton>
      );
    case "interval":
      return <span className="ci">{piece.text}</span>;
    case "symbol":
      return <SymbolText runs={piece.runs} />;
    case "case":
      return (
        <span className="case-name">
          <CaseMark mark={piece.mark} />
          {piece.name}
        </span>
      );
    case "verbatim":
      return <span className="well">{piece.text}</span>;
    case "together":
      return (
        <span className="nowrap">
          <SentenceText sentence={piece.pieces} />
        </span>
      );
  }
}
