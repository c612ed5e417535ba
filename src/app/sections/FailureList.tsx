import { failureText, type PlainFailure } from "../../core/failure.ts";
import { failureSentence } from "../../export/sentences/progressSentences.ts";
import { Pennant } from "./Pennant.tsx";
import { SentenceText } from "./SentenceText.tsx";

/** What could not be used: each by its place, the fact, and what can be done. */
export function FailureList({
  failures,
  fault = false,
}: {
  failures: readonly PlainFailure[];
  /** True where nothing at all could be used. */
  fault?: boolean;
}) {
  return (
    <ul className="failures">
      {failures.map((failure) => (
        <li className={`failure ${fault ? "fault" : ""}`} key={failureText(failure)}>
          <Pennant />
          <span>
            <SentenceText sentence={failureSentence(failure)} />
          </span>
        </li>
      ))}
    </ul>
  );
}
