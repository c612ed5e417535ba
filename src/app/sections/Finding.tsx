import type { Sentence } from "../../export/sentences/piece.ts";
import { SentenceText } from "./SentenceText.tsx";

/** The finding that opens a section; grey on dots while newer numbers take longer than a moment. */
export function Finding({ sentences, stale = false }: { sentences: readonly Sentence[]; stale?: boolean }) {
  return (
    <p className="finding serif" aria-busy={stale}>
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
