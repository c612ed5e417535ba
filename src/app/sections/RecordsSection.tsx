import { useState } from "react";
import { unitOf } from "../../core/unitText.ts";
import type { Sentence } from "../../export/sentences/piece.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import { sectionOf } from "../page/sectionList.ts";
import type { CaseView } from "../session/caseView.ts";
import type { Held } from "../session/session.ts";
import { AsideList } from "./AsideList.tsx";
import { ChecksFold } from "./ChecksFold.tsx";
import { DurationFold } from "./DurationFold.tsx";
import { FailureList } from "./FailureList.tsx";
import { FilesFold } from "./FilesFold.tsx";
import { Finding } from "./Finding.tsx";
import { FlagNotes } from "./FlagNotes.tsx";
import { flagGroups } from "./flagGroups.ts";
import { Questions } from "./Questions.tsx";
import { ReducingState } from "./ReadingState.tsx";
import { RecordsTable } from "./RecordsTable.tsx";
import { ReductionChoices } from "./ReductionChoices.tsx";
import { ReductionFold } from "./ReductionFold.tsx";
import { roundedTimes } from "./roundedTimes.ts";
import { SectionFrame } from "./SectionFrame.tsx";
import { StartUpFold } from "./StartUpFold.tsx";

/** What was read, from where, what is wrong with it, and what is still asked. */
export function RecordsSection({
  cases,
  held,
  sentences,
  narrow,
  onChange,
  onSave,
  onCancel,
  onResume,
}: {
  cases: readonly CaseView[];
  held: Held;
  sentences: readonly Sentence[];
  narrow: boolean;
  onChange: (change: WorkspaceChange) => void;
  onSave: (view: CaseView) => void;
  onCancel: () => void;
  onResume: (caseId: string) => void;
}) {
  const groups = flagGroups(cases);
  const work = cases.flatMap((view) => (view.work ? [view.work] : []));
  const failures = cases.flatMap((view) => view.reduced?.failures ?? []);
  const notes = [
    {
      name: "Choices",
      fact: "how records are reduced",
      body: <ReductionChoices cases={cases} onChange={onChange} />,
    },
    ...(groups.length === 0
      ? []
      : [
          {
            name: "Flags",
            fact: String(groups.length),
            body: <FlagNotes groups={groups} unit={unitOf("L", cases[0].of.sheet.units)} />,
          },
        ]),
  ];
  return (
    <SectionFrame section={sectionOf("records")} notes={notes}>
      {work.length > 0 ? (
        <ReducingState work={work} onCancel={onCancel} />
      ) : (
        <Finding sentences={sentences} />
      )}
      {failures.length > 0 && <FailureList failures={failures} />}
      {cases
        .filter((view) => view.reduced?.complete === false && view.reduced.stations.length > 0 && !view.work)
        .map((view) => (
          <p className="resume" key={view.id}>
            {view.name} was cancelled: {view.reduced?.sources.length} of {view.of.sources.length} files are
            in.{" "}
            <button type="button" className="action" onClick={() => onResume(view.id)}>
              Read the others
            </button>
          </p>
        ))}
      <RecordsTable cases={cases} narrow={narrow} />
      <CaseQuestions cases={cases} onChange={onChange} onSave={onSave} />
      <AsideList aside={held.aside} />
      <FilesFold cases={cases} previews={held.previews} />
      <ChecksFold cases={cases} />
      <ReductionFold />
      <StartUpFold onChange={onChange} />
      <DurationFold />
    </SectionFrame>
  );
}

/** Cases without a sheet, or with an open question, are asked at once until that is closed; the others where it is wanted. */
function CaseQuestions({
  cases,
  onChange,
  onSave,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
  onSave: (view: CaseView) => void;
}) {
  const [chosen, choose] = useState<Readonly<Record<string, boolean>>>({});
  const isOpen = (view: CaseView) => chosen[view.id] ?? (!view.of.fromSheet || roundedTimes(view) !== null);
  const closed = cases.filter((view) => !isOpen(view));
  return (
    <>
      {cases.filter(isOpen).map((view) => (
        <Questions
          key={view.id}
          view={view}
          onChange={onChange}
          onSave={() => onSave(view)}
          onClose={() => choose({ ...chosen, [view.id]: false })}
        />
      ))}
      {closed.length > 0 && (
        <p className="change-cases">
          {closed.map((view) => (
            <button
              type="button"
              className="action"
              key={view.id}
              onClick={() => choose({ ...chosen, [view.id]: true })}
            >
              Change {view.name}
            </button>
          ))}
        </p>
      )}
    </>
  );
}
