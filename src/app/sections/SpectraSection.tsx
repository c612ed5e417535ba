import { useCallback, useMemo, useState } from "react";
import { unitOf } from "../../core/unitText.ts";
import { spectrumSentences } from "../../export/sentences/spectrumSentences.ts";
import type { FigureOptions, PickedCurve } from "../../figures/figureSpec.ts";
import { formatPosition, withUnit } from "../../figures/formatNumber.ts";
import { localSpectrumFigure } from "../../figures/localSpectrumFigure.ts";
import { possibleForm } from "../../figures/spectrumCurves.ts";
import { spectrumFigure } from "../../figures/spectrumFigure.ts";
import type { PickedStation, WorkspaceChange } from "../../sheet/workspace.ts";
import { figureName } from "../page/figureNumbers.ts";
import { pickLetters } from "../page/pickLetters.ts";
import { createStillCases } from "../page/stillCases.ts";
import type { CaseView } from "../session/caseView.ts";
import { ArgumentSection, type SectionFigure } from "./ArgumentSection.tsx";
import { CaseMark } from "./CaseMark.tsx";
import { ChoiceField } from "./ChoiceField.tsx";
import { FigureBlock } from "./FigureBlock.tsx";
import { Fold } from "./Fold.tsx";
import { LocalNumbers } from "./LocalNumbers.tsx";
import { lineMeanings } from "./lineMeaning.ts";
import { RichText } from "./RichText.tsx";

const forms = {
  compensated: "compensated",
  premultiplied: "premultiplied",
  kolmogorov: "Kolmogorov form",
  dimensional: "dimensional",
} as const;
type Form = keyof typeof forms;
const components = {
  E11: "of u, E₁₁",
  E22: "of v, E₂₂",
  E33: "of w, E₃₃",
  E12: "co-spectrum of u and v, E₁₂",
} as const;
type Component = keyof typeof components;

/** Spectra and correlations of the stations picked on the ruler. */
export function SpectraSection({
  cases,
  stale,
  picked,
  onChange,
}: {
  cases: readonly CaseView[];
  stale: boolean;
  picked: readonly PickedStation[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const [form, setForm] = useState<Form>("compensated");
  const [component, setComponent] = useState<Component>("E11");
  const still = useMemo(createStillCases, []);
  const steady = still(cases);
  const build = useCallback(
    (shown: readonly CaseView[], options: FigureOptions) =>
      spectrumFigure(pickedCurves(shown, picked), options, form, component),
    [picked, form, component],
  );
  const buildLocal = useCallback(
    (options: FigureOptions) => localSpectrumFigure(pickedCurves(steady, picked), options),
    [steady, picked],
  );
  const curves = useMemo(() => pickedCurves(steady, picked), [steady, picked]);
  const sentences = useMemo(() => spectrumSentences(curves), [curves]);
  const figure: SectionFigure = {
    name: figureName("spectra"),
    title: "Spectra and autocorrelations of the picked stations",
    widthMm: 178,
    build,
    caption: <Caption form={possibleForm(curves, form)} component={component} curves={curves} />,
  };
  const notes = [
    {
      name: "Picked on the ruler",
      fact: `${curves.length} stations`,
      body: (
        <>
          <PickedList curves={curves} cases={cases} onChange={onChange} />
          {component !== "E12" && (
            <ChoiceField label="spectra" value={form} choices={forms} onChange={setForm} />
          )}
          <ChoiceField label="component" value={component} choices={components} onChange={setComponent} />
        </>
      ),
    },
  ];
  return (
    <ArgumentSection
      id="spectra"
      cases={cases}
      stale={stale}
      sentences={sentences}
      figure={curves.length > 0 ? figure : null}
      notes={notes}
    >
      {curves.length === 0 && (
        <p className="reason">
          {cases.some(({ stations }) => stations.some((station) => station.curves !== null))
            ? "No station is picked. A click on a tick of the ruler, or the space bar on it, picks one."
            : "A profile holds no records, so there are no spectra."}
        </p>
      )}
      {curves.some(({ station }) => station.curves?.local) && (
        <Fold name="Local slope, isotropy scale by scale">
          <FigureBlock
            name={figureName("spectra", true)}
            title="Local slope of the spectra, and E22 against isotropy"
            widthMm={178}
            build={buildLocal}
            caption={localCaption}
          />
          <LocalNumbers curves={curves} />
        </Fold>
      )}
    </ArgumentSection>
  );
}

const localCaption = (
  <>
    (<i>a</i>) <RichText text="Local slope of E₁₁ over bands; dashed: −5/3." /> (<i>b</i>), (<i>c</i>){" "}
    <RichText text="Spectra of v and w over the one that E₁₁ implies in isotropic flow." />
  </>
);

/** What the panels show, in the form and of the component that were chosen. */
function Caption({
  form,
  component,
  curves,
}: {
  form: Form;
  component: Component;
  curves: readonly CurveOfCase[];
}) {
  const revived = curves.some(({ station }) => station.curves?.revival !== undefined);
  const meanings = new Set(
    curves.flatMap(({ station }) => lineMeanings(station.facts.lines?.along ?? "x") ?? []),
  );
  return (
    <>
      (<i>a</i>){" "}
      <RichText
        text={
          component === "E12"
            ? "Co-spectrum of u and v, k₁ E₁₂/(u′v′), in bands: equal areas carry equal shares of the correlation; upright strokes: 95 %, without the quadrature part;"
            : `One-sided spectra ${components[component]}, ${forms[form]}, in bands; upright strokes: 95 % by chi-square;`
        }
      />{" "}
      thin: further downstream. (<i>b</i>) Autocorrelation; ringed: its first zero, the limit of the integral.
      {revived && (
        <>
          {" "}
          (<i>c</i>) The correlation revives where the inflow is replayed; ringed: the period, which is all
          that counts of the record.
        </>
      )}
      {[...meanings].map((text) => (
        <span key={text}>
          {" "}
          On <RichText text={text} />.
        </span>
      ))}
    </>
  );
}

/** A picked station with what the sentences and the figure need of its case. */
interface CurveOfCase extends PickedCurve {
  readonly caseId: string;
  readonly of: CaseView;
}

function PickedList({
  curves,
  cases,
  onChange,
}: {
  curves: readonly CurveOfCase[];
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const unit = unitOf("L", cases[0].of.sheet.units);
  return (
    <ul className="picked-list">
      {curves.map(({ letter, of, station, caseId }) => (
        <li key={letter}>
          <i className="sym">{letter}</i> <CaseMark mark={of.mark} /> {of.name},{" "}
          {withUnit(formatPosition(station.x), unit)}{" "}
          <button
            type="button"
            className="action"
            aria-label={`Leave out ${of.name}, ${station.x}`}
            onClick={() => onChange({ kind: "unpick", station: { caseId, x: station.x } })}
          >
            leave out
          </button>
        </li>
      ))}
    </ul>
  );
}

/** The picked stations that have curves, with their letters. */
function pickedCurves(cases: readonly CaseView[], picked: readonly PickedStation[]): CurveOfCase[] {
  return pickLetters(picked).flatMap(({ caseId, x, letter }) => {
    const of = cases.find(({ id }) => id === caseId);
    const station = of?.stations.find((each) => each.x === x);
    return of && station?.curves ? [{ of, station, letter, caseId }] : [];
  });
}
