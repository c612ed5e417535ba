import { unitOf } from "../../core/unitText.ts";
import { formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";

/** A case without a law: what would give it one, as actions. The reason is in the finding above. */
export function NoLaw({ view, onChange }: { view: CaseView; onChange: (change: WorkspaceChange) => void }) {
  const { decay, stations, of, id } = view;
  if (decay === null || decay.law !== null || stations.length < 3) return null;
  const [first, last] = [stations[0].x, stations[stations.length - 1].x];
  const { fit } = of.sheet;
  const narrowed = fit.window !== "auto" && (fit.window[0] > first || fit.window[1] < last);
  return (
    <p className="no-law">
      <CaseMark mark={view.mark} /> {view.name}:
      {narrowed && (
        <button
          type="button"
          className="action"
          onClick={() => onChange({ kind: "set-window", caseId: id, window: [first, last] })}
        >
          Widen the window to {formatPosition(first)} to{" "}
          {withUnit(formatPosition(last), unitOf("L", of.sheet.units))}
        </button>
      )}
      {fit.x0 === null && (
        <button
          type="button"
          className="action"
          onClick={() => onChange({ kind: "hold-origin", caseId: id, x0: 0 })}
        >
          Hold the origin at zero
        </button>
      )}
      {fit.n === null && (
        <button
          type="button"
          className="action"
          onClick={() => onChange({ kind: "hold-exponent", caseId: id, n: 1.2 })}
        >
          Hold <i className="sym">n</i> at 6/5
        </button>
      )}
    </p>
  );
}
