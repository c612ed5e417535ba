import { unitOf } from "../../core/unitText.ts";
import { formatDigits, withUnit } from "../../figures/formatNumber.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { CaseView } from "../session/caseView.ts";
import { roundedTimes } from "./roundedTimes.ts";

/** Asks once whether rounded time stamps stand for a constant step; the answer is kept in the sheet. */
export function TimesQuestion({
  view,
  onChange,
}: {
  view: CaseView;
  onChange: (change: WorkspaceChange) => void;
}) {
  const found = roundedTimes(view);
  if (found === null) return null;
  const unit = unitOf("T", view.units);
  const { steps, stations } = found;
  const [least, most] = [steps[0], steps[steps.length - 1]];
  const step =
    steps.length < 2
      ? withUnit(formatDigits(least ?? 0, 7), unit)
      : `${formatDigits(least, 7)} to ${withUnit(formatDigits(most, 7), unit)}`;
  const answer = (times: "even" | "written") =>
    onChange({ kind: "set-reduction", caseId: view.id, edit: { read: { times } } });
  return (
    <div className="positions">
      <p className="ask">
        The time stamps at {stations === 1 ? "one station" : `${stations} stations`} have too few digits.
        Within half a digit they agree with a constant step of {step}. Until one of these is chosen, what
        needs the time between samples is missing.
      </p>
      <p className="change-cases">
        <button type="button" className="action" onClick={() => answer("even")}>
          Take the constant step
        </button>
        <button type="button" className="action" onClick={() => answer("written")}>
          Take the times as written
        </button>
      </p>
    </div>
  );
}
