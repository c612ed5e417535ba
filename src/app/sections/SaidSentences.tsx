import type { Sentence } from "../../export/sentences/piece.ts";
import { SentenceText } from "./SentenceText.tsx";

/** Sentences of a fold, one after another as one paragraph. */
export function SaidSentences({ sentences }: { sentences: readonly Sentence[] }) {
  const said = sentences.filter((sentence) => sentence.length > 0);
  if (said.length === 0) return null;
  return (
    <p className="reason">
      {said.map((sentence, i) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: sentences have no identity but their place
        <span key={i}>
          {i > 0 && " "}
          <SentenceText sentence={sentence} />
        </span>
      ))}
    </p>
  );
}
