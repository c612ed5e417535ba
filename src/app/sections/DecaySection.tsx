import type { ReactNode } from "react";
import type { Comparison } from "../../core/comparison.ts";
import type { Sentence } from "../../export/sentences/piece.ts";
import { decayFigure } from "../../figures/decayFigure.ts";
import { formatNumber } from "../../figures/formatNumber.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import { figureName } from "../page/figureNumbers.ts";
import type { CaseView } from "../session/caseView.ts";
import { ArgumentSection, type SectionFigure } from "./ArgumentSection.tsx";
import { DecayChoices } from "./DecayChoices.tsx";
import { DecayFolds } from "./DecayFolds.tsx";
import { FlagNotes } from "./FlagNotes.tsx";
import { flagGroups } from "./flagGroups.ts";
import { NoLaw } from "./NoLaw.tsx";
import type { Note } from "./SectionFrame.tsx";

const figure: SectionFigure = {
  name: figureName("decay"),
  title: "Decay of the energy, with the joint regions of exponent and origin",
  widthMm: 178,
  build: decayFigure,
  caption: (
    <>
      (<i>a</i>) Energy against distance from the virtual origin. Filled: inside the fit window; open:
      outside; the law is thin where it is extended. Below, residuals from the law; an open arrowhead stands
      for one beyond the strip. Bars: 95 %. (<i>b</i>) Joint 68 % and 95 % regions of <i>n</i> and the virtual
      origin in the chosen window, the contours of the profile itself (dotted and empty while they are those
      of the window before); bars: their adopted 95 % intervals, for an automatic window the union over later
      starts; dashed: exponents of the classical hypotheses.
    </>
  ),
};

/** Intensity and decay: the law, its origin, and what else could be said of them. */
export function DecaySection({
  cases,
  sentences,
  stale,
  late,
  comparisons,
  onChange,
  children,
}: {
  cases: readonly CaseView[];
  sentences: readonly Sentence[];
  stale: boolean;
  /** True while the argument has been waited for longer than a moment. */
  late: boolean;
  comparisons: readonly Comparison[];
  onChange: (change: WorkspaceChange) => void;
  /** Further folds. */
  children?: ReactNode;
}) {
  const fitted = cases.filter(({ decay }) => decay !== null && decay.points.length > 0);
  const notes: Note[] = [
    {
      name: "Choices",
      fact: cases.every(({ of }) => of.sheet.fit.window === "auto")
        ? "automatic window"
        : "window set by hand",
      body: <DecayChoices cases={cases} onChange={onChange} />,
    },
    ...flagNotes(fitted),
    ...correlationNote(fitted),
  ];
  return (
    <ArgumentSection
      id="decay"
      cases={cases}
      sentences={sentences}
      stale={stale}
      figure={fitted.length > 0 ? figure : null}
      notes={notes}
    >
      {cases.map((view) => (
        <NoLaw view={view} onChange={onChange} key={view.id} />
      ))}
      {fitted.length > 0 && <DecayFolds comparisons={comparisons} late={late} onChange={onChange} />}
      {children}
    </ArgumentSection>
  );
}

/** The doubts about the laws, beside them. */
function flagNotes(cases: readonly CaseView[]): Note[] {
  const groups = flagGroups(cases.map((view) => ({ ...view, stations: [], reduced: null })));
  if (groups.length === 0) return [];
  return [{ name: "Flags", fact: String(groups.length), body: <FlagNotes groups={groups} unit="" /> }];
}

/** From this size on, n and x0 cannot be read apart. */
const tied = 0.8;

function correlationNote(cases: readonly CaseView[]): Note[] {
  const values = cases.flatMap(({ decay }) => decay?.correlation_n_x0 ?? []);
  if (!values.some((value) => Math.abs(value) > tied)) return [];
  const text = values.map((value) => formatNumber(value, 2)).join(" and ");
  const along = cases[0].along ?? "x";
  return [
    {
      name: "Correlation",
      body: (
        <p>
          <i className="sym">n</i> and{" "}
          <span className="sym">
            {along}
            <sub className="up">0</sub>
          </span>{" "}
          are tied ({text}): an origin {along === "t" ? "that is later" : "further downstream"} asks for a
          smaller exponent. Quote both.
        </p>
      ),
    },
  ];
}
