import { useCallback, useMemo } from "react";
import { unitOf } from "../../core/unitText.ts";
import {
  beyondTargetSentences,
  bodyCaution,
  bodySentences,
  noBodySentence,
} from "../../export/sentences/bodySentences.ts";
import { type Sentence, say } from "../../export/sentences/piece.ts";
import { arguedOf } from "../../figures/arguedOf.ts";
import { bodyFigure } from "../../figures/bodyFigure.ts";
import type { FigureOptions } from "../../figures/figureSpec.ts";
import { formatPosition, withUnit } from "../../figures/formatNumber.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import { figureName } from "../page/figureNumbers.ts";
import { sectionOf } from "../page/sectionList.ts";
import type { CaseView } from "../session/caseView.ts";
import { BodyChoices } from "./BodyChoices.tsx";
import { BodyFields } from "./BodyFields.tsx";
import { BodyTable } from "./BodyTable.tsx";
import { placedBodies } from "./bodyRows.ts";
import { DevelopmentFold } from "./DevelopmentFold.tsx";
import { FigureBlock } from "./FigureBlock.tsx";
import { Finding } from "./Finding.tsx";
import { SaidSentences } from "./SaidSentences.tsx";
import { type Note, SectionFrame } from "./SectionFrame.tsx";
import { TargetTable } from "./TargetTable.tsx";

/** What a body meets: it follows a bracket, and its own marker on the ruler, once they rest. */
export function BodySection({
  cases,
  late,
  onChange,
}: {
  /** At rest; the same list while nothing in it changes. */
  cases: readonly CaseView[];
  /** The worker has been at it for more than a moment. */
  late: boolean;
  onChange: (change: WorkspaceChange) => void;
}) {
  const wanted = useMemo(() => cases.filter(({ of }) => of.sheet.body !== null), [cases]);
  const stale = late && wanted.some((view) => view.stale || arguedOf(view)?.stale);
  return (
    <SectionFrame section={sectionOf("body")} notes={notesOf(cases, wanted, onChange)}>
      <Finding sentences={findingOf(cases, wanted)} stale={stale} />
      <SaidSentences sentences={beyondTargetSentences(wanted)} />
      {wanted.length === 0 ? <NoBody cases={cases} onChange={onChange} /> : <Met cases={wanted} />}
      <DevelopmentFold cases={cases} onChange={onChange} />
    </SectionFrame>
  );
}

function findingOf(cases: readonly CaseView[], wanted: readonly CaseView[]): readonly Sentence[] {
  if (wanted.length === 0) return [noBodySentence(cases[0], lastPlace(cases))];
  const sentences = bodySentences(wanted);
  return sentences.length > 0 ? sentences : [say`What the body meets there is being worked out.`];
}

function notesOf(
  cases: readonly CaseView[],
  [first]: readonly CaseView[],
  onChange: (change: WorkspaceChange) => void,
): Note[] {
  const body = first?.of.sheet.body ?? null;
  if (body === null) return [];
  return [
    {
      name: "Body and targets",
      fact: placeText(body.x, first),
      body: <BodyChoices cases={cases} onChange={onChange} />,
    },
  ];
}

/** Where to say that a body stands; the last station is offered. */
function NoBody({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const last = lastPlace(cases);
  return (
    <div className="no-body">
      <BodyFields cases={cases} onChange={onChange} />
      {last !== null && (
        <button
          type="button"
          className="action"
          onClick={() => onChange({ kind: "set-body", caseId: null, body: { x: last } })}
        >
          Place it at {placeText(last, cases[0])}
        </button>
      )}
    </div>
  );
}

/** Figure and tables of the cases in which a body stands. */
function Met({ cases }: { cases: readonly CaseView[] }) {
  const build = useCallback((options: FigureOptions) => bodyFigure(cases, options), [cases]);
  const placed = useMemo(() => placedBodies(cases), [cases]);
  if (placed.length === 0) return null;
  return (
    <>
      {/* one column of print holds the numbers of two cases; more stand under the figure */}
      <div className={placed.length <= 2 ? "pair" : undefined}>
        <FigureBlock
          name={figureName("body")}
          title="Intensity and integral scale of each case as a path, and where the body stands on it"
          widthMm={86}
          build={build}
          caption={caption}
        />
        <div className="beside">
          <BodyTable placed={placed} />
        </div>
      </div>
      <TargetTable placed={placed} />
      <p className="small-print">{bodyCaution}</p>
    </>
  );
}

const caption = (
  <>
    Each case as a path: downstream the intensity falls. Filled: inside the fit window. Ringed: at the body.
    Bars: 95 %. Cross and dashed lines: targets.
  </>
);

function lastPlace([first]: readonly CaseView[]): number | null {
  return first.stations.at(-1)?.x ?? null;
}

function placeText(x: number, { along, units }: CaseView): string {
  return withUnit(formatPosition(x), unitOf(along === "t" ? "T" : "L", units));
}
