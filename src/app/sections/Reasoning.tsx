import type { Sentence } from "../../export/sentences/piece.ts";
import { SentenceText } from "./SentenceText.tsx";

/** A paragraph of sentences below a finding, or at the head of a fold. */
export function Reasoning({ sentences }: { sentences: readonly Sentence[] }) {
  if (sentences.length === 0) return null;
  return (
    <p className="reason">
      {sentences.map((sentence, i) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: sentences have no identity but their place
        <span key={i}>
          {i > 0 && " "}
          <SentenceText sentence={sentence} />
        </span>
      ))}
    </p>
  );
}
