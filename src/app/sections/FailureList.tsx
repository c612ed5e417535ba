import { failureText, type PlainFailure } from "../../core/failure.ts";
import { Pennant } from "./Pennant.tsx";

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
            {failure.where.file !== undefined && <span className="well">{failure.where.file}</span>}{" "}
            {failureText({ ...failure, where: withoutFile(failure.where) })}
          </span>
        </li>
      ))}
    </ul>
  );
}

function withoutFile({ file: _file, ...place }: PlainFailure["where"]): PlainFailure["where"] {
  return place;
}
