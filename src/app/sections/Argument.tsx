import { memo, use, useCallback, useMemo } from "react";
import { useStore } from "zustand";
import { plainText } from "../../export/sentences/piece.ts";
import { compareSettings } from "../../sheet/compareSettings.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import { LiveRegion } from "../page/LiveRegion.tsx";
import { pageExports } from "../page/pageExports.ts";
import { PlacedCases } from "../page/placedCases.ts";
import { RestedCases } from "../page/restedCases.ts";
import { Title } from "../page/Title.tsx";
import type { CaseView } from "../session/caseView.ts";
import type { PageStore } from "../session/pageStore.ts";
import type { PageWork } from "../session/pageWork.ts";
import type { Held } from "../session/session.ts";
import { ArgumentSection } from "./ArgumentSection.tsx";
import { BodySection } from "./BodySection.tsx";
import { CompareSection } from "./CompareSection.tsx";
import { DecaySection } from "./DecaySection.tsx";
import { DefinitionPanel } from "./DefinitionPanel.tsx";
import { DissipationNote } from "./DissipationNote.tsx";
import { Fold } from "./Fold.tsx";
import { balanceNotes, balancePicture, isotropyNotes, isotropyPicture, scalesPicture } from "./figures.tsx";
import { findingsOf } from "./findings.ts";
import { IntegralScaleNote } from "./IntegralScaleNote.tsx";
import { InvariantsBlock } from "./InvariantsBlock.tsx";
import { LinesNote } from "./LinesNote.tsx";
import { NarrowingFold } from "./NarrowingFold.tsx";
import { PageFoot } from "./PageFoot.tsx";
import { RecordsSection } from "./RecordsSection.tsx";
import {
  anisotropyColumns,
  dissipationColumns,
  gradientColumns,
  integralColumns,
  momentColumns,
} from "./routeColumns.ts";
import { SpectraSection } from "./SpectraSection.tsx";
import { StationRoutes } from "./StationRoutes.tsx";
import { TableSection } from "./TableSection.tsx";

/** The argument from the records to the comparison, top to bottom. */
export function Argument({
  store,
  work,
  held,
  cases,
  narrow,
}: {
  store: PageStore;
  work: PageWork;
  held: Held;
  cases: readonly CaseView[];
  narrow: boolean;
}) {
  const { dispatch, late, setHover, setPlans } = useStore(store);
  const workspace = held.history.present;
  const comparisons = held.argued?.comparisons ?? noComparisons;
  const { tolerance } = workspace.cases[0].sheet.compare;
  const findings = useMemo(() => findingsOf(cases, comparisons, tolerance), [cases, comparisons, tolerance]);
  const change = useCallback(
    (changed: WorkspaceChange) => dispatch({ kind: "changed", change: changed }),
    [dispatch],
  );
  // an argument is told late after a moment; a reduction takes longer than that
  const stale = cases.some((view) =>
    view.work === null ? late !== null && view.stale : view.stations.length > 0,
  );
  const reduced = cases.filter((view) => view.stations.length > 0);
  const shared = { cases: reduced, stale };
  // the many numbers of the folds follow a bracket once it rests
  const rested = use(RestedCases);
  const withBody = use(PlacedCases);
  const placed = useMemo(() => withBody.filter((view) => view.stations.length > 0), [withBody]);
  const folded = useMemo(() => rested.filter((view) => view.stations.length > 0), [rested]);
  const exports = useMemo(() => pageExports(rested, held), [rested, held]);
  const { compare } = useMemo(
    () => findingsOf(rested, comparisons, tolerance),
    [rested, comparisons, tolerance],
  );
  const settings = useMemo(() => compareSettings(workspace.cases[0].sheet), [workspace]);
  const point = useCallback(
    (caseId: string, x: number | null) => setHover(x === null ? null : { caseId, x }),
    [setHover],
  );
  return (
    <DefinitionPanel cases={cases} comparisons={comparisons}>
      <div className="row page-top">
        <div />
        <div>
          <Title
            title={workspace.title}
            cases={cases}
            onRename={(title) => change({ kind: "set-title", title })}
          />
        </div>
      </div>
      <RecordsSection
        cases={cases}
        held={held}
        sentences={findings.records}
        narrow={narrow}
        onChange={change}
        onSave={exports.sheets}
        onCancel={work.cancel}
        onResume={work.resume}
      />
      {reduced.length > 0 && (
        <>
          <DecaySection
            {...shared}
            late={late !== null}
            comparisons={comparisons}
            sentences={findings.decay}
            onChange={change}
          >
            <StillNarrowing cases={folded} onMarks={setPlans} />
          </DecaySection>
          <ArgumentSection
            id="isotropy"
            {...shared}
            sentences={findings.isotropy}
            figure={isotropyPicture}
            notes={isotropyNotes}
          >
            <Fold name="Small scales, stress tensor, skewness and flatness">
              <StillInvariants cases={folded} />
              <StillLines cases={folded} />
              <StillRoutes label="Anisotropy" cases={folded} columns={anisotropyColumns} />
              <StillRoutes label="Skewness and flatness" cases={folded} columns={momentColumns} />
            </Fold>
          </ArgumentSection>
          <ArgumentSection
            id="scales"
            {...shared}
            sentences={findings.scales}
            figure={scalesPicture}
            notes={[{ name: "Integral scale", body: <StillScaleNote cases={folded} onChange={change} /> }]}
          >
            <Fold name="Integral scale by every route, transverse scales">
              <StillLines cases={folded} />
              <StillRoutes label="Integral scales by route" cases={folded} columns={integralColumns} />
            </Fold>
          </ArgumentSection>
          <SpectraSection {...shared} picked={workspace.picked} onChange={change} />
          <ArgumentSection
            id="balance"
            {...shared}
            sentences={findings.balance}
            figure={balancePicture}
            notes={[
              { name: "Adopted", body: <StillDissipation cases={folded} onChange={change} /> },
              ...balanceNotes,
            ]}
          >
            <Fold name="Dissipation and gradients by every route">
              <StillLines cases={folded} />
              <StillRoutes
                label="Dissipation of every station by route"
                cases={folded}
                columns={dissipationColumns}
              />
              <StillRoutes label="Gradients by route" cases={folded} columns={gradientColumns} />
            </Fold>
          </ArgumentSection>
          <StillComparison
            cases={folded}
            stale={late !== null}
            sentences={compare}
            comparisons={comparisons}
            settings={settings}
            onChange={change}
          />
          {placed.length > 0 && <StillBody cases={placed} late={late !== null} onChange={change} />}
          <StillTable cases={folded} exports={exports} onHover={point} />
        </>
      )}
      <PageFoot cases={cases} />
      <LiveRegion text={stale ? "Recomputing." : spoken(cases, findings)} />
    </DefinitionPanel>
  );
}

// what follows a bracket only once it rests is not gone through in every frame of a drag
const StillBody = memo(BodySection);
const StillComparison = memo(CompareSection);
const StillDissipation = memo(DissipationNote);
const StillInvariants = memo(InvariantsBlock);
const StillLines = memo(LinesNote);
const StillNarrowing = memo(NarrowingFold);
const StillRoutes = memo(StationRoutes);
const StillScaleNote = memo(IntegralScaleNote);
const StillTable = memo(TableSection);

const noComparisons = [] as const;

function spoken(cases: readonly CaseView[], { records, decay }: ReturnType<typeof findingsOf>): string {
  if (cases.some((view) => view.work)) return "";
  return [...records, ...decay].map(plainText).join(" ");
}
