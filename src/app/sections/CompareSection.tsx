import { use, useCallback, useMemo, useState } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { type ComparedQuantity, type Comparison, comparedQuantities } from "../../core/comparison.ts";
import type { Sentence } from "../../export/sentences/piece.ts";
import { runsText } from "../../export/sentences/piece.ts";
import { comparedPairs } from "../../figures/comparedPair.ts";
import { comparisonFigure } from "../../figures/comparisonFigure.ts";
import type { FigureOptions } from "../../figures/figureSpec.ts";
import { formatNumber } from "../../figures/formatNumber.ts";
import { overlayFigure } from "../../figures/overlayFigure.ts";
import type { SheetCompare } from "../../sheet/caseSheet.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import { figureName } from "../page/figureNumbers.ts";
import { RestedCases } from "../page/restedCases.ts";
import { sectionOf } from "../page/sectionList.ts";
import type { CaseView } from "../session/caseView.ts";
import { ChoiceField } from "./ChoiceField.tsx";
import { CompareChoices } from "./CompareChoices.tsx";
import { CompareFolds } from "./CompareFolds.tsx";
import { FigureBlock } from "./FigureBlock.tsx";
import { Finding } from "./Finding.tsx";
import { SectionFrame } from "./SectionFrame.tsx";
import { ToleranceControl } from "./ToleranceControl.tsx";

/** Every other case against a chosen one, laid over it by their origins, by x or by intensity. */
export function CompareSection({
  cases,
  stale,
  sentences,
  comparisons,
  settings,
  onChange,
}: {
  cases: readonly CaseView[];
  stale: boolean;
  /** One finding for each comparison. */
  sentences: readonly (readonly Sentence[])[];
  comparisons: readonly Comparison[];
  settings: SheetCompare;
  onChange: (change: WorkspaceChange) => void;
}) {
  const compare = (edit: Partial<SheetCompare>) =>
    onChange({ kind: "edit-every-sheet", edit: { compare: { ...settings, ...edit } } });
  const notes = [
    {
      name: "Tolerance",
      fact: `${formatNumber(settings.tolerance * 100, 0)}\u202f%`,
      body: <ToleranceControl settings={settings} onChange={compare} />,
    },
    {
      name: "Choices",
      body: <CompareChoices cases={cases} settings={settings} onChange={compare} />,
    },
  ];
  const several = comparisons.length > 1;
  return (
    <SectionFrame section={sectionOf("compare")} notes={cases.length > 1 ? notes : []}>
      {cases.length < 2 && (
        <p className="finding serif">A second case is needed for a comparison: drop one, or add its files.</p>
      )}
      {comparisons.map(({ cases: names }, i) => (
        // with several pairs each opens with its claim, and the rest stands in its fold
        <Finding
          key={names.join(" ")}
          sentences={several ? (sentences[i] ?? []).slice(0, 1) : (sentences[i] ?? [])}
          stale={stale}
        />
      ))}
      <CompareFigures comparisons={comparisons} />
      {comparisons.length > 0 && (
        <CompareFolds cases={cases} comparisons={comparisons} sentences={sentences} />
      )}
    </SectionFrame>
  );
}

const quantityNames = Object.fromEntries(
  comparedQuantities.map((key) => [key, `${labelOf(key).name}, ${runsText(labelOf(key).symbol)}`]),
) as Record<ComparedQuantity, string>; // one entry for each key of the list

function CompareFigures({ comparisons }: { comparisons: readonly Comparison[] }) {
  const rested = use(RestedCases);
  const [quantity, choose] = useState<ComparedQuantity>("Tu");
  const pairs = useMemo(
    () => comparedPairs(comparisons, rested).filter(({ comparison }) => comparison.overlap !== null),
    [comparisons, rested],
  );
  const ratios = useCallback((options: FigureOptions) => comparisonFigure(pairs, options), [pairs]);
  const overlay = useCallback(
    (options: FigureOptions) => overlayFigure(comparisons, rested, quantity, options),
    [comparisons, rested, quantity],
  );
  if (pairs.length === 0) return null;
  const [{ comparison, first }] = pairs;
  const spectra = pairs.some((pair) => pair.comparison.spectra.pairs.length > 0);
  return (
    <>
      <FigureBlock
        name={figureName("ratios")}
        title={`Ratios to ${first.name}`}
        widthMm={178}
        build={ratios}
        caption={
          <>
            Ratios to {first.name} over the common range. Marker and bar: geometric mean, 95 %; small ticks:
            single places. Shaded: tolerance. Open: undecided.
          </>
        }
      />
      <div className="laid-quantity">
        <ChoiceField
          label="Laid over one another"
          value={quantity}
          choices={quantityNames}
          onChange={choose}
        />
      </div>
      <FigureBlock
        name={figureName("ratios", true)}
        title={`${labelOf(quantity).name} of all cases over one another, and ratios along the stream`}
        widthMm={spectra ? 178 : 86}
        build={overlay}
        caption={
          <OverlayCaption
            comparison={comparison}
            base={first.name}
            spectra={spectra}
            single={pairs.length === 1}
          />
        }
      />
    </>
  );
}

const laidBy = {
  x0: "Each case is shifted by its own virtual origin; the band along the axis is the 95 % interval of that",
  x: "At the same position: no origin enters, and none makes a band",
  Tu: "At the same intensity, downstream to the right: no origin makes a band",
} as const;

function OverlayCaption({
  comparison: { align },
  base,
  spectra,
  single,
}: {
  comparison: Comparison;
  base: string;
  spectra: boolean;
  single: boolean;
}) {
  return (
    <>
      (<i>a</i>) {laidBy[align]}. (<i>b</i>) Ratio to {base}, with its 95 % interval on the tolerance band
      {single && "; upright: from there on the cases are equivalent in the quantities chosen"}.
      {spectra && (
        <>
          {" "}
          (<i>c</i>) Spectra of the middle pair of stations in Kolmogorov form. (<i>d</i>) Distance of the
          spectra of every two nearest stations within 10 % of equal distance; filled: farther apart than 95
          in 100 would by chance. Lines: what chance makes of it, its mean and its 95 % point.
        </>
      )}
    </>
  );
}
