import { use, useCallback, useMemo, useState } from "react";
import { unitOf } from "../../core/unitText.ts";
import type { FigureOptions } from "../../figures/figureSpec.ts";
import { formatDigits, formatPosition, withUnit } from "../../figures/formatNumber.ts";
import { startUpFigure } from "../../figures/startUpFigure.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import { RestedCases } from "../page/restedCases.ts";
import type { CaseView } from "../session/caseView.ts";
import { CaseMark } from "./CaseMark.tsx";
import { ChoiceField } from "./ChoiceField.tsx";
import { DrawnFold } from "./DrawnFold.tsx";
import { FigureBlock } from "./FigureBlock.tsx";
import { startUpOffer } from "./startUpOffer.ts";
import { useSettled } from "./useSettled.ts";

/** How records begin: block means and variances against time, the transient that was found, and what is left out. */
export function StartUpFold({ onChange }: { onChange: (change: WorkspaceChange) => void }) {
  const rested = use(RestedCases);
  const cases = rested.filter((view) => view.stations.some(({ blocks }) => blocks !== null));
  if (cases.length === 0) return null;
  const begun = cases.filter((view) => startUpOffer(view) !== null).map(({ name }) => name);
  const left = cases.filter((view) => view.of.sheet.startup > 0).map(({ name }) => name);
  const facts = [
    begun.length === 0 ? "no transient found" : `a transient in ${begun.join(", ")}`,
    ...(left.length === 0 ? [] : [`left out in ${left.join(", ")}`]),
  ];
  return (
    <DrawnFold name="How records begin" fact={facts.join("; ")}>
      {() => <Beginnings cases={cases} onChange={onChange} />}
    </DrawnFold>
  );
}

interface Shown {
  readonly cases: readonly CaseView[];
  readonly onChange: (change: WorkspaceChange) => void;
}

function Beginnings({ cases, onChange }: Shown) {
  const [caseId, chooseCase] = useState<string | null>(null);
  const [place, choosePlace] = useState<string | null>(null);
  const view = cases.find(({ id }) => id === caseId) ?? cases.find(startUpOffer) ?? cases[0];
  const recorded = view.stations.filter(({ blocks }) => blocks !== null);
  const offer = startUpOffer(view);
  // what enters with the flow clears the last station last
  const usual = offer?.station ?? recorded[recorded.length - 1];
  const station = recorded.find(({ x }) => String(x) === place) ?? usual;
  const { startup } = view.of.sheet;
  const unit = unitOf(view.along === "t" ? "T" : "L", view.units);
  const now = useMemo(
    () => ({ of: view, station, startup, proposed: offer?.time ?? null }),
    [view, station, startup, offer?.time],
  );
  // blocks belong to the start-up that they were reduced with
  const shown = useSettled(now, view.work === null);
  const build = useCallback((options: FigureOptions) => startUpFigure(shown, options), [shown]);
  return (
    <>
      <div className="fields">
        {cases.length > 1 && (
          <ChoiceField
            label="case"
            value={view.id}
            choices={Object.fromEntries(cases.map(({ id, name }) => [id, name]))}
            onChange={(id) => {
              chooseCase(id);
              choosePlace(null);
            }}
          />
        )}
        <ChoiceField
          label="station"
          value={`at ${station.x}`}
          choices={Object.fromEntries(
            recorded.map(({ x }) => [`at ${x}`, withUnit(formatPosition(x), unit)]),
          )}
          onChange={(at) => choosePlace(at.slice(3))}
        />
      </div>
      <FigureBlock
        name="Start-up"
        title="Block means and variances against time"
        widthMm={178}
        build={build}
        caption={caption}
      />
      <Answers view={view} onChange={onChange} />
    </>
  );
}

const caption = (
  <>
    (<i>a</i>) Means of <i>u</i> and (<i>b</i>) variances over blocks of the record, over those of the whole.
    Shaded: left out. Dashed: time after which the checks find it steady. Upright line: time of flight from{" "}
    <i>x</i> = 0.
  </>
);

function Answers({ view, onChange }: { view: CaseView; onChange: Shown["onChange"] }) {
  const offer = startUpOffer(view);
  const { startup } = view.of.sheet;
  const time = unitOf("T", view.units);
  const leaveOut = (seconds: number) =>
    onChange({ kind: "set-reduction", caseId: view.id, edit: { startup: seconds } });
  return (
    <p className="change-cases">
      <span>
        <CaseMark mark={view.mark} /> {view.name}:{" "}
        {startup === 0 ? "nothing is left out" : `${withUnit(formatDigits(startup, 3), time)} are left out`}
        {view.work === null && offer === null && ", and every record goes on as it begins"}
      </span>
      {offer !== null && (
        <button type="button" className="action" onClick={() => leaveOut(offer.time)}>
          Leave out {withUnit(formatDigits(offer.time, 3), time)}
        </button>
      )}
      {startup > 0 && (
        <button type="button" className="action" onClick={() => leaveOut(0)}>
          Leave nothing out
        </button>
      )}
    </p>
  );
}
