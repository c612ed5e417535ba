import type { Aside } from "../session/session.ts";
import { FailureList } from "./FailureList.tsx";
import { Fold } from "./Fold.tsx";

/** A list no longer than this stands open: it is read sooner than it is opened. */
const shownAtOnce = 8;

/** What of the drops was not used: faults in sight, files left out in a fold. */
export function AsideList({ aside, fault = false }: { aside: Aside; fault?: boolean }) {
  const { leftOut, failures, warnings } = aside;
  const list = (
    <ul className="left-out">
      {leftOut.map(({ name, reason }) => (
        <li key={name}>
          <span className="well">{name}</span> {reason}
        </li>
      ))}
    </ul>
  );
  return (
    <>
      {failures.length > 0 && <FailureList failures={failures} fault={fault} />}
      {warnings.map((warning) => (
        <p className="warning" key={warning}>
          {warning}
        </p>
      ))}
      {leftOut.length > 0 &&
        (fault ? (
          list
        ) : (
          <Fold
            name="Left out"
            open={leftOut.length <= shownAtOnce}
            fact={leftOut.length === 1 ? "1 file" : `${leftOut.length} files`}
          >
            {list}
          </Fold>
        ))}
    </>
  );
}
